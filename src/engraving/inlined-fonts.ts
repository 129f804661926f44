import plexItalicUrl from '@fontsource/ibm-plex-sans/files/ibm-plex-sans-latin-400-italic.woff2?url';
import plexBoldUrl from '@fontsource/ibm-plex-sans/files/ibm-plex-sans-latin-600-normal.woff2?url';
import plexUrl from '@fontsource/ibm-plex-sans/files/ibm-plex-sans-latin-400-normal.woff2?url';
import accidentalsUrl from '@fontsource/noto-music/files/noto-music-music-400-normal.woff2?url';
import { ACCIDENTALS_FONT, MUSIC_FONT, musicFontUrl } from '@/engraving/music-font';

const FACES = [
  { family: MUSIC_FONT, url: musicFontUrl, weight: 400, style: 'normal' },
  { family: 'IBM Plex Sans', url: plexUrl, weight: 400, style: 'normal' },
  { family: 'IBM Plex Sans', url: plexItalicUrl, weight: 400, style: 'italic' },
  { family: 'IBM Plex Sans', url: plexBoldUrl, weight: 600, style: 'normal' },
] as const;
const ACCIDENTALS = { family: ACCIDENTALS_FONT, url: accidentalsUrl, weight: 400, style: 'normal' } as const;
const HAS_ACCIDENTAL = /[♭♮♯]/u;

type Face = (typeof FACES)[number] | typeof ACCIDENTALS;

/** Bytes at a time: the arguments of one call are limited. */
const CHUNK = 0x8000;

function base64(bytes: Uint8Array): string {
  let text = '';
  for (let at = 0; at < bytes.length; at += CHUNK)
    text += String.fromCharCode(...bytes.subarray(at, at + CHUNK));
  return btoa(text);
}

async function fetched({ family, url, weight, style }: Face): Promise<string> {
  const answer = await fetch(url);
  if (!answer.ok) throw new Error(`The font ${family} could not be fetched.`);
  const data = base64(new Uint8Array(await answer.arrayBuffer()));
  const source = `src:url(data:font/woff2;base64,${data}) format('woff2')`;
  return `@font-face{font-family:'${family}';font-weight:${weight};font-style:${style};${source}}`;
}

const kept = new Map<string, Promise<string>>();

function faceOf(face: Face): Promise<string> {
  const known = kept.get(face.url);
  if (known) return known;
  const fetching = fetched(face).catch((error: unknown) => {
    kept.delete(face.url);
    throw error;
  });
  kept.set(face.url, fetching);
  return fetching;
}

/**
 * The fonts of a drawing as a style sheet that needs nothing from elsewhere.
 * @param text all that the drawing writes: the accidentals' font is put in only where it is needed
 * @throws Error where a font cannot be fetched; the next call tries again
 */
export async function inlinedFonts(text: string): Promise<string> {
  const faces = HAS_ACCIDENTAL.test(text) ? [...FACES, ACCIDENTALS] : FACES;
  return (await Promise.all(faces.map(faceOf))).join('');
}

import musicFontUrl from '@vexflow-fonts/sebastian/sebastian.woff2?url';

/** Sebastian (SIL Open Font License 1.1): the notation's signs. */
export const MUSIC_FONT = 'Sebastian';
/** What Plex lacks: ♭ ♮ ♯; the page has the same under this name. */
export const ACCIDENTALS_FONT = 'Siltline Accidentals';
export const TEXT_FONTS = `'IBM Plex Sans', '${ACCIDENTALS_FONT}', sans-serif`;

export { musicFontUrl };

let loading: Promise<void> | null = null;

/** Loads the music font once; a failed attempt is made anew when asked again. */
export function loadMusicFont(): Promise<void> {
  loading ??= new FontFace(MUSIC_FONT, `url(${musicFontUrl})`)
    .load()
    .then((face) => {
      document.fonts.add(face);
    })
    .catch((error: unknown) => {
      loading = null;
      throw error;
    });
  return loading;
}

import type { NoteNaming } from '#shared/pitch/display';
import type { ReadNote } from '#shared/pitch/reading';
import { readNote } from '#shared/pitch/reading';
import type { Technique, Voice } from '#shared/study/study.document';
import { DYNAMICS, techniqueSchema, voiceSchema } from '#shared/study/study.document';

/** How a note is played, as the line says it. */
export interface TypedHow extends Pick<Voice, 'players' | 'technique' | 'dynamic' | 'string' | 'locked'> {
  /** Notes with the same number are linked: they move together. */
  readonly link: number | null;
}

export const PLAIN_HOW: TypedHow = {
  players: null,
  technique: techniqueSchema.parse({}),
  dynamic: null,
  string: null,
  locked: false,
  link: null,
};

/** One thing said of a note. */
export type HowSetting = Partial<Omit<TypedHow, 'technique'>> & { readonly technique?: Partial<Technique> };

/** A string by its name, which the section must have. */
export interface NamedString {
  readonly openString: ReadNote;
}

/** A word found, what it says, and where it ends. */
export interface ReadHow {
  readonly setting: HowSetting | NamedString | { readonly fault: string };
  readonly end: number;
}

const STRINGS: readonly string[] = ['I', 'II', 'III', 'IV', 'V'];
const MAX_PLAYERS = voiceSchema.shape.players.unwrap().unwrap().maxValue ?? 60;
export const MAX_LINK = 20;

type Say = (match: RegExpExecArray, naming: NoteNaming) => ReadHow['setting'];
type Pattern = readonly [RegExp, Say];

/** A word ends where neither a letter nor a figure follows; a full stop belongs to its abbreviation. */
const pattern = (source: string, say: Say | HowSetting): Pattern => [
  new RegExp(`(?:${source})(?![\\p{L}\\p{N}♭♯#])\\.?`, 'iuy'),
  typeof say === 'function' ? say : () => say,
];

function bySul([, name = '']: RegExpExecArray, naming: NoteNaming): ReturnType<Say> {
  const openString = readNote(name, naming);
  return openString ? { openString } : { fault: `“${name}” is not the name of a string, such as sul G.` };
}

function byPlayers([, figure]: RegExpExecArray): ReturnType<Say> {
  const players = Number(figure);
  if (players >= 1 && players <= MAX_PLAYERS) return { players };
  return { fault: `A note has 1 to ${MAX_PLAYERS} players.` };
}

function byLink([, figure]: RegExpExecArray): ReturnType<Say> {
  const link = Number(figure ?? 1);
  return link >= 1 && link <= MAX_LINK ? { link } : { fault: `Links are numbered from 1 to ${MAX_LINK}.` };
}

/** Words that cannot be taken for a note or a section: they may stand outside brackets too. */
const ANYWHERE: readonly Pattern[] = [
  pattern('(?:sul\\s+)?tasto', { technique: { contact: 'sulTasto' } }),
  pattern('(?:sul\\s+)?pont(?:icello)?', { technique: { contact: 'sulPonticello' } }),
  pattern('ord(?:inary|inario)?', { technique: { contact: 'ordinary' } }),
  pattern('(?:senza\\s+sord(?:ino|ini)?|unmuted)', { technique: { mute: false } }),
  pattern('(?:con\\s+sord(?:ino|ini)?|sord(?:ino|ini)?|muted?)', { technique: { mute: true } }),
  pattern('trem(?:olo)?', { technique: { stroke: 'tremolo' } }),
  pattern('pizz(?:icato)?', { technique: { stroke: 'pizzicato' } }),
  pattern('(?:arco|sustained)', { technique: { stroke: 'sustained' } }),
  pattern('art(?:ificial)?\\.?\\s*harm(?:onics?)?', { technique: { harmonic: 'artificial' } }),
  pattern('(?:nat(?:ural)?\\.?\\s*)?harm(?:onics?)?', { technique: { harmonic: 'natural' } }),
  pattern('solo', { players: 1 }),
  pattern('div(?:isi|ided)?', { players: null }),
  pattern('(?:lock(?:ed)?|melody)', { locked: true }),
  pattern('link(?:ed)?\\s*(\\d+)?', byLink),
  pattern('string\\s*([1-5])', ([, figure]) => ({ string: Number(figure) })),
  pattern('sul\\s+([\\p{L}♭♯#]+)', bySul),
  ...DYNAMICS.filter((dynamic) => dynamic !== 'f').map((dynamic) => pattern(dynamic, { dynamic })),
];

/** Within brackets a figure counts players, a Roman one names the string, and f is forte. */
const IN_BRACKETS: readonly Pattern[] = [
  ...ANYWHERE,
  pattern('f', { dynamic: 'f' }),
  pattern('(\\d+)(?:\\s*(?:players?|pl))?', byPlayers),
  pattern('(III|II|IV|I|V)', ([, roman = '']) => ({ string: STRINGS.indexOf(roman.toUpperCase()) + 1 })),
];

/**
 * Reads a word that says how a note is played.
 * @param text the line
 * @param start where the word would begin
 * @param place within brackets more can be said than outside
 * @param naming how the reader names notes, for strings by their name
 * @returns what it says and where it ends, or `null` where it says nothing of the kind
 * @example readHow('sul tasto', 0, 'outside', 'english') // { setting: { technique: { contact: 'sulTasto' } }, end: 9 }
 */
export function readHow(
  text: string,
  start: number,
  place: 'brackets' | 'outside',
  naming: NoteNaming,
): ReadHow | null {
  for (const [regex, say] of place === 'brackets' ? IN_BRACKETS : ANYWHERE) {
    regex.lastIndex = start;
    const match = regex.exec(text);
    if (match) return { setting: say(match, naming), end: start + match[0].length };
  }
  return null;
}

/** @returns what is said of a note after one more setting */
export function withSetting(how: TypedHow, { technique, ...others }: HowSetting): TypedHow {
  return { ...how, ...others, technique: { ...how.technique, ...technique } };
}

const CONTACT_WORDS = { ordinary: '', sulTasto: 'tasto', sulPonticello: 'ponticello' } as const;
const STROKE_WORDS = { sustained: '', tremolo: 'tremolo', pizzicato: 'pizz' } as const;
const HARMONIC_WORDS = { none: '', natural: 'harmonic', artificial: 'artificial harmonic' } as const;

function playersText(players: number | null): string {
  if (players === null) return '';
  return players === 1 ? 'solo' : String(players);
}

/**
 * The inverse: what a bracket says of a note, nothing for a note played as any other.
 * @example howText({ ...PLAIN_HOW, players: 1, dynamic: 'pp' }) // 'solo pp'
 */
export function howText({ players, technique, dynamic, string, locked, link }: TypedHow): string {
  const words = [
    playersText(players),
    CONTACT_WORDS[technique.contact],
    technique.mute ? 'muted' : '',
    STROKE_WORDS[technique.stroke],
    HARMONIC_WORDS[technique.harmonic],
    dynamic ?? '',
    string === null ? '' : (STRINGS[string - 1] ?? ''),
    locked ? 'locked' : '',
    link === null ? '' : `link ${link}`,
  ];
  return words.filter((word) => word !== '').join(' ');
}

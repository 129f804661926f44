import { displayPitch, noteName, type NoteNaming } from '#shared/pitch/display';
import { spellIn } from '#shared/pitch/spelling';
import { openStringsOf } from '#shared/strings/ranges';
import type { Ensemble, Voice } from '#shared/study/study.document';
import type { SectionLine } from '#shared/notation/section-lines';

/** What a section is told, aspect by aspect; an empty text is the ordinary way. */
export interface PlayingState {
  readonly division: '' | 'div.' | 'non div.' | `div. a ${number}`;
  readonly players: string;
  readonly contact: string;
  readonly mute: string;
  readonly stroke: string;
  readonly string: string;
}

/** How every study begins: undivided, bowed, on the ordinary place, without mutes. */
export const ORDINARY_STATE: PlayingState = {
  division: '',
  players: '',
  contact: '',
  mute: '',
  stroke: '',
  string: '',
};

/** What is written where an aspect goes back to the ordinary. */
const BACK: Readonly<Record<keyof PlayingState, string>> = {
  division: 'unis.',
  players: 'tutti',
  contact: 'ord.',
  mute: 'senza sord.',
  stroke: 'arco',
  string: '',
};

const CONTACT_WORDS = { ordinary: '', sulTasto: 'sul tasto', sulPonticello: 'sul pont.' } as const;

const ASPECTS = ['division', 'players', 'stroke', 'mute', 'contact', 'string'] as const;

function divisionOf(lines: readonly SectionLine[]): PlayingState['division'] {
  if (lines.length > 2) return `div. a ${lines.length}`;
  if (lines.length === 2) return 'div.';
  return (lines[0]?.length ?? 0) > 1 ? 'non div.' : '';
}

/** The same for all lines, or each line's own with its number from the top. */
function perLine(lines: readonly SectionLine[], wordOf: (voice: Voice) => string): string {
  const words = lines.map((line) => [...new Set(line.map(wordOf))].filter((word) => word !== '').join(' '));
  if (new Set(words).size <= 1) return words[0] ?? '';
  return words.flatMap((word, index) => (word === '' ? [] : [`${index + 1}. ${word}`])).join(', ');
}

/** A stroke that all lines share is drawn on the stem; one of several lines has its word. */
export function isTremolo(lines: readonly SectionLine[]): boolean {
  return lines.length > 0 && lines.flat().every(({ technique }) => technique.stroke === 'tremolo');
}

function strokeWord({ technique }: Voice, drawn: boolean): string {
  if (technique.stroke === 'pizzicato') return 'pizz.';
  return technique.stroke === 'tremolo' && !drawn ? 'trem.' : '';
}

function stringWord({ section, string }: Voice, ensemble: Ensemble, naming: NoteNaming): string {
  const open = string === null ? undefined : openStringsOf(section, ensemble.bass)[string - 1];
  return open === undefined ? '' : `sul ${noteName(spellIn(open, { tonic: 'C', mode: 'major' }), naming)}`;
}

function playersWord({ section, players }: Voice, ensemble: Ensemble): string {
  if (players === null || players >= ensemble.players[section]) return '';
  return players === 1 ? 'solo' : `${players} players`;
}

/**
 * How a section plays one chord.
 * @param lines of the section, the highest first
 * @param ensemble for players and strings
 * @param naming of the open string in `sul G`
 * @returns the state; ordinary where the section is silent
 * @source words: common practice
 * @example playingState([[cello F3], [cello A2]], …).division // 'div.'
 */
export function playingState(
  lines: readonly SectionLine[],
  ensemble: Ensemble,
  naming: NoteNaming,
): PlayingState {
  const drawn = isTremolo(lines);
  return {
    division: divisionOf(lines),
    players: perLine(lines, (voice) => playersWord(voice, ensemble)),
    contact: perLine(lines, ({ technique }) => CONTACT_WORDS[technique.contact]),
    mute: perLine(lines, ({ technique }) => (technique.mute ? 'con sord.' : '')),
    stroke: perLine(lines, (voice) => strokeWord(voice, drawn)),
    string: perLine(lines, (voice) => stringWord(voice, ensemble, naming)),
  };
}

/**
 * The words that must stand where one state follows another: what is new, and what ends.
 * @param before the state in force
 * @param now the state wanted
 * @example newWords(ORDINARY_STATE, { ...ORDINARY_STATE, mute: 'con sord.' }) // ['con sord.']
 */
export function newWords(before: PlayingState, now: PlayingState): readonly string[] {
  return ASPECTS.flatMap((aspect) => {
    if (before[aspect] === now[aspect]) return [];
    if (now[aspect] !== '') return [now[aspect]];
    if (aspect === 'division' && before.division === 'non div.') return [];
    // A tremolo that some lines had ends with the strokes, not with a word.
    if (aspect === 'stroke' && !before.stroke.includes('pizz.')) return [];
    return BACK[aspect] === '' ? [] : [BACK[aspect]];
  });
}

/**
 * Where the harmonics sound that are not written at their sound.
 * @param lines of one section, the highest first
 * @param naming how the reader names notes
 * @returns e.g. `sounds E6`, from the highest line down
 */
export function soundingWords(lines: readonly SectionLine[], naming: NoteNaming): readonly string[] {
  const sounding = lines.flat().filter(({ technique }) => technique.harmonic === 'artificial');
  if (sounding.length === 0) return [];
  const names = sounding.map(({ pitch }) => displayPitch(pitch, naming));
  return [`sounds ${names.join(', ')}`];
}

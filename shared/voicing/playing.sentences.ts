import { displayPitch, type NoteNaming } from '#shared/pitch/display';
import { pitchName } from '#shared/pitch/names';
import { spellIn, type SpellingKey } from '#shared/pitch/spelling';
import type { Grade } from '#shared/strings/grades';
import { artificialHarmonic, naturalHarmonics } from '#shared/strings/harmonics';
import { playingFindings, stringsFor, type PlayingFinding } from '#shared/strings/playing';
import { SECTION_FACTS } from '#shared/strings/sections';
import { midiOfName } from '#shared/pitch/names';
import type { Chord, Ensemble, Voice } from '#shared/study/study.document';
import type { Hertz, Midi } from '#shared/units';
import { sentence } from '#shared/voicing/words';

/** What is said of how something is played. */
export interface PlayingRemark {
  /** The voices that it is about, the first one first. */
  readonly ids: readonly string[];
  readonly grade: Grade;
  readonly text: string;
}

/** What the players and their strings depend on. */
export interface PlayedBy {
  readonly ensemble: Ensemble;
  readonly a4Hz: Hertz;
  readonly key: SpellingKey;
  readonly naming: NoteNaming;
}

const ROMAN = ['I', 'II', 'III', 'IV', 'V'] as const;

/**
 * What of a chord is awkward or not playable, and why. Nothing is forbidden: players find ways.
 * @returns what is not playable first; nothing for what is easy
 * @example playingRemarks(chord, by)[0]?.text // 'Not playable: the cellos’ A2 and B2 together, a stretch of …'
 */
export function playingRemarks(chord: Pick<Chord, 'voices'>, by: PlayedBy): readonly PlayingRemark[] {
  return playingFindings(chord, by.ensemble, by.a4Hz)
    .filter(({ grade }) => grade !== 'easy')
    .map((finding) => ({ ids: finding.ids, grade: finding.grade, text: remarkOf(finding, chord, by.naming) }))
    .sort((a, b) => Number(a.grade !== 'not playable') - Number(b.grade !== 'not playable'));
}

function remarkOf(finding: PlayingFinding, { voices }: Pick<Chord, 'voices'>, naming: NoteNaming): string {
  const { kind, grade, reason, section, ids } = finding;
  const notes = voices.filter(({ id }) => ids.includes(id)).map(({ pitch }) => displayPitch(pitch, naming));
  const who = `the ${SECTION_FACTS[section].plural}`;
  const what = kind === 'divisi' ? `${who} divided` : `${who}’ ${notes.join(' and ')}`;
  return sentence(`${grade}: ${what}${kind === 'stop' ? ' as a stop' : ''}, ${reason}.`);
}

/**
 * How the selected note is played: how easily, on which strings, or where a harmonic is touched.
 * @example playingText(cello A3, chord, by) // 'easy, on string I, II or III'
 */
export function playingText(voice: Voice, chord: Pick<Chord, 'voices'>, by: PlayedBy): string {
  const [own] = playingFindings(chord, by.ensemble, by.a4Hz).filter(
    ({ kind, ids }) => kind === 'note' && ids.includes(voice.id),
  );
  const grade = own ? own.grade : '';
  const { harmonic } = voice.technique;
  const where = harmonic === 'none' ? stringsText(voice, by) : harmonicText(voice, by);
  const why = own && own.grade !== 'easy' ? own.reason : '';
  return [grade, why, where].filter((part) => part !== '').join(', ');
}

function stringsText(voice: Voice, { ensemble }: PlayedBy): string {
  const names = stringsFor(voice, ensemble.bass).map(({ number }) => ROMAN[number - 1] ?? String(number));
  if (voice.string !== null) return `on string ${ROMAN[voice.string - 1] ?? voice.string}`;
  const last = names.at(-1);
  if (last === undefined) return '';
  return names.length === 1 ? `on string ${last}` : `on string ${names.slice(0, -1).join(', ')} or ${last}`;
}

function harmonicText({ section, pitch, string, technique }: Voice, by: PlayedBy): string {
  const name = (midi: Midi): string => displayPitch(pitchName(spellIn(Math.round(midi), by.key)), by.naming);
  const midi = midiOfName(pitch);
  const { bass } = by.ensemble;
  if (technique.harmonic === 'artificial') {
    const way = artificialHarmonic(midi, section, bass);
    return way ? `stopped at ${name(way.stopped)} and touched at ${name(way.touched)}` : '';
  }
  const [way] = naturalHarmonics(midi, section, bass, by.a4Hz, string);
  if (!way) return '';
  const touch = way.touch[0] ?? 0;
  return `touched near ${name(way.open + touch)} on the ${name(way.open)} string, ${centsText(way.centsOff)}`;
}

/** @returns how far off its key something sounds: `14 cents low`, `in tune with the key` */
export function centsText(cents: number): string {
  const whole = Math.round(Math.abs(cents));
  if (whole === 0) return 'in tune with the key';
  return `${whole} ${whole === 1 ? 'cent' : 'cents'} ${cents < 0 ? 'low' : 'high'}`;
}

/** @returns the same where there is little room: `−14 cents`, `0 cents` */
export function signedCents(cents: number): string {
  const whole = Math.round(cents);
  const sign = whole > 0 ? '+' : whole < 0 ? '−' : '';
  return `${sign}${Math.abs(whole)} ${Math.abs(whole) === 1 ? 'cent' : 'cents'}`;
}

import { LOW_INTERVAL_LIMITS } from '#shared/data/low-interval-limits';
import { displayPitch, type NoteNaming } from '#shared/pitch/display';
import { pitchName } from '#shared/pitch/names';
import { spellIn, type SpellingKey } from '#shared/pitch/spelling';
import { limitsInForce, OWN_LIMIT_BOUNDS, type OwnLimit } from '#shared/study/own-limits';
import type { Midi, Semitones } from '#shared/units';

/** One interval of the table: the chart's limit and the one in force. */
export interface LimitRow {
  readonly semitones: Semitones;
  readonly name: string;
  readonly chart: string;
  readonly chartMidi: Midi;
  /** Over all the published variants. */
  readonly spread: string;
  /** The limit in force; null where the interval has none. */
  readonly own: Midi | null;
  readonly changed: boolean;
}

const NAMES: Readonly<Record<string, string>> = {
  m2: 'minor second',
  M2: 'major second',
  m3: 'minor third',
  M3: 'major third',
  P4: 'fourth',
  'A4/d5': 'augmented fourth, diminished fifth',
  P5: 'fifth',
  m6: 'minor sixth',
  M6: 'major sixth',
  m7: 'minor seventh',
  M7: 'major seventh',
  m9: 'minor ninth',
  M9: 'major ninth',
  m10: 'minor tenth',
  M10: 'major tenth',
};

/**
 * @returns the fifteen intervals of the chart, narrow to wide
 * @example limitRows(null, 'english')[3] // the major third: chart 'B♭2', own 46
 */
export function limitRows(own: readonly OwnLimit[] | null, naming: NoteNaming): readonly LimitRow[] {
  const inForce = limitsInForce(own);
  const key = { tonic: 'F', mode: 'major' } as const;
  const name = (midi: Midi): string => displayPitch(pitchName(spellIn(midi, key)), naming);
  return LOW_INTERVAL_LIMITS.map(({ interval, semitones, lowest, lowestMidi, spread }) => {
    const now = inForce.find((limit) => limit.semitones === semitones)?.lowestMidi ?? null;
    return {
      semitones,
      name: NAMES[interval] ?? interval,
      chart: displayPitch(lowest, naming),
      chartMidi: lowestMidi,
      spread: spread.low === spread.high ? '' : `${name(spread.low)} to ${name(spread.high)}`,
      own: now,
      changed: now !== lowestMidi,
    };
  });
}

/** A note that can be chosen as a limit. */
export interface LimitNote {
  readonly midi: Midi;
  /** As the document keeps it. */
  readonly pitch: string;
  readonly label: string;
}

/** Further from the chart nobody has set a limit: our own choice. */
const AROUND: Semitones = 18;

/** @returns the notes that can be an interval's limit, low to high, spelt by the key: an octave and a half round the chart's */
export function limitNotes(
  { chartMidi, own }: Pick<LimitRow, 'chartMidi' | 'own'>,
  key: SpellingKey,
  naming: NoteNaming,
): readonly LimitNote[] {
  const low = Math.max(Math.min(chartMidi - AROUND, own ?? chartMidi), OWN_LIMIT_BOUNDS.low);
  const high = Math.min(Math.max(chartMidi + AROUND, own ?? chartMidi), OWN_LIMIT_BOUNDS.high);
  return Array.from({ length: high - low + 1 }, (_, index) => {
    const pitch = pitchName(spellIn(low + index, key));
    return { midi: low + index, pitch, label: displayPitch(pitch, naming) };
  });
}

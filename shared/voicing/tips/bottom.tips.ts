import { LOW_INTERVAL_LIMITS } from '#shared/data/low-interval-limits';
import { displayPitch, type NoteNaming } from '#shared/pitch/display';
import { OCTAVE, intervalUnder, notesText, pitchedUpwards } from '#shared/voicing/tips/notes';
import { COMMON_PRACTICE, type Tip } from '#shared/voicing/tips/tip';

const THIRDS: readonly string[] = ['m3', 'M3'];
const SECONDS: readonly string[] = ['m2', 'M2'];
const CHART = 'Chart of low interval limits: Lowell & Pullig 2003';

/** @throws RangeError where the chart has no such interval */
function lowestOf(interval: string, naming: NoteNaming): string {
  const line = LOW_INTERVAL_LIMITS.find((known) => known.interval === interval);
  if (!line) throw new RangeError(`the chart has no ${interval}`);
  return displayPitch(line.lowest, naming);
}

/** Why the bottom stands wide. */
export const LOW_THIRD: Tip = {
  id: 'low-third',
  source: `${COMMON_PRACTICE}; the harmonic series`,
  says({ analysis, naming }) {
    const pair = intervalUnder(analysis, THIRDS);
    if (!pair) return null;
    return `${notesText(pair, naming)}: a third. The harmonic series has its first third two octaves up: hence a wide bottom, close notes above.`;
  },
};

/** The tenth is the low third's usual stand-in. */
export const TENTH_FOR_THIRD: Tip = {
  id: 'tenth-for-third',
  source: CHART,
  says({ analysis, naming }) {
    const pair = intervalUnder(analysis, THIRDS);
    if (!pair) return null;
    return `A third opened to a tenth can stand far lower: the chart lets a major third begin at ${lowestOf('M3', naming)}, a major tenth at ${lowestOf('M10', naming)}.`;
  },
};

/** A ninth reaches where a second does not. */
export const LOW_SECOND: Tip = {
  id: 'low-second',
  source: CHART,
  says({ analysis, naming }) {
    const pair = intervalUnder(analysis, SECONDS);
    if (!pair) return null;
    return `${notesText(pair, naming)}: a second. Opened to a ninth it can stand an octave lower: the chart has ${lowestOf('M2', naming)} for the major second, ${lowestOf('M9', naming)} for the ninth.`;
  },
};

/** Why the octave of basses and cellos is the usual bottom. */
export const CELLOS_OVER_BASSES: Tip = {
  id: 'cellos-over-basses',
  source: `${COMMON_PRACTICE}; the harmonic series`,
  says({ analysis }) {
    const [bottom, next] = pitchedUpwards(analysis.voices);
    const isOctave = bottom && next && next.midi - bottom.midi === OCTAVE;
    if (!isOctave || bottom.section !== 'doubleBass' || next.section !== 'cello') return null;
    return 'Cellos an octave over the basses: their overtones all fall on the basses’, so the line gains body and edge, and the two do not cloud.';
  },
};

/** Notes are given as they sound. */
export const BASSES_SOUND_LOWER: Tip = {
  id: 'basses-sound-lower',
  source: `${COMMON_PRACTICE} of notation`,
  says({ analysis, naming }) {
    const bass = analysis.voices.find(({ section }) => section === 'doubleBass');
    if (!bass) return null;
    return `Double basses sound an octave lower than written. Notes here are named as they sound: the players read this ${displayPitch(bass.pitch, naming)} an octave higher.`;
  },
};

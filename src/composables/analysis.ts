import { analyseChord, type ChordAnalysis, type SoundSettings } from '#shared/voicing/analysis';
import type { Chord } from '#shared/study/study.document';

interface Known {
  readonly settings: string;
  readonly analysis: ChordAnalysis;
}

/** Chords are never altered, so that one judged once is judged for as long as it is kept. */
const known = new WeakMap<Chord, Known>();

/** Only what a judgement depends on, so that a new title does not judge everything anew. */
export function settingsKey({ a4Hz, intonation, ensemble, key, limits }: SoundSettings): string {
  return JSON.stringify([a4Hz, intonation, ensemble, key.tonic, limits ?? null]);
}

/** @returns how a chord was judged, or `null` where it has not been judged under these settings */
export function knownAnalysis(chord: Chord, settings: SoundSettings): ChordAnalysis | null {
  const kept = known.get(chord);
  return kept?.settings === settingsKey(settings) ? kept.analysis : null;
}

/** Judges a chord, or remembers how it was judged. */
export function analysisOf(chord: Chord, settings: SoundSettings): ChordAnalysis {
  const before = knownAnalysis(chord, settings);
  if (before) return before;
  const analysis = analyseChord(chord, settings);
  known.set(chord, { settings: settingsKey(settings), analysis });
  return analysis;
}

import { displayPitch, type NoteNaming } from '#shared/pitch/display';
import type { Semitones } from '#shared/units';
import type { ChordAnalysis, VoiceSound } from '#shared/voicing/analysis';
import { possessive, sentence } from '#shared/voicing/words';

export const OCTAVE: Semitones = 12;

/** Two voices of a chord. */
export interface NotePair {
  readonly lower: VoiceSound;
  readonly upper: VoiceSound;
}

/**
 * @param voices of one chord
 * @returns one voice a pitch, the lowest first; of voices at the unison the first given
 * @example pitchedUpwards([]) // []
 */
export function pitchedUpwards(voices: readonly VoiceSound[]): readonly VoiceSound[] {
  const byPitch = new Map<number, VoiceSound>();
  for (const voice of voices) if (!byPitch.has(voice.midi)) byPitch.set(voice.midi, voice);
  return [...byPitch.values()].sort((a, b) => a.midi - b.midi);
}

/**
 * @param intervals by the chart's names, `M3`
 * @returns the pair of sounding notes that stands furthest under the limit of one of these intervals, or null
 * @example intervalUnder({ voices: [], limits: [] }, ['M3']) // null
 */
export function intervalUnder(
  { voices, limits }: Pick<ChordAnalysis, 'voices' | 'limits'>,
  intervals: readonly string[],
): NotePair | null {
  const byId = new Map(voices.map((voice) => [voice.id, voice]));
  for (const { interval, lowerId, upperId } of limits) {
    const [lower, upper] = [byId.get(lowerId), byId.get(upperId)];
    if (lower && upper && intervals.includes(interval)) return { lower, upper };
  }
  return null;
}

/** @returns whose notes they are: `The cellos’ F2–A2`, `The double basses’ D2 and the cellos’ F2` */
export function notesText({ lower, upper }: NotePair, naming: NoteNaming): string {
  const [low, high] = [displayPitch(lower.pitch, naming), displayPitch(upper.pitch, naming)];
  const owner = possessive(lower.section, lower.players);
  if (lower.section === upper.section) return sentence(`${owner} ${low}–${high}`);
  return sentence(`${owner} ${low} and ${possessive(upper.section, upper.players)} ${high}`);
}

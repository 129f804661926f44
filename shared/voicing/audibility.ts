import { erbRate } from '#shared/hearing/erb';
import { thresholdInQuiet } from '#shared/hearing/terhardt-1979';
import type { Decibels, Hertz } from '#shared/units';
import type { VoiceSound } from '#shared/voicing/analysis';
import { powerOf } from '#shared/voicing/muddiness/joined';

/**
 * Level at the listener of what the partials call 0 dB. A violinist's mf is 84 dB sound power; ten metres away
 * in a hall about 24 dB of that are lost.
 * @source Meyer 2009 for the power, from memory; the loss of distance and hall from memory of room acoustics
 */
const LISTENER_LEVEL: Decibels = 60;
/** A partial so much louder in the same band hides another. */
export const MASKING: Decibels = 20;
/** More equivalent rectangular bandwidths than there are up to any frequency that is heard. */
export const MOST_BANDS = 64;

/** What the ear meets in a chord: its partials, voice after voice, worked out once for all that is asked of them. */
export interface HeardPartials {
  /** The first partial of each voice, and behind the last voice the number of all. */
  readonly starts: readonly number[];
  readonly frequencies: Float64Array;
  readonly levels: Float64Array;
  readonly powers: Float64Array;
  /** The equivalent rectangular bandwidth in which each lies, 0 the lowest. */
  readonly bands: Uint8Array;
  /** 1 where the partial lies above the threshold in quiet where the listener sits. */
  readonly above: Uint8Array;
}

/**
 * @param voices as they sound
 * @example hearPartials([cello, viola]).starts // [0, 32, 64]
 */
export function hearPartials(voices: readonly Pick<VoiceSound, 'partials'>[]): HeardPartials {
  const starts = [0];
  for (const { partials } of voices) starts.push((starts.at(-1) ?? 0) + partials.length);
  const count = starts.at(-1) ?? 0;
  const heard: HeardPartials = {
    starts,
    frequencies: new Float64Array(count),
    levels: new Float64Array(count),
    powers: new Float64Array(count),
    bands: new Uint8Array(count),
    above: new Uint8Array(count),
  };
  let place = 0;
  for (const { partials } of voices) {
    for (const { frequencyHz, levelDb } of partials) {
      heard.frequencies[place] = frequencyHz;
      heard.levels[place] = levelDb;
      heard.powers[place] = powerOf(levelDb);
      heard.bands[place] = bandOf(frequencyHz);
      heard.above[place] = levelDb + LISTENER_LEVEL > thresholdInQuiet(frequencyHz) ? 1 : 0;
      place += 1;
    }
  }
  return heard;
}

function bandOf(frequencyHz: Hertz): number {
  return Math.min(Math.floor(erbRate(frequencyHz)), MOST_BANDS - 1);
}

/**
 * @returns whether a partial is heard beside the loudest that could mask it in its band
 * @example isHeard(heard, 0, 20 + level) // false: masked
 */
export function isHeard({ levels, above }: HeardPartials, place: number, masker: Decibels): boolean {
  return above[place] === 1 && masker - (levels[place] ?? 0) < MASKING;
}

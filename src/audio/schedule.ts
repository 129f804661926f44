import type { VoiceSound } from '#shared/voicing/analysis';
import type { Beats } from '#shared/units';

/** Something that sounds from a moment on, for a while. */
export interface TimedSound {
  /** What it is: a chord's id, a voice's id. */
  readonly key: string;
  /** From the beginning of the whole. */
  readonly startSeconds: number;
  readonly seconds: number;
  readonly sounds: readonly VoiceSound[];
}

/** A chord of a progression with its sound. */
export interface ProgressionChord {
  readonly chordId: string;
  readonly beats: Beats;
  readonly sounds: readonly VoiceSound[];
}

const SECONDS_PER_MINUTE = 60;
/** A struck chord sounds for one slow bow. Chosen. */
export const STRIKE_SECONDS = 2.5;
/** Long enough to take in each note before the next one joins it. Chosen. */
export const BUILD_STEP_SECONDS = 0.8;

/** @returns the chord once, for one bow */
export function strikeSchedule(sounds: readonly VoiceSound[]): readonly TimedSound[] {
  return [{ key: 'chord', startSeconds: 0, seconds: STRIKE_SECONDS, sounds }];
}

/** A held chord lasts so long in a file. Chosen. */
export const HOLD_SECONDS = 10;

/** @returns the chord once, held */
export function holdSchedule(sounds: readonly VoiceSound[]): readonly TimedSound[] {
  return [{ key: 'chord', startSeconds: 0, seconds: HOLD_SECONDS, sounds }];
}

/**
 * The chord built up from the bottom: one note joins after the other, and all end together.
 * @returns one entry for each voice, the lowest first
 */
export function buildSchedule(sounds: readonly VoiceSound[]): readonly TimedSound[] {
  const upwards = [...sounds].sort((a, b) => a.midi - b.midi);
  const end = (upwards.length - 1) * BUILD_STEP_SECONDS + STRIKE_SECONDS;
  return upwards.map((sound, index) => {
    const startSeconds = index * BUILD_STEP_SECONDS;
    return { key: sound.id, startSeconds, seconds: end - startSeconds, sounds: [sound] };
  });
}

/**
 * A progression in tempo. Each start is counted from the sum of beats before it, so that nothing drifts.
 * @param tempoBpm beats a minute, > 0
 * @throws RangeError where the tempo is not above 0
 * @example progressionSchedule([{ chordId: 'a', beats: 4, sounds: [] }], 120)[0].seconds // 2
 */
export function progressionSchedule(
  chords: readonly ProgressionChord[],
  tempoBpm: number,
): readonly TimedSound[] {
  if (!(tempoBpm > 0)) throw new RangeError('a tempo is a number of beats above 0');
  const secondsPerBeat = SECONDS_PER_MINUTE / tempoBpm;
  let beatsBefore: Beats = 0;
  return chords.map(({ chordId, beats, sounds }) => {
    const startSeconds = beatsBefore * secondsPerBeat;
    beatsBefore += beats;
    return { key: chordId, startSeconds, seconds: beats * secondsPerBeat, sounds };
  });
}

/** @returns the second at which the last of it ends; 0 for nothing */
export function endOf(schedule: readonly TimedSound[]): number {
  return schedule.reduce((end, { startSeconds, seconds }) => Math.max(end, startSeconds + seconds), 0);
}

/** @returns what begins from `from` on and before `until`, in seconds from the beginning */
export function startingBetween(
  schedule: readonly TimedSound[],
  from: number,
  until: number,
): readonly TimedSound[] {
  return schedule.filter(({ startSeconds }) => startSeconds >= from && startSeconds < until);
}

/** @returns what began last at a moment and has not ended; null before, between and after */
export function sounding(schedule: readonly TimedSound[], second: number): TimedSound | null {
  const begun = schedule.filter(
    ({ startSeconds, seconds }) => startSeconds <= second && second < startSeconds + seconds,
  );
  return begun.at(-1) ?? null;
}

/** Long enough to take in each partial before the next. Chosen. */
export const PARTIAL_STEP_SECONDS = 0.7;

/** @returns the key under which a partial of a voice is played */
export function partialKey(voiceId: string, n: number): string {
  return `${voiceId} ${n}`;
}

/**
 * One voice's partials one after another, each as strong as it is in the chord, from the fundamental up.
 * @returns one entry for each partial, under its {@link partialKey}
 * @example partialsSchedule({ ...voice, partials: [] }) // []
 */
export function partialsSchedule(sound: VoiceSound): readonly TimedSound[] {
  return sound.partials.map((partial, index) => ({
    key: partialKey(sound.id, partial.n),
    startSeconds: index * PARTIAL_STEP_SECONDS,
    seconds: PARTIAL_STEP_SECONDS,
    sounds: [{ ...sound, partials: [partial] }],
  }));
}

/** A partial of a voice that sounds by itself. */
export interface SoundingPartial {
  readonly voiceId: string;
  readonly n: number;
}

/**
 * The inverse of {@link partialKey}.
 * @returns null where the key names no partial
 * @example partialOfKey('cello-voice 3') // { voiceId: 'cello-voice', n: 3 }
 */
export function partialOfKey(key: string): SoundingPartial | null {
  const [voiceId, n] = key.split(' ');
  return voiceId && n ? { voiceId, n: Number(n) } : null;
}

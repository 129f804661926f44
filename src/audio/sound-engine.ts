import type { TimedSound } from '@/audio/schedule';
import type { Section } from '#shared/strings/sections';
import type { VoiceSound } from '#shared/voicing/analysis';
import type { Decibels } from '#shared/units';

/** What sounds at the moment. */
export type SoundState = 'silent' | 'held' | 'playing';

/** Everything that the rest of the program knows about making sound. */
export interface SoundEngine {
  readonly state: SoundState;
  /**
   * Lets a chord sound until it is stopped, or changes the one that is held: notes that stay are not touched,
   * the others cross over without a click.
   * @param loudest level of the loudest chord of the common scale
   */
  hold(sounds: readonly VoiceSound[], loudest: Decibels): Promise<void>;
  /** Plays a schedule from its beginning. */
  play(schedule: readonly TimedSound[], loudest: Decibels): Promise<void>;
  /** Lets what has not begun yet be played as it is now; nothing where no schedule is being played. */
  revise(schedule: readonly TimedSound[], loudest: Decibels): void;
  /** Ends everything as players do, within a fifth of a second; nothing that was to come begins. */
  stop(): void;
  /** Ends everything at once. */
  silence(): void;
  /** The sections that are let through, while sounding too. */
  setSections(heard: readonly Section[]): void;
  setVolume(volume: Decibels): void;
  /** @returns the highest peak of the last moments against full scale; −Infinity in silence */
  peak(): Decibels;
  /** @returns the key of what is being played from a schedule; null when nothing is */
  playhead(): string | null;
  /** Wakes the sound where the browser has put it to sleep; only what was sounding goes on. */
  wake(): Promise<void>;
}

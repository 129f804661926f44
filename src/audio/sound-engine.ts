import type { TimedSound } from '@/audio/schedule';
import type { Section } from '#shared/strings/sections';
import type { VoiceSound } from '#shared/voicing/analysis';
import type { Decibels } from '#shared/units';

/** What sounds at the moment. */
export type SoundState = 'silent' | 'held' | 'playing';

/** One of two chords that are compared. */
export type Side = 'a' | 'b';

/** A chord that is compared with another. */
export interface ComparedSound {
  readonly sounds: readonly VoiceSound[];
  /** What is taken off it, ≤ 0, so that both are equally loud. */
  readonly trim: Decibels;
}

/** Everything that the rest of the program knows about making sound. */
export interface SoundEngine {
  readonly state: SoundState;
  /**
   * Lets a chord sound until it is stopped, or changes the one that is held: notes that stay are not touched,
   * the others cross over without a click.
   * @param loudest level of the loudest chord of the common scale
   */
  hold(sounds: readonly VoiceSound[], loudest: Decibels): Promise<void>;
  /** Holds two chords of which one is heard; either may change as a held one may. */
  compare(chords: Readonly<Record<Side, ComparedSound>>, heard: Side, loudest: Decibels): Promise<void>;
  /** Lets the other of two compared chords be heard, at once and without a click. */
  switchTo(side: Side): void;
  /** Plays a schedule from its beginning. */
  play(schedule: readonly TimedSound[], loudest: Decibels): Promise<void>;
  /** Lets what has not begun yet be played as it is now; nothing where no schedule is being played. */
  revise(schedule: readonly TimedSound[], loudest: Decibels): void;
  /** Makes beforehand, bit by bit, what these voices need, so that they begin at once when they are asked for. */
  makeReady(sounds: readonly VoiceSound[]): void;
  /** Ends everything as players do, within a fifth of a second; nothing that was to come begins. */
  stop(): void;
  /** Ends everything at once, the room too. */
  silence(): void;
  /** The sections that are let through, while sounding too. */
  setSections(heard: readonly Section[]): void;
  setVolume(volume: Decibels): void;
  /** With the room, or dry. */
  setRoom(on: boolean): void;
  /** @returns the highest peak of the last moments against full scale; −Infinity in silence */
  peak(): Decibels;
  /** @returns the key of what is being played from a schedule; null when nothing is */
  playhead(): string | null;
  /** Wakes the sound where the browser has put it to sleep; only what was sounding goes on. */
  wake(): Promise<void>;
}

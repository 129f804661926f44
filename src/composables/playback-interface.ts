import type { Ref } from 'vue';
import type { Listening, Mix } from '@/audio/listening';
import type { SoundingPartial, TimedSound } from '@/audio/schedule';
import type { Side } from '@/audio/sound-engine';
import type { PlaybackMaterial } from '@/composables/playback-choice';
import type { PlaybackStatus } from '@/composables/playback-engine';
import type { PlaybackMode } from '@/composables/playback-signs';
import type { Section } from '#shared/strings/sections';
import type { Decibels } from '#shared/units';
import type { VoiceSound } from '#shared/voicing/analysis';

/** Everything that the page may ask of its sound, and what it shows of it. */
export interface Playback {
  readonly status: Readonly<Ref<PlaybackStatus>>;
  readonly mode: Readonly<Ref<PlaybackMode>>;
  /** What of the chord sounds, or would sound next. */
  readonly listening: Readonly<Ref<Listening>>;
  /** The part that is heard by itself just now; null while none is. */
  readonly heard: Readonly<Ref<Listening | null>>;
  readonly mix: Readonly<Ref<Mix>>;
  readonly volume: Readonly<Ref<Decibels>>;
  /** How much of the level meter is filled, 0 … 1. */
  readonly level: Readonly<Ref<number>>;
  /** The chord of the progression that sounds. */
  readonly playingChordId: Readonly<Ref<string | null>>;
  /** The partial that sounds while one voice's are gone through. */
  readonly playingPartial: Readonly<Ref<SoundingPartial | null>>;
  /** Which of two compared chords is heard, or would be. */
  readonly side: Readonly<Ref<Side>>;
  /** With the room, or dry; remembered in this browser. */
  readonly room: Readonly<Ref<boolean>>;
  /** Everything sounds an octave higher than it is written. */
  readonly octave: Readonly<Ref<boolean>>;
  /** Says what there is to hear; a held chord follows it. */
  bring(material: PlaybackMaterial): void;
  strike(): Promise<void>;
  hold(): Promise<void>;
  build(): Promise<void>;
  playProgression(): Promise<void>;
  /** One voice's partials one after another, from its fundamental up. */
  playPartials(voiceId: string): Promise<void>;
  /** Lets a part of the chord, or the whole, be heard for some seconds; the same part once more ends it. */
  hear(part: Listening): Promise<void>;
  /** Holds two chords at equal loudness and lets the one on {@link side} be heard; again with what has changed. */
  compareAB(a: readonly VoiceSound[], b: readonly VoiceSound[]): Promise<void>;
  /** Changes to the other of two compared chords at once, without a click. */
  switchTo(side: Side): void;
  /** Plays what is not of the study, such as a trial tone, on a scale of its own. */
  playApart(schedule: readonly TimedSound[], loudest: Decibels): Promise<void>;
  toggle(part: keyof Mix, section: Section): void;
  setVolume(volume: Decibels): void;
  setRoom(on: boolean): void;
  setOctave(higher: boolean): void;
  stop(): void;
  /** The panic key: everything ends at once. */
  silence(): void;
}

import type { TimedSound } from '@/audio/schedule';
import type { ComparedSound, Side, SoundEngine, SoundState } from '@/audio/sound-engine';
import type { Section } from '#shared/strings/sections';
import type { VoiceSound } from '#shared/voicing/analysis';

/** A sound engine without a loudspeaker: it remembers what it was told. */
export class SilentEngine implements SoundEngine {
  state: SoundState = 'silent';
  held: readonly VoiceSound[] = [];
  schedule: readonly TimedSound[] = [];
  loudest = NaN;
  sections: readonly Section[] | null = null;
  volume = NaN;
  head: string | null = null;
  woken = 0;
  silenced = 0;
  compared: Readonly<Record<Side, ComparedSound>> | null = null;
  side: Side | null = null;
  ready: readonly VoiceSound[] = [];
  room: boolean | null = null;

  async hold(sounds: readonly VoiceSound[], loudest: number): Promise<void> {
    this.held = sounds;
    this.loudest = loudest;
    this.state = 'held';
  }

  async compare(chords: Readonly<Record<Side, ComparedSound>>, heard: Side, loudest: number): Promise<void> {
    this.compared = chords;
    this.side = heard;
    this.loudest = loudest;
    this.state = 'held';
  }

  switchTo(side: Side): void {
    this.side = side;
  }

  makeReady(sounds: readonly VoiceSound[]): void {
    this.ready = sounds;
  }

  setRoom(on: boolean): void {
    this.room = on;
  }

  async play(schedule: readonly TimedSound[], loudest: number): Promise<void> {
    this.schedule = schedule;
    this.loudest = loudest;
    this.state = 'playing';
  }

  revise(schedule: readonly TimedSound[], loudest: number): void {
    this.schedule = schedule;
    this.loudest = loudest;
  }

  stop(): void {
    this.held = [];
    this.schedule = [];
    this.state = 'silent';
  }

  silence(): void {
    this.silenced += 1;
    this.stop();
  }

  setSections(heard: readonly Section[]): void {
    this.sections = heard;
  }

  setVolume(volume: number): void {
    this.volume = volume;
  }

  peak(): number {
    return this.state === 'silent' ? -Infinity : -12;
  }

  playhead(): string | null {
    return this.head;
  }

  async wake(): Promise<void> {
    this.woken += 1;
  }
}

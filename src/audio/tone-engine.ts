import { Context, setContext } from 'tone';
import { createByAndBy } from '@/audio/by-and-by';
import { envelopeOf } from '@/audio/envelope';
import { HeldLines, type HeldVoice } from '@/audio/held-lines';
import { amplitudeOf, scaleFor } from '@/audio/levels';
import { prepareLine, type Line } from '@/audio/line';
import { buildMaster, type Master } from '@/audio/master';
import { endOf, sounding, startingBetween, type TimedSound } from '@/audio/schedule';
import type { ComparedSound, Side, SoundEngine, SoundState } from '@/audio/sound-engine';
import { createWaveStore, type WaveStore } from '@/audio/wave-store';
import type { Section } from '#shared/strings/sections';
import type { VoiceSound } from '#shared/voicing/analysis';
import type { Decibels } from '#shared/units';

/** Notes are handed to the audio clock so many seconds before they sound: a busy page delays none. */
const HORIZON = 1.5;
const PUMP_MILLISECONDS = 50;
/**
 * Two hundredths of a second between an order and its sound: a key is answered at once, and no order comes too
 * late for its moment. Tone's own ticking moves nothing here: it is as seldom as may be, and without a worker
 * made from a blob.
 */
const CLOCK = {
  latencyHint: 'interactive',
  lookAhead: 0.02,
  updateInterval: 1,
  clockSource: 'timeout',
} as const;
/** A section's other players join the first once nothing has changed for so long: a drag is not held up. */
const REST_MILLISECONDS = 60;
const SIDES = ['a', 'b'] as const;
/** The panic key: as fast as can be without a crack in the loudspeaker. */
const SILENCE_SECONDS = 0.008;

class ToneEngine implements SoundEngine {
  state: SoundState = 'silent';
  private readonly context = new Context(CLOCK);
  private readonly master: Master;
  private readonly waves: WaveStore;
  private readonly held = new HeldLines();
  private readonly joining = createByAndBy(REST_MILLISECONDS);
  private readonly readying = createByAndBy(REST_MILLISECONDS);
  private trims: Readonly<Record<Side, number>> = { a: 1, b: 1 };
  private lines: Line[] = [];
  private schedule: readonly TimedSound[] = [];
  private beganAt = 0;
  private handedOver = 0;
  /** Counts the orders, so that one that waited for the browser gives way to a later one. */
  private order = 0;
  private pumping: ReturnType<typeof setInterval> | null = null;

  constructor(volume: Decibels, room: boolean) {
    setContext(this.context, true);
    this.master = buildMaster(this.context, { volume, room, limited: true });
    this.waves = createWaveStore(this.context);
  }

  async hold(sounds: readonly VoiceSound[], loudest: Decibels): Promise<void> {
    await this.keep(
      sounds.map((sound) => ({ side: 'a', sound, presence: 1 })),
      loudest,
    );
  }

  async compare(
    chords: Readonly<Record<Side, ComparedSound>>,
    heard: Side,
    loudest: Decibels,
  ): Promise<void> {
    this.trims = { a: amplitudeOf(chords.a.trim), b: amplitudeOf(chords.b.trim) };
    const voices = SIDES.flatMap((side) =>
      chords[side].sounds.map((sound) => ({ side, sound, presence: side === heard ? this.trims[side] : 0 })),
    );
    await this.keep(voices, loudest);
  }

  switchTo(heard: Side): void {
    this.held.setPresence((side) => (side === heard ? this.trims[side] : 0), this.context.now());
  }

  makeReady(sounds: readonly VoiceSound[]): void {
    this.readying.forget();
    for (const sound of sounds) {
      this.readying.add(() => void this.waves.of(sound, 'middle'));
      if (sound.players > 1) this.readying.add(() => void this.waves.of(sound, 'others'));
    }
  }

  private async keep(voices: readonly HeldVoice[], loudest: Decibels): Promise<void> {
    if (!(await this.awake())) return;
    if (this.state === 'playing') this.stop();
    const entered = this.held.hold(
      voices,
      (sound) => this.prepare(sound),
      () => {
        const now = this.context.now();
        this.rescale(loudest, now);
        return now;
      },
    );
    this.state = 'held';
    this.completeAll(entered);
    this.pump();
  }

  async play(schedule: readonly TimedSound[], loudest: Decibels): Promise<void> {
    if (!(await this.awake())) return;
    this.end(null);
    this.schedule = schedule;
    const first = this.prepared(startingBetween(schedule, 0, HORIZON));
    this.beganAt = this.context.now();
    this.handedOver = HORIZON;
    this.rescale(loudest, this.beganAt);
    this.state = 'playing';
    first.forEach((begin) => begin());
    this.pump();
  }

  revise(schedule: readonly TimedSound[], loudest: Decibels): void {
    if (this.state !== 'playing') return;
    this.schedule = schedule;
    this.rescale(loudest, this.context.now());
  }

  stop(): void {
    this.order += 1;
    this.end(null);
  }

  silence(): void {
    this.order += 1;
    this.end(SILENCE_SECONDS);
    this.master.emptyRoom();
  }

  setSections(heard: readonly Section[]): void {
    this.master.setSections(heard, this.context.now());
  }

  setVolume(volume: Decibels): void {
    this.master.setVolume(volume, this.context.now());
  }

  setRoom(on: boolean): void {
    this.master.setRoom(on, this.context.now());
  }

  peak(): Decibels {
    return this.master.peak();
  }

  playhead(): string | null {
    if (this.state !== 'playing') return null;
    return sounding(this.schedule, this.elapsed())?.key ?? null;
  }

  async wake(): Promise<void> {
    if (this.context.state !== 'running') await this.context.resume();
  }

  /** @returns false where another order has come while the browser was waking the sound up */
  private async awake(): Promise<boolean> {
    this.order += 1;
    const mine = this.order;
    await this.wake();
    return mine === this.order;
  }

  private elapsed(): number {
    return this.context.immediate() - this.beganAt;
  }

  /** In silence the scale is set at once; while something sounds it glides. */
  private rescale(loudest: Decibels, now: number): void {
    const glide = this.lines.some((line) => line.beganBefore(now) && line.endsAt > now);
    this.master.setScale(scaleFor(loudest), now, glide);
  }

  private prepare(sound: VoiceSound): Line {
    const line = prepareLine(this.context, this.waves, sound, this.master.seat(sound.section));
    this.lines.push(line);
    return line;
  }

  /** Sections whose waves are there are complete from the beginning, others a little later. */
  private completeAll(lines: readonly Line[]): void {
    for (const line of lines) {
      const complete = (): void => line.complete(this.context.now());
      if (this.waves.has(line.sound, 'others')) complete();
      else this.joining.add(complete);
    }
  }

  private end(seconds: number | null): void {
    const now = this.context.now();
    this.lines.forEach(({ sound, release }) =>
      release(now, seconds ?? envelopeOf(sound.technique, sound.midi).release),
    );
    this.joining.forget();
    this.held.clear();
    this.schedule = [];
    this.state = 'silent';
  }

  /** Hands what comes next to the audio clock and puts away what has ended. */
  private pump(): void {
    const now = this.context.immediate();
    if (this.state === 'playing') this.handOver();
    this.lines.filter((line) => line.endsAt < now).forEach((line) => line.dispose());
    this.lines = this.lines.filter((line) => line.endsAt >= now);
    const busy = this.state !== 'silent' || this.lines.length > 0;
    if (busy && this.pumping === null) this.pumping = setInterval(() => this.pump(), PUMP_MILLISECONDS);
    if (!busy && this.pumping !== null) {
      clearInterval(this.pumping);
      this.pumping = null;
    }
  }

  private handOver(): void {
    const until = this.elapsed() + HORIZON;
    const next = startingBetween(this.schedule, this.handedOver, until);
    this.handedOver = Math.max(this.handedOver, until);
    this.prepared(next).forEach((begin) => begin());
    if (this.elapsed() >= endOf(this.schedule)) this.state = 'silent';
  }

  /** @returns for each voice what lets it begin and end in its time, counted from the beginning of the schedule */
  private prepared(entries: readonly TimedSound[]): readonly (() => void)[] {
    return entries.flatMap(({ startSeconds, seconds, sounds }) =>
      sounds.map((sound) => {
        const line = this.prepare(sound);
        const envelope = envelopeOf(sound.technique, sound.midi);
        return () => {
          line.begin(this.beganAt + startSeconds, envelope);
          line.release(this.beganAt + startSeconds + seconds, envelope.release);
          this.completeAll([line]);
        };
      }),
    );
  }
}

/** Makes the one sound engine of the page; call it from a gesture of the reader, or the browser keeps silent. */
export function createSoundEngine(volume: Decibels, room: boolean): SoundEngine {
  return new ToneEngine(volume, room);
}

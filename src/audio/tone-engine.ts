import { Context, getContext, setContext } from 'tone';
import { soundsAlike } from '@/audio/alike';
import { CROSSFADE, envelopeOf } from '@/audio/envelope';
import { scaleFor } from '@/audio/levels';
import { prepareLine, type Line } from '@/audio/line';
import { buildMaster, type Master } from '@/audio/master';
import { endOf, sounding, startingBetween, type TimedSound } from '@/audio/schedule';
import type { SoundEngine, SoundState } from '@/audio/sound-engine';
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
/** The panic key: as fast as can be without a crack in the loudspeaker. */
const SILENCE_SECONDS = 0.008;

class ToneEngine implements SoundEngine {
  state: SoundState = 'silent';
  private readonly master: Master;
  private readonly held = new Map<string, Line>();
  private lines: Line[] = [];
  private schedule: readonly TimedSound[] = [];
  private beganAt = 0;
  private handedOver = 0;
  /** Counts the orders, so that one that waited for the browser gives way to a later one. */
  private order = 0;
  private pumping: ReturnType<typeof setInterval> | null = null;

  constructor(volume: Decibels) {
    setContext(new Context(CLOCK), true);
    this.master = buildMaster(volume);
  }

  async hold(sounds: readonly VoiceSound[], loudest: Decibels): Promise<void> {
    if (!(await this.awake())) return;
    if (this.state === 'playing') this.stop();
    const changed = sounds.filter((sound) => !this.isHeld(sound));
    const entering = changed.map((sound) => this.prepare(sound));
    const now = getContext().now();
    this.rescale(loudest, now);
    this.state = 'held';
    this.leaveOthers(sounds, now);
    entering.forEach((line) => this.enter(line, now));
    this.pump();
  }

  async play(schedule: readonly TimedSound[], loudest: Decibels): Promise<void> {
    if (!(await this.awake())) return;
    this.end(null);
    this.schedule = schedule;
    const first = this.prepared(startingBetween(schedule, 0, HORIZON));
    this.beganAt = getContext().now();
    this.handedOver = HORIZON;
    this.rescale(loudest, this.beganAt);
    this.state = 'playing';
    first.forEach((begin) => begin());
    this.pump();
  }

  revise(schedule: readonly TimedSound[], loudest: Decibels): void {
    if (this.state !== 'playing') return;
    this.schedule = schedule;
    this.rescale(loudest, getContext().now());
  }

  stop(): void {
    this.order += 1;
    this.end(null);
  }

  silence(): void {
    this.order += 1;
    this.end(SILENCE_SECONDS);
  }

  setSections(heard: readonly Section[]): void {
    this.master.setSections(heard, getContext().now());
  }

  setVolume(volume: Decibels): void {
    this.master.setVolume(volume, getContext().now());
  }

  peak(): Decibels {
    return this.master.peak();
  }

  playhead(): string | null {
    if (this.state !== 'playing') return null;
    return sounding(this.schedule, this.elapsed())?.key ?? null;
  }

  async wake(): Promise<void> {
    if (getContext().state !== 'running') await getContext().resume();
  }

  /** @returns false where another order has come while the browser was waking the sound up */
  private async awake(): Promise<boolean> {
    this.order += 1;
    const mine = this.order;
    await this.wake();
    return mine === this.order;
  }

  private elapsed(): number {
    return getContext().immediate() - this.beganAt;
  }

  /** In silence the scale is set at once; while something sounds it glides. */
  private rescale(loudest: Decibels, now: number): void {
    const glide = this.lines.some((line) => line.beganBefore(now) && line.endsAt > now);
    this.master.setScale(scaleFor(loudest), now, glide);
  }

  private prepare(sound: VoiceSound): Line {
    const line = prepareLine(sound, this.master.seat(sound.section));
    this.lines.push(line);
    return line;
  }

  private isHeld(sound: VoiceSound): boolean {
    const line = this.held.get(sound.id);
    return line !== undefined && soundsAlike(line.sound, sound);
  }

  private leaveOthers(sounds: readonly VoiceSound[], now: number): void {
    const staying = new Set(sounds.map(({ id }) => id));
    this.held.forEach((line, id) => {
      if (staying.has(id)) return;
      line.release(now, envelopeOf(line.sound.technique).release);
      this.held.delete(id);
    });
  }

  /** A note takes the place of the one that its voice held before, or begins as a player would. */
  private enter(line: Line, now: number): void {
    const before = this.held.get(line.sound.id);
    before?.release(now, CROSSFADE.release);
    line.begin(now, before ? CROSSFADE : envelopeOf(line.sound.technique));
    this.held.set(line.sound.id, line);
  }

  private end(seconds: number | null): void {
    const now = getContext().now();
    this.lines.forEach((line) => line.release(now, seconds ?? envelopeOf(line.sound.technique).release));
    this.held.clear();
    this.schedule = [];
    this.state = 'silent';
  }

  /** Hands what comes next to the audio clock and puts away what has ended. */
  private pump(): void {
    const now = getContext().immediate();
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
        const envelope = envelopeOf(sound.technique);
        return () => {
          line.begin(this.beganAt + startSeconds, envelope);
          line.release(this.beganAt + startSeconds + seconds, envelope.release);
        };
      }),
    );
  }
}

/** Makes the one sound engine of the page; call it from a gesture of the reader, or the browser keeps silent. */
export function createSoundEngine(volume: Decibels): SoundEngine {
  return new ToneEngine(volume);
}

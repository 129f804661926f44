import { Context, getContext, setContext } from 'tone';
import { CROSSFADE, envelopeOf, type Envelope } from '@/audio/envelope';
import { scaleFor } from '@/audio/levels';
import { startLine, type Line } from '@/audio/line';
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
 * Ten milliseconds between an order and its sound, so that a key is answered at once. Tone's own ticking
 * moves nothing here: it is as seldom as may be, and without a worker made from a blob.
 */
const CLOCK = {
  latencyHint: 'interactive',
  lookAhead: 0.01,
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
    const now = getContext().now();
    this.master.setScale(scaleFor(loudest), now, this.anySounding(now));
    this.state = 'held';
    const ids = new Set(sounds.map(({ id }) => id));
    this.held.forEach((line, id) => {
      if (!ids.has(id)) this.letGo(id, line, now, envelopeOf(line.sound.technique));
    });
    sounds.forEach((sound) => this.holdVoice(sound, now));
    this.pump();
  }

  async play(schedule: readonly TimedSound[], loudest: Decibels): Promise<void> {
    if (!(await this.awake())) return;
    this.end(null);
    const now = getContext().now();
    this.master.setScale(scaleFor(loudest), now, this.anySounding(now));
    this.schedule = schedule;
    this.beganAt = now;
    this.handedOver = 0;
    this.state = 'playing';
    this.pump();
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

  private anySounding(now: number): boolean {
    return this.lines.some((line) => line.endsAt > now);
  }

  private start(sound: VoiceSound, at: number, envelope: Envelope): Line {
    const line = startLine({ sound, into: this.master.seat(sound.section), at, envelope });
    this.lines.push(line);
    return line;
  }

  private holdVoice(sound: VoiceSound, now: number): void {
    const before = this.held.get(sound.id);
    if (before && soundsAlike(before.sound, sound)) return;
    if (before) this.letGo(sound.id, before, now, CROSSFADE);
    this.held.set(sound.id, this.start(sound, now, before ? CROSSFADE : envelopeOf(sound.technique)));
  }

  private letGo(id: string, line: Line, now: number, { release }: Envelope): void {
    line.release(now, release);
    this.held.delete(id);
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
    for (const entry of startingBetween(this.schedule, this.handedOver, until)) {
      const at = this.beganAt + entry.startSeconds;
      for (const sound of entry.sounds) {
        const envelope = envelopeOf(sound.technique);
        this.start(sound, at, envelope).release(at + entry.seconds, envelope.release);
      }
    }
    this.handedOver = until;
    if (this.elapsed() >= endOf(this.schedule)) this.state = 'silent';
  }
}

function soundsAlike(a: VoiceSound, b: VoiceSound): boolean {
  return (
    a === b ||
    (a.section === b.section &&
      a.partials.length === b.partials.length &&
      a.partials.every(({ frequencyHz, levelDb }, index) => {
        const other = b.partials[index];
        return other?.frequencyHz === frequencyHz && other.levelDb === levelDb;
      }))
  );
}

/** Makes the one sound engine of the page; call it from a gesture of the reader, or the browser keeps silent. */
export function createSoundEngine(volume: Decibels): SoundEngine {
  return new ToneEngine(volume);
}

import { connect, Gain, type BaseContext } from 'tone';
import { playersOf, seedOf, type Player } from '@/audio/ensemble';
import { CROSSFADE, type Envelope } from '@/audio/envelope';
import { strokesFor } from '@/audio/tremolo';
import type { ReadyWave, WaveStore } from '@/audio/wave-store';
import type { VoiceSound } from '#shared/voicing/analysis';

/** One voice that sounds. Times are those of the audio clock, in seconds. */
export interface Line {
  readonly sound: VoiceSound;
  /** When it has ended and can be put away; Infinity while nobody has ended it. */
  readonly endsAt: number;
  beganBefore(moment: number): boolean;
  begin(at: number, envelope: Envelope): void;
  /** Lets the rest of a section join its first player; nothing for a solo, once it has ended, or a second time. */
  complete(earliest: number): void;
  /** How much of it is let through, 0 … 1: at once before it begins, gliding afterwards. */
  setPresence(presence: number, at: number, seconds: number): void;
  /** Lets it end. A line that has not begun by then never does. */
  release(at: number, seconds: number): void;
  dispose(): void;
}

/** 60 dB below the full level. */
const DECAYED = 0.001;
/** The oscillators go on a little after the level has reached 0. */
const AFTER = 0.02;

/** A player's oscillators with the gain that is the player's share. */
interface Desk {
  readonly sources: readonly OscillatorNode[];
  readonly gain: Gain;
  readonly nodes: readonly Gain[];
}

function oscillatorOf(context: BaseContext, wave: PeriodicWave, frequencyHz: number): OscillatorNode {
  const node = context.createOscillator();
  node.setPeriodicWave(wave);
  node.frequency.value = frequencyHz;
  return node;
}

/** Swings a gain with the strokes of one player. */
function stroke(context: BaseContext, store: WaveStore, into: Gain, index: number, players: number) {
  const { ratesHz, base, real, imag } = strokesFor(players);
  const strokes = new Gain({ context, gain: base }).connect(into);
  const swing = oscillatorOf(context, store.named('strokes', real, imag), ratesHz[index] ?? 0);
  connect(swing, strokes.gain);
  return { strokes, swing };
}

/** A voice as it stands on the desks: who plays, from which waves, into what. */
class Desks {
  private readonly players: readonly Player[];
  readonly desks: Desk[] = [];

  constructor(
    private readonly context: BaseContext,
    private readonly store: WaveStore,
    private readonly sound: VoiceSound,
    private readonly into: Gain,
  ) {
    const [first] = sound.partials;
    this.players = playersOf(sound.players, first ? first.frequencyHz / first.n : 1, seedOf(sound.id));
  }

  get hasOthers(): boolean {
    return this.players.length > 1;
  }

  add(kind: 'middle' | 'others'): readonly { readonly desk: Desk; readonly player: Player }[] {
    const waves = this.store.of(this.sound, kind);
    return this.players.flatMap((player, index) =>
      (index === 0) === (kind === 'middle') ? [{ desk: this.seat(player, index, waves), player }] : [],
    );
  }

  /** Whole periods of the first player from its beginning on, so that the others' waves stand to it as planned. */
  laterSeconds({ laterPeriods }: Player, atLeast: number): number {
    const [first] = this.sound.partials;
    if (!first) return 0;
    const periodsPerSecond = first.frequencyHz / first.n;
    return (laterPeriods + Math.ceil(Math.max(atLeast, 0) * periodsPerSecond)) / periodsPerSecond;
  }

  private seat(player: Player, index: number, waves: readonly ReadyWave[]): Desk {
    const gain = new Gain({ context: this.context, gain: player.share }).connect(this.into);
    const stroked =
      this.sound.technique.stroke === 'tremolo'
        ? stroke(this.context, this.store, gain, index, this.players.length)
        : null;
    const oscillators = waves.map(({ fundamentalHz, periodic }) => {
      const node = oscillatorOf(this.context, periodic, fundamentalHz);
      node.detune.value = player.cents;
      connect(node, stroked?.strokes ?? gain);
      return node;
    });
    const desk = {
      gain,
      sources: stroked ? [...oscillators, stroked.swing] : oscillators,
      nodes: stroked ? [stroked.strokes, gain] : [gain],
    };
    this.desks.push(desk);
    return desk;
  }
}

/**
 * Prepares one voice: its partials at their levels against 0 dB, each as exact as an oscillator is. New waves
 * take milliseconds to make, so that the moment of beginning is read from the clock afterwards; those of a
 * section's other players are made once it sounds.
 */
export function prepareLine(context: BaseContext, store: WaveStore, sound: VoiceSound, into: Gain): Line {
  const presence = new Gain({ context, gain: 1 }).connect(into);
  const level = new Gain({ context, gain: 0 }).connect(presence);
  const desks = new Desks(context, store, sound, level);
  const middle = desks.add('middle');
  let isComplete = !desks.hasOthers;
  let beginsAt = Infinity;
  let endsAt = Infinity;
  const stopAt = (time: number): void => {
    endsAt = time;
    desks.desks.forEach(({ sources }) => sources.forEach((node) => node.stop(time)));
  };
  return {
    sound,
    get endsAt() {
      return endsAt;
    },
    beganBefore: (moment) => beginsAt < moment,
    begin(at, { attack, decay }) {
      beginsAt = at;
      level.gain.setValueAtTime(0, at).linearRampToValueAtTime(1, at + attack);
      if (decay !== null) level.gain.exponentialRampToValueAtTime(DECAYED, at + attack + decay);
      middle.forEach(({ desk }) => desk.sources.forEach((node) => node.start(at)));
    },
    complete(earliest) {
      if (isComplete || beginsAt === Infinity || endsAt <= earliest) return;
      isComplete = true;
      for (const { desk, player } of desks.add('others')) {
        const start = beginsAt + desks.laterSeconds(player, earliest - beginsAt);
        desk.gain.gain.setValueAtTime(0, 0).setValueAtTime(0, start);
        desk.gain.gain.linearRampToValueAtTime(player.share, start + CROSSFADE.attack);
        desk.sources.forEach((node) => node.start(start));
      }
      if (endsAt < Infinity) stopAt(endsAt);
    },
    setPresence(value, at, seconds) {
      if (beginsAt === Infinity) presence.gain.value = value;
      else presence.gain.linearRampTo(value, seconds, at);
    },
    release(from, seconds) {
      if (endsAt <= from) return;
      if (from <= beginsAt) {
        level.disconnect();
        stopAt(from);
        return;
      }
      level.gain.linearRampTo(0, seconds, from);
      stopAt(from + seconds + AFTER);
    },
    dispose() {
      desks.desks.forEach(({ sources, nodes }) => {
        sources.forEach((node) => node.disconnect());
        nodes.forEach((node) => node.dispose());
      });
      level.dispose();
      presence.dispose();
    },
  };
}

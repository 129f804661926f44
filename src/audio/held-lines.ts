import { soundsAlike } from '@/audio/alike';
import { CROSSFADE, envelopeOf } from '@/audio/envelope';
import type { Line } from '@/audio/line';
import type { Side } from '@/audio/sound-engine';
import type { VoiceSound } from '#shared/voicing/analysis';

/** A voice that is to be held. */
export interface HeldVoice {
  readonly side: Side;
  readonly sound: VoiceSound;
  /** How much of it is let through, 0 … 1. */
  readonly presence: number;
}

interface HeldLine {
  readonly side: Side;
  readonly line: Line;
}

/** Prepares a line that begins later. */
export type Prepare = (sound: VoiceSound) => Line;

/** From one of two chords to the other: at once to the ear, and still no click. */
const SWITCH_SECONDS = 0.015;

const keyOf = ({ side, sound }: HeldVoice): string => `${side} ${sound.id}`;

/** The notes that sound until they are told to end, each voice at most one. */
export class HeldLines {
  private readonly held = new Map<string, HeldLine>();

  /**
   * Holds these voices and no others: notes that stay are not touched, others cross over.
   * @param prepare makes a line; what it takes is over before `now` is asked for
   * @returns the lines that have begun
   */
  hold(voices: readonly HeldVoice[], prepare: Prepare, now: () => number): readonly Line[] {
    const entering = voices
      .filter((voice) => !this.isHeld(voice))
      .map((voice) => ({ voice, line: prepare(voice.sound) }));
    const at = now();
    this.leaveOthers(voices, at);
    voices.forEach((voice) =>
      this.held.get(keyOf(voice))?.line.setPresence(voice.presence, at, SWITCH_SECONDS),
    );
    entering.forEach(({ voice, line }) => this.enter(voice, line, at));
    return entering.map(({ line }) => line);
  }

  /** Lets each side through as far as is said. */
  setPresence(presenceOf: (side: Side) => number, at: number): void {
    this.held.forEach(({ side, line }) => line.setPresence(presenceOf(side), at, SWITCH_SECONDS));
  }

  /** Holds them no more; ending them is left to who asks. */
  clear(): void {
    this.held.clear();
  }

  private isHeld(voice: HeldVoice): boolean {
    const known = this.held.get(keyOf(voice));
    return known !== undefined && soundsAlike(known.line.sound, voice.sound);
  }

  private leaveOthers(voices: readonly HeldVoice[], at: number): void {
    const staying = new Set(voices.map(keyOf));
    this.held.forEach(({ line }, key) => {
      if (staying.has(key)) return;
      line.release(at, envelopeOf(line.sound.technique, line.sound.midi).release);
      this.held.delete(key);
    });
  }

  /** A note takes the place of the one that its voice held before, or begins as a player would. */
  private enter(voice: HeldVoice, line: Line, at: number): void {
    const before = this.held.get(keyOf(voice));
    before?.line.release(at, CROSSFADE.release);
    line.setPresence(voice.presence, at, 0);
    line.begin(at, before ? CROSSFADE : envelopeOf(voice.sound.technique, voice.sound.midi));
    this.held.set(keyOf(voice), { side: voice.side, line });
  }
}

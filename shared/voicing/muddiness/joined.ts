import { spectrumOf } from '#shared/acoustics/spectrum';
import type { Decibels, Hertz } from '#shared/units';
import type { Partial } from '#shared/voicing/analysis';
import type { MuddinessVoice } from '#shared/voicing/muddiness/model';
import type { Tone } from '#shared/voicing/muddiness/tones';
import { toneOf } from '#shared/voicing/muddiness/tones';
import type { VoiceSource } from '#shared/voicing/sound';

const DB_PER_POWER_DECADE = 10;
/** Fundamentals nearer than this, as a ratio, are one pitch: far under what any tuning here can differ by. */
const SAME_PITCH = 1e-9;

/** Voices that sound one pitch, joined into one of their joint energy. */
export interface JoinedVoice extends MuddinessVoice {
  /** Their places in the chord, each with its part of the joint energy. */
  readonly members: readonly { readonly index: number; readonly part: number }[];
}

/** A voice by what joining needs. */
export type Joinable = Pick<
  VoiceSource,
  'toneKey' | 'f0Hz' | 'nominalDb' | 'instrument' | 'technique' | 'dynamic'
>;

/**
 * @returns the power of a level: 1 at 0 dB
 * @example powerOf(10) // 10
 */
export function powerOf(level: Decibels): number {
  return 10 ** (level / DB_PER_POWER_DECADE);
}

/** @returns a voice that stands alone, as the index hears it */
export function muddinessVoice(voice: Joinable, a4Hz: Hertz): MuddinessVoice {
  return {
    key: voice.toneKey,
    makeTone: () => toneOf(spectrumOf(voice), a4Hz, spectrumAtMf(voice)),
    energy: powerOf(voice.nominalDb),
  };
}

/** What a tone is scaled by; undefined where it is at mf itself. */
function spectrumAtMf(voice: Joinable): readonly Partial[] | undefined {
  return voice.dynamic === 'mf' ? undefined : spectrumOf({ ...voice, dynamic: 'mf' });
}

/**
 * Joins the voices that stand in unison: a doubled note is one note, louder, and does not cloud itself.
 * @param voices of a chord, in any order
 * @param a4Hz places them on the pitch axis
 * @returns one voice for each pitch, low to high
 */
export function joinUnisons(voices: readonly Joinable[], a4Hz: Hertz): readonly JoinedVoice[] {
  const rising = voices.map((voice, index) => ({ voice, index })).sort(byPitch);
  const groups: Member[][] = [];
  for (const entry of rising) {
    const group = groups.at(-1);
    const first = group?.[0];
    if (group && first && inUnison(first.voice, entry.voice)) group.push(entry);
    else groups.push([entry]);
  }
  return groups.map((group) => joined(group, a4Hz));
}

/** Low to high; voices in unison in an order of their own, so that the chord's cannot change a digit. */
function byPitch({ voice: a }: Member, { voice: b }: Member): number {
  return a.f0Hz - b.f0Hz || a.nominalDb - b.nominalDb || compareText(a.toneKey, b.toneKey);
}

function compareText(a: string, b: string): number {
  if (a === b) return 0;
  return a < b ? -1 : 1;
}

/**
 * @returns whether two voices sound one pitch
 * @example inUnison({ f0Hz: 440 }, { f0Hz: 441 }) // false
 */
export function inUnison(a: Pick<Joinable, 'f0Hz'>, b: Pick<Joinable, 'f0Hz'>): boolean {
  return Math.abs(a.f0Hz - b.f0Hz) < SAME_PITCH * b.f0Hz;
}

interface Member {
  readonly voice: Joinable;
  readonly index: number;
}

function joined(group: readonly Member[], a4Hz: Hertz): JoinedVoice {
  const [first] = group;
  const energy = group.reduce((sum, { voice }) => sum + powerOf(voice.nominalDb), 0);
  const members = group.map(({ voice, index }) => ({ index, part: powerOf(voice.nominalDb) / energy }));
  const alike = new Set(group.map(({ voice }) => voice.toneKey)).size === 1;
  if (first && alike) return { ...muddinessVoice(first.voice, a4Hz), energy, members };
  const voices = group.map(({ voice }) => voice);
  return { key: mixedKey(voices), makeTone: () => mixedTone(voices, a4Hz), energy, members };
}

/** Unlike shapes in unison make a shape of their own, told by how loud each is. */
function mixedKey(voices: readonly Joinable[]): string {
  const loudest = Math.max(...voices.map(({ nominalDb }) => nominalDb));
  return voices
    .map(({ toneKey, nominalDb }) => `${toneKey} ${nominalDb - loudest}`)
    .sort()
    .join(' + ');
}

function mixedTone(voices: readonly Joinable[], a4Hz: Hertz): Tone {
  const shapes = voices.map(spectrumOf);
  if (voices.every(({ dynamic }) => dynamic === 'mf'))
    return toneOf(jointPartials(voices, shapes, shapes), a4Hz);
  const atMf = voices.map((voice) => spectrumOf({ ...voice, dynamic: 'mf' }));
  return toneOf(jointPartials(voices, shapes, atMf), a4Hz, jointPartials(voices, atMf, atMf));
}

/** Energies of shapes, each scaled at mf to its voice's nominal power, added partial by partial. */
function jointPartials(
  voices: readonly Joinable[],
  shapes: readonly (readonly Partial[])[],
  atMf: readonly (readonly Partial[])[],
): readonly Partial[] {
  const powers = new Map<number, { frequencyHz: Hertz; power: number }>();
  voices.forEach(({ nominalDb }, i) => {
    const whole = (atMf[i] ?? []).reduce((sum, { levelDb }) => sum + powerOf(levelDb), 0);
    for (const { n, frequencyHz, levelDb } of shapes[i] ?? []) {
      const power = (powerOf(nominalDb) * powerOf(levelDb)) / whole;
      powers.set(n, { frequencyHz, power: power + (powers.get(n)?.power ?? 0) });
    }
  });
  return [...powers]
    .sort(([a], [b]) => a - b)
    .map(([n, { frequencyHz, power }]) => ({
      n,
      frequencyHz,
      levelDb: DB_PER_POWER_DECADE * Math.log10(power),
    }));
}

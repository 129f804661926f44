import type { Decibels, Hertz } from '#shared/units';
import type { Partial } from '#shared/voicing/analysis';
import type { MuddinessVoice } from '#shared/voicing/muddiness/model';
import { toneOf } from '#shared/voicing/muddiness/tones';
import type { SoundingVoice } from '#shared/voicing/sound';

const DB_PER_POWER_DECADE = 10;
/** Fundamentals nearer than this, as a ratio, are one pitch: far under what any tuning here can differ by. */
const SAME_PITCH = 1e-9;

/** Voices that sound one pitch, joined into one of their joint energy. */
export interface JoinedVoice extends MuddinessVoice {
  /** Their places in the chord, each with its part of the joint energy. */
  readonly members: readonly { readonly index: number; readonly part: number }[];
}

/** A voice by what joining needs. */
export type Joinable = Pick<SoundingVoice, 'f0Hz' | 'nominalDb' | 'partials'>;

/** @returns the power of a level: 1 at 0 dB */
export function powerOf(level: Decibels): number {
  return 10 ** (level / DB_PER_POWER_DECADE);
}

/**
 * Joins the voices that stand in unison: a doubled note is one note, louder, and does not cloud itself.
 * @param voices of a chord, in any order
 * @param a4Hz places them on the pitch axis
 * @returns one voice for each pitch, low to high
 */
export function joinUnisons(voices: readonly Joinable[], a4Hz: Hertz): readonly JoinedVoice[] {
  const rising = voices.map((voice, index) => ({ voice, index })).sort((a, b) => a.voice.f0Hz - b.voice.f0Hz);
  const groups: { voice: Joinable; index: number }[][] = [];
  for (const entry of rising) {
    const group = groups.at(-1);
    const same = group?.[0] && entry.voice.f0Hz - group[0].voice.f0Hz < SAME_PITCH * entry.voice.f0Hz;
    if (group && same) group.push(entry);
    else groups.push([entry]);
  }
  return groups.map((group) => joined(group, a4Hz));
}

function joined(group: readonly { voice: Joinable; index: number }[], a4Hz: Hertz): JoinedVoice {
  const energy = group.reduce((sum, { voice }) => sum + powerOf(voice.nominalDb), 0);
  const members = group.map(({ voice, index }) => ({ index, part: powerOf(voice.nominalDb) / energy }));
  const only = group.length === 1 ? group[0] : undefined;
  const partials = only ? only.voice.partials : jointPartials(group.map(({ voice }) => voice));
  return { tone: toneOf(partials, a4Hz), energy, members };
}

/** Energies of shapes, each scaled to its voice's nominal power, added partial by partial. */
function jointPartials(voices: readonly Joinable[]): readonly Partial[] {
  const powers = new Map<number, Partial & { power: number }>();
  for (const { partials, nominalDb } of voices) {
    const whole = partials.reduce((sum, { levelDb }) => sum + powerOf(levelDb), 0);
    for (const partial of partials) {
      const power = (powerOf(nominalDb) * powerOf(partial.levelDb)) / whole;
      powers.set(partial.n, { ...partial, power: power + (powers.get(partial.n)?.power ?? 0) });
    }
  }
  return [...powers.values()]
    .sort((a, b) => a.n - b.n)
    .map(({ n, frequencyHz, power }) => ({
      n,
      frequencyHz,
      levelDb: DB_PER_POWER_DECADE * Math.log10(power),
    }));
}

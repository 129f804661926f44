import type { Decibels } from '#shared/units';
import type { VoiceSound } from '#shared/voicing/analysis';
import type { HeardPartials } from '#shared/voicing/audibility';
import { hearPartials, isHeard, MOST_BANDS } from '#shared/voicing/audibility';

/** How much of a voice is heard. */
export interface VoiceBalance {
  readonly id: string;
  /** The share of its energy that is above the threshold and not masked by another voice, 0 … 1. */
  readonly heard: number;
  /** Less than half of it is heard. */
  readonly covered: boolean;
}

/** How one tone of the chord stands against the others. */
export interface ToneBalance {
  /** The tone's name as spelt, without octave: `F#`. */
  readonly tone: string;
  readonly ids: readonly string[];
  readonly players: number;
  /** Its level less the mean level of the other tones; null where it is the only one. */
  readonly levelDb: Decibels | null;
  readonly standing: 'thin' | 'even' | 'swollen';
}

export interface ChordBalance {
  readonly voices: readonly VoiceBalance[];
  readonly tones: readonly ToneBalance[];
}

export const COVERED = 0.5;
/** Twice the loudness, by Stevens's rule of thumb a difference of 10 dB, is swollen; from memory. */
export const SWOLLEN: Decibels = 10;
const THIN: Decibels = -10;
const DB_PER_POWER_DECADE = 10;

/**
 * Who is covered, and which tone of the chord is thin or swollen.
 * @param voices as they sound
 * @param heard the same voices' partials, where they are at hand
 * @returns voices in the order given; tones in the order of their first voice
 * @example balanceOf([]) // { voices: [], tones: [] }
 */
export function balanceOf(
  voices: readonly VoiceSound[],
  heard: HeardPartials = hearPartials(voices),
): ChordBalance {
  const powers = voices.map((_, voice) => powerOfVoice(heard, voice));
  return { voices: voiceBalances(voices, heard, powers), tones: toneBalances(voices, powers) };
}

/** The loudest partial of each band, who plays it, and the loudest of anybody else: what masks a voice. */
interface Maskers {
  readonly voice: Int32Array;
  readonly first: Float64Array;
  readonly others: Float64Array;
}

function voiceBalances(
  voices: readonly VoiceSound[],
  heard: HeardPartials,
  powers: readonly number[],
): readonly VoiceBalance[] {
  const maskers = maskersOf(heard);
  return voices.map(({ id }, voice) => {
    let sum = 0;
    const end = heard.starts[voice + 1] ?? 0;
    for (let place = heard.starts[voice] ?? 0; place < end; place += 1) {
      const band = heard.bands[place] ?? 0;
      const masker = (maskers.voice[band] === voice ? maskers.others : maskers.first)[band] ?? -Infinity;
      if (isHeard(heard, place, masker)) sum += heard.powers[place] ?? 0;
    }
    const whole = powers[voice] ?? 0;
    const share = whole === 0 ? 0 : sum / whole;
    return { id, heard: share, covered: share < COVERED };
  });
}

function maskersOf({ starts, bands, levels }: HeardPartials): Maskers {
  const voice = new Int32Array(MOST_BANDS).fill(-1);
  const first = new Float64Array(MOST_BANDS).fill(-Infinity);
  const others = new Float64Array(MOST_BANDS).fill(-Infinity);
  for (let now = 0; now + 1 < starts.length; now += 1) {
    for (let place = starts[now] ?? 0; place < (starts[now + 1] ?? 0); place += 1) {
      const band = bands[place] ?? 0;
      const level = levels[place] ?? -Infinity;
      const most = first[band] ?? -Infinity;
      if (voice[band] === now) first[band] = Math.max(most, level);
      else if (level > most) {
        others[band] = most;
        first[band] = level;
        voice[band] = now;
      } else others[band] = Math.max(others[band] ?? -Infinity, level);
    }
  }
  return { voice, first, others };
}

function powerOfVoice({ starts, powers }: HeardPartials, voice: number): number {
  let sum = 0;
  for (let place = starts[voice] ?? 0; place < (starts[voice + 1] ?? 0); place += 1)
    sum += powers[place] ?? 0;
  return sum;
}

function toneBalances(voices: readonly VoiceSound[], powers: readonly number[]): readonly ToneBalance[] {
  const tones = new Map<string, { readonly ids: string[]; players: number; power: number }>();
  voices.forEach(({ id, pitch, players }, i) => {
    const name = pitch.replace(/-?\d+$/, '');
    const tone = tones.get(name) ?? { ids: [], players: 0, power: 0 };
    tone.ids.push(id);
    tone.players += players;
    tone.power += powers[i] ?? 0;
    tones.set(name, tone);
  });
  const whole = powers.reduce((sum, power) => sum + power, 0);
  return [...tones].map(([tone, { ids, players, power }]) => {
    const others = (whole - power) / (tones.size - 1);
    const levelDb = tones.size > 1 ? DB_PER_POWER_DECADE * Math.log10(power / others) : null;
    return { tone, ids, players, levelDb, standing: standingOf(levelDb ?? 0) };
  });
}

function standingOf(levelDb: Decibels): ToneBalance['standing'] {
  if (levelDb <= THIN) return 'thin';
  return levelDb >= SWOLLEN ? 'swollen' : 'even';
}

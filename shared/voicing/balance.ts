import type { Decibels } from '#shared/units';
import type { VoiceSound } from '#shared/voicing/analysis';
import { bandNumber, isAboveThreshold, MASKING } from '#shared/voicing/audibility';
import { powerOf } from '#shared/voicing/muddiness/joined';

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
 * @returns voices in the order given; tones in the order of their first voice
 */
export function balanceOf(voices: readonly VoiceSound[]): ChordBalance {
  return { voices: voiceBalances(voices), tones: toneBalances(voices) };
}

/** The two loudest voices of each band: what masks a voice is the loudest other. */
interface Loudest {
  readonly voice: number;
  readonly first: Decibels;
  readonly second: Decibels;
}

function voiceBalances(voices: readonly VoiceSound[]): readonly VoiceBalance[] {
  const bands = loudestOthers(voices);
  return voices.map(({ id, partials }, index) => {
    let whole = 0;
    let heard = 0;
    for (const partial of partials) {
      const power = powerOf(partial.levelDb);
      whole += power;
      const loudest = bands.get(bandNumber(partial));
      const masker = loudest?.voice === index ? loudest.second : (loudest?.first ?? -Infinity);
      if (isAboveThreshold(partial) && masker - partial.levelDb < MASKING) heard += power;
    }
    const share = whole === 0 ? 0 : heard / whole;
    return { id, heard: share, covered: share < COVERED };
  });
}

function loudestOthers(voices: readonly VoiceSound[]): ReadonlyMap<number, Loudest> {
  const bands = new Map<number, Loudest>();
  voices.forEach(({ partials }, voice) => {
    for (const partial of partials) {
      const band = bandNumber(partial);
      bands.set(band, louder(bands.get(band), voice, partial.levelDb));
    }
  });
  return bands;
}

function louder(known: Loudest | undefined, voice: number, levelDb: Decibels): Loudest {
  if (!known) return { voice, first: levelDb, second: -Infinity };
  if (voice === known.voice) return { ...known, first: Math.max(known.first, levelDb) };
  if (levelDb > known.first) return { voice, first: levelDb, second: known.first };
  return { ...known, second: Math.max(known.second, levelDb) };
}

function toneBalances(voices: readonly VoiceSound[]): readonly ToneBalance[] {
  const groups = new Map<string, VoiceSound[]>();
  for (const voice of voices) {
    const tone = voice.pitch.replace(/-?\d+$/, '');
    groups.set(tone, [...(groups.get(tone) ?? []), voice]);
  }
  const powers = [...groups.values()].map((group) =>
    group.reduce((sum, voice) => sum + soundPower(voice), 0),
  );
  const whole = powers.reduce((sum, power) => sum + power, 0);
  return [...groups].map(([tone, group], i) => {
    const power = powers[i] ?? 0;
    const others = (whole - power) / (powers.length - 1);
    const levelDb = powers.length > 1 ? DB_PER_POWER_DECADE * Math.log10(power / others) : null;
    return {
      tone,
      ids: group.map(({ id }) => id),
      players: group.reduce((sum, { players }) => sum + players, 0),
      levelDb,
      standing: standingOf(levelDb ?? 0),
    };
  });
}

function standingOf(levelDb: Decibels): ToneBalance['standing'] {
  if (levelDb <= THIN) return 'thin';
  return levelDb >= SWOLLEN ? 'swollen' : 'even';
}

function soundPower({ partials }: VoiceSound): number {
  return partials.reduce((sum, { levelDb }) => sum + powerOf(levelDb), 0);
}

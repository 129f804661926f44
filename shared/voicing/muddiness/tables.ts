import type { Hertz, Semitones } from '#shared/units';
import type { Deposit, PitchAxis, Profile, Window } from '#shared/voicing/muddiness/axis';
import { AXIS_LOW, depositOn, windowOn } from '#shared/voicing/muddiness/axis';
import type { MuddinessConstants } from '#shared/voicing/muddiness/constants';
import { poolingPower } from '#shared/voicing/muddiness/constants';
import { cloudingOf } from '#shared/voicing/muddiness/pairs';
import type { Tone } from '#shared/voicing/muddiness/tones';

/** What a tone of unit energy puts where, computed once. */
export interface ToneTable {
  /** Tells tables apart in pairs of them. */
  readonly number: number;
  readonly tone: Tone;
  /** W∗E: what sounds at each place. */
  readonly energy: Profile;
  /** w: how much the voice counts for the places around its fundamental. */
  readonly neighbourhood: Profile;
}

/** Tables of tones and of pairs of tones, computed when first asked for. */
export interface MuddinessTables {
  /** @param key tells tones of different shape apart; @param make is called where the tone is not known yet */
  readonly ofTone: (key: string, make: () => Tone) => ToneTable;
  /** (W∗r)^m of two tones of unit energy. */
  readonly ofPair: (a: ToneTable, b: ToneTable) => Profile;
}

/** Fundamentals within an octave of a place count for what sounds there. */
const NEIGHBOURHOOD: Semitones = 12;
/** About 20 MB of pairs; a study with its moves and suggestions needs far fewer. */
const MOST_PAIRS = 16_384;
/** More tones than pairs could be kept of; two numbers make one key. */
const MOST_TONES = 8192;

/** @returns empty tables for one axis, one A4 and one set of constants */
export function muddinessTables(
  constants: MuddinessConstants,
  a4Hz: Hertz,
  axis: PitchAxis,
): MuddinessTables {
  const deposit = depositOn(axis);
  const window = windowOn(axis, constants.windowSemitones);
  const localWindow = windowOn(axis, constants.localWindowSemitones);
  const power = poolingPower(constants);
  const tones = new Map<string, ToneTable>();
  const pairs = new Map<number, Profile>();
  const ofTone = (key: string, make: () => Tone): ToneTable => {
    const known = tones.get(key);
    if (known) return known;
    if (tones.size >= MOST_TONES) forget(tones, pairs);
    const tone = make();
    const table = {
      number: tones.size,
      tone,
      energy: energyOf(tone, deposit, localWindow),
      neighbourhood: neighbourhoodOf(tone, axis),
    };
    tones.set(key, table);
    return table;
  };
  const ofPair = (a: ToneTable, b: ToneTable): Profile => {
    const low = Math.min(a.number, b.number);
    const key = low * MOST_TONES + Math.max(a.number, b.number);
    const known = pairs.get(key);
    if (known) return known;
    if (pairs.size >= MOST_PAIRS) pairs.clear();
    // One order for both ways round, so that the order of voices cannot change a digit.
    const [first, second] = low === a.number ? [a, b] : [b, a];
    const profile = cloudingOf(first.tone, second.tone, constants, a4Hz, deposit, window);
    const { values } = profile;
    for (let i = 0; i < values.length; i += 1) values[i] = power(values[i] ?? 0);
    pairs.set(key, profile);
    return profile;
  };
  return { ofTone, ofPair };
}

/** Numbers are given anew, so the pairs known by the old ones go too. */
function forget(tones: Map<string, ToneTable>, pairs: Map<number, Profile>): void {
  tones.clear();
  pairs.clear();
}

function energyOf({ pitches, amplitudes }: Tone, deposit: Deposit, window: Window): Profile {
  for (let i = 0; i < pitches.length; i += 1) deposit.add(pitches[i] ?? 0, (amplitudes[i] ?? 0) ** 2);
  return deposit.smooth(window, 1);
}

function neighbourhoodOf({ fundamental }: Tone, axis: PitchAxis): Profile {
  const from = Math.max(Math.ceil((fundamental - NEIGHBOURHOOD - AXIS_LOW) / axis.step), 0);
  const to = Math.min(Math.floor((fundamental + NEIGHBOURHOOD - AXIS_LOW) / axis.step), axis.count - 1);
  const values = new Float64Array(Math.max(to - from + 1, 0));
  for (let i = 0; i < values.length; i += 1) {
    values[i] = neighbourWeight(AXIS_LOW + axis.step * (from + i) - fundamental);
  }
  return { from, values };
}

/**
 * @source w = ½ (1 + cos(πd/12)) for a fundamental d semitones away, 0 beyond an octave
 * @example neighbourWeight(6) // 0.5
 */
export function neighbourWeight(distance: Semitones): number {
  return Math.abs(distance) >= NEIGHBOURHOOD ? 0 : (1 + Math.cos((Math.PI * distance) / NEIGHBOURHOOD)) / 2;
}

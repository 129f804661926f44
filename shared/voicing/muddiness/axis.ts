import type { Midi, Semitones } from '#shared/units';

/** A quarter tone under C0, the lower edge of the lowest register. */
export const AXIS_LOW: Midi = 11.5;
/** E8. */
export const AXIS_HIGH: Midi = 112;
/** The farthest that any window reaches; masses this far outside the axis still count inside it. */
const MARGIN: Semitones = 24;
/** A window counts as nothing where it has fallen under a millionth. */
const WINDOW_END = 1e-6;
const EXPONENT = 2;
/** Masses are gathered on a finer axis than the values are taken on, so that where they lie hardly matters. */
const FINER = 4;

/** The pitch axis: points at even steps, the registers' edges among them. */
export interface PitchAxis {
  readonly step: Semitones;
  readonly count: number;
}

/** A window's values at the finer steps from −reach to reach; 1 in the middle. */
export interface Window {
  readonly reach: number;
  readonly weights: Float64Array;
}

/** Values along a stretch of the axis; nothing outside it. */
export interface Profile {
  /** The first point with a value. */
  readonly from: number;
  readonly values: Float64Array;
}

const EMPTY_PROFILE: Profile = { from: 0, values: new Float64Array(0) };

/**
 * @param step 0.5 or 0.25 semitones, so that the registers' edges are points
 * @example pitchAxis(0.5).count // 202
 */
export function pitchAxis(step: Semitones): PitchAxis {
  return { step, count: Math.round((AXIS_HIGH - AXIS_LOW) / step) + 1 };
}

/**
 * @returns the pitch of a point of the axis
 * @example pitchAt(pitchAxis(0.5), 1) // 12, C0
 */
export function pitchAt(axis: PitchAxis, point: number): Midi {
  return AXIS_LOW + axis.step * point;
}

/**
 * @param width semitones at which the window has fallen to e^−2
 * @source W(d) = exp(−2 (d / width)²), d in semitones
 * @example windowValue(2, 2) // 0.1353, e^−2
 */
export function windowValue(distance: Semitones, width: Semitones): number {
  return Math.exp(-EXPONENT * (distance / width) ** 2);
}

/** @returns the window on an axis, up to where it counts as nothing */
export function windowOn({ step }: PitchAxis, width: Semitones): Window {
  const finer = step / FINER;
  const farthest = Math.min(width * Math.sqrt(-Math.log(WINDOW_END) / EXPONENT), MARGIN);
  const reach = Math.ceil(farthest / finer);
  const weights = Float64Array.from({ length: 2 * reach + 1 }, (_, i) =>
    windowValue((i - reach) * finer, width),
  );
  return { reach, weights };
}

/** Gathers masses at pitches and smooths them; used again and again, so that adding allocates nothing. */
export interface Deposit {
  readonly add: (pitch: Midi, mass: number) => void;
  /** Smooths what was added since the last time by a window and starts anew. */
  readonly smooth: (window: Window, scale: number) => Profile;
}

/** @returns a deposit on an axis; masses go linearly onto the two nearest points of the finer one */
export function depositOn(axis: PitchAxis): Deposit {
  const finer = axis.step / FINER;
  const margin = Math.round(MARGIN / finer);
  const masses = new Float64Array(axis.count * FINER + 2 * margin);
  let first = masses.length;
  let last = -1;
  const add = (pitch: Midi, mass: number): void => {
    const place = (pitch - AXIS_LOW) / finer + margin;
    const below = Math.floor(place);
    if (below < 0 || below + 1 >= masses.length) return;
    const part = place - below;
    masses[below] = (masses[below] ?? 0) + mass * (1 - part);
    masses[below + 1] = (masses[below + 1] ?? 0) + mass * part;
    if (below < first) first = below;
    if (below + 1 > last) last = below + 1;
  };
  const smooth = (window: Window, scale: number): Profile => {
    const profile = smoothed(masses, { first, last, margin, scale }, axis, window);
    if (last >= 0) masses.fill(0, first, last + 1);
    first = masses.length;
    last = -1;
    return profile;
  };
  return { add, smooth };
}

interface Stretch {
  readonly first: number;
  readonly last: number;
  readonly margin: number;
  readonly scale: number;
}

function smoothed(masses: Float64Array, stretch: Stretch, axis: PitchAxis, window: Window): Profile {
  const { first, last, margin, scale } = stretch;
  const { reach, weights } = window;
  const from = Math.max(Math.ceil((first - margin - reach) / FINER), 0);
  const to = Math.min(Math.floor((last - margin + reach) / FINER), axis.count - 1);
  if (to < from) return EMPTY_PROFILE;
  const values = new Float64Array(to - from + 1);
  for (let source = first; source <= last; source += 1) {
    const mass = masses[source] ?? 0;
    if (mass === 0) continue;
    const centre = source - margin;
    const low = Math.max(Math.ceil((centre - reach) / FINER), from);
    const high = Math.min(Math.floor((centre + reach) / FINER), to);
    const scaled = mass * scale;
    let weight = reach + FINER * low - centre;
    for (let point = low - from; point <= high - from; point += 1, weight += FINER) {
      values[point] = (values[point] ?? 0) + scaled * (weights[weight] ?? 0);
    }
  }
  return { from, values };
}

/** Adds a profile, scaled, to a sum along the whole axis. */
export function addProfile(sum: Float64Array, { from, values }: Profile, scale: number): void {
  const { length } = values;
  for (let i = 0; i < length; i += 1) sum[from + i] = (sum[from + i] ?? 0) + scale * (values[i] ?? 0);
}

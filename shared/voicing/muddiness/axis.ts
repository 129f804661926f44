import type { Midi, Semitones } from '#shared/units';

/** A quarter tone under C0, the lower edge of the lowest register. */
export const AXIS_LOW: Midi = 11.5;
/** E8. */
export const AXIS_HIGH: Midi = 112;
/** Farther than this from its centre the window counts as nothing: under one part in 60,000,000. */
export const WINDOW_REACH: Semitones = 12;
const EXPONENT = 2;

/** The pitch axis: points at even steps, the registers' edges among them. */
export interface PitchAxis {
  readonly step: Semitones;
  readonly count: number;
  /** The window's values at 0, 1, 2 … steps from its centre; 1 at the centre. */
  readonly window: Float64Array;
}

/** Values along a stretch of the axis; nothing outside it. */
export interface Profile {
  /** The first point with a value. */
  readonly from: number;
  readonly values: Float64Array;
}

export const EMPTY_PROFILE: Profile = { from: 0, values: new Float64Array(0) };

/**
 * @param step 0.5 or 0.25 semitones, so that the registers' edges are points
 * @param windowSemitones where the window has fallen to e^−2
 * @source W(d) = exp(−2 (d / width)²), d in semitones
 */
export function pitchAxis(step: Semitones, windowSemitones: Semitones): PitchAxis {
  const reach = Math.round(WINDOW_REACH / step);
  const window = new Float64Array(reach + 1);
  for (let i = 0; i <= reach; i += 1) window[i] = Math.exp(-EXPONENT * ((i * step) / windowSemitones) ** 2);
  return { step, count: Math.round((AXIS_HIGH - AXIS_LOW) / step) + 1, window };
}

/** @returns the pitch of a point of the axis */
export function pitchAt(axis: PitchAxis, point: number): Midi {
  return AXIS_LOW + axis.step * point;
}

/** Gathers masses at pitches and smooths them by the window; kept and used again, so that nothing is allocated. */
export interface Deposit {
  readonly add: (pitch: Midi, mass: number) => void;
  /** Smooths what was added since the last time and starts anew. */
  readonly smooth: () => Profile;
}

/** @returns a deposit on an axis; masses go linearly onto the two nearest points */
export function depositOn(axis: PitchAxis): Deposit {
  const reach = axis.window.length - 1;
  const masses = new Float64Array(axis.count + 2 * reach);
  let first = masses.length;
  let last = -1;
  const add = (pitch: Midi, mass: number): void => {
    const place = (pitch - AXIS_LOW) / axis.step + reach;
    const below = Math.floor(place);
    if (below < 0 || below + 1 >= masses.length) return;
    const part = place - below;
    masses[below] = (masses[below] ?? 0) + mass * (1 - part);
    masses[below + 1] = (masses[below + 1] ?? 0) + mass * part;
    if (below < first) first = below;
    if (below + 1 > last) last = below + 1;
  };
  const smooth = (): Profile => {
    if (last < 0) return EMPTY_PROFILE;
    const profile = smoothed(masses, first, last, axis);
    masses.fill(0, first, last + 1);
    first = masses.length;
    last = -1;
    return profile;
  };
  return { add, smooth };
}

function smoothed(masses: Float64Array, first: number, last: number, axis: PitchAxis): Profile {
  const reach = axis.window.length - 1;
  const from = Math.max(first - 2 * reach, 0);
  const to = Math.min(last, axis.count - 1);
  const values = new Float64Array(Math.max(to - from + 1, 0));
  for (let source = first; source <= last; source += 1) {
    const mass = masses[source] ?? 0;
    if (mass === 0) continue;
    const centre = source - reach;
    const low = Math.max(centre - reach, from);
    const high = Math.min(centre + reach, to);
    for (let point = low; point <= high; point += 1) {
      const weight = axis.window[Math.abs(point - centre)] ?? 0;
      values[point - from] = (values[point - from] ?? 0) + mass * weight;
    }
  }
  return { from, values };
}

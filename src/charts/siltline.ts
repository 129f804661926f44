import type { Midi, Semitones } from '#shared/units';
import type { SiltlineMap } from '#shared/voicing/siltline-map';
import type { PitchAxis } from '@/charts/pitch-axis';
import { siltColour } from '@/charts/silt';

/** A run of intervals above one note that cloud alike. */
export interface SiltStratum {
  readonly key: string;
  readonly x: number;
  readonly y: number;
  readonly width: number;
  readonly height: number;
  readonly fill: string;
}

/** The map of the room above each note: pitch of the lower note up, interval to the right. */
export interface SiltlineField {
  readonly strata: readonly SiltStratum[];
  /** The line of 50, round every island. */
  readonly line: string;
  readonly marks: readonly { readonly semitones: Semitones; readonly x: number; readonly label: string }[];
  /** Width of one semitone of interval, in pixels. */
  readonly step: number;
}

/** Where the strata begin. */
const STRATA = [75, 50, 25, 0] as const;
const LINE = 50;
/** The intervals that a reader finds his way by. */
const MARKS = [
  { semitones: 4, label: '3' },
  { semitones: 7, label: '5' },
  { semitones: 12, label: '8' },
  { semitones: 19, label: '12' },
] as const;
const HALF = 0.5;

/** @returns the lower end of the stratum in which an index lies: 0, 25, 50 or 75 */
export function stratumOf(index: number): number {
  return STRATA.find((from) => index > from || from === 0) ?? 0;
}

/**
 * Draws the map as it is, island by island, in whole semitones.
 * @param map as the model gives it
 * @param width of the field, in pixels
 */
export function siltlineField(map: SiltlineMap, axis: PitchAxis, width: number): SiltlineField {
  const step = width / map.widest;
  const rows = map.index.flatMap((indices, i) => {
    const midi = map.lowest + i;
    return midi + HALF < axis.low || midi - HALF > axis.high
      ? []
      : [{ midi, indices, above: map.index[i + 1] }];
  });
  const marks = MARKS.filter(({ semitones }) => semitones <= map.widest).map((mark) => ({
    ...mark,
    x: (mark.semitones - HALF) * step,
  }));
  return {
    strata: rows.flatMap(({ midi, indices }) => strataOf(midi, indices, axis, step)),
    line: rows.map(({ midi, indices, above }) => lineOf(midi, indices, above, axis, step)).join(''),
    marks,
    step,
  };
}

interface Edges {
  readonly top: number;
  readonly bottom: number;
}

function edgesOf(midi: Midi, axis: PitchAxis): Edges {
  const top = axis.yOf(Math.min(midi + HALF, axis.high));
  return { top, bottom: Math.min(axis.yOf(Math.max(midi - HALF, axis.low)), axis.height) };
}

function strataOf(midi: Midi, indices: readonly number[], axis: PitchAxis, step: number): SiltStratum[] {
  const { top, bottom } = edgesOf(midi, axis);
  const strata: SiltStratum[] = [];
  let from = 0;
  indices.forEach((index, i) => {
    const next = indices[i + 1];
    const stratum = stratumOf(index);
    if (next !== undefined && stratumOf(next) === stratum) return;
    const [x, width] = [from * step, (i + 1 - from) * step];
    if (stratum > 0) {
      const fill = siltColour(stratum);
      strata.push({ key: `${midi} ${from}`, x, y: top, width, height: bottom - top, fill });
    }
    from = i + 1;
  });
  return strata;
}

/** Its upright pieces in this row, and the level ones towards the row above. */
function lineOf(
  midi: Midi,
  indices: readonly number[],
  above: readonly number[] | undefined,
  axis: PitchAxis,
  step: number,
): string {
  const { top, bottom } = edgesOf(midi, axis);
  return indices
    .map((index, i) => {
      const [over, next, up] = [index > LINE, indices[i + 1], above?.[i]];
      const upright = next !== undefined && next > LINE !== over ? `M${(i + 1) * step} ${top}V${bottom}` : '';
      const level = up !== undefined && up > LINE !== over ? `M${i * step} ${top}H${(i + 1) * step}` : '';
      return upright + level;
    })
    .join('');
}

/** What another note at a height above the selected one would do. */
export interface RoomStep {
  readonly semitones: Semitones;
  readonly top: number;
  readonly height: number;
  readonly fill: string;
  readonly clouds: boolean;
}

/** @returns one step for each semitone above a note, as far as the axis shows them; none off the map */
export function roomSteps(map: SiltlineMap, midi: Midi, axis: PitchAxis): readonly RoomStep[] {
  return (map.index[midi - map.lowest] ?? []).flatMap((index, i) => {
    const at = midi + i + 1;
    if (at < axis.low || at > axis.high) return [];
    const { top, bottom } = edgesOf(at, axis);
    return [{ semitones: i + 1, top, height: bottom - top, fill: siltColour(index), clouds: index > LINE }];
  });
}

import type { PitchRange, Section } from '#shared/strings/sections';
import { SECTIONS } from '#shared/strings/sections';
import type { Midi } from '#shared/units';

/** The compass that each section is dealt notes in. */
export type Reach = Readonly<Record<Section, PitchRange>>;

/** Weights of the choice, all common practice: a note in reach outranks an undivided section, and basses divide last. */
const PER_SEMITONE_OUT_OF_REACH = 10;
const PER_DIVISION: Readonly<Record<Section, number>> = {
  doubleBass: 6,
  cello: 3,
  viola: 3,
  violin2: 3,
  violin1: 3,
};
/** Small enough to decide only between equals: then the lower section plays. */
const PER_SECTION_UP = 0.1;

const FROM_THE_BOTTOM: readonly Section[] = [...SECTIONS].reverse();

function outOfReach(notes: readonly Midi[], { low, high }: PitchRange): number {
  return notes.reduce((sum, midi) => sum + Math.max(0, low - midi, midi - high), 0);
}

interface Deal {
  readonly cost: number;
  readonly sections: readonly Section[];
}

/**
 * Deals notes to the sections from the bottom: upwards without crossing, each in its reach where that can be
 * done, each section undivided where it can.
 * @param groups the notes that one section plays together, each group in MIDI numbers, the lowest group first
 * @param reach where each section plays comfortably
 * @returns a section for every group, in their order
 * @example dealToSections([[38], [45], [53], [62], [69]], reach) // double basses up to first violins
 */
export function dealToSections(groups: readonly (readonly Midi[])[], reach: Reach): readonly Section[] {
  let best: Deal[] = FROM_THE_BOTTOM.map(() => ({ cost: 0, sections: [] }));
  groups.forEach((notes, place) => {
    best = FROM_THE_BOTTOM.map((section, rank) => {
      const own = outOfReach(notes, reach[section]) * PER_SEMITONE_OUT_OF_REACH + rank * PER_SECTION_UP;
      const costFrom = (below: number) =>
        (best[below]?.cost ?? Infinity) + (below === rank && place > 0 ? PER_DIVISION[section] : 0);
      const below = Array.from({ length: rank + 1 }, (_, index) => index).reduce((a, b) =>
        costFrom(b) < costFrom(a) ? b : a,
      );
      return { cost: costFrom(below) + own, sections: [...(best[below]?.sections ?? []), section] };
    });
  });
  return best.reduce((a, b) => (b.cost < a.cost ? b : a)).sections;
}

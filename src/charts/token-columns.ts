import type { Midi } from '#shared/units';

/** Where in its lane a note stands, so that close notes do not cover each other. */
export interface TokenColumn {
  readonly column: number;
  /** Columns that the lane needs. */
  readonly columns: number;
}

/**
 * Sets the notes of one lane into columns, from the bottom, as heads are set beside a stem.
 * @param notes of one lane
 * @param apart semitones that two notes of a column must stand apart
 * @returns a column by note id
 * @example tokenColumns([{ id: 'a', midi: 40 }, { id: 'b', midi: 41 }], 4).get('b') // { column: 1, columns: 2 }
 */
export function tokenColumns(
  notes: readonly { readonly id: string; readonly midi: Midi }[],
  apart: number,
): ReadonlyMap<string, TokenColumn> {
  const tops: Midi[] = [];
  const placed = [...notes]
    .sort((a, b) => a.midi - b.midi)
    .map(({ id, midi }) => {
      const free = tops.findIndex((top) => midi - top >= apart);
      const column = free < 0 ? tops.length : free;
      tops[column] = midi;
      return { id, column };
    });
  return new Map(placed.map(({ id, column }) => [id, { column, columns: tops.length }]));
}

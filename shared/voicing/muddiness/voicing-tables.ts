import type { Profile } from '#shared/voicing/muddiness/axis';
import type { MuddinessEntry, MuddinessModel } from '#shared/voicing/muddiness/model';

/** Points that are added up at once; a block that cannot hold the peak is passed over. */
export const BLOCK = 16;
/** W∗E, w E² and w E of a note stand side by side. */
export const NOTE_ROWS = 3;
/** Bounds are kept in single precision: this much higher they are still bounds. */
const ROUNDING = 1 + 1e-6;

/** What every note of some parts, and every pair of them, contributes; block by block along the axis. */
export interface VoicingTables {
  readonly blocks: number;
  readonly noteCount: number;
  readonly pairCount: number;
  /** By block and note: W∗E, w E², w E, a block each. */
  readonly notes: Float64Array;
  readonly energies: Float64Array;
  /** By block and pair: (W∗r)^m, weighted. */
  readonly clouding: Float64Array;
  /** By pair and block: the most that ρ^m can owe the pair there. */
  readonly bounds: Float32Array;
  /** Where each part's notes begin, and where each two parts' pairs do. */
  readonly noteStart: Int32Array;
  readonly pairStart: Int32Array;
  readonly sizes: Int32Array;
  /** h, over whole blocks. */
  readonly turn: Float64Array;
}

/**
 * @param parts for each part the notes that it could take, each of some energy
 * @returns their tables; pairs of parts in the order 0-1, 0-2 … 1-2 …
 */
export function voicingTables(
  parts: readonly (readonly MuddinessEntry[])[],
  model: MuddinessModel,
): VoicingTables {
  const sizes = parts.map((part) => part.length);
  const blocks = Math.ceil(model.axis.count / BLOCK);
  const pairs = parts.flatMap((lower, first) => parts.slice(first + 1).map((upper) => ({ lower, upper })));
  const noteStart = startsOf(sizes);
  const pairStart = startsOf(pairs.map(({ lower, upper }) => lower.length * upper.length));
  const noteCount = sizes.reduce((sum, size) => sum + size, 0);
  const pairCount = pairs.reduce((sum, { lower, upper }) => sum + lower.length * upper.length, 0);
  const turn = new Float64Array(blocks * BLOCK);
  turn.set(model.turn);
  const tables: VoicingTables = {
    blocks,
    noteCount,
    pairCount,
    notes: new Float64Array(blocks * noteCount * NOTE_ROWS * BLOCK),
    energies: Float64Array.from(parts.flat(), ({ energy }) => energy),
    clouding: new Float64Array(blocks * pairCount * BLOCK),
    bounds: new Float32Array(pairCount * BLOCK),
    noteStart,
    pairStart,
    sizes: Int32Array.from(sizes),
    turn,
  };
  parts.flat().forEach((entry, note) => fillNote(tables, entry, note));
  pairs.forEach(({ lower, upper }, i) => fillPairs(tables, lower, upper, pairStart[i] ?? 0, model));
  return tables;
}

function startsOf(sizes: readonly number[]): Int32Array {
  let end = 0;
  return Int32Array.from(sizes, (size) => {
    end += size;
    return end - size;
  });
}

function fillNote(
  { notes, noteCount }: VoicingTables,
  { table, energy }: MuddinessEntry,
  note: number,
): void {
  const put = ({ from, values }: Profile, row: number, scale: number): void => {
    values.forEach((value, i) => {
      const x = from + i;
      const start = (Math.floor(x / BLOCK) * noteCount + note) * NOTE_ROWS + row;
      notes[start * BLOCK + (x % BLOCK)] = scale * value;
    });
  };
  put(table.energy, 0, energy);
  put(table.neighbourhood, 1, energy * energy);
  put(table.neighbourhood, 2, energy);
}

function fillPairs(
  tables: VoicingTables,
  lower: readonly MuddinessEntry[],
  upper: readonly MuddinessEntry[],
  start: number,
  model: MuddinessModel,
): void {
  lower.forEach((a, i) =>
    upper.forEach((b, j) => fillPair(tables, a, b, start + i * upper.length + j, model)),
  );
}

/**
 * What sounds at a place is never less than what a pair's two notes put there, so the pair's clouding over that
 * bounds its part of any chord's.
 */
function fillPair(
  { clouding, bounds, pairCount }: VoicingTables,
  a: MuddinessEntry,
  b: MuddinessEntry,
  pair: number,
  { tables, power, turn }: MuddinessModel,
): void {
  const { from, values } = tables.ofPair(a.table, b.table);
  const weight = a.weight * b.weight;
  values.forEach((value, i) => {
    const x = from + i;
    const block = Math.floor(x / BLOCK);
    clouding[(block * pairCount + pair) * BLOCK + (x % BLOCK)] = weight * value;
    if (value === 0) return;
    const here = a.energy * valueAt(a.table.energy, x) + b.energy * valueAt(b.table.energy, x);
    const owed = weight * value * power((turn[x] ?? 0) / here) * ROUNDING;
    const place = pair * BLOCK + block;
    if (owed > (bounds[place] ?? 0)) bounds[place] = owed;
  });
}

function valueAt({ from, values }: Profile, x: number): number {
  return values[x - from] ?? 0;
}

import type { MuddinessModel, MuddinessVoice } from '#shared/voicing/muddiness/model';
import { entryOf, SILENCE } from '#shared/voicing/muddiness/model';
import { indexOf } from '#shared/voicing/muddiness/scores';
import type { VoicingTables } from '#shared/voicing/muddiness/voicing-tables';
import { BLOCK, NOTE_ROWS, voicingTables } from '#shared/voicing/muddiness/voicing-tables';

/**
 * Judges a whole voicing.
 * @param choices for each part the number of the note that it takes; no two in unison
 * @returns the chord's index, the same as from the model
 */
export type VoicingJudge = (choices: ArrayLike<number>) => number;

/** What one voicing needs while it is judged; used again for the next. */
interface Workspace {
  readonly notes: Int32Array;
  readonly pairs: Int32Array;
  readonly bounds: Float64Array;
  readonly clouding: Float64Array;
  readonly local: Float64Array;
}

/**
 * Prepares a judge for parts that each choose among some notes: tables once, then a few additions a voicing.
 * @param parts for each part the notes that it could take
 * @param model the index's machinery
 */
export function voicingJudge(
  parts: readonly (readonly MuddinessVoice[])[],
  model: MuddinessModel,
): VoicingJudge {
  const entries = parts.map((choices) => choices.map((voice) => entryOf(voice, model)));
  const tables = voicingTables(entries, model);
  const work: Workspace = {
    notes: new Int32Array(parts.length),
    pairs: new Int32Array((parts.length * (parts.length - 1)) / 2),
    bounds: new Float64Array(tables.blocks),
    clouding: new Float64Array(BLOCK),
    local: new Float64Array(NOTE_ROWS * BLOCK),
  };
  const root = 1 / model.constants.pooling;
  return (choices) => indexOf(highest(choices, tables, work, model) ** root, model.constants.threshold);
}

/** The highest ρ^m of a voicing: the most promising block first, then those that could still hold more. */
function highest(
  choices: ArrayLike<number>,
  tables: VoicingTables,
  work: Workspace,
  model: MuddinessModel,
): number {
  const { bounds } = work;
  const silence = SILENCE * choose(choices, tables, work);
  addBounds(tables, work);
  let first = 0;
  for (let b = 1; b < bounds.length; b += 1) if ((bounds[b] ?? 0) > (bounds[first] ?? 0)) first = b;
  let most = highestInBlock(first, silence, tables, work, model);
  for (let b = 0; b < bounds.length; b += 1) {
    if (b === first || (bounds[b] ?? 0) <= most) continue;
    most = Math.max(most, highestInBlock(b, silence, tables, work, model));
  }
  return most;
}

/** Finds where the chosen notes and their pairs stand in the tables; returns their whole energy. */
function choose(choices: ArrayLike<number>, tables: VoicingTables, { notes, pairs }: Workspace): number {
  const { noteStart, pairStart, sizes, energies } = tables;
  let pair = 0;
  let energy = 0;
  for (let first = 0; first < notes.length; first += 1) {
    const choice = choices[first] ?? 0;
    const note = (noteStart[first] ?? 0) + choice;
    notes[first] = note;
    energy += energies[note] ?? 0;
    for (let second = first + 1; second < notes.length; second += 1) {
      pairs[pair] = (pairStart[pair] ?? 0) + choice * (sizes[second] ?? 0) + (choices[second] ?? 0);
      pair += 1;
    }
  }
  return energy;
}

function addBounds(tables: VoicingTables, { pairs, bounds }: Workspace): void {
  bounds.fill(0);
  for (let p = 0; p < pairs.length; p += 1) {
    const start = (pairs[p] ?? 0) * BLOCK;
    for (let b = 0; b < bounds.length; b += 1) bounds[b] = (bounds[b] ?? 0) + (tables.bounds[start + b] ?? 0);
  }
}

function highestInBlock(
  block: number,
  silence: number,
  { turn, clouding, pairCount, notes, noteCount }: VoicingTables,
  work: Workspace,
  { constants, power }: MuddinessModel,
): number {
  gather(work.clouding, clouding, work.pairs, block * pairCount);
  gather(work.local, notes, work.notes, block * noteCount);
  let most = 0;
  for (let i = 0; i < BLOCK; i += 1) {
    const weightedEnergy = work.local[BLOCK + i] ?? 0;
    const around = weightedEnergy / ((work.local[2 * BLOCK + i] ?? 0) + silence);
    const here = (work.local[i] ?? 0) + constants.floor * around + silence;
    const pooled = (work.clouding[i] ?? 0) * power((turn[block * BLOCK + i] ?? 0) / here);
    if (pooled > most) most = pooled;
  }
  return most;
}

/** Adds up one block of several rows of a table. */
function gather(into: Float64Array, table: Float64Array, rows: Int32Array, first: number): void {
  const { length } = into;
  into.fill(0);
  for (let r = 0; r < rows.length; r += 1) {
    const start = (first + (rows[r] ?? 0)) * length;
    for (let i = 0; i < length; i += 1) into[i] = (into[i] ?? 0) + (table[start + i] ?? 0);
  }
}

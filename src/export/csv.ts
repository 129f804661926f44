import Papa from 'papaparse';

export type Cell = string | number | null;
/** A table with its headings, each with its unit. */
export interface Table {
  readonly headings: readonly string[];
  readonly rows: readonly (readonly Cell[])[];
}

/** What a table program could take for a formula at the head of a cell. */
const FORMULA = /^[=+\-@\t\r\0]/;

/** Figures are ours and stay figures; words are somebody's and never become a formula. */
function safeCell(cell: Cell): Cell {
  return typeof cell === 'string' && FORMULA.test(cell) ? `'${cell}` : cell;
}

/**
 * Writes a table as comma-separated values: a heading line, decimal points, lines that end as RFC 4180 has them.
 * @throws RangeError where a figure is none
 * @example csvOf({ headings: ['n', 'note'], rows: [[1, '=1+1']] }) // "n,note\r\n1,'=1+1"
 */
export function csvOf({ headings, rows }: Table): string {
  if (rows.flat().some((cell) => typeof cell === 'number' && !Number.isFinite(cell))) {
    throw new RangeError('a figure of the table is none');
  }
  const data = [headings, ...rows].map((row) => row.map(safeCell));
  return Papa.unparse(data, { newline: '\r\n' });
}

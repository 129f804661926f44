import { readFileSync } from 'node:fs';
import { z } from 'zod';

const rowSchema = z.strictObject({
  id: z.string(),
  inputs: z.record(z.string(), z.unknown()),
  value: z.union([z.number(), z.array(z.number())]),
  tolerance: z.union([z.number(), z.string(), z.null()]),
  note: z.string().optional(),
});
const fileSchema = z.array(
  z.strictObject({ source: z.string(), obtained: z.string(), rows: z.array(rowSchema) }),
);

export type PublishedRow = z.infer<typeof rowSchema> & { readonly source: string };

/** The published values of one file whose names begin alike, each with its source; never none. */
export function publishedRows(file: string, prefix: string): readonly PublishedRow[] {
  const text = readFileSync(new URL(`../fixtures/published/${file}.json`, import.meta.url), 'utf8');
  const rows = fileSchema
    .parse(JSON.parse(text))
    .flatMap(({ source, rows }) => rows.map((row) => ({ ...row, source })))
    .filter(({ id }) => id.startsWith(prefix));
  if (rows.length === 0) throw new Error(`no published value ${prefix} in ${file}`);
  return rows;
}

/** A published value that is one number. */
export function numberOf(row: PublishedRow): number {
  return z.number().parse(row.value);
}

/** A published value that is several numbers. */
export function numbersOf(row: PublishedRow): readonly number[] {
  return z.array(z.number()).parse(row.value);
}

/** Half a last printed digit is itself a rounded number. */
const FLOATING = 1e-12;

/** How far a result may lie from the published value. */
export function toleranceOf(row: PublishedRow): number {
  return z.number().parse(row.tolerance) + FLOATING;
}

/** One input of a published value. */
export function input<T>(row: PublishedRow, name: string, schema: z.ZodType<T>): T {
  return schema.parse(row.inputs[name]);
}

export const numberList = z.array(z.number());

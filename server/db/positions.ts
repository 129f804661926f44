import { z } from 'zod';
import { invalidInput } from '#server/http/request-error';

const positionSchema = z.tuple([z.string(), z.union([z.string(), z.number()]), z.string()]);

/** Where a page of a list begins: behind the entry that has this value in its order, and this id. */
export interface Position<Value extends string | number = string | number> {
  readonly value: Value;
  readonly id: string;
}

/** @param list names the list and its order: a place in one is none in another */
export function writePosition(list: string, { value, id }: Position): string {
  return Buffer.from(JSON.stringify([list, value, id])).toString('base64url');
}

function parse(after: string): unknown {
  try {
    return JSON.parse(Buffer.from(after, 'base64url').toString());
  } catch {
    return null;
  }
}

/** @throws RequestError when it is no place in this list */
export function readPosition(list: string, after: string | undefined): Position | null {
  if (after === undefined) return null;
  const parsed = positionSchema.safeParse(parse(after));
  if (parsed.success && parsed.data[0] === list) return { value: parsed.data[1], id: parsed.data[2] };
  throw invalidInput([{ path: 'query.after', message: 'this is no place in the list' }]);
}

/** Like {@link readPosition}, of a list in the order of times. */
export function readMoment(list: string, after: string | undefined): { at: Date; id: string } | null {
  const position = readPosition(list, after);
  return position && { at: new Date(Number(position.value)), id: position.id };
}

import { z } from 'zod';
import { idSchema } from '#shared/contracts/ids';
import { invalidInput, type RequestError } from '#server/http/request-error';

const positionSchema = z.tuple([z.string(), z.union([z.string(), z.number()]), idSchema]);

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

function noPlace(): RequestError {
  return invalidInput([{ path: 'query.after', message: 'this is no place in the list' }]);
}

/** @throws RequestError when it is no place in this list */
export function readPosition(list: string, after: string | undefined): Position | null {
  if (after === undefined) return null;
  const parsed = positionSchema.safeParse(parse(after));
  if (parsed.success && parsed.data[0] === list) return { value: parsed.data[1], id: parsed.data[2] };
  throw noPlace();
}

/**
 * @returns the moment that a position in a list in the order of times holds
 * @throws RequestError when it holds none
 */
export function momentOf({ value }: Position): Date {
  const moment = new Date(Number(value));
  if (Number.isNaN(moment.getTime())) throw noPlace();
  return moment;
}

/** Like {@link readPosition}, of a list in the order of times. */
export function readMoment(list: string, after: string | undefined): { at: Date; id: string } | null {
  const position = readPosition(list, after);
  return position && { at: momentOf(position), id: position.id };
}

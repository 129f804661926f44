/**
 * @returns whether two values of a document say the same, whatever the order of their keys; a value that is
 *   not set says the same as one that is not there
 * @example same({ a: 1, b: 2 }, { b: 2, a: 1 }) // true
 */
export function same(a: unknown, b: unknown): boolean {
  if (a === b) return true;
  if (typeof a !== 'object' || typeof b !== 'object' || a === null || b === null) return false;
  const left = set(a);
  const right = new Map(set(b));
  return (
    left.length === right.size && left.every(([key, value]) => right.has(key) && same(value, right.get(key)))
  );
}

function set(thing: object): [string, unknown][] {
  return Object.entries(thing).filter(([, value]) => value !== undefined);
}

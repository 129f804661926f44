type Order = readonly string[];

interface Orders {
  readonly base: Order;
  readonly newest: Order;
  readonly mine: Order;
}

function only(order: Order, among: ReadonlySet<string>): Order {
  return order.filter((id) => among.has(id));
}

function alike(a: Order, b: Order): boolean {
  return a.length === b.length && a.every((id, place) => id === b[place]);
}

/** Each newcomer goes behind the one that it follows in its own order, and behind what stands there already. */
function putIn(order: Order, from: Order, isNew: ReadonlySet<string>): Order {
  const result = [...order];
  from.forEach((id, place) => {
    if (!isNew.has(id)) return;
    const before = from.slice(0, place).findLast((other) => result.includes(other));
    let at = before === undefined ? 0 : result.indexOf(before) + 1;
    // Newcomers of the other side that stand at this place keep it.
    while (isStranger(result[at], from)) at += 1;
    result.splice(at, 0, id);
  });
  return result;
}

function isStranger(id: string | undefined, from: Order): boolean {
  return id !== undefined && !from.includes(id);
}

/**
 * Joins two orders of a progression that come from one.
 * @param orders ids of the chords, each once: as both began, as the newest save has them, as mine has them
 * @param kept the ids that stay; each stands in one of the two later orders at least
 * @returns the kept ids in order; `null` where both moved the same chords to different places
 * @example mergeOrder({ base: ['a', 'b'], newest: ['a', 'x', 'b'], mine: ['b', 'a'] }, new Set(['a', 'b', 'x'])) // ['b', 'a', 'x']
 */
export function mergeOrder({ base, newest, mine }: Orders, kept: ReadonlySet<string>): Order | null {
  const [inNewest, inMine] = [new Set(newest), new Set(mine)];
  const common = new Set(base.filter((id) => kept.has(id) && inNewest.has(id) && inMine.has(id)));
  const [was, theirs, own] = [only(base, common), only(newest, common), only(mine, common)];
  const [theyMoved, iMoved] = [!alike(was, theirs), !alike(was, own)];
  if (theyMoved && iMoved && !alike(theirs, own)) return null;
  const [leading, following] = iMoved ? [mine, newest] : [newest, mine];
  const lead = only(leading, kept);
  const missing = new Set(only(following, kept).filter((id) => !lead.includes(id)));
  return putIn(lead, only(following, kept), missing);
}

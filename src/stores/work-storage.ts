import { ref, type Ref } from 'vue';
import { browserStorage } from '@/stores/draft-storage';
import { openWorkDatabase, type TextTable } from '@/stores/work-database';

/** What kept work is read from and written to: at once, as the browser's small store is. */
export type TextStorage = Pick<Storage, 'getItem' | 'setItem' | 'removeItem' | 'key' | 'length'>;

export interface WorkStorage extends TextStorage {
  /** Reads what is kept now, other tabs' work too. */
  refresh(): Promise<void>;
  /** Whether the last write was refused: the browser is full, or keeps nothing. */
  readonly failed: Ref<boolean>;
  /** Counts what was read, for those who show it. */
  readonly reads: Ref<number>;
}

/**
 * The browser's database behind a copy in memory, which is read and written at once; what is written follows to the
 * database in its order.
 * @param open the database; where it cannot be opened, the small store stands in
 * @param small what earlier visits kept in the small store is moved over
 * @param isWork which of its keys are work
 */
export function createWorkStorage(
  open: () => Promise<TextTable>,
  small: Storage | null,
  isWork: (key: string) => boolean,
): WorkStorage {
  const copy = new Map<string, string>();
  const [failed, reads] = [ref(false), ref(0)];
  const opening = open().catch(() => smallTable(small, isWork));
  let last: Promise<unknown> = Promise.resolve();

  /** What the database refused stays here as long as the page does. */
  const refused = new Set<string>();

  function follow(key: string, write: (table: TextTable) => Promise<void>): void {
    last = Promise.all([opening, last])
      .then(([table]) => write(table))
      .then(() => refused.delete(key))
      .catch(() => refused.add(key))
      .finally(() => (failed.value = refused.size > 0));
  }

  async function refresh(): Promise<void> {
    const table = await opening;
    await last;
    const kept = await table.all().catch(() => []);
    for (const key of [...copy.keys()]) if (!refused.has(key)) copy.delete(key);
    for (const [key, text] of kept) if (!refused.has(key)) copy.set(key, text);
    reads.value += 1;
  }

  const storage: WorkStorage = {
    ...{ failed, reads, refresh },
    getItem: (key) => copy.get(key) ?? null,
    setItem(key, text) {
      copy.set(key, text);
      follow(key, (table) => table.put(key, text));
    },
    removeItem(key) {
      copy.delete(key);
      follow(key, (table) => table.remove(key));
    },
    key: (index) => [...copy.keys()][index] ?? null,
    get length() {
      return copy.size;
    },
  };
  last = opening.then((table) => moveOver(table, small, isWork)).catch(() => undefined);
  return storage;
}

function keysOf(small: Storage | null, isWork: (key: string) => boolean): string[] {
  const all = Array.from({ length: small?.length ?? 0 }, (_, index) => small?.key(index) ?? '');
  return all.filter(isWork);
}

/** Stands in for the database. */
function smallTable(small: Storage | null, isWork: (key: string) => boolean): TextTable {
  return {
    all: () => Promise.resolve(keysOf(small, isWork).map((key) => [key, small?.getItem(key) ?? ''] as const)),
    async put(key, text) {
      if (small === null) throw new Error('This browser keeps nothing.');
      small.setItem(key, text);
    },
    remove: (key) => Promise.resolve(small?.removeItem(key)),
  };
}

/** Takes over what an earlier visit kept in the small store; there it goes only once it is here. */
async function moveOver(
  table: TextTable,
  small: Storage | null,
  isWork: (key: string) => boolean,
): Promise<void> {
  const known = new Map(await table.all());
  for (const key of keysOf(small, isWork)) {
    const text = small?.getItem(key) ?? '';
    if (known.get(key) === text) continue;
    await table.put(key, text);
    small?.removeItem(key);
  }
}

export const WORK_PREFIX = 'siltline.unsaved.';
const isWork = (key: string): boolean => key.startsWith(WORK_PREFIX);

let opened: WorkStorage | null = null;

/** The one of this page. */
export function workStorage(): WorkStorage {
  opened ??= createWorkStorage(openWorkDatabase, browserStorage(), isWork);
  return opened;
}

import { openDB, type DBSchema } from 'idb';

/** Where texts are kept by key; every call may fail: the browser may be full, or refuse. */
export interface TextTable {
  all(): Promise<readonly (readonly [key: string, text: string])[]>;
  put(key: string, text: string): Promise<void>;
  remove(key: string): Promise<void>;
}

interface Schema extends DBSchema {
  work: { key: string; value: string };
}

const NAME = 'siltline';
const VERSION = 1;

/** The browser's database. What is put has been written through when the promise is kept. */
export async function openWorkDatabase(): Promise<TextTable> {
  const database = await openDB<Schema>(NAME, VERSION, {
    upgrade: (upgraded) => {
      upgraded.createObjectStore('work');
    },
  });
  return {
    async all() {
      const read = database.transaction('work');
      const [keys, texts] = await Promise.all([read.store.getAllKeys(), read.store.getAll()]);
      return keys.map((key, place) => [key, texts[place] ?? ''] as const);
    },
    async put(key, text) {
      const write = database.transaction('work', 'readwrite');
      await Promise.all([write.store.put(text, key), write.done]);
    },
    async remove(key) {
      await database.delete('work', key);
    },
  };
}

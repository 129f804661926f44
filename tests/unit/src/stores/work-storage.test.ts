import 'fake-indexeddb/auto';
import { IDBFactory } from 'fake-indexeddb';
import { beforeEach, describe, expect, it } from 'vitest';
import { forgetWorkOfOthers, readUnreadable, readWork, writeWork } from '@/stores/kept-work';
import { openWorkDatabase, type TextTable } from '@/stores/work-database';
import { createWorkStorage, WORK_PREFIX } from '@/stores/work-storage';
import { documentOf } from '../../../support/open-study';

const isWork = (key: string) => key.startsWith(WORK_PREFIX);
const page = (small: Storage | null = null, open: () => Promise<TextTable> = openWorkDatabase) =>
  createWorkStorage(open, small, isWork);
const work = (pitch: string, accountId = 'account-ada') => ({
  accountId,
  basedOn: 1,
  document: documentOf(pitch),
  pending: null,
});

/** As far as the storage asks it. */
function smallStore(texts: Readonly<Record<string, string>> = {}): Storage {
  const kept = new Map(Object.entries(texts));
  return {
    getItem: (key) => kept.get(key) ?? null,
    setItem: (key, text) => void kept.set(key, text),
    removeItem: (key) => void kept.delete(key),
    key: (index) => [...kept.keys()][index] ?? null,
    clear: () => kept.clear(),
    get length() {
      return kept.size;
    },
  };
}

beforeEach(() => {
  globalThis.indexedDB = new IDBFactory();
});

describe('unsaved work in the browser’s database', () => {
  it('when it is written, then it can be read at once, and after the page is opened anew', async () => {
    const before = page();
    writeWork(before, 'study-1', work('D3'));
    writeWork(before, 'study-1', work('E3'));
    expect(readWork(before, 'study-1', 'account-ada')).toEqual(work('E3'));
    await before.refresh();
    const after = page();
    await after.refresh();
    expect(readWork(after, 'study-1', 'account-ada')).toEqual(work('E3'));
    expect(after.failed.value).toBe(false);
  });

  it('when it is taken away, then it is gone for the next page too', async () => {
    const before = page();
    writeWork(before, 'study-1', work('D3'));
    before.removeItem(`${WORK_PREFIX}study-1`);
    await before.refresh();
    const after = page();
    await after.refresh();
    expect(after.length).toBe(0);
  });

  it('when an earlier visit had kept work in the small store, then it is moved over, and nothing else', async () => {
    const small = smallStore({
      [`${WORK_PREFIX}study-1`]: JSON.stringify(work('D3')),
      'siltline.theme': 'dark',
    });
    const storage = page(small);
    await storage.refresh();
    expect(readWork(storage, 'study-1', 'account-ada')).toEqual(work('D3'));
    expect([small.length, small.getItem('siltline.theme')]).toEqual([1, 'dark']);
  });

  it('when the browser has no database, then the small store stands in', async () => {
    const small = smallStore();
    const storage = page(small, () => Promise.reject(new Error('refused')));
    writeWork(storage, 'study-1', work('D3'));
    await storage.refresh();
    expect(JSON.parse(small.getItem(`${WORK_PREFIX}study-1`) ?? 'null')).toEqual(work('D3'));
    expect(storage.failed.value).toBe(false);
  });

  it('when the browser is full, then that is told, the work stays on the page, and it is told when there is room', async () => {
    let isFull = true;
    const table = await openWorkDatabase();
    const full = (): Promise<TextTable> =>
      Promise.resolve({
        ...table,
        put: (key, text) =>
          isFull ? Promise.reject(new DOMException('full', 'QuotaExceededError')) : table.put(key, text),
      });
    const storage = page(null, full);
    writeWork(storage, 'study-1', work('D3'));
    await storage.refresh();
    expect(storage.failed.value).toBe(true);
    expect(readWork(storage, 'study-1', 'account-ada')).toEqual(work('D3'));
    isFull = false;
    writeWork(storage, 'study-1', work('E3'));
    await storage.refresh();
    expect(storage.failed.value).toBe(false);
  });

  it('when what is kept is damaged or of another edition, then it is none, and can be had as it is by its owner alone', async () => {
    const damaged = JSON.stringify(work('D3')).slice(0, 60);
    const storage = page();
    storage.setItem(`${WORK_PREFIX}study-1`, damaged);
    await storage.refresh();
    expect(readWork(storage, 'study-1', 'account-ada')).toBeNull();
    expect(readUnreadable(storage, 'study-1', 'account-ada')).toBe(damaged);
    expect(readUnreadable(storage, 'study-1', 'account-bea')).toBeNull();
    forgetWorkOfOthers(storage, 'account-ada');
    expect(storage.length).toBe(1);
    forgetWorkOfOthers(storage, 'account-bea');
    expect(storage.length).toBe(0);
  });
});

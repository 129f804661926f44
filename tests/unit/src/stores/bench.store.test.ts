import { createPinia, setActivePinia } from 'pinia';
import { beforeEach, describe, expect, it } from 'vitest';
import { newStudy, newVoice } from '#shared/study/new-study';
import { setStudy } from '#shared/study/study.changes';
import { addVoice } from '#shared/study/voices.changes';
import { useBenchStore } from '@/stores/bench.store';
import { DRAFT_KEY, readDraft, SET_ASIDE_KEY, writeDraft } from '@/stores/draft-storage';

class MemoryStorage implements Storage {
  readonly #kept = new Map<string, string>();
  [name: string]: unknown;
  get length() {
    return this.#kept.size;
  }
  clear() {
    this.#kept.clear();
  }
  getItem(key: string) {
    return this.#kept.get(key) ?? null;
  }
  key(index: number) {
    return [...this.#kept.keys()][index] ?? null;
  }
  removeItem(key: string) {
    this.#kept.delete(key);
  }
  setItem(key: string, value: string) {
    this.#kept.set(key, value);
  }
}

const withCello = (pitch: string) => (chord: Parameters<typeof addVoice>[0]) =>
  addVoice(chord, newVoice(`cello-${pitch}`, 'cello', pitch));

beforeEach(() => {
  setActivePinia(createPinia());
  Object.defineProperty(globalThis, 'localStorage', { value: new MemoryStorage(), configurable: true });
});

describe('the bench', () => {
  it('when notes are put in, then each can be undone and redone', () => {
    const bench = useBenchStore();
    bench.changeCurrentChord(withCello('A2'));
    bench.changeCurrentChord(withCello('F3'));
    bench.undo();
    expect(bench.chord?.voices.map(({ pitch }) => pitch)).toEqual(['A2']);
    bench.undo();
    expect(bench.isEmpty).toBe(true);
    expect(bench.canUndo).toBe(false);
    bench.redo();
    bench.redo();
    expect(bench.chord?.voices.map(({ pitch }) => pitch)).toEqual(['A2', 'F3']);
    expect(bench.canRedo).toBe(false);
  });

  it('when a change follows an undo, then what was undone is gone', () => {
    const bench = useBenchStore();
    bench.changeCurrentChord(withCello('A2'));
    bench.undo();
    bench.changeCurrentChord(withCello('F3'));
    expect(bench.canRedo).toBe(false);
  });

  it('when a gesture makes many changes, then it is one step', () => {
    const bench = useBenchStore();
    bench.beginGesture();
    bench.changeCurrentChord(withCello('A2'));
    bench.changeCurrentChord(withCello('F3'));
    expect(bench.revision).toBe(0);
    bench.endGesture();
    expect(bench.revision).toBe(1);
    bench.undo();
    expect(bench.isEmpty).toBe(true);
  });

  it('when a gesture is given up, then all is as before it', () => {
    const bench = useBenchStore();
    bench.beginGesture();
    bench.changeCurrentChord(withCello('A2'));
    bench.cancelGesture();
    expect(bench.isEmpty).toBe(true);
    expect(bench.canUndo).toBe(false);
  });

  it('when the study may only be read, then nothing changes it', () => {
    const bench = useBenchStore();
    bench.readOnly = true;
    bench.changeCurrentChord(withCello('A2'));
    expect(bench.isEmpty).toBe(true);
  });

  it('when changes follow the one that was sent, then the study is still unsaved', () => {
    const bench = useBenchStore();
    bench.changeCurrentChord(withCello('A2'));
    const sent = bench.revision;
    bench.changeCurrentChord(withCello('F3'));
    bench.markSaved(sent);
    expect(bench.dirty).toBe(true);
    bench.markSaved();
    expect(bench.dirty).toBe(false);
  });

  it('when a chord is duplicated and taken away, then its neighbour is selected', () => {
    const bench = useBenchStore();
    const first = bench.chordId;
    bench.duplicateChord();
    expect(bench.chordId).not.toBe(first);
    bench.removeCurrentChord();
    expect(bench.chordId).toBe(first);
    expect(bench.study.chords).toHaveLength(1);
  });
});

describe('the draft', () => {
  it('when the page is opened again, then the draft is there', () => {
    const bench = useBenchStore();
    bench.openDraft();
    bench.changeCurrentChord(withCello('A2'));
    setActivePinia(createPinia());
    const again = useBenchStore();
    again.openDraft();
    expect(again.chord?.voices.map(({ pitch }) => pitch)).toEqual(['A2']);
  });

  it('when a saved study is on the bench, then the draft stays as it was', () => {
    const bench = useBenchStore();
    bench.openDraft();
    bench.changeCurrentChord(withCello('A2'));
    bench.leaveDraft();
    bench.replaceDocument(newStudy('chord-of-study'));
    bench.changeCurrentChord(withCello('C2'));
    bench.openDraft();
    expect(bench.chord?.voices.map(({ pitch }) => pitch)).toEqual(['A2']);
  });

  it.each(['{ broken', '{"schemaVersion":99}'])(
    'when the draft is %s, then it is set aside, whole',
    (text) => {
      localStorage.setItem(DRAFT_KEY, text);
      const bench = useBenchStore();
      bench.openDraft();
      expect(bench.isEmpty).toBe(true);
      expect(bench.setAside).toBe(text);
      expect(localStorage.getItem(SET_ASIDE_KEY)).toBe(text);
      bench.discardSetAside();
      expect(localStorage.getItem(SET_ASIDE_KEY)).toBeNull();
    },
  );

  it('when the browser refuses to keep it, then the bench knows and goes on', () => {
    const full = new MemoryStorage();
    full.setItem = () => {
      throw new DOMException('full', 'QuotaExceededError');
    };
    expect(writeDraft(full, newStudy('chord-1'))).toBe(false);
    expect(writeDraft(null, newStudy('chord-1'))).toBe(false);
    expect(readDraft(null)).toEqual({ kind: 'none' });
  });

  it('when a draft is kept and read, then nothing of it is lost', () => {
    const storage = new MemoryStorage();
    const study = setStudy(newStudy('chord-1'), { title: 'Reeds', tempoBpm: 54 });
    writeDraft(storage, study);
    expect(readDraft(storage)).toEqual({ kind: 'draft', document: study });
  });
});

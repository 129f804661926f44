import { onScopeDispose, shallowRef, watch, type ShallowRef } from 'vue';
import type { Chord, StudyDocument } from '#shared/study/study.document';
import { analyseChord, type ChordAnalysis } from '#shared/voicing/analysis';
import { soundSettingsOf } from '#shared/voicing/settings';

export type Muddiness = ChordAnalysis['muddiness'];

interface Waiting {
  readonly chord: Chord;
  readonly study: StudyDocument;
}

/** Where the browser has no idle callback, a moment that lets it paint in between. */
const BETWEEN_MS = 16;
/** On a busy machine the profiles come all the same. */
const LATEST_MS = 300;

function whenIdle(work: () => void): () => void {
  if (typeof requestIdleCallback === 'function') {
    const handle = requestIdleCallback(work, { timeout: LATEST_MS });
    return () => cancelIdleCallback(handle);
  }
  const handle = setTimeout(work, BETWEEN_MS);
  return () => clearTimeout(handle);
}

/**
 * Works out the chords of many studies one by one while the browser is idle, so that a long table stands at
 * once and its profiles follow.
 * @returns what is known so far, by chord object: a document that comes anew is worked out anew
 */
export function useIdleMuddiness(
  studies: () => readonly StudyDocument[],
): Readonly<ShallowRef<ReadonlyMap<Chord, Muddiness>>> {
  const known = shallowRef<ReadonlyMap<Chord, Muddiness>>(new Map());
  let waiting: Waiting[] = [];
  let cancel: (() => void) | null = null;

  function next(): void {
    cancel = null;
    const job = waiting.shift();
    if (!job) return;
    const { muddiness } = analyseChord(job.chord, soundSettingsOf(job.study));
    known.value = new Map(known.value).set(job.chord, muddiness);
    cancel = whenIdle(next);
  }

  watch(
    studies,
    (now) => {
      waiting = now
        .flatMap((study) => study.chords.map((chord) => ({ chord, study })))
        .filter(({ chord }) => !known.value.has(chord));
      cancel ??= whenIdle(next);
    },
    { immediate: true },
  );
  onScopeDispose(() => cancel?.());
  return known;
}

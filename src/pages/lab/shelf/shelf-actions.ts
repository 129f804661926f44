import { reactive, ref } from 'vue';
import type { ShelfVoicing } from '#shared/contracts/shelf';
import { keyName } from '#shared/study/about-study';
import { fitChord } from '#shared/study/shelved';
import { shortened } from '#shared/study/shortened';
import { addChordAfter } from '#shared/study/study.changes';
import { MAX_CHORD_NAME, MAX_CHORDS, type Chord } from '#shared/study/study.document';
import { ApiError } from '@/api/api-error';
import { newRequestKey } from '@/api/request-key';
import { notice } from '@/composables/notices';
import type { useShelf } from '@/composables/shelf';
import { useBenchStore } from '@/stores/bench.store';
import { newId } from '@/stores/ids';
import { useShelfStore } from '@/stores/shelf.store';

/** The tonics of the circle of fifths, in the order of the scale. */
export const TONICS = ['C', 'C#', 'Db', 'D', 'Eb', 'E', 'F', 'F#', 'Gb', 'G', 'Ab', 'A', 'Bb', 'B', 'Cb'].map(
  (tonic) => ({ tonic, label: keyName({ tonic, mode: 'major' }).replace(' major', '') }),
);

/** What passes between the shelf and the bench. */
export function useShelfActions(shelf: ReturnType<typeof useShelf>) {
  const [bench, store] = [useBenchStore(), useShelfStore()];
  const key = reactive({ ...bench.study.key });
  const octaves = ref(0);
  const name = ref(store.toKeep?.name ?? '');
  const failed = ref<string | null>(null);
  const keeping = ref(false);
  /** The same until the chord is kept: asked again, it is kept once. */
  const requestKey = newRequestKey();

  function told(error: unknown) {
    if (!(error instanceof ApiError)) throw error;
    failed.value = error.message;
  }

  async function keep(chord: Chord): Promise<void> {
    const { a4Hz, intonation, ensemble, limits, key: inKey } = bench.study;
    keeping.value = true;
    failed.value = null;
    await shelf
      .keep({
        name: name.value,
        voicing: { chord, key: inKey, a4Hz, intonation, ensemble, limits },
        requestKey,
      })
      .then(() => (store.toKeep = null))
      .catch(told)
      .finally(() => (keeping.value = false));
  }

  function use(kept: ShelfVoicing): void {
    failed.value = null;
    const { ensemble } = bench.study;
    const fitted = fitChord(kept.voicing, { key, ensemble }, octaves.value, newId);
    if (!fitted) failed.value = 'There it would leave the strings’ compass: choose another octave.';
    else if (bench.study.chords.length >= MAX_CHORDS)
      failed.value = `A study has at most ${MAX_CHORDS} chords.`;
    else putIn({ ...fitted, name: shortened(kept.name, MAX_CHORD_NAME).trim() }, kept.name);
  }

  function putIn(chord: Chord, called: string): void {
    bench.endGesture();
    bench.change(addChordAfter(bench.study, bench.chordId, chord));
    bench.selectChord(chord.id);
    store.isOpen = false;
    notice(`“${called}” is in the progression, in ${keyName(key)}.`, {
      label: 'Undo',
      handler: () => bench.undo(),
    });
  }

  const rename = (kept: ShelfVoicing, given: string) => shelf.rename(kept.id, given).catch(told);
  const remove = (kept: ShelfVoicing) =>
    shelf
      .remove(kept.id)
      .then(() =>
        notice(`“${kept.name}” is off the shelf.`, { label: 'Undo', handler: () => void putBack(kept) }),
      )
      .catch(told);
  const putBack = ({ name: called, voicing }: ShelfVoicing) =>
    shelf.keep({ name: called, voicing, requestKey: newRequestKey() }).catch(told);

  return { bench, store, name, key, octaves, failed, keeping, keep, use, rename, remove };
}

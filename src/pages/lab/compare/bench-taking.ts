import { addChordAfter, changeChord, copyChord } from '#shared/study/study.changes';
import { MAX_CHORDS } from '#shared/study/study.document';
import type { Voicing } from '#shared/study/voicing';
import { notice } from '@/composables/notices';
import type { useBenchStore } from '@/stores/bench.store';
import type { useCompareStore } from '@/stores/compare.store';
import { newId } from '@/stores/ids';

/** Where a voicing goes when it is taken to the bench. */
type Way = 'select' | 'restore' | 'insert';

/** Takes voicings to the bench: chords of the progression are gone to, others come in as new chords. */
export function useBenchTaking(
  bench: ReturnType<typeof useBenchStore>,
  compare: ReturnType<typeof useCompareStore>,
) {
  function wayOf({ place, chord }: Voicing): Way | null {
    const own = place?.studyId === null ? bench.study.chords.find(({ id }) => id === chord.id) : undefined;
    if (own === chord) return 'select';
    if (bench.readOnly) return null;
    if (own) return 'restore';
    return bench.study.chords.length < MAX_CHORDS ? 'insert' : null;
  }

  function labelOf(voicing: Voicing): string | null {
    const labels = {
      select: 'Go to it in the progression',
      restore: 'Bring its notes back',
      insert: 'Take it into the progression',
    };
    const way = wayOf(voicing);
    return way && labels[way];
  }

  const undo = { label: 'Undo', handler: () => bench.undo() };

  function restore({ chord }: Voicing): void {
    bench.selectChord(chord.id);
    bench.change(changeChord(bench.study, chord.id, () => chord));
    notice('The chord is as A has it.', undo);
  }

  function insert({ chord, name }: Voicing): void {
    const copy = copyChord(chord, newId);
    bench.change(addChordAfter(bench.study, bench.chordId, copy));
    bench.selectChord(copy.id);
    notice(`“${name}” is in the progression now.`, undo);
  }

  function take(voicing: Voicing): void {
    const way = wayOf(voicing);
    if (way === null) return;
    bench.endGesture();
    compare.bring(null);
    if (way === 'select') bench.selectChord(voicing.chord.id);
    if (way === 'restore') restore(voicing);
    if (way === 'insert') insert(voicing);
  }

  /** Lays a voicing beside A as B: a chord of the progression comes on the bench, another is only looked at. */
  function bring(voicing: Voicing): void {
    if (wayOf(voicing) === 'select') take(voicing);
    else compare.bring(voicing);
  }

  return { labelOf, take, bring };
}

import type { DraftDocument } from '#shared/study/draft';
import { voicingsOf } from '#shared/study/voicing';
import { notice } from '@/composables/notices';
import type { VersionRead } from '@/composables/versions';
import { useBenchStore } from '@/stores/bench.store';
import { useCompareStore } from '@/stores/compare.store';
import { useStudyStore } from '@/stores/study.store';

/** What the bench does with a version. */
export function useVersionActions() {
  const [bench, compare, study] = [useBenchStore(), useCompareStore(), useStudyStore()];

  /** A version comes back as a change like any other: it is saved as a new one, and can be undone. */
  function bringBack(document: DraftDocument, made: string): void {
    bench.endGesture();
    bench.change(document);
    void study.save();
    notice(`The version of ${made} is back, as a new save.`, { label: 'Undo', handler: () => bench.undo() });
  }

  /** @returns what the selected chord is called in a version; nothing where that has it not */
  function comparableIn(document: DraftDocument): string | null {
    const place = document.chords.findIndex(({ id }) => id === bench.chordId);
    return place < 0 ? null : (document.chords[place]?.name ?? `chord ${place + 1}`);
  }

  /** Holds the selected chord as the version has it beside what lies on the bench. */
  function hold(studyId: string, { kind, number, document }: VersionRead, title: string): void {
    const from = `version of ${title}`;
    const found = voicingsOf(document, { studyId, number, from }).find(
      ({ chord }) => chord.id === bench.chordId,
    );
    // No link can name a version that was set aside.
    if (found) compare.hold(kind === 'accepted' ? found : { ...found, place: null });
  }

  return { bringBack, comparableIn, compare: hold };
}

import { defineStore } from 'pinia';
import { computed, ref } from 'vue';
import type { DraftDocument } from '#shared/study/draft';
import {
  addChordAfter,
  changeChord,
  copyChord,
  isEmptyStudy,
  removeChord,
} from '#shared/study/study.changes';
import type { Chord } from '#shared/study/study.document';
import { useBenchDocument } from '@/stores/bench-document';
import { useDraftKeeping } from '@/stores/draft-keeping';
import { newId } from '@/stores/ids';
import { useVoiceSelection } from '@/stores/voice-selection';

/** The document on the bench and what of it is selected. */
export const useBenchStore = defineStore('bench', () => {
  const { open, ...bench } = useBenchDocument();
  const { study, change } = bench;
  /** What was selected last; undo may have taken it away. */
  const wantedChordId = ref<string | null>(null);

  const chord = computed(
    () => study.value.chords.find(({ id }) => id === wantedChordId.value) ?? study.value.chords[0],
  );
  const chordId = computed(() => chord.value?.id ?? '');
  const voices = useVoiceSelection(chord);
  const isEmpty = computed(() => isEmptyStudy(study.value));

  function changeCurrentChord(alter: (chord: Chord) => Chord): void {
    change(changeChord(study.value, chordId.value, alter));
  }

  function selectChord(id: string): void {
    if (id === chordId.value) return;
    bench.endGesture();
    wantedChordId.value = id;
    voices.selectVoice(null);
  }

  /** Puts a chord like the current one after it and goes there. */
  function duplicateChord(): void {
    if (!chord.value) return;
    const copy = copyChord(chord.value, newId);
    change(addChordAfter(study.value, chordId.value, copy));
    if (study.value.chords.includes(copy)) selectChord(copy.id);
  }

  /** Takes the current chord away and goes to the one that followed it. */
  function removeCurrentChord(): void {
    const place = study.value.chords.findIndex(({ id }) => id === chordId.value);
    const neighbour = study.value.chords[place + 1] ?? study.value.chords[place - 1];
    change(removeChord(study.value, chordId.value, newId()));
    wantedChordId.value = neighbour?.id ?? null;
  }

  /** Opens another document: its history begins here and counts as saved. */
  function replaceDocument(document: DraftDocument): void {
    wantedChordId.value = null;
    voices.selectVoice(null);
    open(document);
  }

  const draft = useDraftKeeping(study, bench.revision, replaceDocument);
  const selection = { chord, chordId, isEmpty, selectChord, ...voices };
  const changes = { changeCurrentChord, duplicateChord, removeCurrentChord, replaceDocument };
  return { ...bench, ...selection, ...changes, ...draft };
});

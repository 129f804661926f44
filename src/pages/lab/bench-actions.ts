import { midiOfName, pitchName } from '#shared/pitch/names';
import { spellIn } from '#shared/pitch/spelling';
import type { Section } from '#shared/strings/sections';
import { firstNote } from '#shared/study/first-note';
import { newVoice } from '#shared/study/new-study';
import { moveSelected, removeSelected } from '#shared/study/selected.changes';
import { changeChord, reorderChord } from '#shared/study/study.changes';
import { MAX_VOICES, type Chord } from '#shared/study/study.document';
import { applyTyped } from '#shared/study/typed.changes';
import type { TypedVoice } from '#shared/study/typing-line';
import { addVoice, changeSection, moveVoice } from '#shared/study/voices.changes';
import type { ChordSettings } from '@/components/progression/ChordMenu.vue';
import type { SelectionChoice } from '@/components/bench/selection-choice';
import { notice } from '@/composables/notices';
import type { useBenchStore } from '@/stores/bench.store';
import { newId } from '@/stores/ids';

type Bench = ReturnType<typeof useBenchStore>;

/** What the hands on the bench do to the selected chord. */
export function useVoiceActions(bench: Bench) {
  /** @returns the new note's id, or nothing where the chord is full */
  function put(section: Section, at: number | null): string | null {
    const { chord } = bench;
    if (!chord || bench.readOnly) return null;
    if (chord.voices.length >= MAX_VOICES) {
      notice(`A chord has at most ${MAX_VOICES} voices: take one away first.`);
      return null;
    }
    const midi = at ?? firstNote(section, bench.study.ensemble.bass, chord);
    const voice = newVoice(newId(), section, pitchName(spellIn(midi, bench.study.key)));
    bench.changeCurrentChord((current) => addVoice(current, voice));
    bench.selectVoice(voice.id);
    return voice.id;
  }

  /** One note, or with it all that are selected where it only moves up or down. */
  function move(id: string, midi: number, section: Section): void {
    bench.changeCurrentChord((chord) => {
      const voice = chord.voices.find((other) => other.id === id);
      if (!voice) return chord;
      const semitones = midi - midiOfName(voice.pitch);
      if (voice.section === section && isOneOfMany(id)) {
        return moveSelected(chord, bench.voiceIds, semitones, bench.study.key);
      }
      const there = voice.section === section ? chord : changeSection(chord, id, section);
      return semitones === 0 ? there : moveVoice(there, id, midi, bench.study.key);
    });
  }

  function choose(choice: SelectionChoice): void {
    if (choice.kind === 'toggle') bench.toggleVoice(choice.id);
    if (choice.kind === 'all') bench.selectVoices(bench.chord?.voices.map(({ id }) => id) ?? []);
    if (choice.kind === 'one' && bench.voiceId) bench.selectVoices([bench.voiceId]);
  }

  function gesture(stage: 'begin' | 'end' | 'cancel'): void {
    const stages = { begin: bench.beginGesture, end: bench.endGesture, cancel: bench.cancelGesture };
    stages[stage]();
  }

  const isOneOfMany = (id: string): boolean => bench.voiceIds.length > 1 && bench.voiceIds.includes(id);
  const remove = (id: string): void =>
    bench.changeCurrentChord((chord) => removeSelected(chord, isOneOfMany(id) ? bench.voiceIds : [id]));
  return { put, move, choose, gesture, remove };
}

/** The typing line's side of the bench: each line is laid over the chord as it was when the typing began. */
export function useTypingActions(bench: Bench) {
  let from: Chord | undefined;

  function begin(): void {
    from ??= bench.chord;
    bench.beginGesture();
  }

  function typed(voices: readonly TypedVoice[]): void {
    const base = from ?? bench.chord;
    if (base) bench.change(changeChord(bench.study, base.id, () => applyTyped(base, voices, newId)));
  }

  function end(): void {
    from = undefined;
    bench.endGesture();
  }

  function cancel(): void {
    from = undefined;
    bench.cancelGesture();
  }

  return { begin, typed, end, cancel };
}

/** What is done to chords as wholes. */
export function useChordActions(bench: Bench) {
  function set(settings: ChordSettings): void {
    bench.changeCurrentChord((chord) => ({ ...chord, ...settings }));
  }

  function place(at: number): void {
    bench.change(reorderChord(bench.study, bench.chordId, at));
  }

  function remove(): void {
    bench.removeCurrentChord();
    notice('The chord is taken away.', { label: 'Undo', handler: bench.undo });
  }

  return { set, place, remove };
}

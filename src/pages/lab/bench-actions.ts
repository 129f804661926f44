import { midiOfName, pitchName } from '#shared/pitch/names';
import { spellIn } from '#shared/pitch/spelling';
import type { Section } from '#shared/strings/sections';
import { firstNote } from '#shared/study/first-note';
import { divide, joinStop, link, unlink } from '#shared/study/joins.changes';
import { newVoice } from '#shared/study/new-study';
import { changeChord, reorderChord } from '#shared/study/study.changes';
import { MAX_VOICES, type Chord, type Voice } from '#shared/study/study.document';
import { applyTyped } from '#shared/study/typed.changes';
import type { TypedVoice } from '#shared/study/typing-line';
import { addVoice, changeSection, moveVoice, removeVoice, setVoice } from '#shared/study/voices.changes';
import type { ChordSettings } from '@/components/progression/ChordMenu.vue';
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

  function move(id: string, midi: number, section: Section): void {
    bench.changeCurrentChord((chord) => {
      const voice = chord.voices.find((other) => other.id === id);
      const there = voice && voice.section !== section ? changeSection(chord, id, section) : chord;
      return voice && midiOfName(voice.pitch) !== midi ? moveVoice(there, id, midi, bench.study.key) : there;
    });
  }

  function join(voice: Voice, partner: Voice | null): void {
    bench.changeCurrentChord((chord) =>
      partner ? joinStop(chord, voice.id, partner) : divide(chord, voice),
    );
  }

  function linkTo(voice: Voice, partner: Voice | null): void {
    bench.changeCurrentChord((chord) =>
      partner ? link(chord, voice.id, partner, newId()) : unlink(chord, voice.link ?? ''),
    );
  }

  function gesture(stage: 'begin' | 'end' | 'cancel'): void {
    const stages = { begin: bench.beginGesture, end: bench.endGesture, cancel: bench.cancelGesture };
    stages[stage]();
  }

  const remove = (id: string): void => bench.changeCurrentChord((chord) => removeVoice(chord, id));
  const lock = (id: string, locked: boolean): void =>
    bench.changeCurrentChord((chord) => setVoice(chord, id, { locked }));
  return { put, move, join, linkTo, gesture, remove, lock };
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

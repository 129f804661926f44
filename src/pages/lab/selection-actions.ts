import type { Section } from '#shared/strings/sections';
import { divide, joinStop, link, linkPartner, stopPartner, unlink } from '#shared/study/joins.changes';
import {
  moveSelected,
  removeSelected,
  setSelected,
  type SelectedSettings,
} from '#shared/study/selected.changes';
import type { Voice } from '#shared/study/study.document';
import { changeChord } from '#shared/study/study.changes';
import { chordsIntoKey, studyBySemitones, studyIntoKey } from '#shared/study/transpose';
import { changeSection } from '#shared/study/voices.changes';
import type { Transposing } from '@/components/bench/transposing';
import { notice } from '@/composables/notices';
import type { useBenchStore } from '@/stores/bench.store';
import { newId } from '@/stores/ids';

type Bench = ReturnType<typeof useBenchStore>;

/** What is done to all selected notes together; each is one step, which undo takes back. */
export function useSelectionActions(bench: Bench) {
  const step = (semitones: number): void =>
    bench.changeCurrentChord((chord) => moveSelected(chord, bench.voiceIds, semitones, bench.study.key));
  const set = (settings: SelectedSettings): void =>
    bench.changeCurrentChord((chord) => setSelected(chord, bench.voiceIds, settings));
  const remove = (): void => bench.changeCurrentChord((chord) => removeSelected(chord, bench.voiceIds));
  const give = (section: Section): void =>
    bench.changeCurrentChord((chord) =>
      bench.voiceIds.reduce((given, id) => changeSection(given, id, section), chord),
    );

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

  /** The keys' way: joins with the nearest, or divides what is joined. */
  function toggleStop(): void {
    const { chord, voice } = bench;
    if (!chord || !voice) return;
    if (voice.stop !== null) return join(voice, null);
    const partner = stopPartner(chord, voice);
    if (partner) join(voice, partner);
    else notice('A double stop needs a second note in this section.');
  }

  function toggleLink(): void {
    const { chord, voice } = bench;
    if (!chord || !voice) return;
    if (voice.link !== null) return linkTo(voice, null);
    const partner = linkPartner(chord, voice);
    if (partner) linkTo(voice, partner);
    else notice('No other section has this note at the unison or an octave: there is nothing to link.');
  }

  function select(what: 'section' | 'all'): void {
    const all = bench.chord?.voices ?? [];
    const section = bench.voice?.section;
    bench.selectVoices(
      all.filter((voice) => what === 'all' || voice.section === section).map(({ id }) => id),
    );
  }

  return { step, set, remove, give, join, linkTo, toggleStop, toggleLink, select };
}

function transposed(bench: Bench, how: Transposing) {
  const { study, chordId } = bench;
  if (how.what === 'progression') {
    return how.by === 'semitones'
      ? studyBySemitones(study, how.semitones)
      : studyIntoKey(study, how.to, how.direction);
  }
  return changeChord(study, chordId, (chord) => {
    const ids = how.what === 'selection' ? bench.voiceIds : chord.voices.map(({ id }) => id);
    if (how.by === 'semitones') return moveSelected(chord, ids, how.semitones, study.key);
    const own = { ...chord, voices: chord.voices.filter(({ id }) => ids.includes(id)) };
    const [moved = own] = chordsIntoKey([own], study.key, how.to, how.direction);
    const there = new Map(moved.voices.map((voice) => [voice.id, voice]));
    return moved === own ? chord : { ...chord, voices: chord.voices.map((v) => there.get(v.id) ?? v) };
  });
}

/** Transposes, and says so where that cannot be done. */
export function transpose(bench: Bench, how: Transposing): void {
  const next = transposed(bench, how);
  if (next !== bench.study) bench.change(next);
  else if (how.by === 'key' || how.semitones !== 0) {
    notice('Nothing was moved: no note is selected, or one would leave the range from A0 to E8.');
  }
}

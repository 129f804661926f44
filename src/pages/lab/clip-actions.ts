import type { NoteNaming } from '#shared/pitch/display';
import {
  clipOfVoices,
  clipTexts,
  pasteChords,
  pasteVoices,
  readClipData,
  readClipText,
  type Clip,
} from '#shared/study/clipboard';
import { comfortableReach } from '#shared/study/reach';
import { removeSelected } from '#shared/study/selected.changes';
import { copyText, pastedText, useClipboard, type ClipTexts } from '@/composables/clipboard';
import { notice } from '@/composables/notices';
import type { useBenchStore } from '@/stores/bench.store';
import { newId } from '@/stores/ids';

const PASTE_WORDS = 'There is nothing to paste: copy notes or a chord first, or a line such as Vc A2 F3.';

/** Copy, cut and paste of notes and of whole chords. */
export function useClipActions(bench: ReturnType<typeof useBenchStore>, naming: () => NoteNaming) {
  /** The clip that a button copied last: the system keeps only its text. */
  let kept: ClipTexts | null = null;

  /** The selected notes; the whole chord where all or none are. */
  function clip(whole: boolean): Clip | null {
    const { chord, voiceIds } = bench;
    if (!chord || chord.voices.length === 0) return null;
    const isWhole = whole || voiceIds.length === 0 || voiceIds.length === chord.voices.length;
    return isWhole ? { kind: 'chords', chords: [chord] } : clipOfVoices(chord, voiceIds);
  }

  function copy(whole = false): ClipTexts | null {
    const copied = clip(whole);
    kept = copied && clipTexts(copied, naming());
    return kept;
  }

  function cut(): void {
    const ids = bench.voiceIds;
    if (bench.readOnly) return;
    if (ids.length === 0) bench.removeCurrentChord();
    else bench.changeCurrentChord((chord) => removeSelected(chord, ids));
  }

  function put(pasted: Clip): void {
    const { chord } = bench;
    if (!chord) return;
    if (pasted.kind === 'voices' || chord.voices.length === 0) {
      const next = pasteVoices(chord, pasted, newId);
      if (next === chord) return notice('The chord has no room for these notes.');
      const known = new Set(chord.voices.map(({ id }) => id));
      bench.changeCurrentChord(() => next);
      return bench.selectVoices(next.voices.map(({ id }) => id).filter((id) => !known.has(id)));
    }
    const { study, lastId } = pasteChords(bench.study, chord.id, pasted, newId);
    bench.change(study);
    bench.selectChord(lastId);
  }

  function paste(text: string, data: string): boolean {
    if (bench.readOnly) return false;
    const reach = comfortableReach(bench.study.ensemble.bass);
    // Line ends are the system's own; the text that a button copied stands for all that was copied.
    const own = kept?.text === text.replaceAll('\r\n', '\n') ? kept.data : '';
    const pasted = readClipData(data || own) ?? readClipText(text, naming(), reach, newId);
    if (pasted) put(pasted);
    return pasted !== null;
  }

  async function byButton(what: 'copy' | 'cut' | 'paste' | 'copyChord'): Promise<void> {
    if (what === 'paste') {
      const text = (await pastedText()) ?? kept?.text ?? '';
      if (!paste(text, '')) notice(PASTE_WORDS);
      return;
    }
    const copied = copy(what === 'copyChord');
    if (!copied) return notice('There is nothing to copy yet.');
    const taken = await copyText(copied.text);
    notice(taken ? `Copied: ${copied.text}` : 'Copied, to be pasted on this page.');
    if (what === 'cut') cut();
  }

  useClipboard({ copy, cut, paste });
  return { byButton };
}

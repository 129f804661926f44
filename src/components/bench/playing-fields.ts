import { noteName, type NoteNaming } from '#shared/pitch/display';
import { spellIn } from '#shared/pitch/spelling';
import { openStringsOf } from '#shared/strings/ranges';
import type { BassKind } from '#shared/strings/sections';
import { common } from '#shared/study/selected.changes';
import { voiceSchema, type Voice } from '#shared/study/study.document';
import { boundsOf } from '@/components/forms/field-values';

export const CONTACT_LABELS = {
  ordinary: 'ordinary',
  sulTasto: 'sul tasto',
  sulPonticello: 'sul ponticello',
} as const;
export const STROKE_LABELS = { sustained: 'sustained', tremolo: 'tremolo', pizzicato: 'pizzicato' } as const;
export const HARMONIC_LABELS = { none: 'none', natural: 'natural', artificial: 'artificial' } as const;

/** What the document itself accepts. */
export const VOICE_PLAYERS = boundsOf(voiceSchema.shape.players.unwrap().unwrap());

const STRING_SIGNS = ['I', 'II', 'III', 'IV', 'V'] as const;
const C_MAJOR = { tonic: 'C', mode: 'major' } as const;

/** @returns the strings to choose from, the highest first; none where the notes are of several sections */
export function stringChoices(
  voices: readonly Voice[],
  bass: BassKind,
  naming: NoteNaming,
): readonly { readonly string: number; readonly label: string }[] {
  const section = common(voices, (voice) => voice.section);
  if (section === null) return [];
  return openStringsOf(section, bass).map((open, index) => ({
    string: index + 1,
    label: `${STRING_SIGNS[index] ?? ''}, the ${noteName(spellIn(open, C_MAJOR), naming)} string`,
  }));
}

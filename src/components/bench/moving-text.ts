import { centsOf } from '#shared/pitch/intervals';
import { equalTempered } from '#shared/pitch/tuning';
import { stringReaches } from '#shared/strings/reach';
import type { BassKind } from '#shared/strings/sections';
import { hertzText } from '#shared/voicing/words';
import type { LaneNote } from '@/components/bench/lane-notes';

const STRINGS = ['I', 'II', 'III', 'IV', 'V'] as const;

/** Cents off equal temperament, where the intonation bends the note. */
function bentText(frequencyHz: number, midi: number, a4Hz: number): string {
  const cents = Math.round(centsOf(frequencyHz / equalTempered(midi, a4Hz)));
  if (cents === 0) return '';
  return `${cents > 0 ? '+' : '−'}${Math.abs(cents)} cents`;
}

function stringsText({ voice, midi }: Pick<LaneNote, 'voice' | 'midi'>, bass: BassKind): string {
  const found = stringReaches(voice.section, bass).filter(({ open, top }) => open <= midi && midi <= top);
  const names = found.map(({ number }) => STRINGS[number - 1] ?? String(number));
  if (names.length === 0) return 'on no string';
  return `${names.length === 1 ? 'string' : 'strings'} ${names.join(' ')}`;
}

/**
 * What is told of a note while it is moved: its frequency, how far the intonation bends it, and the strings
 * that it can be played on.
 * @example movingText(note, 'four-string', 440) // '110 Hz, strings III IV'
 */
export function movingText(
  note: Pick<LaneNote, 'voice' | 'midi' | 'frequencyHz'>,
  bass: BassKind,
  a4Hz: number,
): string {
  const { frequencyHz, midi } = note;
  const parts = frequencyHz === null ? [] : [hertzText(frequencyHz), bentText(frequencyHz, midi, a4Hz)];
  return [...parts, stringsText(note, bass)].filter((part) => part !== '').join(', ');
}

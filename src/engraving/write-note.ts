import type { StaveNote } from 'vexflow/core';
import type { NoteSign, NoteValue } from '#shared/notation/note-values';
import type { StaffNote } from '#shared/notation/staff-chord';
import type { Engraver } from '@/engraving/engraver';
import { hasStem } from '@/engraving/note-shapes';
import type { StaffEvent } from '@/engraving/staff-sketch';

const DURATIONS: Readonly<Record<NoteSign, string>> = {
  breve: '1/2',
  1: 'w',
  2: 'h',
  4: 'q',
  8: '8',
  16: '16',
  32: '32',
  64: '64',
};
/** A touched head is open, however short the note. */
const TOUCHED_WHOLE = 'D0';
const TOUCHED_STEMMED = 'D1';
const SIGNS = new Map([
  [-2, 'bb'],
  [-1, 'b'],
  [0, 'n'],
  [1, '#'],
  [2, '##'],
]);
const TREMOLO_STROKES = 3;
/** The ink of whatever the drawing is put into. */
export const INK = { fillStyle: 'currentColor', strokeStyle: 'currentColor' };

function keyOf({ pitch, head }: StaffNote, value: NoteValue): string {
  const key = `${pitch.letter.toLowerCase()}/${pitch.octave}`;
  return head === 'touched' ? `${key}/${hasStem(value) ? TOUCHED_STEMMED : TOUCHED_WHOLE}` : key;
}

function restOf(engraver: Engraver, value: NoteValue): StaveNote {
  const rest = { keys: ['b/4'], duration: `${DURATIONS[value.sign]}r`, dots: value.dotted ? 1 : 0 };
  return new engraver.StaveNote(rest);
}

/** A chord, or a rest, as the engraver writes it. */
export function noteOf(engraver: Engraver, { chord, value, clef }: StaffEvent): StaveNote {
  const note = chord
    ? new engraver.StaveNote({
        keys: chord.notes.map((written) => keyOf(written, value)),
        ...{ clef, duration: DURATIONS[value.sign], dots: value.dotted ? 1 : 0, autoStem: true },
      })
    : restOf(engraver, value);
  chord?.notes.forEach(({ accidental }, index) => {
    const sign = accidental === null ? undefined : SIGNS.get(accidental);
    if (sign) note.addModifier(new engraver.Accidental(sign), index);
  });
  if (chord?.tremolo) note.addModifier(new engraver.Tremolo(TREMOLO_STROKES), 0);
  if (value.dotted) engraver.Dot.buildAndAttach([note], { all: true });
  return note.setStyle(INK);
}

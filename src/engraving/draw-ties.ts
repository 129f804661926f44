import type { RenderContext, StaveNote } from 'vexflow/core';
import type { Engraver } from '@/engraving/engraver';
import type { StaffEvent } from '@/engraving/staff-sketch';
import { INK } from '@/engraving/write-note';

/** The ties between the notes of a staff, and half a tie where one goes over its ends. */
export function drawTies(
  engraver: Engraver,
  context: RenderContext,
  events: readonly StaffEvent[],
  notes: readonly StaveNote[],
): void {
  const indexes = (event: StaffEvent): number[] => (event.chord?.notes ?? []).map((_, index) => index);
  const tie = (first: StaveNote | null, last: StaveNote | null, event: StaffEvent): void => {
    const all = indexes(event);
    if (all.length === 0) return;
    new engraver.StaveTie({ firstNote: first, lastNote: last, firstIndexes: all, lastIndexes: all })
      .setStyle(INK)
      .setContext(context)
      .drawWithStyle();
  };
  events.forEach((event, index) => {
    const note = notes[index];
    if (!note || !event.chord) return;
    if (event.tiedTo) tie(note, notes[index + 1] ?? null, event);
    if (event.tiedFrom && index === 0) tie(null, note, event);
  });
}

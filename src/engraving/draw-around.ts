import type { StaveNote } from 'vexflow/core';
import { drawCircle, drawDynamics, drawOctaveSign, drawStopBracket, drawText } from '@/engraving/draw-signs';
import { hasStem } from '@/engraving/note-shapes';
import { bottomOf, CIRCLE_ROOM, LINE, OCTAVE_SIGN_ROOM, topOf } from '@/engraving/staff-extents';
import type { DrawnHead, StaffEvent, StaffText } from '@/engraving/staff-sketch';
import { SPACE, STEP } from '@/engraving/units';

const STOP_BRACKET_BEFORE = 7;
const WORDS_OVER = 5;
const DYNAMIC_FOOT = 1.9 * SPACE;

/** @returns what the accidentals of a note take before its heads */
export function roomBefore(note: StaveNote): number {
  return note.getMetrics().modLeftPx ?? 0;
}

/** What stands over the heads, from the bottom up: circles, the octave sign, words. */
function drawOver(event: StaffEvent, note: StaveNote, text: StaffText): readonly SVGElement[] {
  const { chord, value, words } = event;
  const drawn: SVGElement[] = [];
  const middle = event.x + note.getGlyphWidth() / 2;
  const top = topOf(event, hasStem(value));
  let y = top;
  if (chord?.octaveUp) {
    drawn.push(drawOctaveSign(middle, y + OCTAVE_SIGN_ROOM - STEP / 2));
    y += OCTAVE_SIGN_ROOM;
  }
  for (const { circled } of chord?.notes ?? []) {
    if (!circled || event.tiedFrom) continue;
    drawn.push(drawCircle(middle, y + CIRCLE_ROOM / 2));
    y += CIRCLE_ROOM;
  }
  const edge = text.anchor === 'start' ? event.x : event.x + note.getGlyphWidth();
  const look = { ...text, italic: true };
  [...words].reverse().forEach((word, line) => {
    drawn.push(drawText(word, edge, top - WORDS_OVER - line * text.size * LINE, look));
  });
  return drawn;
}

/** Its dynamics. */
function drawUnder(event: StaffEvent, note: StaveNote, text: StaffText): readonly SVGElement[] {
  if (event.dynamics.length === 0) return [];
  const y = bottomOf(event, hasStem(event.value)) + DYNAMIC_FOOT;
  const edge = text.anchor === 'start' ? event.x : event.x + note.getGlyphWidth();
  return [drawDynamics(event.dynamics, edge, y, text.anchor)];
}

/** The brackets of double stops, before accidentals and heads. */
function drawStops({ chord, x, tiedFrom }: StaffEvent, note: StaveNote, heads: readonly DrawnHead[]) {
  const before = x - roomBefore(note) - STOP_BRACKET_BEFORE;
  return (tiedFrom ? [] : (chord?.stops ?? [])).flatMap(([low, high]) => {
    const [lowest, highest] = [heads[low], heads[high]];
    return lowest && highest ? [drawStopBracket(before, highest.y - STEP, lowest.y + STEP)] : [];
  });
}

/** What stands round the heads of a note that is drawn. */
export function drawAround(
  event: StaffEvent,
  note: StaveNote,
  heads: readonly DrawnHead[],
  text: StaffText,
): readonly SVGElement[] {
  return [...drawOver(event, note, text), ...drawUnder(event, note, text), ...drawStops(event, note, heads)];
}

import type { RenderContext, Stave, StaveNote } from 'vexflow/core';
import type { NoteSign, NoteValue } from '#shared/notation/note-values';
import type { StaffChord, StaffNote } from '#shared/notation/staff-chord';
import type { Clef } from '#shared/strings/clefs';
import type { Dynamic } from '#shared/study/study.document';
import {
  drawCircle,
  drawDynamics,
  drawOctaveSign,
  drawStopBracket,
  drawText,
  svgElement,
} from '@/engraving/draw-signs';
import type { Engraver } from '@/engraving/engraver';
import { hasStem } from '@/engraving/note-shapes';
import { bottomOf, CIRCLE_ROOM, LINE, OCTAVE_SIGN_ROOM, topOf } from '@/engraving/staff-extents';
import { SPACE, STEP } from '@/engraving/units';

/** One written length on a staff. */
export interface StaffEvent {
  /** Left edge of its heads. */
  readonly x: number;
  readonly value: NoteValue;
  /** Null is a rest. */
  readonly chord: StaffChord | null;
  readonly clef: Clef;
  /** The clef changes here. */
  readonly newClef: boolean;
  readonly tiedFrom: boolean;
  readonly tiedTo: boolean;
  /** Over the staff, and under it. */
  readonly words: readonly string[];
  readonly dynamics: readonly Dynamic[];
}

/** A stretch of one staff. */
export interface StaffSketch {
  readonly width: number;
  readonly clef: Clef;
  readonly signature: number;
  /** The clef and signature are drawn at its beginning. */
  readonly opens: boolean;
  /** Drawn after the signature; null where it is not. */
  readonly metre: { readonly beats: number; readonly unit: number } | null;
  readonly events: readonly StaffEvent[];
  /** A new clef before its bar line. */
  readonly clefAfter: Clef | null;
  readonly text: StaffText;
}

/** How the words stand to their notes: from the left edge of the heads on, or up to their right edge. */
export interface StaffText {
  readonly size: number;
  readonly anchor: 'start' | 'end';
}

export interface DrawnHead {
  readonly voiceId: string;
  readonly left: number;
  readonly right: number;
  readonly y: number;
}

export interface DrawnStaff {
  readonly element: SVGGElement;
  /** Of each event, from the bottom. */
  readonly heads: readonly (readonly DrawnHead[])[];
}

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
/** Major keys by their sharps, from seven flats on. */
const KEYS = [
  ...['Cb', 'Gb', 'Db', 'Ab', 'Eb', 'Bb', 'F'],
  ...['C', 'G', 'D', 'A', 'E', 'B', 'F#', 'C#'],
] as const;
const KEY_OF_C = 7;
const TREMOLO_STROKES = 3;
const CLEF_BEFORE = 26;
const STOP_BRACKET_BEFORE = 7;
const WORDS_OVER = 5;
const DYNAMIC_FOOT = 1.9 * SPACE;
const INK = { fillStyle: 'currentColor', strokeStyle: 'currentColor' };

function keyOf({ pitch, head }: StaffNote, value: NoteValue): string {
  const key = `${pitch.letter.toLowerCase()}/${pitch.octave}`;
  return head === 'touched' ? `${key}/${hasStem(value) ? TOUCHED_STEMMED : TOUCHED_WHOLE}` : key;
}

function restOf(engraver: Engraver, value: NoteValue): StaveNote {
  const rest = { keys: ['b/4'], duration: `${DURATIONS[value.sign]}r`, dots: value.dotted ? 1 : 0 };
  return new engraver.StaveNote(rest);
}

function noteOf(engraver: Engraver, { chord, value, clef }: StaffEvent): StaveNote {
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

/** Sets a note at its place, whatever stands before it. */
function place(engraver: Engraver, note: StaveNote, stave: Stave, x: number): void {
  const voice = new engraver.Voice().setMode(engraver.VoiceMode.SOFT).addTickables([note]);
  const formatter = new engraver.Formatter();
  formatter.joinVoices([voice]).format([voice], 0);
  const padding = engraver.Metrics.get('Stave.padding', 0);
  note.setStave(stave);
  note.getTickContext().setX(x - stave.getNoteStartX() - padding);
}

function drawClef(engraver: Engraver, stave: Stave, context: RenderContext, clef: Clef, x: number): void {
  const sign = new engraver.Clef(clef, 'small');
  sign.setX(x).setY(stave.getYForLine(sign.line));
  context.save();
  sign.renderText(context, 0, 0);
  context.restore();
}

function headsOf(note: StaveNote, { chord }: StaffEvent): readonly DrawnHead[] {
  return (chord?.notes ?? []).map(({ voiceId }, index) => {
    const head = note.noteHeads[index];
    const left = head?.getAbsoluteX() ?? note.getNoteHeadBeginX();
    return { voiceId, left, right: left + note.getGlyphWidth(), y: note.getYs()[index] ?? 0 };
  });
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

function drawTies(
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

function staveOf(engraver: Engraver, sketch: StaffSketch): Stave {
  const stave = new engraver.Stave(0, 0, sketch.width, {
    ...{ leftBar: false, rightBar: false, spaceAboveStaffLn: 0, spaceBelowStaffLn: 0 },
  });
  stave.setStyle({ ...INK, lineWidth: 0.9 });
  stave.setDefaultLedgerLineStyle({ ...INK, lineWidth: 1.3 });
  if (sketch.opens) {
    stave.addClef(sketch.clef);
    const key = KEYS[sketch.signature + KEY_OF_C];
    if (key && sketch.signature !== 0) stave.addKeySignature(key);
    if (sketch.metre) stave.addTimeSignature(`${sketch.metre.beats}/${sketch.metre.unit}`);
  }
  stave.getModifiers().forEach((modifier) => modifier.setStyle(INK));
  return stave;
}

/** The drawing with all that its own root says of fonts and ink. */
function asGroup(svg: SVGElement): SVGGElement {
  const group = svgElement('g', { fill: 'currentColor', stroke: 'currentColor' });
  for (const name of ['font-family', 'font-size', 'font-weight', 'font-style', 'stroke-width']) {
    const value = svg.getAttribute(name);
    if (value !== null) group.setAttribute(name, value);
  }
  group.append(...svg.childNodes);
  return group;
}

/** @returns where notes may begin after the clef, signature and metre, the same for all of the staves */
export function beginningOf(engraver: Engraver, sketches: readonly StaffSketch[]): number {
  return Math.max(...sketches.map((sketch) => staveOf(engraver, sketch).getNoteStartX()));
}

/**
 * Draws a stretch of a staff: its top line at 0, in tenths of a staff space, in the ink of what it is put into.
 * @returns the drawing, which is in no page yet, and where its heads lie
 */
export function drawStaff(engraver: Engraver, sketch: StaffSketch): DrawnStaff {
  const host = document.createElement('div');
  const context = new engraver.SVGContext(host);
  context.setFillStyle('currentColor').setStrokeStyle('currentColor');
  const stave = staveOf(engraver, sketch).setContext(context);
  stave.drawWithStyle();
  const notes = sketch.events.map((event) => {
    const note = noteOf(engraver, event);
    place(engraver, note, stave, event.x);
    note.setContext(context).drawWithStyle();
    if (event.newClef)
      drawClef(engraver, stave, context, event.clef, event.x - CLEF_BEFORE - roomBefore(note));
    return note;
  });
  drawTies(engraver, context, sketch.events, notes);
  if (sketch.clefAfter) drawClef(engraver, stave, context, sketch.clefAfter, sketch.width - CLEF_BEFORE);
  const heads = notes.map((note, index) => {
    const event = sketch.events[index];
    return event ? headsOf(note, event) : [];
  });
  const element = asGroup(context.svg);
  sketch.events.forEach((event, index) => {
    const note = notes[index];
    if (!note) return;
    element.append(...drawOver(event, note, sketch.text), ...drawUnder(event, note, sketch.text));
    element.append(...drawStops(event, note, heads[index] ?? []));
  });
  return { element, heads };
}

function roomBefore(note: StaveNote): number {
  return note.getMetrics().modLeftPx ?? 0;
}

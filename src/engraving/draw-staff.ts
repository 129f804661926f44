import type { RenderContext, Stave, StaveNote } from 'vexflow/core';
import type { Clef } from '#shared/strings/clefs';
import { drawAround, roomBefore } from '@/engraving/draw-around';
import { svgElement } from '@/engraving/draw-signs';
import { drawTies } from '@/engraving/draw-ties';
import type { Engraver } from '@/engraving/engraver';
import type { DrawnHead, DrawnStaff, StaffEvent, StaffSketch } from '@/engraving/staff-sketch';
import { INK, noteOf } from '@/engraving/write-note';

/** Major keys by their sharps, from seven flats on. */
const KEYS = [
  ...['Cb', 'Gb', 'Db', 'Ab', 'Eb', 'Bb', 'F'],
  ...['C', 'G', 'D', 'A', 'E', 'B', 'F#', 'C#'],
] as const;
const KEY_OF_C = 7;
const CLEF_BEFORE = 26;

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
  const width = note.getGlyphWidth();
  return (chord?.notes ?? []).map(({ voiceId }, index) => {
    // A drawn head cannot be asked: one set to the other side of the stem would count its shift twice.
    const aside = note.noteHeads[index]?.isDisplaced() ? width * note.getStemDirection() : 0;
    const left = note.getNoteHeadBeginX() + aside;
    return { voiceId, left, right: left + width, y: note.getYs()[index] ?? 0 };
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
    element.append(...drawAround(event, note, heads[index] ?? [], sketch.text));
  });
  return { element, heads };
}

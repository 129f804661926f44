import { scorePlan } from '#shared/notation/score-plan';
import { systemPlan, type NotatedStudy } from '#shared/notation/system-plan';
import type { NoteNaming } from '#shared/pitch/display';
import type { Chord } from '#shared/study/study.document';
import { beginningWidth } from '@/engraving/beginning';
import { drawBar } from '@/engraving/draw-bar';
import { drawFrame, FRAME_WIDTH } from '@/engraving/draw-frame';
import { svgElement } from '@/engraving/draw-signs';
import { drawStaff } from '@/engraving/draw-staff';
import { loadEngraver } from '@/engraving/engraver';
import { inlinedFonts } from '@/engraving/inlined-fonts';
import { scoreLines } from '@/engraving/score-lines';
import { systemSketch } from '@/engraving/system-sketch';

/** A drawing that stands alone: its fonts are in it, so that it looks the same in a page, a file or a print. */
export interface StandaloneSvg {
  readonly svg: string;
  readonly width: number;
  readonly height: number;
}

export interface StandaloneLook {
  /** Pixels. */
  readonly width: number;
  readonly naming: NoteNaming;
  /** Pixels a tenth of a staff space; 0.7 gives staves 7 mm high at 96 pixels an inch. */
  readonly scale?: number;
  /** Of the notes; the ground stays clear. */
  readonly ink?: string;
}

/** The ink of the light page, which is that of paper. */
const INK = '#1b2a2c';
const SCALE = 0.7;
const TEXT_PX = 11;
const TITLE_PX = 13;
const TITLES_PX = 22;

async function standalone(
  content: SVGElement,
  width: number,
  height: number,
  ink: string,
): Promise<StandaloneSvg> {
  const svg = svgElement('svg', { width, height, viewBox: `0 0 ${width} ${height}`, color: ink });
  const style = svgElement('style', {});
  style.textContent = await inlinedFonts(content.textContent);
  svg.append(style, content);
  return { svg: new XMLSerializer().serializeToString(svg), width, height };
}

/**
 * Draws one chord as a system of five staves.
 * @param chord may be empty
 * @param study key, metre and ensemble
 * @param look width, names of notes, and if wanted size and ink
 * @returns the drawing, as high as it needs to be
 * @throws Error where the notation or a font cannot be fetched
 */
export async function chordSvg(
  chord: Chord,
  study: NotatedStudy,
  look: StandaloneLook,
): Promise<StandaloneSvg> {
  const { width, naming, scale: largest = SCALE, ink = INK } = look;
  const engraver = await loadEngraver();
  const plan = systemPlan(chord, study, naming);
  const left = FRAME_WIDTH * largest;
  const room = { width: width - left, height: Infinity, textSize: TEXT_PX, largest };
  const sketch = systemSketch(plan, { ...room, beginning: beginningWidth(plan) });
  const { scale, tops } = sketch;
  const content = svgElement('g', { transform: `scale(${scale})` });
  const unscaled = tops.map((top) => top / scale);
  content.append(drawFrame(left / scale, unscaled, TITLE_PX / scale));
  sketch.staves.forEach((staff, index) => {
    const { element } = drawStaff(engraver, staff);
    element.setAttribute('transform', `translate(${left / scale} ${unscaled[index] ?? 0})`);
    content.append(element);
  });
  return standalone(content, width, sketch.height, ink);
}

/**
 * Draws a progression as a score, one drawing a line, so that a page can break between them.
 * @param chords in their order
 * @param study key, metre and ensemble
 * @param look width, names of notes, and if wanted size and ink
 * @returns the lines from the top
 * @throws Error where the notation or a font cannot be fetched
 */
export async function progressionSvgs(
  chords: readonly Chord[],
  study: NotatedStudy,
  look: StandaloneLook,
): Promise<readonly StandaloneSvg[]> {
  const { width, naming, scale = SCALE, ink = INK } = look;
  const engraver = await loadEngraver();
  const plan = scorePlan(study, chords, naming);
  const textSize = TEXT_PX / scale;
  const titles = TITLES_PX / scale;
  const lines = scoreLines(plan, { width: width / scale - FRAME_WIDTH, textSize, titles });
  return Promise.all(
    lines.map(({ bars, tops, height }) => {
      const content = svgElement('g', { transform: `scale(${scale})` });
      content.append(drawFrame(FRAME_WIDTH, tops, TITLE_PX / scale));
      let x = FRAME_WIDTH;
      for (const bar of bars) {
        const drawn = drawBar(engraver, bar, {
          tops,
          titleSize: TITLE_PX / scale,
          titleY: TITLE_PX / scale,
        });
        drawn.setAttribute('transform', `translate(${x} 0)`);
        content.append(drawn);
        x += bar.width;
      }
      return standalone(content, width, Math.ceil(height * scale), ink);
    }),
  );
}

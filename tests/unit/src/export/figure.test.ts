import { describe, expect, it } from 'vitest';
import { DEFAULT_ENSEMBLE } from '#shared/study/study.document';
import { chordFigure, figureAxis } from '@/export/figure/figure';
import type { FigureInput } from '@/export/figure/figure-input';
import { FIGURE_PANES, figureLayout } from '@/export/figure/layout';
import { projectorLayout } from '@/export/figure/projector-layout';
import { SHEET_LAYOUT } from '@/export/figure/sheet-layout';
import { PAPER_PALETTE } from '@/export/palette';
import { standAloneSvg } from '@/export/picture';
import { escapeXml, svgNode, svgText, type SvgNode } from '@/export/svg/nodes';
import { analysisOf } from '../../../support/made-up-analyses';
import { chordOf } from '../../../support/typed-chords';

const chord = chordOf('DB C2, Vc E2 G3, Va C4');
const analysis = analysisOf(chord, {
  registers: { great: { index: 72, at: 38 }, small: { index: 31, at: 52 } },
  limits: [{ lowerId: 'note-1', upperId: 'note-2', interval: 'M3', limit: 'Bb2', semitonesBelow: 10 }],
});
const input: FigureInput = {
  ...{ chord, analysis, ensemble: DEFAULT_ENSEMBLE, a4Hz: 440, naming: 'english', staves: [] },
  ...{ palette: PAPER_PALETTE, layout: SHEET_LAYOUT, shown: { overtones: true, figures: true } },
};

/** All that a drawing says, in its order. */
function textsOf(node: SvgNode | string): readonly string[] {
  return typeof node === 'string' ? [node] : node.children.flatMap(textsOf);
}

function lines(node: SvgNode): readonly SvgNode[] {
  const inner = node.children.flatMap((child) => (typeof child === 'string' ? [] : lines(child)));
  return node.tag === 'line' ? [node, ...inner] : inner;
}

describe('a figure of the bench', () => {
  it('when a chord is drawn, then its notes, its interval under the limit and its registers are in it', () => {
    const texts = textsOf(chordFigure(input));
    expect(texts).toEqual(expect.arrayContaining(['C2', 'E2', 'G3', 'C4', 'Vn I', 'Overtones', 'Muddiness']));
    expect(texts).toContain('maj 3rd, 10 under');
    expect(texts).toEqual(expect.arrayContaining(['great', '72', 'small', '31']));
  });

  it('when a note stands at a pitch, then its line runs through all panes at the axis’s height', () => {
    const axis = figureAxis(chord, SHEET_LAYOUT);
    const across = lines(chordFigure(input)).filter(({ attributes }) => attributes.x2 === SHEET_LAYOUT.width);
    const heights = across.map(({ attributes }) => attributes.y1);
    for (const midi of [36, 40, 55, 60]) expect(heights).toContain(axis.yOf(midi));
  });

  it('when figures are covered, then neither they nor the limits are in the drawing', () => {
    const texts = textsOf(chordFigure({ ...input, shown: { overtones: true, figures: false } }));
    expect(texts.join(' ')).not.toMatch(/under|72|31/);
    expect(texts).toContain('maj 3rd');
  });

  it('when overtones are covered, then no partial is in the drawing', () => {
    const count = (overtones: boolean) =>
      lines(chordFigure({ ...input, shown: { overtones, figures: false } })).length;
    // Four notes of three partials each, and the edge of the pane.
    expect(count(true) - count(false)).toBe(13);
  });

  it('when it is a file, then all that it needs is inside and no token of the page is left', () => {
    const rules = "@font-face{font-family:'A';src:url(data:font/woff2;base64,AAAA)}";
    const text = standAloneSvg(chordFigure(input), '#ffffff', rules, 'A & B <1>');
    expect(text).not.toMatch(/var\(|url\((?!data:)|color-mix|href=/);
    expect(text).toContain('<title>A &amp; B &lt;1&gt;</title>');
    expect(text).toContain('data:font/woff2');
  });
});

describe('the layout of a figure', () => {
  it('when panes share the width, then they stand beside each other and end at its edge', () => {
    const { panes } = figureLayout({ ...SHEET_LAYOUT, width: 800 });
    const rooms = FIGURE_PANES.map((pane) => panes[pane] ?? { left: NaN, width: NaN });
    rooms.slice(1).forEach(({ left }, at) => {
      const before = rooms[at] ?? { left: NaN, width: NaN };
      expect(left).toBeGreaterThan(before.left + before.width);
    });
    const last = rooms.at(-1) ?? { left: NaN, width: NaN };
    expect(last.left + last.width).toBeCloseTo(800);
  });

  it('when it is for a projector of 1440 pixels, then the type is one and a half times the bench’s at least', () => {
    const { text, small } = projectorLayout(1392, 580);
    expect(text).toBeGreaterThanOrEqual(14 * 1.5);
    expect(small).toBeGreaterThanOrEqual(12 * 1.5);
  });

  it('when there is little room, then three panes are left', () => {
    expect(Object.keys(projectorLayout(360, 420).panes)).toEqual(['sections', 'overtones', 'muddiness']);
  });
});

describe('writing a drawing', () => {
  it('when it is written, then the examples hold', () => {
    expect(svgText(svgNode('g', { x: 1 }, ['a']))).toBe('<g x="1">a</g>');
    expect(escapeXml('a < "b"')).toBe('a &lt; &quot;b&quot;');
  });

  it('when text holds what XML does not know, then that is left out and the rest stays', () => {
    expect(escapeXml('a\u0000\u0008\uFFFE\uD800b\t𝄪')).toBe('ab\t𝄪');
  });
});

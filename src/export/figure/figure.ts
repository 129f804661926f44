import { midiOfName } from '#shared/pitch/names';
import type { Chord } from '#shared/study/study.document';
import { pitchAxis, type PitchAxis } from '@/charts/pitch-axis';
import type { FigureInput, PaneInput } from '@/export/figure/figure-input';
import { FIGURE_PANES, type FigureLayout, type FigurePane } from '@/export/figure/layout';
import { muddinessPane } from '@/export/figure/muddiness-pane';
import { overtonesPane } from '@/export/figure/overtones-pane';
import { sectionsPane } from '@/export/figure/sections-pane';
import { spacingPane } from '@/export/figure/spacing-pane';
import { throughLines } from '@/export/figure/through';
import { words } from '@/export/figure/words';
import { svgNode, type SvgNode } from '@/export/svg/nodes';

/** The page's own type; files bring these fonts with them. */
export const FIGURE_FONTS = "'IBM Plex Sans', 'Siltline Accidentals', sans-serif";

const HEADINGS: Readonly<Partial<Record<FigurePane, string>>> = {
  spacing: 'Spacing',
  overtones: 'Overtones',
  muddiness: 'Muddiness',
};

const PANES: Readonly<Record<FigurePane, (input: PaneInput) => readonly SvgNode[]>> = {
  system: ({ staves }) => staves,
  sections: sectionsPane,
  spacing: spacingPane,
  overtones: overtonesPane,
  muddiness: muddinessPane,
};

/** @returns the one pitch axis of a figure */
export function figureAxis(chord: Chord, { axisHeight, strip }: FigureLayout): PitchAxis {
  return pitchAxis(
    chord.voices.map(({ pitch }) => midiOfName(pitch)),
    axisHeight,
    strip,
  );
}

/**
 * Draws the bench as one figure: staves, lanes, spacing, overtones and muddiness on one pitch axis.
 * @param input what is drawn, how, and how much of it may be seen yet
 * @returns an `svg` with its view box
 */
export function chordFigure(input: FigureInput): SvgNode {
  const { layout, palette } = input;
  const axis = figureAxis(input.chord, layout);
  const height = layout.head + axis.height + layout.foot;
  const panes = FIGURE_PANES.flatMap((pane) => {
    const room = layout.panes[pane];
    if (!room) return [];
    const heading = HEADINGS[pane];
    const look = { size: layout.text, fill: palette.ink, weight: 600 };
    return [
      ...(heading ? [words(heading, room.left, -layout.head / 2, look)] : []),
      ...PANES[pane]({ ...input, axis, room }),
    ];
  });
  const body = svgNode('g', { transform: `translate(0 ${layout.head})` }, [
    ...throughLines(input, axis),
    ...panes,
  ]);
  return svgNode(
    'svg',
    {
      ...{ xmlns: 'http://www.w3.org/2000/svg', viewBox: `0 0 ${layout.width} ${height}` },
      ...{ width: layout.width, height, 'font-family': FIGURE_FONTS },
    },
    [body],
  );
}

import { displayPitch } from '#shared/pitch/display';
import { rangeOf } from '#shared/strings/ranges';
import { SECTION_FACTS, SECTIONS, type Section } from '#shared/strings/sections';
import { tokenColumns } from '@/charts/token-columns';
import type { PaneInput } from '@/export/figure/figure-input';
import { markAt } from '@/export/figure/mark';
import { words } from '@/export/figure/words';
import { svgNode, type SvgNode } from '@/export/svg/nodes';

/** In sizes of type: height of a token, its corner, its sign, the widest name's room for each letter. */
const [TOKEN, CORNER, SIGN, LETTER] = [1.5, 0.25, 0.62, 0.62] as const;
/** A little air between tokens over each other. */
const AIR = 1.08;
/** Of a lane, from its edge to the middle of its outermost tokens. */
const EDGE = 0.05;
/** A lane is at least so many sizes of a token's type wide. */
const LANE = 3.4;
const HALF_TONE = 0.5;

/** Where a section plays at ease, shaded, and the string on which it ends. */
function laneOf(input: PaneInput, section: Section, index: number): readonly SvgNode[] {
  const { room, axis, palette, ensemble, layout } = input;
  const width = room.width / SECTIONS.length;
  const x = room.left + index * width;
  const { lowest, comfortableTop, orchestralTop } = rangeOf(section, ensemble.bass);
  const colour = palette.section(section);
  const top = axis.yOf(comfortableTop + HALF_TONE);
  const bottom = axis.yOf(lowest - HALF_TONE);
  const inset = { x: x + width * 0.08, width: width * 0.84 };
  const reach = axis.yOf(orchestralTop + HALF_TONE);
  return [
    svgNode('rect', { ...inset, y: top, height: bottom - top, fill: colour, 'fill-opacity': 0.13 }),
    svgNode('rect', { ...inset, y: reach, height: top - reach, fill: colour, 'fill-opacity': 0.05 }),
    svgNode('line', {
      ...{ x1: inset.x, x2: inset.x + inset.width, y1: bottom, y2: bottom },
      ...{ stroke: colour, 'stroke-width': layout.text / 8 },
    }),
  ];
}

function tokensOf(input: PaneInput, section: Section, index: number): readonly SvgNode[] {
  const { analysis, axis, layout, naming, palette, room } = input;
  const width = room.width / SECTIONS.length;
  const text = Math.min(layout.text, width / LANE);
  const own = analysis.voices.filter((voice) => voice.section === section);
  const columns = tokenColumns(own, (text * TOKEN * AIR) / axis.semitone);
  return own.flatMap(({ id, midi, pitch }) => {
    const { column, columns: all } = columns.get(id) ?? { column: 0, columns: 1 };
    const across = all === 1 ? 1 / 2 : EDGE + ((1 - 2 * EDGE) * column) / (all - 1);
    const x = room.left + width * (index + across);
    const y = axis.yOf(midi);
    const name = displayPitch(pitch, naming);
    const sign = text * SIGN;
    const wide = sign + text * (LETTER * name.length + 1);
    const height = text * TOKEN;
    const left = x - wide / 2;
    return [
      svgNode('rect', {
        ...{ x: left, y: y - height / 2, width: wide, height, rx: text * CORNER },
        ...{ fill: palette.surface, stroke: palette.section(section), 'stroke-width': text / 9 },
      }),
      markAt(section, left + text * 0.3 + sign / 2, y, sign, palette),
      words(name, left + text * 0.5 + sign, y, { size: text, fill: palette.ink, weight: 600 }),
    ];
  });
}

/** The five lanes with their ranges, and the chord's notes in them. */
export function sectionsPane(input: PaneInput): readonly SvgNode[] {
  const { room, layout, palette } = input;
  const width = room.width / SECTIONS.length;
  const heads = SECTIONS.map((section, index) =>
    words(SECTION_FACTS[section].short, room.left + width * (index + 1 / 2), -layout.head / 2, {
      ...{ size: layout.text, fill: palette.ink, anchor: 'middle', weight: 600 },
    }),
  );
  return [
    ...heads,
    ...SECTIONS.flatMap((section, index) => laneOf(input, section, index)),
    ...SECTIONS.flatMap((section, index) => tokensOf(input, section, index)),
  ];
}

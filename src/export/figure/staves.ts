import { systemPlan, type NotatedStudy } from '#shared/notation/system-plan';
import type { NoteNaming } from '#shared/pitch/display';
import { SECTION_FACTS, SECTIONS } from '#shared/strings/sections';
import type { Chord } from '#shared/study/study.document';
import type { PitchAxis } from '@/charts/pitch-axis';
import { beginningWidth } from '@/engraving/beginning';
import { drawStaff } from '@/engraving/draw-staff';
import type { Engraver } from '@/engraving/engraver';
import { leadersOf, type PlacedHead } from '@/engraving/leaders';
import { systemSketch } from '@/engraving/system-sketch';
import { STAFF_HEIGHT } from '@/engraving/units';
import type { PaneRoom } from '@/export/figure/layout';
import { markAt } from '@/export/figure/mark';
import { words } from '@/export/figure/words';
import type { Palette } from '@/export/palette';
import { nodeOfElement } from '@/export/svg/from-element';
import { svgNode, type SvgNode } from '@/export/svg/nodes';

/** What a system is drawn from. */
export interface StavesInput {
  readonly chord: Chord;
  readonly study: NotatedStudy;
  readonly naming: NoteNaming;
  readonly axis: PitchAxis;
  readonly room: PaneRoom;
  /** Size of the words. */
  readonly text: number;
  readonly palette: Palette;
  /** From each head to its height on the axis; none where the staves stand by themselves. */
  readonly leaders: boolean;
}

/** In sizes of type: room of the sections' names, and of the leaders after the staves. */
const [NAMES, LEADERS] = [3.2, 2.8] as const;
/** A staff's height at most, in sizes of type. */
const LARGEST = 2.9;

/** The staves of one chord with names, marks and bracket, each head led to its height. */
export function drawStaves(engraver: Engraver, input: StavesInput): readonly SvgNode[] {
  const { chord, study, naming, axis, room, text, palette } = input;
  const left = room.left + text * NAMES;
  const right = room.left + room.width - (input.leaders ? text * LEADERS : 0);
  const plan = systemPlan(chord, study, naming);
  const sketch = systemSketch(plan, {
    ...{ width: right - left, height: axis.height, textSize: text * 0.85 },
    ...{ beginning: beginningWidth(plan), largest: (text * LARGEST) / STAFF_HEIGHT },
  });
  const { scale, tops } = sketch;
  const heads: PlacedHead[] = [];
  const staves = sketch.staves.map((staff, index) => {
    const top = tops[index] ?? 0;
    const drawn = drawStaff(engraver, staff);
    for (const head of drawn.heads.at(-1) ?? []) {
      const { voiceId } = head;
      const place = { left: left + head.left * scale, right: left + head.right * scale };
      heads.push({ voiceId, ...place, y: top + head.y * scale });
    }
    const transform = `translate(${left} ${top}) scale(${scale})`;
    return svgNode('g', { transform, color: palette.ink }, [nodeOfElement(drawn.element)]);
  });
  const leaders = input.leaders ? leadersOf(heads, chord.voices, axis, room.left + room.width) : [];
  return [
    ...frameOf(tops, scale, { left, right, text, palette, names: room.left }),
    ...staves,
    ...leaders.flatMap(({ path, section, from, to }) => {
      const colour = palette.section(section);
      const dot = { r: text / 6, fill: colour };
      return [
        svgNode('path', { d: path, fill: 'none', stroke: colour, 'stroke-width': text / 10 }),
        svgNode('circle', { cx: from.x, cy: from.y, ...dot }),
        svgNode('circle', { cx: to.x, cy: to.y, ...dot }),
      ];
    }),
  ];
}

interface Frame {
  readonly left: number;
  readonly right: number;
  readonly names: number;
  readonly text: number;
  readonly palette: Palette;
}

/** The sections' names and signs, and the bracket that holds the staves together. */
function frameOf(tops: readonly number[], scale: number, frame: Frame): readonly SvgNode[] {
  const { left, right, names, text, palette } = frame;
  const staff = STAFF_HEIGHT * scale;
  const [first, last] = [tops[0] ?? 0, (tops.at(-1) ?? 0) + staff];
  const x = left - text * 0.4;
  const tip = x + text * 0.55;
  const hook = text * 0.3;
  const bracket = `M${tip} ${first - hook * 2}Q${x} ${first - hook} ${x} ${first}V${last}Q${x} ${last + hook} ${tip} ${last + hook * 2}`;
  const edge = (at: number): SvgNode =>
    svgNode('line', { x1: at, x2: at, y1: first, y2: last, stroke: palette.ink, 'stroke-width': text / 16 });
  return [
    ...SECTIONS.flatMap((section, index) => {
      const middle = (tops[index] ?? 0) + staff / 2;
      const name = words(SECTION_FACTS[section].short, names, middle - text * 0.55, {
        ...{ size: text * 0.9, fill: palette.ink, weight: 600, clear: palette },
      });
      return [name, markAt(section, names + text * 0.4, middle + text * 0.5, text * 0.7, palette)];
    }),
    svgNode('path', { d: bracket, fill: 'none', stroke: palette.ink, 'stroke-width': text / 5 }),
    ...[left, right].map(edge),
  ];
}

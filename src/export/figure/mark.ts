import type { Section } from '#shared/strings/sections';
import { MARK_SIZE, SECTION_MARKS } from '@/charts/section-marks';
import type { Palette } from '@/export/palette';
import { svgNode, type SvgNode } from '@/export/svg/nodes';

/** @returns a section's sign, its middle at the place */
export function markAt(section: Section, x: number, y: number, size: number, palette: Palette): SvgNode {
  const scale = size / MARK_SIZE;
  const transform = `translate(${x - size / 2} ${y - size / 2}) scale(${scale})`;
  return svgNode('path', { d: SECTION_MARKS[section], fill: palette.section(section), transform });
}

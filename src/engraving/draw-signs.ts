import type { Dynamic } from '#shared/study/study.document';
import { MUSIC_FONT, TEXT_FONTS } from '@/engraving/music-font';

const SVG = 'http://www.w3.org/2000/svg';

/** @source SMuFL 1.4: dynamics, octaves, string techniques */
const DYNAMIC_SIGNS: Readonly<Record<Dynamic, string>> = {
  ppp: '\uE52A',
  pp: '\uE52B',
  p: '\uE520',
  mp: '\uE52C',
  mf: '\uE52D',
  f: '\uE522',
  ff: '\uE52F',
  fff: '\uE530',
};
const OCTAVE_SIGN = '\uE511';
const DYNAMIC_SIZE = 34;
const OCTAVE_SIZE = 30;
const CIRCLE_RADIUS = 2.8;

export function svgElement<Name extends keyof SVGElementTagNameMap>(
  name: Name,
  attributes: Readonly<Record<string, string | number>>,
): SVGElementTagNameMap[Name] {
  const element = document.createElementNS(SVG, name);
  for (const [key, value] of Object.entries(attributes)) element.setAttribute(key, String(value));
  return element;
}

export type Anchor = 'start' | 'middle' | 'end';

export interface TextLook {
  readonly size: number;
  readonly anchor: Anchor;
  readonly weight?: number;
  readonly italic?: boolean;
}

/** @returns a line of text with its foot at `y` */
export function drawText(text: string, x: number, y: number, look: TextLook): SVGTextElement {
  const element = svgElement('text', {
    ...{ x, y, 'text-anchor': look.anchor, 'font-size': look.size, 'font-family': TEXT_FONTS },
    ...{ 'font-weight': look.weight ?? 400, 'font-style': look.italic ? 'italic' : 'normal' },
    ...{ fill: 'currentColor', stroke: 'none' },
  });
  element.textContent = text;
  return element;
}

function drawSign(sign: string, x: number, y: number, size: number, anchor: Anchor): SVGTextElement {
  const element = svgElement('text', {
    ...{ x, y, 'font-size': size, 'font-family': MUSIC_FONT, 'text-anchor': anchor },
    ...{ fill: 'currentColor', stroke: 'none' },
  });
  element.textContent = sign;
  return element;
}

/** The dynamics of a staff, those of several lines one after the other from the highest. */
export function drawDynamics(
  dynamics: readonly Dynamic[],
  x: number,
  y: number,
  anchor: Anchor,
): SVGTextElement {
  return drawSign(dynamics.map((dynamic) => DYNAMIC_SIGNS[dynamic]).join(' '), x, y, DYNAMIC_SIZE, anchor);
}

export function drawOctaveSign(x: number, y: number): SVGTextElement {
  return drawSign(OCTAVE_SIGN, x, y, OCTAVE_SIZE, 'middle');
}

/** The small circle of a natural harmonic. */
export function drawCircle(x: number, y: number): SVGCircleElement {
  return svgElement('circle', {
    ...{ cx: x, cy: y, r: CIRCLE_RADIUS },
    ...{ fill: 'none', stroke: 'currentColor', 'stroke-width': 1.2 },
  });
}

/** The square bracket before the heads of a double stop. */
export function drawStopBracket(x: number, top: number, bottom: number): SVGPathElement {
  return svgElement('path', {
    d: `M${x + 4} ${top}H${x}V${bottom}H${x + 4}`,
    ...{ fill: 'none', stroke: 'currentColor', 'stroke-width': 1.4 },
  });
}

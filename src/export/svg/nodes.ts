/** A piece of a drawing that is in no page yet, so that one builder serves the page, the paper and the file. */
export interface SvgNode {
  readonly tag: string;
  readonly attributes: Readonly<Record<string, string | number>>;
  readonly children: readonly (SvgNode | string)[];
}

/**
 * @param tag of SVG
 * @param attributes with their values unescaped
 * @param children drawn one over the other
 * @returns the piece
 */
export function svgNode(
  tag: string,
  attributes: SvgNode['attributes'],
  children: SvgNode['children'] = [],
): SvgNode {
  return { tag, attributes, children };
}

const ESCAPES: Readonly<Record<string, string>> = { '&': '&amp;', '<': '&lt;', '>': '&gt;', '"': '&quot;' };
/** @source XML 1.0, production 2: of the control characters a document may have only these three */
const KEPT_CONTROLS = new Set(['\t', '\n', '\r']);
const SPACE_CODE = 32;

/** @source XML 1.0, production 2: half a surrogate pair and the two non-characters are none that a document may have */
const NO_CHARACTER = /[\uD800-\uDFFF\uFFFE\uFFFF]/u;

function mayStand(sign: string): boolean {
  if (NO_CHARACTER.test(sign)) return false;
  return (sign.codePointAt(0) ?? 0) >= SPACE_CODE || KEPT_CONTROLS.has(sign);
}

/**
 * @returns text as it may stand in an XML document; characters that none may have are left out
 * @example escapeXml('a < "b"') // 'a &lt; &quot;b&quot;'
 */
export function escapeXml(text: string): string {
  return [...text]
    .filter(mayStand)
    .map((sign) => ESCAPES[sign] ?? sign)
    .join('');
}

/**
 * Writes a drawing as XML.
 * @example svgText(svgNode('g', { x: 1 }, ['a'])) // '<g x="1">a</g>'
 */
export function svgText({ tag, attributes, children }: SvgNode): string {
  const written = Object.entries(attributes)
    .map(([name, value]) => ` ${name}="${escapeXml(String(value))}"`)
    .join('');
  if (children.length === 0) return `<${tag}${written}/>`;
  const inner = children.map((child) => (typeof child === 'string' ? escapeXml(child) : svgText(child)));
  return `<${tag}${written}>${inner.join('')}</${tag}>`;
}

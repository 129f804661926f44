import { svgNode, type SvgNode } from '@/export/svg/nodes';

/** @returns a drawn element, such as the engraver makes them, as a piece of a drawing */
export function nodeOfElement(element: Element): SvgNode {
  const attributes = Object.fromEntries([...element.attributes].map(({ name, value }) => [name, value]));
  const children = [...element.childNodes].flatMap((child): (SvgNode | string)[] => {
    if (child instanceof Element) return [nodeOfElement(child)];
    return child.textContent ? [child.textContent] : [];
  });
  return svgNode(element.tagName, attributes, children);
}

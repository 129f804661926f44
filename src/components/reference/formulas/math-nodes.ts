import { h, type VNode } from 'vue';
import type { Expression } from '@/components/reference/formulas/expression';

type Node = VNode | readonly VNode[];

const nodesOf = (node: Node): VNode[] => ('type' in node ? [node] : [...node]);
const row = (...parts: readonly Node[]): VNode => h('mrow', parts.flatMap(nodesOf));
const sign = (text: string, more: Readonly<Record<string, string>> = {}): VNode => h('mo', more, text);

/** Brackets grow with what is tall within them and with nothing else. */
function between(open: string, inner: Node, close: string, tall: boolean): VNode {
  const more = { stretchy: String(tall) };
  return row(sign(open, more), inner, sign(close, more));
}

function isTall(part: Expression): boolean {
  if (part.kind === 'quotient' || part.kind === 'over') return true;
  if ('parts' in part) return part.parts.some(isTall);
  if (part.kind === 'call') return part.of.some(isTall);
  return 'of' in part && isTall(part.of);
}

/** Signs that a reader would otherwise need to bind by hand. */
const LOOSE: readonly Expression['kind'][] = ['sum', 'negative', 'over'];
const COMPOUND: readonly Expression['kind'][] = [...LOOSE, 'product', 'quotient', 'power', 'call'];

/** Digits as they are written, with no thousands to set apart. */
function numberText(value: number): string {
  return String(value);
}

function enclosed(part: Expression, kinds: readonly Expression['kind'][]): VNode {
  const node = mathNode(part);
  return kinds.includes(part.kind) ? between('(', node, ')', isTall(part)) : node;
}

function sumNode(parts: readonly Expression[]): VNode {
  return row(
    ...parts.flatMap((part, index) => {
      if (part.kind === 'negative') return [sign('−'), enclosed(part.of, LOOSE)];
      return index === 0 ? [mathNode(part)] : [sign('+'), mathNode(part)];
    }),
  );
}

/** A dot between what would otherwise run together: two figures, or a figure before a bracket of its own. */
function productNode(parts: readonly Expression[]): VNode {
  return row(
    ...parts.flatMap((part, index) => {
      const node = enclosed(part, LOOSE);
      return index === 0 ? [node] : [sign('·', { lspace: '0.15em', rspace: '0.15em' }), node];
    }),
  );
}

function symbolNode(name: string, below?: string): VNode {
  const letter = h('mi', name);
  return below === undefined ? letter : h('msub', [letter, h('mi', { mathvariant: 'normal' }, below)]);
}

/** @returns a formula as MathML, to stand within a math element */
export function mathNode(expression: Expression): VNode {
  switch (expression.kind) {
    case 'number':
      return h('mn', numberText(expression.value));
    case 'symbol':
      return symbolNode(expression.name, expression.below);
    case 'sum':
      return sumNode(expression.parts);
    case 'product':
      return productNode(expression.parts);
    case 'quotient':
      return h('mfrac', [mathNode(expression.of), mathNode(expression.by)]);
    case 'power':
      return h('msup', [enclosed(expression.of, COMPOUND), mathNode(expression.by)]);
    case 'negative':
      return row(sign('−', { form: 'prefix' }), enclosed(expression.of, LOOSE));
    case 'root':
      return h('msqrt', [mathNode(expression.of)]);
    case 'size':
      return between('|', mathNode(expression.of), '|', isTall(expression.of));
    case 'call':
      return row(
        h('mi', expression.name),
        between('(', row(...separated(expression.of.map(mathNode))), ')', isTall(expression)),
      );
    case 'over':
      return row(
        h('munder', [sign('∑'), h('mtext', expression.pairs)]),
        enclosed(expression.of, ['sum', 'negative']),
      );
  }
}

function separated(nodes: readonly VNode[]): readonly VNode[] {
  return nodes.flatMap((node, index) => (index === 0 ? [node] : [sign(',', { separator: 'true' }), node]));
}

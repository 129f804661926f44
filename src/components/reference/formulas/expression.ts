/**
 * A formula as the page sets it. It can be worked out as well as set, so that a test can hold every formula
 * on the page to the function that computes it.
 */
export type Expression =
  | { readonly kind: 'number'; readonly value: number }
  | { readonly kind: 'symbol'; readonly name: string; readonly below?: string }
  | { readonly kind: 'sum' | 'product'; readonly parts: readonly Expression[] }
  | { readonly kind: 'quotient' | 'power'; readonly of: Expression; readonly by: Expression }
  | { readonly kind: 'negative' | 'root' | 'size'; readonly of: Expression }
  | { readonly kind: 'call'; readonly name: Callable; readonly of: readonly Expression[] }
  | { readonly kind: 'over'; readonly pairs: string; readonly of: Expression };

export type Callable = 'exp' | 'lg' | 'cos' | 'min';

/** What a formula may call by name; all but the smallest of several take one number. */
const CALLABLES: Readonly<Record<Callable, (...of: readonly number[]) => number>> = {
  exp: (x = NaN) => Math.exp(x),
  lg: (x = NaN) => Math.log10(x),
  cos: (x = NaN) => Math.cos(x),
  min: (...of) => Math.min(...of),
};

type Part = Expression | number;

function expressionOf(part: Part): Expression {
  if (typeof part !== 'number') return part;
  return part < 0
    ? { kind: 'negative', of: { kind: 'number', value: -part } }
    : { kind: 'number', value: part };
}

export function symbol(name: string, below?: string): Expression {
  return below === undefined ? { kind: 'symbol', name } : { kind: 'symbol', name, below };
}

export function sum(...parts: readonly Part[]): Expression {
  return { kind: 'sum', parts: parts.map(expressionOf) };
}

export function product(...parts: readonly Part[]): Expression {
  return { kind: 'product', parts: parts.map(expressionOf) };
}

export function quotient(of: Part, by: Part): Expression {
  return { kind: 'quotient', of: expressionOf(of), by: expressionOf(by) };
}

export function power(of: Part, by: Part): Expression {
  return { kind: 'power', of: expressionOf(of), by: expressionOf(by) };
}

export function negative(of: Part): Expression {
  return { kind: 'negative', of: expressionOf(of) };
}

export function root(of: Part): Expression {
  return { kind: 'root', of: expressionOf(of) };
}

/** The absolute value. */
export function size(of: Part): Expression {
  return { kind: 'size', of: expressionOf(of) };
}

export function call(name: Callable, ...of: readonly Part[]): Expression {
  return { kind: 'call', name, of: of.map(expressionOf) };
}

/** A sum over what `pairs` names; it can be set and not worked out. */
export function over(pairs: string, of: Part): Expression {
  return { kind: 'over', pairs, of: expressionOf(of) };
}

/** What a symbol is called where values are given for it: `f`, or `f_c` with what stands below it. */
export function symbolKey(name: string, below?: string): string {
  return below === undefined ? name : `${name}_${below}`;
}

/**
 * Works a formula out.
 * @param values of its symbols, by {@link symbolKey}
 * @throws RangeError where a symbol has no value, or a sum runs over what only a chord can give
 * @example evaluate(quotient(symbol('f'), 2), { f: 10 }) // 5
 */
export function evaluate(expression: Expression, values: Readonly<Record<string, number>>): number {
  const of = (part: Expression): number => evaluate(part, values);
  switch (expression.kind) {
    case 'number':
      return expression.value;
    case 'symbol':
      return valueOf(symbolKey(expression.name, expression.below), values);
    case 'sum':
      return expression.parts.reduce((total, part) => total + of(part), 0);
    case 'product':
      return expression.parts.reduce((total, part) => total * of(part), 1);
    case 'quotient':
      return of(expression.of) / of(expression.by);
    case 'power':
      return of(expression.of) ** of(expression.by);
    case 'negative':
      return -of(expression.of);
    case 'root':
      return Math.sqrt(of(expression.of));
    case 'size':
      return Math.abs(of(expression.of));
    case 'call':
      return CALLABLES[expression.name](...expression.of.map(of));
    case 'over':
      throw new RangeError(`only a chord can say what to add up over ${expression.pairs}`);
  }
}

function valueOf(key: string, values: Readonly<Record<string, number>>): number {
  const value = values[key];
  if (value === undefined) throw new RangeError(`no value for ${key}`);
  return value;
}

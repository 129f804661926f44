import type { z } from 'zod';
import { createSchema, type oas31 } from 'zod-openapi';

/** One line of a table of fields. */
export interface Field {
  /** Dotted from the root; `[]` is each of a list: `voices[].pitch`. */
  readonly path: string;
  readonly kind: string;
  /** Whether a request may leave it out. */
  readonly optional: boolean;
  readonly about: string;
}

type Schema = oas31.SchemaObject;
type Node = Schema | oas31.ReferenceObject;

/** The contracts name no schemas, so nothing is referred to. */
function inPlace(node: Node): Schema {
  if ('$ref' in node) throw new Error(`a schema that lies elsewhere: ${node.$ref}`);
  return node;
}

/** A value that may be null is described as either. @returns the other, and whether null may stand for it */
function withoutNull(schema: Schema): { readonly schema: Schema; readonly nullable: boolean } {
  const choices = (schema.anyOf ?? []).map(inPlace);
  const other = choices.find(({ type }) => type !== 'null');
  if (other === undefined) return { schema, nullable: false };
  return { schema: other, nullable: choices.length > 1 };
}

function boundsOf({ minimum, maximum, type }: Schema): string {
  if (type === 'array' || minimum === undefined || maximum === undefined) return '';
  // Whole numbers without a bound are described by the widest that can be told apart.
  return Math.abs(maximum) >= Number.MAX_SAFE_INTEGER ? '' : `, ${minimum} to ${maximum}`;
}

function kindOf(schema: Schema): string {
  if (schema.enum) return schema.enum.map((value) => JSON.stringify(value)).join(', ');
  if (schema.type === 'array') {
    const { items } = schema;
    return items === undefined ? 'list' : `list of ${kindOf(withoutNull(inPlace(items)).schema)}`;
  }
  return `${String(schema.type)}${boundsOf(schema)}`;
}

function below(path: string, schema: Schema): readonly Field[] {
  if (schema.type === 'array' && schema.items !== undefined) {
    return below(`${path}[]`, withoutNull(inPlace(schema.items)).schema);
  }
  const required = new Set(schema.required ?? []);
  return Object.entries(schema.properties ?? {}).flatMap(([name, node]) => {
    const whole = inPlace(node);
    const { schema: inner, nullable } = withoutNull(whole);
    const at = path === '' ? name : `${path}.${name}`;
    const kind = nullable ? `${kindOf(inner)} or null` : kindOf(inner);
    const field: Field = { path: at, kind, optional: !required.has(name), about: whole.description ?? '' };
    return [field, ...below(at, inner)];
  });
}

/**
 * Every field of a schema, those inside others after them.
 * @param io whether it is read (`input`: defaults may be left out) or answered
 */
export function fieldsOf(schema: z.ZodType, io: 'input' | 'output'): readonly Field[] {
  return below('', inPlace(createSchema(schema, { io }).schema));
}

import type { InputFaults } from '#shared/contracts/errors';

const BODY = 'body.';

/** Of each field its first fault, under the field's own name. */
export type FieldFaults = Readonly<Record<string, string>>;

/**
 * Says what is to be mended where, for a form whose fields are named as in the body that it sends.
 * @param faults as the server gives them (`body.email`) or as a schema's own issues (`email`)
 * @param fields the form's fields
 * @returns the faults beside fields, and the sentences that belong to no field
 * @example faultsByField([{ path: 'body.email', message: 'no' }], ['email']) // { fields: { email: 'no' }, others: [] }
 */
export function faultsByField(
  faults: InputFaults,
  fields: readonly string[],
): { readonly fields: FieldFaults; readonly others: readonly string[] } {
  const found: Record<string, string> = {};
  const others: string[] = [];
  for (const { path, message } of faults) {
    const inBody = path.startsWith(BODY) ? path.slice(BODY.length) : path;
    const field = fields.find((name) => inBody === name || inBody.startsWith(`${name}.`));
    if (field === undefined) others.push(message);
    else found[field] ??= message;
  }
  return { fields: found, others };
}

import { nextTick, ref, type Ref, type ShallowRef } from 'vue';
import type { z } from 'zod';
import type { InputFaults } from '#shared/contracts/errors';
import { ApiError } from '@/api/api-error';
import { faultsByField, type FieldFaults } from '@/api/faults';

export interface Submission<Body> {
  readonly sending: Ref<boolean>;
  readonly faults: Ref<FieldFaults>;
  /** What went amiss that belongs to no field. */
  readonly trouble: Ref<string | null>;
  /** The failure's stable code, for a page that can offer the next step. */
  readonly code: Ref<string | null>;
  submit(body: Body): Promise<void>;
}

const KEPT = 'What you typed is still here: please try again.';

/**
 * Checks a form by the contract's own schema, sends it, and puts every fault beside its field; the first
 * of them gets the focus.
 */
export function useSubmission<Schema extends z.ZodObject>(
  schema: Schema,
  form: Readonly<ShallowRef<HTMLElement | null>>,
  send: (body: z.infer<Schema>) => Promise<void>,
): Submission<z.input<Schema>> {
  const sending = ref(false);
  const faults = ref<FieldFaults>({});
  const trouble = ref<string | null>(null);
  const code = ref<string | null>(null);

  async function show(found: InputFaults): Promise<void> {
    const sorted = faultsByField(found, Object.keys(schema.shape));
    faults.value = sorted.fields;
    trouble.value = sorted.others.length > 0 ? sorted.others.join('. ') : null;
    await nextTick();
    form.value?.querySelector<HTMLElement>('[aria-invalid="true"]')?.focus();
  }

  async function fail(error: unknown): Promise<void> {
    if (!(error instanceof ApiError)) throw error;
    code.value = error.code;
    if (error.faults.length > 0) return show(error.faults);
    trouble.value = error.isPassing ? `${error.message} ${KEPT}` : error.message;
  }

  async function submit(body: z.input<Schema>): Promise<void> {
    if (sending.value) return;
    [faults.value, trouble.value, code.value] = [{}, null, null];
    const parsed = schema.safeParse(body);
    if (!parsed.success) {
      return show(parsed.error.issues.map(({ path, message }) => ({ path: path.join('.'), message })));
    }
    sending.value = true;
    await send(parsed.data)
      .catch(fail)
      .finally(() => (sending.value = false));
  }

  return { sending, faults, trouble, code, submit };
}

import { staleDetailsSchema, type StaleDetails } from '#shared/contracts/studies';
import { ApiError } from '@/api/api-error';

const UNAUTHORISED = 401;
const NOT_FOUND = 404;
const FORBIDDEN = 403;

/** What became of a save that was not taken, and what to do about it. */
export type SaveFailure =
  | { readonly kind: 'stale'; readonly details: StaleDetails }
  /** It may get through later, unchanged. */
  | { readonly kind: 'passing'; readonly message: string }
  /** It will not, unless something is done. */
  | { readonly kind: 'refused'; readonly message: string };

const KEPT = 'Your changes are kept in this browser';

/** @returns what to tell, with what was kept and what to do */
export function saveFailureOf(error: unknown): SaveFailure {
  if (!(error instanceof ApiError)) throw error;
  const stale = error.code === 'study.stale' ? staleDetailsSchema.safeParse(error.details) : null;
  if (stale?.success) return { kind: 'stale', details: stale.data };
  if (error.isPassing) {
    return { kind: 'passing', message: `${error.message} ${KEPT} and saved as soon as that is possible.` };
  }
  if (error.status === UNAUTHORISED) {
    return {
      kind: 'refused',
      message: `Your session has ended. ${KEPT}: sign in again, and they are saved.`,
    };
  }
  return { kind: 'refused', message: `${error.message} ${nextStep(error)}` };
}

function nextStep(error: ApiError): string {
  if (error.status === NOT_FOUND || error.status === FORBIDDEN) {
    return `${KEPT}: you can keep them as a new study of your own.`;
  }
  const [fault] = error.faults;
  return fault ? `${fault.message}. ${KEPT} meanwhile.` : `${KEPT}.`;
}

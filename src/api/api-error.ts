import { inputFaultsSchema, type InputFaults } from '#shared/contracts/errors';

const BAD_GATEWAY = 502;
const UNAVAILABLE = 503;
const GATEWAY_TIMEOUT = 504;
const TOO_MANY = 429;
const PASSING: readonly number[] = [0, TOO_MANY, BAD_GATEWAY, UNAVAILABLE, GATEWAY_TIMEOUT];

/** Codes that arise on this side of the wire. */
export const NO_ANSWER = 'network.no-answer';
export const UNREADABLE = 'network.unreadable';

/** A request that was refused or did not get through. */
export class ApiError extends Error {
  override readonly name = 'ApiError';

  constructor(
    /** The HTTP status; 0 where there was no answer. */
    readonly status: number,
    readonly code: string,
    message: string,
    readonly details?: unknown,
  ) {
    super(message);
  }

  /** Whether the same request may succeed later, unchanged. */
  get isPassing(): boolean {
    return PASSING.includes(this.status);
  }

  /** Every fault of what was sent; empty for other failures. */
  get faults(): InputFaults {
    const parsed = inputFaultsSchema.safeParse(this.details);
    return parsed.success ? parsed.data : [];
  }
}

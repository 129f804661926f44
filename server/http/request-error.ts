import type { InputFaults } from '#shared/contracts/errors';

interface Extras {
  details?: unknown;
  /** Seconds after which the same request may pass. */
  retryAfterS?: number;
}

/** A failure that is expected and told to the person: thrown where the fact is known, answered in one place. */
export class RequestError extends Error {
  readonly details: unknown;
  readonly retryAfterS: number | undefined;

  constructor(
    readonly status: number,
    /** Stable, for programs. */
    readonly code: string,
    message: string,
    extras: Extras = {},
  ) {
    super(message);
    this.name = 'RequestError';
    this.details = extras.details;
    this.retryAfterS = extras.retryAfterS;
  }
}

export function invalidInput(faults: InputFaults): RequestError {
  return new RequestError(422, 'input.invalid', 'Some of what was sent cannot be taken.', {
    details: faults,
  });
}

export function signInNeeded(): RequestError {
  return new RequestError(401, 'session.required', 'Please sign in first.');
}

export function notAllowed(): RequestError {
  return new RequestError(403, 'action.forbidden', 'You may not do this.');
}

export function nothingHere(): RequestError {
  return new RequestError(404, 'route.unknown', 'There is nothing at this address.');
}

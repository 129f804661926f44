import type { ErrorRequestHandler, RequestHandler } from 'express';
import type { ErrorBody } from '#shared/contracts/errors';
import { isDatabaseAway } from '#server/db/faults';
import { MAX_BODY_BYTES } from '#server/http/json-body';
import { describeError } from '#server/http/describe-error';
import { nothingHere, RequestError } from '#server/http/request-error';

const DATABASE_RETRY_S = 5;

function property(error: unknown, name: string): unknown {
  return typeof error === 'object' && error !== null ? Reflect.get(error, name) : undefined;
}

/** What the middleware before the routes may throw, by its own marks. */
function fromMiddleware(error: unknown): RequestError | null {
  if (property(error, 'code') === 'EBADCSRFTOKEN') {
    return new RequestError(
      403,
      'csrf.invalid',
      'This page is out of date: load it again, then repeat what you did.',
    );
  }
  if (property(error, 'type') === 'entity.too.large') {
    const most = MAX_BODY_BYTES / 1024 / 1024;
    return new RequestError(413, 'body.tooLarge', `At most ${most} MB can be sent at once.`);
  }
  if (property(error, 'type') === 'encoding.unsupported') {
    return new RequestError(415, 'media.unsupported', 'This compression is not read here.');
  }
  const status = property(error, 'status');
  if (typeof status !== 'number' || status < 400 || status > 499) return null;
  return new RequestError(status, 'request.invalid', 'This request cannot be read.');
}

/** @returns what is told for a fault; null: it is ours, and nothing but its number is told. */
function expected(error: unknown): RequestError | null {
  if (error instanceof RequestError) return error;
  if (isDatabaseAway(error)) {
    return new RequestError(
      503,
      'database.away',
      'The database is away just now. Please try again in a moment.',
      {
        retryAfterS: DATABASE_RETRY_S,
      },
    );
  }
  return fromMiddleware(error);
}

function unexpected(requestId: string): RequestError {
  return new RequestError(500, 'server.failed', `Something failed on our side. It is noted as ${requestId}.`);
}

function bodyOf(error: RequestError): ErrorBody {
  const { code, message, details } = error;
  return { error: details === undefined ? { code, message } : { code, message, details } };
}

export const unknownRoute: RequestHandler = () => {
  throw nothingHere();
};

/** The one place where a failure becomes an answer. */
export const errorHandler: ErrorRequestHandler = (error: unknown, req, res, _next) => {
  const told = expected(error) ?? unexpected(String(req.id));
  if (told.status >= 500) req.log.error({ fault: describeError(error) }, told.code);
  else req.log.info({ refused: told.code, account: req.viewer?.id }, 'refused');
  // The answer went out already (a session that could not be kept): there is no other to give.
  if (res.headersSent) return;
  if (told.retryAfterS !== undefined) res.set('Retry-After', String(Math.ceil(told.retryAfterS)));
  res.status(told.status).json(bodyOf(told));
};

import type { RequestHandler } from 'express';
import type { Deps } from '#server/deps';
import { SCRIPT_CALLS_PER_ADDRESS } from '#server/limits/limits.rules';
import { addressOf, countTry } from '#server/limits/limits.service';

/** Counts the calls that scripts and lessons make, before what they send is read: a bad one costs, too. */
export function scriptCalls({ db, clock }: Pick<Deps, 'db' | 'clock'>): RequestHandler {
  return async (req, _res, next) => {
    if (req.method === 'POST') await countTry(db, SCRIPT_CALLS_PER_ADDRESS, addressOf(req), clock());
    next();
  };
}

import express, { type RequestHandler } from 'express';
import { RequestError } from '#server/http/request-error';

/** A study of 200 chords with 40 voices each is close to 2 MiB. */
export const MAX_BODY_BYTES = 3 * 1024 * 1024;
/** MariaDB refuses JSON nested 32 deep; a study needs 7 levels. */
export const MAX_JSON_DEPTH = 24;
const REFUSED_KEYS = new Set(['__proto__', 'constructor', 'prototype']);
const LONE_SURROGATE = /\p{Surrogate}/u;

function refused(message: string): RequestError {
  return new RequestError(422, 'json.refused', message);
}

function checkText(text: string): void {
  if (LONE_SURROGATE.test(text)) throw refused('The text has half of a character in it (a lone surrogate).');
}

function checkKey(key: string): void {
  if (REFUSED_KEYS.has(key)) throw refused(`The name "${key}" is not taken.`);
  checkText(key);
}

/** Walks level by level, without recursion: 10,000 levels must not exhaust the stack. */
function checkTree(root: unknown): void {
  let level: unknown[] = [root];
  for (let depth = 0; level.length > 0; depth += 1) {
    if (depth > MAX_JSON_DEPTH) throw refused(`What was sent is nested more than ${MAX_JSON_DEPTH} deep.`);
    const next: unknown[] = [];
    for (const value of level) {
      if (typeof value === 'string') checkText(value);
      if (typeof value !== 'object' || value === null) continue;
      if (!Array.isArray(value)) Object.keys(value).forEach(checkKey);
      for (const inner of Object.values(value)) next.push(inner);
    }
    level = next;
  }
}

function decode(bytes: Buffer): string {
  try {
    return new TextDecoder('utf-8', { fatal: true }).decode(bytes);
  } catch {
    throw new RequestError(400, 'text.invalid', 'What was sent is not valid UTF-8 text.');
  }
}

function parse(text: string): unknown {
  try {
    return JSON.parse(text);
  } catch {
    throw new RequestError(400, 'json.invalid', 'What was sent is not JSON.');
  }
}

/** @throws RequestError 400 when it is no UTF-8 or no JSON, 422 when it is JSON of a kind that is not taken. */
export function parseJsonBody(bytes: Buffer): unknown {
  const value = parse(decode(bytes));
  checkTree(value);
  return value;
}

const MEDIA_TYPE = /^application\/json\s*(;\s*charset\s*=\s*"?utf-8"?\s*)?$/i;

const checkMediaType: RequestHandler = (req, _res, next) => {
  if (MEDIA_TYPE.test(req.headers['content-type'] ?? '')) return next();
  next(new RequestError(415, 'media.unsupported', 'Send application/json in UTF-8.'));
};

const parseRaw: RequestHandler = (req, _res, next) => {
  req.body = parseJsonBody(Buffer.isBuffer(req.body) ? req.body : Buffer.alloc(0));
  next();
};

/** Reads a body as bytes, then parses it strictly: the stock parser lets broken UTF-8 pass. */
export const jsonBody: readonly RequestHandler[] = [
  checkMediaType,
  express.raw({ type: () => true, limit: MAX_BODY_BYTES }),
  parseRaw,
];

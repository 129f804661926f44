import { randomUUID } from 'node:crypto';
import type { IncomingMessage } from 'node:http';
import type { Logger } from 'pino';
import { pinoHttp } from 'pino-http';

/** Addresses and error texts can carry control and direction characters that fake other lines on a terminal. */
const UNSEEN = /[\p{Cc}\p{Cf}\p{Zl}\p{Zp}]/gu;
const LONGEST_PATH = 200;

/** The path alone: neither queries nor headers nor bodies are logged, so no cookie, token or password can be. */
function pathOf(req: IncomingMessage & { originalUrl?: string }): string {
  const path = (req.originalUrl ?? req.url ?? '').split('?')[0] ?? '';
  return path.replace(UNSEEN, '?').slice(0, LONGEST_PATH);
}

/** One line for each request, with its number; the number goes out with the answer. */
export function requestLog(log: Logger) {
  return pinoHttp({
    logger: log,
    genReqId: (_req, res) => {
      const id = randomUUID();
      res.setHeader('x-request-id', id);
      return id;
    },
    serializers: {
      req: (req: { id: string; method: string; raw: IncomingMessage }) => ({
        id: req.id,
        method: req.method,
        path: pathOf(req.raw),
      }),
      res: (res: { statusCode: number }) => ({ status: res.statusCode }),
      // pino-http makes an error of its own for every 500; the handler has logged the real one.
      err: (error: { type?: string }) => ({ type: error.type }),
    },
    customLogLevel: (_req, res) => (res.statusCode >= 500 ? 'warn' : 'info'),
  });
}

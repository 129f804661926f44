import { pino, stdTimeFunctions, type Logger } from 'pino';
import type { Settings } from '#server/env';

/** One JSON object a line, times in UTC. */
export function createLogger({ logLevel }: Pick<Settings, 'logLevel'>): Logger {
  return pino({ level: logLevel, base: { pid: process.pid }, timestamp: stdTimeFunctions.isoTime });
}

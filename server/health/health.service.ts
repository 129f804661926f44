import type { Pool } from 'mysql2/promise';
import type { readHealth } from '#shared/contracts/health';
import type { ResponseOf } from '#shared/contracts/endpoint';

/** Longer, and the database counts as away: whoever asks wants an answer now. */
const PATIENCE_MS = 2000;

type Asked = Pick<Pool, 'query'>;

/** Asks the database for an answer, and says which program this is. */
export async function checkHealth(
  pool: Asked,
  version: string,
  patienceMs = PATIENCE_MS,
): Promise<ResponseOf<typeof readHealth>> {
  const up = await answersWithin(pool, patienceMs);
  return { status: up ? 'ok' : 'degraded', database: up ? 'up' : 'down', version };
}

async function answersWithin(pool: Asked, patienceMs: number): Promise<boolean> {
  let timer: NodeJS.Timeout | undefined;
  const tooLate = new Promise<boolean>((resolve) => {
    timer = setTimeout(() => resolve(false), patienceMs);
  });
  const answered = pool.query('SELECT 1').then(
    () => true,
    () => false,
  );
  try {
    return await Promise.race([answered, tooLate]);
  } finally {
    clearTimeout(timer);
  }
}

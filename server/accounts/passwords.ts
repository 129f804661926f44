import { availableParallelism } from 'node:os';
import { getRounds } from 'bcryptjs';
import { randomSecret } from '#server/accounts/secrets';
import { createPasswordWorkers } from '#server/accounts/password-workers';

/** Keeps and checks passwords. */
export interface Passwords {
  hash(password: string): Promise<string>;
  /** Takes as long for an account that does not exist (null) as for one that does. */
  matches(password: string, hash: string | null): Promise<boolean>;
  /** Whether a hash was made at another cost than is in force. */
  isOutdated(hash: string): boolean;
  close(): Promise<void>;
}

/** OWASP asks for 10 or more; 12 takes about a third of a second here. */
export const PASSWORD_COST = 12;
const MOST_WORKERS = 4;

/** One core is left for everything else. */
function defaultWorkers(): number {
  return Math.max(1, Math.min(MOST_WORKERS, availableParallelism() - 1));
}

export function createPasswords(cost = PASSWORD_COST, count = defaultWorkers()): Passwords {
  const workers = createPasswordWorkers(count);
  const hash = async (password: string) => String(await workers.run({ kind: 'hash', password, cost }));
  let dummy: Promise<string> | undefined;
  // A hash that is no hash would be refused at once, and the quick answer would tell.
  const dummyHash = async () => {
    dummy ??= hash(randomSecret());
    try {
      return await dummy;
    } catch (error) {
      // The workers were busy: the next who needs it has it made anew.
      dummy = undefined;
      throw error;
    }
  };
  return {
    hash,
    matches: async (password, known) => {
      const against = known ?? (await dummyHash());
      const fits = await workers.run({ kind: 'compare', password, hash: against });
      return fits === true && known !== null;
    },
    isOutdated: (known) => getRounds(known) !== cost,
    close: () => workers.close(),
  };
}

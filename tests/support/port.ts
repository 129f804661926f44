import { randomInt } from 'node:crypto';
import { once } from 'node:events';
import { createServer } from 'node:net';

/** Below the ports that Linux gives to outgoing connections (32768 on), so that none of those can slip in. */
const LOWEST = 20_000;
const HIGHEST = 32_000;

/** Finds a port of the loopback address on which nobody listens. */
export async function freePort(): Promise<number> {
  for (;;) {
    const port = randomInt(LOWEST, HIGHEST);
    const probe = createServer();
    try {
      await once(probe.listen(port, '127.0.0.1'), 'listening');
      probe.close();
      await once(probe, 'close');
      return port;
    } catch {
      continue;
    }
  }
}

import { once } from 'node:events';
import { createServer, type RequestListener, type Server } from 'node:http';
import { setTimeout as pause } from 'node:timers/promises';
import { CannotStart } from '#server/setup/data-folder';

/** A client that sends slower than this holds a connection for nothing and is answered 408. */
const SLOWNESS = { headersTimeout: 15_000, requestTimeout: 60_000, connectionsCheckingInterval: 5_000 };
const POLL_MS = 50;

const REASONS: Readonly<Record<string, string>> = {
  EADDRINUSE: 'another program listens there; set PORT to another',
  EACCES: 'that needs more rights; set PORT to 1024 or above',
  EADDRNOTAVAIL: 'this machine has no such address; set HOST to one that it has',
};

/** @throws {CannotStart} if the address cannot be had. */
export async function listen(app: RequestListener, host: string, port: number): Promise<Server> {
  const server = createServer(SLOWNESS, app);
  try {
    await once(server.listen(port, host), 'listening');
    return server;
  } catch (error) {
    const code = error instanceof Error && 'code' in error ? String(error.code) : String(error);
    throw new CannotStart(`Cannot listen on ${host}:${port}: ${REASONS[code] ?? code}.`, { cause: error });
  }
}

/** Tells of an address that cannot be had before anything else is made. @throws {CannotStart} */
export async function checkAddress(host: string, port: number): Promise<void> {
  await closeServer(await listen(() => undefined, host, port), 0);
}

/** Takes no more requests, lets those under way finish, and ends what is left when patience is over. */
export async function closeServer(server: Server, patienceMs: number): Promise<void> {
  const deadline = Date.now() + patienceMs;
  const closed = new Promise<true>((resolve) => server.close(() => resolve(true)));
  // Connections that fall idle after the closing would otherwise be kept for their next request.
  while (!(await Promise.race([closed, pause(POLL_MS, false)]))) {
    server.closeIdleConnections();
    if (Date.now() > deadline) server.closeAllConnections();
  }
}

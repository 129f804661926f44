import { once } from 'node:events';
import { request } from 'node:http';
import type { AddressInfo } from 'node:net';
import { expect, test } from 'vitest';
import { CannotStart } from '#server/setup/data-folder';
import { checkAddress, closeServer, listen } from '#server/setup/listen';

const HOST = '127.0.0.1';
const ANY = 0;
const LONG_MS = 60_000;

function portOf(server: Awaited<ReturnType<typeof listen>>): number {
  // A server that listens on a host and a port has an address of this kind.
  return (server.address() as AddressInfo).port;
}

test('when the port is taken, then the refusal says so', async () => {
  const server = await listen(() => undefined, HOST, ANY);
  await expect(checkAddress(HOST, portOf(server))).rejects.toThrow(CannotStart);
  await expect(checkAddress(HOST, portOf(server))).rejects.toThrow(/another program listens there/);
  await closeServer(server, 0);
});

test('when a request is under way, then closing waits for its answer', async () => {
  let answer = () => {};
  const server = await listen((_req, res) => (answer = () => res.end('done')), HOST, ANY);
  const reply = fetch(`http://${HOST}:${portOf(server)}/`).then((response) => response.text());
  await once(server, 'request');
  const closed = closeServer(server, LONG_MS);
  answer();
  expect(await reply).toBe('done');
  await closed;
});

test('when a request never ends, then closing ends it once patience is over', async () => {
  const server = await listen(() => undefined, HOST, ANY);
  const ended = new Promise<string>((resolve) => {
    request({ host: HOST, port: portOf(server) })
      .on('error', (error) => resolve(error.message))
      .end();
  });
  await once(server, 'request');
  await closeServer(server, 0);
  expect(await ended).toBe('socket hang up');
});

import { mkdirSync, mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { request as httpRequest } from 'node:http';
import type { AddressInfo } from 'node:net';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import supertest from 'supertest';
import { afterAll, beforeAll, expect, test } from 'vitest';
import { createApp } from '#server/app';
import { createTestApp } from '../support/app';

let folder = '';
beforeAll(() => {
  folder = mkdtempSync(join(tmpdir(), 'siltline-client-'));
  mkdirSync(join(folder, 'assets'));
  mkdirSync(join(folder, '.git'));
  writeFileSync(join(folder, 'index.html'), '<!doctype html><title>Siltline</title>');
  writeFileSync(join(folder, 'assets', 'main-3f0c6e6f.js'), 'export {};');
  writeFileSync(join(folder, 'icon.svg'), '<svg xmlns="http://www.w3.org/2000/svg"/>');
  writeFileSync(join(folder, '.git', 'config'), '[core]');
});
afterAll(() => rmSync(folder, { recursive: true, force: true }));

async function withClient(settings = {}) {
  const { deps } = await createTestApp(settings);
  return createApp(deps, folder);
}

function directives(csp: string | undefined): Map<string, string> {
  const parts = (csp ?? '').split(';').map((part) => part.trim());
  return new Map(parts.map((part) => [part.split(' ')[0] ?? '', part.split(' ').slice(1).join(' ')]));
}

test('when anything is answered, a page, a file, an error, then it carries the strict policy', async () => {
  const app = await withClient();
  for (const path of [
    '/',
    '/studies',
    '/icon.svg',
    '/nothing.png',
    '/api/session',
    '/api/nothing',
    '/api/health',
  ]) {
    const { headers } = await supertest(app).get(path);
    const policy = directives(headers['content-security-policy']);
    expect(policy.get('default-src')).toBe("'none'");
    expect(policy.get('script-src')).toBe("'self'");
    expect(policy.get('style-src')).toBe("'self' 'unsafe-inline'");
    expect(policy.get('worker-src')).toBe("'self' blob:");
    expect(policy.get('connect-src')).toBe("'self'");
    expect(policy.get('base-uri')).toBe("'none'");
    expect(policy.get('frame-ancestors')).toBe("'none'");
    expect(policy.has('upgrade-insecure-requests')).toBe(false);
    expect(headers['x-content-type-options']).toBe('nosniff');
    expect(headers['referrer-policy']).toBe('no-referrer');
    expect(headers['strict-transport-security']).toBeUndefined();
    expect(headers['access-control-allow-origin']).toBeUndefined();
    expect(headers['x-powered-by']).toBeUndefined();
    expect(headers['x-request-id']).toMatch(/^[0-9a-f-]{36}$/);
  }
});

test('when people come by https, then browsers are told to insist on it for a year', async () => {
  const app = await withClient({
    DEMO: 'off',
    PUBLIC_URL: 'https://siltline.example',
    SMTP_URL: 'smtp://127.0.0.1:9',
    MAIL_FROM: 'siltline@siltline.example',
    TRUST_PROXY: '1',
  });
  for (const path of ['/', '/api/session', '/api/nothing']) {
    const { headers } = await supertest(app).get(path).set('x-forwarded-proto', 'https');
    expect(headers['strict-transport-security']).toBe('max-age=31536000; includeSubDomains');
    expect(directives(headers['content-security-policy']).has('upgrade-insecure-requests')).toBe(true);
  }
});

test('when the API answers, whatever it is, then nobody may keep it', async () => {
  const app = await withClient();
  for (const path of [
    '/api/session',
    '/api/session/csrf-token',
    '/api/studies',
    '/api/nothing',
    '/api/health',
  ]) {
    expect((await supertest(app).get(path)).headers['cache-control']).toBe('no-store');
  }
});

test('when a page is asked for by its address, then it is the client; files named by content are kept for good', async () => {
  const app = await withClient();
  for (const path of ['/', '/studies', '/confirm', '/studies/AAAAAAAAAAAAAAAAAAAAAA']) {
    const page = await supertest(app).get(path);
    expect([page.status, page.headers['cache-control']]).toEqual([200, 'no-cache']);
    expect(page.text).toContain('<title>Siltline</title>');
  }
  const asset = await supertest(app).get('/assets/main-3f0c6e6f.js');
  expect(asset.headers['cache-control']).toBe('public, max-age=31536000, immutable');
  expect((await supertest(app).get('/icon.svg')).headers['cache-control']).toBe('public, max-age=0');
});

test.each([
  '/.git/config',
  '/assets/gone.js',
  '/assets/',
  '/index.html.map',
  '/..%2fpackage.json',
  '/%2e%2e/package.json',
  '/metrics.json',
])('when %s is probed, then there is nothing', async (path) => {
  const answer = await supertest(await withClient()).get(path);
  expect(answer.status).toBe(404);
  expect(answer.body.error.code).toBe('route.unknown');
});

test('when a method is none of ours, then it is refused', async () => {
  const server = (await withClient()).listen(0);
  const { port } = server.address() as AddressInfo;
  for (const method of ['TRACE', 'OPTIONS', 'PROPFIND']) {
    const status = await new Promise((resolve, reject) => {
      httpRequest({ port, method, path: '/api/session' }, (answer) => resolve(answer.statusCode))
        .on('error', reject)
        .end();
    });
    expect(status).toBe(405);
  }
  server.close();
  server.closeAllConnections();
});

test('when a page is posted to, then there is nothing to post to', async () => {
  expect(
    (
      await supertest(await withClient())
        .post('/studies')
        .send({})
    ).status,
  ).toBe(404);
});

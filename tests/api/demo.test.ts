import { expect, test } from 'vitest';
import { createTestApp } from '../support/app';
import { somebody } from '../support/people';

const IN_EARNEST = {
  DEMO: 'off',
  PUBLIC_URL: 'http://localhost:3000',
  SMTP_URL: 'smtp://127.0.0.1:9',
  MAIL_FROM: 'siltline@siltline.example',
};

test('when this is the demonstration, then it says so and tells how to enter', async () => {
  const visitor = somebody(await createTestApp());
  expect((await visitor.send('GET', '/api/session')).body).toEqual({ account: null, demo: true });
  const { body } = await visitor.send('GET', '/api/demo/people');
  expect(Array.isArray(body.people)).toBe(true);
  expect((await visitor.send('GET', '/api/demo/mails')).body).toEqual({ mails: [] });
});

test('when it runs in earnest, then there are neither hints nor a mail page', async () => {
  const visitor = somebody(await createTestApp(IN_EARNEST));
  expect((await visitor.send('GET', '/api/session')).body).toEqual({ account: null, demo: false });
  for (const path of ['/api/demo/people', '/api/demo/mails']) {
    expect((await visitor.send('GET', path)).status).toBe(404);
  }
});

import { expect, test } from 'vitest';
import { createClosing } from '#server/setup/closing';

test('when things are closed, then in reverse order, each once, whatever fails', async () => {
  const closed: string[] = [];
  const failures: unknown[] = [];
  const closing = createClosing();
  closing.add(() => closed.push('database'));
  closing.add(() => Promise.reject(new Error('pool')));
  closing.add(async () => closed.push('server'));
  await closing.run((error) => failures.push(error));
  await closing.run((error) => failures.push(error));
  expect(closed).toEqual(['server', 'database']);
  expect(failures).toEqual([new Error('pool')]);
});

test('when a step takes longer than its patience, then the next one is not kept waiting', async () => {
  const closed: string[] = [];
  const failures: string[] = [];
  const closing = createClosing();
  closing.add(() => closed.push('database'));
  closing.add(() => new Promise<never>(() => undefined), 1);
  await closing.run((error) => failures.push(String(error)));
  expect(closed).toEqual(['database']);
  expect(failures).toEqual(['Error: It took longer than 1 ms.']);
});

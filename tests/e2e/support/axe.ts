import { readFileSync } from 'node:fs';
import { createRequire } from 'node:module';
import type { Page } from '@playwright/test';
import type { AxeResults } from 'axe-core';

const AXE = readFileSync(createRequire(import.meta.url).resolve('axe-core/axe.min.js'), 'utf8');

declare global {
  interface Window {
    readonly axe: { run(): Promise<AxeResults> };
  }
}

/** What the checker of accessibility finds on the page as it stands: each rule with the first place. */
export async function barriersOn(page: Page): Promise<readonly string[]> {
  await page.evaluate(AXE);
  const { violations } = await page.evaluate(() => window.axe.run());
  return violations.map(({ id, help, nodes }) => `${id}: ${help}: ${nodes[0]?.html ?? ''}`);
}

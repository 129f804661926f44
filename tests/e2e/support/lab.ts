import { expect, type Page } from '@playwright/test';

/** One partial as the page shows it. */
export interface PlottedPartial {
  readonly note: string;
  readonly n: number;
  readonly frequencyHz: number;
  /** Under the loudest. */
  readonly levelDb: number;
}

/** Types a line of notes over the chord on the bench. */
export async function typeNotes(page: Page, line: string): Promise<void> {
  const notes = page.getByLabel('Notes', { exact: true });
  await notes.fill(line);
  await notes.press('Enter');
  await expect(page.getByRole('button', { name: 'Hold', exact: true })).toBeEnabled();
}

function figure(text: string | undefined): number {
  return Number.parseFloat((text ?? '').replace('−', '-').replaceAll(/[^0-9.-]/g, ''));
}

/** The partials of the chord on the bench, as its table of overtones gives them. */
export async function plottedPartials(page: Page): Promise<readonly PlottedPartial[]> {
  const table = page.getByRole('button', { name: 'Table', exact: true });
  await table.click();
  const rows = await page
    .getByRole('region', { name: 'Overtones as a table' })
    .locator('tbody tr')
    .evaluateAll((found) => found.map((row) => [...row.children].map((cell) => cell.textContent.trim())));
  await table.click();
  return rows.map(([note = '', n, frequency, level]) => ({
    note,
    n: figure(n),
    frequencyHz: figure(frequency),
    levelDb: figure(level),
  }));
}

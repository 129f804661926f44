import { expect, test, type Page } from '@playwright/test';
import { barriersOn } from './support/axe';

async function openReference(page: Page): Promise<void> {
  await page.goto('/');
  await page.getByRole('link', { name: 'Reference' }).click();
  await expect(page.getByRole('heading', { level: 1, name: 'Reference' })).toBeVisible();
}

async function isWithinWidth(page: Page): Promise<void> {
  const over = await page.evaluate(
    () => document.documentElement.scrollWidth - document.documentElement.clientWidth,
  );
  expect(over).toBe(0);
}

test('a reader finds the fit, its figures and a published value that can be checked', async ({ page }) => {
  await openReference(page);
  await expect(page).toHaveTitle(/Reference/);
  await expect(page.getByRole('img', { name: /Lowest lower notes of 15 intervals/ })).toBeVisible();
  const fit = page.getByRole('region', { name: 'The plot in figures: lower notes' });
  await expect(fit.locator('tbody tr')).toHaveCount(15);

  // Harrison & Pearce 2020 test Hutchinson & Knopoff’s measure with 0.120 for 60 64 67 and 11 exact partials.
  await page.getByLabel('Notes', { exact: true }).fill('C4 E4 G4');
  await expect(page.locator('output')).toHaveText(/^0\.120/);
  await page.getByLabel('Measure', { exact: true }).selectOption('hutchinsonKnopoffRounded');
  await expect(page.locator('output')).toHaveText(/^0\.0870/);
  await page.getByLabel('Notes', { exact: true }).fill('C4 Q4');
  await expect(page.getByText('“Q4” is neither a note')).toBeVisible();
  await expect(page.locator('output')).toHaveCount(0);
  expect(await barriersOn(page)).toEqual([]);
});

test('when a part is chosen from the contents with the keyboard, then the page goes there, as its address does', async ({
  page,
}) => {
  await openReference(page);
  await page
    .getByRole('navigation', { name: 'On this page' })
    .getByRole('link', { name: 'Cautions' })
    .focus();
  await page.keyboard.press('Enter');
  await expect(page).toHaveURL(/\/reference#cautions$/);
  await expect(page.getByRole('heading', { name: 'Cautions' })).toBeInViewport();
  await page.goto('/reference#tables');
  await expect(page.getByRole('heading', { name: 'Limits, ranges, sections, bodies' })).toBeInViewport();
});

test.describe('in the dark, on a phone', () => {
  test.use({ viewport: { width: 390, height: 844 }, colorScheme: 'dark' });

  test('when the page is read, then nothing runs out of it and nobody is kept out', async ({ page }) => {
    await openReference(page);
    await expect(page.getByRole('img', { name: /Lowest lower notes/ })).toBeVisible();
    await isWithinWidth(page);
    expect(await barriersOn(page)).toEqual([]);
  });
});

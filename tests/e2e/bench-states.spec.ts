import { expect, test, type Page } from '@playwright/test';
import { barriersOn } from './support/axe';
import { typeNotes } from './support/lab';

const CHORD = 'DB C2, Vc E2 G2, Va E3+B3, Vn2 G4, Vn1 C5';
const NOTES = 7;
const SIZES = [
  [1440, 900],
  [1024, 768],
  [390, 844],
] as const;
const THEMES = ['light', 'dark'] as const;

/** Keeps the screen as it is, for somebody to look at, and asks the checker. */
async function look(page: Page, state: string): Promise<void> {
  const body = await page.screenshot({ animations: 'disabled' });
  await test.info().attach(state, { body, contentType: 'image/png' });
  expect.soft(await barriersOn(page), state).toEqual([]);
}

/** The engraving has come: it is the last thing that does. */
async function untilDrawn(page: Page): Promise<void> {
  const wide = (page.viewportSize()?.width ?? 0) >= 1280;
  await expect(page.locator('canvas').first()).toBeVisible();
  if (wide) await expect(page.locator('.system .vf-notehead')).toHaveCount(NOTES);
}

for (const [width, height] of SIZES)
  for (const colorScheme of THEMES)
    test.describe(`${width}x${height} ${colorScheme}`, () => {
      test.use({ viewport: { width, height }, colorScheme });

      test('the bench, full, is kept as a picture', async ({ page }) => {
        await page.goto('/');
        await typeNotes(page, CHORD);
        if (width >= 720) await untilDrawn(page);
        await look(page, 'the full bench');
      });
    });

for (const colorScheme of THEMES)
  test.describe(`each state of the bench, ${colorScheme}`, () => {
    test.use({ viewport: { width: 1440, height: 900 }, colorScheme });

    test.beforeEach(async ({ page }) => {
      await page.goto('/');
      await typeNotes(page, CHORD);
      await untilDrawn(page);
    });

    test('when a note is selected, the room, the open strings or the table is shown, then nobody is kept out', async ({
      page,
    }) => {
      await page.getByRole('slider', { name: /E2/ }).first().click();
      await look(page, 'a note selected');
      await page.getByRole('button', { name: 'Room', exact: true }).click();
      await look(page, 'the room above a note');
      await page.getByRole('button', { name: 'Open strings' }).click();
      await look(page, 'the open strings');
      await page.getByRole('button', { name: 'Table', exact: true }).click();
      await look(page, 'the table of overtones');
    });

    test('when the score, the guess or the help sheet is open, then nobody is kept out', async ({ page }) => {
      const score = page.getByRole('button', { name: 'Score', exact: true });
      await score.click();
      await expect(page.getByRole('region', { name: 'Score' })).toBeVisible();
      await look(page, 'the score');
      await score.click();
      await page.getByRole('button', { name: 'Guess first' }).click();
      await expect(page.getByText('Listen, then guess')).toBeVisible();
      await look(page, 'the guess');
      await page.getByRole('button', { name: 'Guess first' }).click();
      await page.locator('body').press('?');
      await expect(page.getByRole('dialog')).toBeVisible();
      await look(page, 'the help sheet');
    });
  });

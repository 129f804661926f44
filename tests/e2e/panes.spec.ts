import { expect, test, type Page } from '@playwright/test';
import { typeNotes } from './support/lab';

const CHORD = 'DB E2, Vc B2, Va G3, Vn2 C4, Vn1 E4';

async function open(page: Page): Promise<void> {
  await page.goto('/');
  await typeNotes(page, CHORD);
}

const note = (page: Page, name: string) => page.getByRole('slider', { name, exact: true });
const meetings = (page: Page) => page.getByRole('list', { name: 'What its partials meet' });

test('when a note is under the pointer, then its series stands alone with what its partials meet', async ({
  page,
}) => {
  await open(page);
  await note(page, 'E2').hover();
  // The third partial of E2 is the second of B2, but for the tempered fifth.
  await expect(meetings(page)).toContainText(/Partial 3, 247 Hz, meets partial 2 of the cellos’ B2/);
  await page.getByRole('heading', { name: 'Sections' }).hover();
  await expect(meetings(page)).toHaveCount(0);
});

test('when a note has the focus, then the same is told, and the room that it needs', async ({ page }) => {
  await open(page);
  await note(page, 'E2').focus();
  await expect(meetings(page)).toContainText('Partial 3');
  await page.getByRole('button', { name: 'Room', exact: true }).click();
  await expect(
    page.getByRole('img', { name: /^Room above E2, double basses with cellos above: / }).first(),
  ).toBeVisible();
});

test('when the axis is fitted by a key, then the notes stand further apart, and 0 brings all back', async ({
  page,
}) => {
  await open(page);
  const height = async (name: string) => (await note(page, name).boundingBox())?.y ?? NaN;
  const apart = async () => (await height('E2')) - (await height('E4'));
  await note(page, 'E2').focus();
  const before = await apart();
  await page.keyboard.press('z');
  await expect.poll(apart).toBeGreaterThan(before * 1.5);
  await page.keyboard.press('0');
  await expect.poll(apart).toBeCloseTo(before, 0);
});

test('when the wheel is turned with Ctrl, then the axis comes closer, and the page does not', async ({
  page,
}) => {
  await open(page);
  await note(page, 'G3').hover();
  await page.keyboard.down('Control');
  await page.mouse.wheel(0, -400);
  await page.keyboard.up('Control');
  await expect(page.getByRole('button', { name: 'All', exact: true })).toBeVisible();
  expect(await page.evaluate(() => window.visualViewport?.scale)).toBe(1);
});

test('when the open strings are asked, then natural harmonics of the chord’s notes are told', async ({
  page,
}) => {
  await open(page);
  await page.getByRole('button', { name: 'Open strings' }).click();
  const offers = page.getByRole('region', { name: 'Natural harmonics of the open strings for this chord' });
  // The fifth partial of the cellos' C string: E4, 14 cents low.
  await expect(offers.getByRole('row', { name: /E4, −14 cents .*cellos C2 5 / })).toBeVisible();
});

test('when a study is given a limit of its own, then its findings follow, and its line says so', async ({
  page,
}) => {
  await open(page);
  await page.getByRole('button', { name: /^Setting: / }).click();
  await page.getByRole('button', { name: 'Limits', exact: true }).click();
  // The fifth E2–B2 keeps the chart's B♭1, and not F2.
  await page.getByLabel('fifth, here not below', { exact: true }).selectOption({ label: 'F2' });
  await page.getByRole('button', { name: 'Close', exact: true }).click();
  await expect(
    page.getByText(/E2 and the cellos’ B2, a fifth, stand 1 semitone under their low limit/),
  ).toBeVisible();
  await expect(page.getByText(/own low limits/)).toBeVisible();
});

test('when the root is played elsewhere, then the lowest note is tested against it', async ({ page }) => {
  await open(page);
  await page.getByRole('button', { name: /^This chord: / }).click();
  await page.getByLabel('Root elsewhere').selectOption('C');
  await expect(page.getByText('With the root C played elsewhere, the double basses’ E2')).toBeVisible();
});

test.describe('by touch', () => {
  test.use({ hasTouch: true, viewport: { width: 390, height: 844 } });

  test('when the axis is fitted and a note tapped, then all stays in reach of a thumb', async ({ page }) => {
    await open(page);
    await page.getByRole('button', { name: 'Fit', exact: true }).tap();
    await note(page, 'E2').tap();
    await expect(page.getByRole('group', { name: /The selected note, E2/ })).toBeVisible();
    await page.getByRole('button', { name: 'All', exact: true }).tap();
    await expect(page.getByRole('button', { name: 'All', exact: true })).toHaveCount(0);
  });
});

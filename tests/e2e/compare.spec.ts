import { expect, test, type Page } from '@playwright/test';
import { barriersOn } from './support/axe';
import { typeNotes } from './support/lab';

const CLOSE = 'DB D2, Vc F2 A2, Va D3, Vn2 A3, Vn1 D4';
const OPEN = 'DB D2, Vc D3, Va A3, Vn2 F4, Vn1 D5';

const head = (page: Page) => page.getByRole('region', { name: 'Compared voicings' });
const foot = (page: Page) => page.getByRole('region', { name: 'Comparison of A and B' });

/** A voicing held, and another in its place. */
async function holdAndOpen(page: Page): Promise<void> {
  await page.goto('/');
  await typeNotes(page, CLOSE);
  await page.getByRole('button', { name: 'Compare', exact: true }).click();
  await expect(head(page)).toBeVisible();
  await typeNotes(page, OPEN);
}

test('when a voicing is held and changed, then both lie on one axis and the change is told', async ({
  page,
}) => {
  await holdAndOpen(page);
  await expect(foot(page)).toContainText('B is clearer than A.');
  await expect(foot(page)).toContainText('The first violins’ D4 moves up an octave, to D5.');
  await expect(page.locator('.ring').first()).toBeVisible();
  await expect(page.locator('.ghost').first()).toBeVisible();
  const rows = foot(page).getByRole('row', { name: /^Pairs under their low limit/ });
  await expect(rows).toHaveText(/3\s*0/);

  await foot(page).getByRole('button', { name: 'A: Bring its notes back' }).click();
  await expect(foot(page)).toContainText('B sounds the same as A.');
  await page.getByRole('button', { name: 'Undo', exact: true }).first().click();
  await expect(foot(page)).toContainText('B is clearer than A.');
  expect(await barriersOn(page)).toEqual([]);
});

test('when the keys alone are used, then a voicing is held, heard in turn with the other, and let go', async ({
  page,
}) => {
  await page.goto('/');
  await typeNotes(page, CLOSE);
  await page.getByLabel('Notes', { exact: true }).blur();
  await page.keyboard.press('c');
  await expect(head(page)).toBeVisible();
  await page.getByRole('slider', { name: 'D4' }).focus();
  await page.keyboard.press('Shift+ArrowUp');
  await expect(foot(page)).toContainText('moves up an octave, to D5.');
  await page.keyboard.press('x');
  await expect(head(page).getByRole('button', { name: 'Sounds: A' })).toBeVisible();
  await page.keyboard.press('x');
  await expect(head(page).getByRole('button', { name: 'Sounds: B' })).toBeVisible();
  await page.keyboard.press('Escape');
  await expect(head(page).getByRole('button', { name: 'Hear A, B' })).toBeVisible();
  await page.keyboard.press('c');
  await expect(head(page)).toBeHidden();
});

test('when two chords of the progression are compared, then the address opens the same comparison', async ({
  page,
}) => {
  await page.goto('/');
  await typeNotes(page, CLOSE);
  await page.getByRole('button', { name: 'Add a chord like this one' }).click();
  await typeNotes(page, OPEN);
  await page.getByRole('button', { name: 'Compare', exact: true }).click();
  // The second was a copy of the first before it was changed.
  await expect(head(page)).toContainText('as it was before your changes');
  await expect(foot(page)).toContainText('B is clearer than A.');
  await foot(page).getByRole('button', { name: 'Hold it as it is now' }).click();
  await expect(head(page)).toContainText('as it was when held');
  await page.locator('[data-chord]').first().click();
  await expect(foot(page)).toContainText('B is more clouded than A.');
  await expect(page).toHaveURL(/[?&]a=[^&]+&b=/);
  await page.reload();
  await expect(foot(page)).toContainText('B is more clouded than A.');

  await head(page)
    .getByRole('button', { name: /^Choose B/ })
    .click();
  const dialog = page.getByRole('dialog', { name: 'Lay which voicing beside it as B?' });
  await dialog.getByRole('button', { name: /Chord 2/ }).click();
  await expect(foot(page)).toContainText('B sounds the same as A.');
});

test('when several voicings stand side by side, then the clearest is named and one goes to the bench', async ({
  page,
}) => {
  await page.goto('/');
  await typeNotes(page, CLOSE);
  await page.getByRole('button', { name: 'Add a chord like this one' }).click();
  await typeNotes(page, OPEN);
  await page.getByRole('button', { name: 'Compare', exact: true }).click();
  await page.getByRole('button', { name: 'Side by side' }).click();
  const beside = page.getByRole('region', { name: 'Voicings side by side' });
  await beside.getByRole('button', { name: 'Take the progression' }).click();
  await expect(beside.getByRole('listitem')).toHaveCount(2);
  await expect(beside.getByRole('status')).toHaveText('Clearest: Chord 2.');
  await beside.getByLabel('the clearest first').check();
  await expect(beside.getByRole('listitem').first()).toContainText('Chord 2');
  await beside.getByRole('button', { name: 'Bench Chord 1' }).click();
  await expect(page.getByLabel('Notes', { exact: true })).toHaveValue(CLOSE);
  expect(await barriersOn(page)).toEqual([]);
});

test('when two are heard blind, then nothing tells until the answer, and chance is named', async ({
  page,
}) => {
  await holdAndOpen(page);
  await head(page).getByRole('button', { name: 'Blind' }).click();
  const dialog = page.getByRole('dialog', { name: 'Which is clearer?' });
  await expect(dialog).toBeVisible();
  await expect(dialog.getByRole('button', { name: '1 is clearer' })).toBeDisabled();
  await page.keyboard.press('1');
  await expect(dialog.getByRole('button', { name: 'Hear 1' })).toHaveAttribute('aria-pressed', 'true');
  await page.keyboard.press('x');
  await expect(dialog.getByRole('button', { name: 'Hear 2' })).toHaveAttribute('aria-pressed', 'true');
  await dialog.getByRole('button', { name: '1 is clearer' }).click();
  await expect(dialog).toContainText(/1 was [AB] \(Chord 1\), 2 was [AB] \(Chord 1\)\./);
  await expect(dialog).toContainText('By guessing alone');
  await dialog.getByRole('button', { name: 'Another round' }).click();
  await expect(dialog.getByRole('button', { name: '1 is clearer' })).toBeDisabled();
});

test('when the screen is a phone’s, then each pane lies over the held one by itself', async ({ page }) => {
  await page.setViewportSize({ width: 390, height: 844 });
  await holdAndOpen(page);
  await expect(page.locator('.ghost').first()).toBeVisible();
  await page.getByRole('button', { name: 'Muddiness', exact: true }).click();
  await expect(page.locator('.outline').first()).toBeVisible();
  await expect(page.locator('.change').first()).toContainText(/^A \d+: /);
});

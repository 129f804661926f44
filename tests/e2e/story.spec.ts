import { expect, test, type Browser, type Page } from '@playwright/test';
import { typeNotes } from './support/lab';
import { record, tapSound } from './support/recording';
import { peakOf } from './support/spectrum';

const LOW_THIRD = 'DB C2, Vc E2, Va G3, Vn2 C4, Vn1 E4';

/** The figure of a register on the bench. */
async function registerFigure(page: Page, register: string): Promise<number> {
  const bar = page.getByRole('list', { name: /Muddiness by register/ }).getByRole('listitem');
  const text = await bar.filter({ hasText: register }).locator('.figure').textContent();
  return Number(text);
}

async function signUp(page: Page, email: string, password: string): Promise<void> {
  await page.getByRole('link', { name: 'Sign up' }).first().click();
  await page.getByLabel('Name', { exact: true }).fill('Nora Quill');
  await page.getByLabel('E-mail', { exact: true }).fill(email);
  await page.getByLabel('Password', { exact: true }).fill(password);
  await page.getByRole('radio', { name: /composer/i }).click();
  await page.getByRole('button', { name: 'Sign up', exact: true }).click();
  await expect(page.getByRole('heading', { name: 'Look at your mail' })).toBeVisible();
}

/** Follows the link in the newest mail to this address, as the demonstration shows it. */
async function followMail(page: Page, email: string): Promise<void> {
  await page.goto('/mail');
  const mail = page.getByRole('article').filter({ hasText: email }).first();
  await mail.getByRole('link').click();
}

async function confirmAndSignIn(page: Page, email: string, password: string): Promise<void> {
  await followMail(page, email);
  await page.getByLabel('Password', { exact: true }).fill(password);
  await page.getByRole('button', { name: 'Confirm and sign in', exact: true }).click();
}

/** A second person at a second machine. */
async function enterAs(browser: Browser, name: string): Promise<Page> {
  const context = await browser.newContext();
  const page = await context.newPage();
  await page.goto('/sign-in');
  await page.getByRole('button', { name: `Enter as ${name}` }).click();
  await expect(page.getByRole('link', { name: 'Studies' })).toBeVisible();
  return page;
}

test('a visitor finds a low third clouded, hears it, keeps it, shares it and is answered', async ({
  page,
  browser,
}) => {
  test.setTimeout(180_000);
  const email = 'nora.quill@averhythe.example';
  const password = 'under the ninth pier';
  await tapSound(page);
  await page.goto('/');

  await typeNotes(page, LOW_THIRD);
  await expect.poll(() => registerFigure(page, 'great')).toBeGreaterThan(75);
  expect(await registerFigure(page, 'two-line')).toBeLessThan(25);
  await expect(page.getByText(/C2 and the cellos’ E2.*10 semitones under/).first()).toBeVisible();

  await page.getByRole('button', { name: 'Hold', exact: true }).click();
  await expect.poll(async () => peakOf(await record(page, 0.2))).toBeGreaterThan(1e-4);
  await page.getByRole('button', { name: 'Stop', exact: true }).click();

  await page.reload();
  await expect(page.getByLabel('Notes', { exact: true })).toHaveValue(LOW_THIRD);

  await signUp(page, email, password);
  await confirmAndSignIn(page, email, password);
  await expect(page).toHaveURL(/\/studies\/[\w-]+$/);
  await expect(page.getByLabel('Notes', { exact: true })).toHaveValue(LOW_THIRD);

  await page.getByRole('button', { name: 'Change the title' }).click();
  await page.getByLabel('Title of the study').fill('Under the pier');
  await page.getByLabel('Title of the study').press('Enter');
  await expect(page.getByRole('status').filter({ hasText: /Saved .*save 2/ })).toBeVisible();

  await page.getByRole('button', { name: 'Share', exact: true }).click();
  const dialog = page.getByRole('dialog');
  await dialog.getByLabel('With whom').fill('corin@saltern.example');
  await dialog.getByRole('radio', { name: /write remarks/ }).click();
  await dialog.getByRole('button', { name: 'Share', exact: true }).click();
  await expect(dialog.getByText('corin@saltern.example')).toBeVisible();
  await page.keyboard.press('Escape');
  await page.getByRole('button', { name: 'Talk' }).click();

  const corin = await enterAs(browser, 'Corin Wexley');
  await corin.getByRole('link', { name: 'Studies' }).click();
  await corin.getByRole('link', { name: 'Under the pier' }).click();
  await expect(corin.getByLabel('Notes', { exact: true })).toHaveValue(LOW_THIRD);
  await corin.getByRole('button', { name: 'Talk' }).click();
  await corin.getByLabel(/Say something about (?!the study)/).fill('Give the third to the violas.');
  await corin.getByRole('button', { name: 'Write' }).first().click();
  await expect(corin.getByText('Give the third to the violas.')).toBeVisible();

  const remark = page.getByRole('listitem').filter({ hasText: 'Give the third to the violas.' });
  await expect(remark).toBeVisible();
  await expect(remark).toContainText('Corin Wexley');
  await corin.context().close();
});

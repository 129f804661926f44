import { expect, test, type Page } from '@playwright/test';
import { barriersOn } from './support/axe';
import { typeNotes } from './support/lab';

const FOR_VISITORS = [
  ['/sign-in', 'Sign in'],
  ['/sign-up', 'Sign up'],
  ['/forgotten-password', 'Forgotten password'],
  ['/reset-password', /password/i],
  ['/confirm', 'Confirm your address'],
  ['/mail', 'Mail'],
  ['/reference', 'Reference'],
  ['/nowhere', 'There is nothing at this address'],
] as const;

const SIZES = [
  { name: 'at a desk, in the light', width: 1440, height: 900, colorScheme: 'light' },
  { name: 'on a small screen, in the dark', width: 1024, height: 768, colorScheme: 'dark' },
  { name: 'on a phone, in the dark', width: 390, height: 844, colorScheme: 'dark' },
  { name: 'on a phone, in the light', width: 390, height: 844, colorScheme: 'light' },
] as const;

async function hasNoBarriers(page: Page, where: string): Promise<void> {
  expect(await barriersOn(page), where).toEqual([]);
}

async function enterAsTeacher(page: Page): Promise<void> {
  await page.goto('/sign-in');
  await page.getByRole('button', { name: 'Enter as Isolde Marchbank' }).click();
  await expect(page.getByRole('link', { name: 'Studies' })).toBeVisible();
}

for (const { name, width, height, colorScheme } of SIZES) {
  test.describe(name, () => {
    test.use({ viewport: { width, height }, colorScheme });
    test.setTimeout(180_000);

    test('a visitor meets no barriers on any page, with an empty bench and a full one', async ({ page }) => {
      for (const [path, heading] of FOR_VISITORS) {
        await page.goto(path);
        await expect(page.getByRole('heading', { level: 1, name: heading })).toBeVisible();
        await hasNoBarriers(page, path);
      }
      await page.goto('/');
      await expect(page.getByLabel('Notes', { exact: true })).toBeVisible();
      await hasNoBarriers(page, 'the empty bench');
      await typeNotes(page, 'DB C2, Vc E2 G2, Va E3+B3, Vn2 G4, Vn1 C5');
      await hasNoBarriers(page, 'the full bench');
      await page.getByLabel('Notes', { exact: true }).fill('DB H12, Xx C2');
      await hasNoBarriers(page, 'the bench with faults in its line');
    });

    test('somebody signed in meets no barriers in their studies, the talk and the sharing', async ({
      page,
    }) => {
      await enterAsTeacher(page);
      await page.getByRole('link', { name: 'Studies' }).click();
      await expect(page.getByRole('link', { name: 'Over a held G' })).toBeVisible();
      await hasNoBarriers(page, 'the studies');
      await page.getByRole('link', { name: 'Over a held G' }).click();
      await page.getByRole('button', { name: 'Talk' }).click();
      await expect(page.getByRole('complementary', { name: 'Talk' })).toBeVisible();
      await hasNoBarriers(page, 'the talk');
      await page.getByRole('button', { name: 'Share', exact: true }).click();
      await expect(page.getByRole('dialog').getByText('petra@saltern.example')).toBeVisible();
      await hasNoBarriers(page, 'the sharing');
    });
  });
}

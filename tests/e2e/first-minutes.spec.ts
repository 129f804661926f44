import { expect, test, type Page } from '@playwright/test';
import { barriersOn } from './support/axe';
import { typeNotes } from './support/lab';

const line = (page: Page) => page.getByLabel('Notes', { exact: true });
const begin = (page: Page) => page.getByRole('region', { name: 'Three ways to begin' });
const step = (page: Page, title: string) => page.getByRole('dialog', { name: title });
const lanesTop = async (page: Page) =>
  (await page.getByRole('region', { name: 'Bench' }).boundingBox())?.y ?? null;

const STEPS = ['Notes in', 'Where it clouds', 'Why', 'What helps', 'Hear it, keep it'] as const;

test('by mouse, an example lies on the bench in one click, and the bench stays where it is', async ({
  page,
}) => {
  await page.goto('/');
  await expect(begin(page)).toBeVisible();
  const before = await lanesTop(page);
  await begin(page).getByRole('button', { name: 'D minor, close and low' }).click();
  await expect(line(page)).toHaveValue('DB D2, Vc F2 A2, Va D3, Vn2 A3, Vn1 D4');
  await expect(begin(page)).toBeHidden();
  expect(await lanesTop(page)).toBe(before);
  await page.getByRole('button', { name: 'Undo' }).click();
  await expect(begin(page)).toBeVisible();
});

test('by keyboard, a chord is dealt from the empty bench; what cannot be read is told there', async ({
  page,
}) => {
  await page.goto('/');
  const symbol = begin(page).getByLabel('Deal a chord');
  await symbol.focus();
  await page.keyboard.type('Hx99');
  await page.keyboard.press('Enter');
  await expect(begin(page).getByRole('alert')).not.toBeEmpty();
  await symbol.fill('Dm7');
  await page.keyboard.press('Enter');
  await expect(line(page)).toHaveValue(/^DB \S+, Vc \S+, Va \S+, Vn2 \S+, Vn1 \S+$/);
  await expect(page.getByRole('button', { name: 'Play chord' })).toBeFocused();
});

test('by mouse, the tour goes through five steps on a lent example, which undo takes away', async ({
  page,
}) => {
  await page.goto('/');
  await begin(page).getByRole('button', { name: 'Tour' }).click();
  await expect(line(page)).not.toHaveValue('');
  for (const title of STEPS) {
    await expect(step(page, title)).toBeVisible();
    if (title === 'Where it clouds') expect(await barriersOn(page)).toEqual([]);
    await step(page, title)
      .getByRole('button', { name: title === STEPS.at(-1) ? 'Done' : 'Next' })
      .click();
  }
  await expect(page.getByRole('dialog')).toBeHidden();
  await expect(page.getByRole('button', { name: 'Play chord' })).toBeFocused();
  await page.getByRole('button', { name: 'Undo' }).click();
  await expect(begin(page).getByRole('button', { name: 'Tour', exact: true })).toBeVisible();
});

test('by keyboard, the tour is left at any step, keeps the notes, and goes on there another day', async ({
  page,
}) => {
  await page.goto('/');
  await typeNotes(page, 'Vc C2 E2');
  await page.getByRole('button', { name: 'Play chord' }).focus();
  await page.keyboard.press('t');
  await expect(step(page, 'Notes in').getByRole('button', { name: 'Next' })).toBeFocused();
  await page.keyboard.press('Enter');
  await expect(step(page, 'Where it clouds').getByRole('button', { name: 'Next' })).toBeFocused();
  await page.keyboard.press('ArrowRight');
  await expect(step(page, 'Why').getByRole('button', { name: 'Next' })).toBeFocused();
  await page.keyboard.press('Tab');
  await expect(step(page, 'Why').locator(':focus')).toBeVisible();
  await page.keyboard.press('Escape');
  await expect(page.getByRole('dialog')).toBeHidden();
  await expect(page.getByRole('button', { name: 'Play chord' })).toBeFocused();
  await expect(line(page)).toHaveValue('Vc C2 E2');

  await page.reload();
  await expect(page.getByRole('button', { name: 'Play chord' })).toBeEnabled();
  await expect(page.getByRole('dialog')).toBeHidden();
  await page.keyboard.press('?');
  await page.getByRole('dialog', { name: 'Keys' }).getByRole('button', { name: 'Take the tour' }).click();
  await expect(step(page, 'Why')).toBeVisible();
  await step(page, 'Why').getByRole('button', { name: 'Leave' }).click();
  await expect(page.getByRole('dialog')).toBeHidden();
});

test('a tip tells the reason beside a low third, and once put away it stays away', async ({ page }) => {
  await page.goto('/');
  const tip = page.getByRole('complementary', { name: 'Tip' });
  await typeNotes(page, 'Vc C2 E2');
  await expect(tip).toContainText('a wide bottom');
  await expect(tip).toContainText('Common practice');
  const before = await lanesTop(page);
  await tip.getByRole('button', { name: 'Do not show again' }).click();
  await expect(tip).not.toContainText('a wide bottom');
  expect(await lanesTop(page)).toBe(before);
  await page.reload();
  await expect(tip).toContainText('opened to a tenth');
});

test.describe('on a phone', () => {
  test.use({ viewport: { width: 390, height: 844 }, hasTouch: true, isMobile: true });

  test('the ways to begin lie at the foot, and the tour finds what is there', async ({ page }) => {
    await page.goto('/');
    const before = await lanesTop(page);
    await begin(page).getByRole('button', { name: 'The same, opened' }).tap();
    await expect(begin(page)).toBeHidden();
    expect(await lanesTop(page)).toBe(before);
    await page.getByRole('button', { name: 'How notes are written' }).tap();
    await page.getByRole('button', { name: 'Tour of the Lab' }).tap();
    for (const title of STEPS) {
      await expect(step(page, title)).toBeInViewport();
      await step(page, title)
        .getByRole('button', { name: title === STEPS.at(-1) ? 'Done' : 'Next' })
        .tap();
    }
    await expect(page.getByRole('dialog')).toBeHidden();
  });
});

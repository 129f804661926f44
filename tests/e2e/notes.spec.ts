import { expect, test, type Page } from '@playwright/test';
import { typeNotes } from './support/lab';

const line = (page: Page) => page.getByLabel('Notes', { exact: true });
const note = (page: Page, name: string) => page.getByRole('slider', { name, exact: true });
const hand = (page: Page) => page.getByRole('group', { name: /selected note/ });

/** The choices of how a note is played are seen as soon as their menu is open: nothing has to be scrolled. */
async function expectAllInSight(page: Page) {
  const menu = page.getByRole('dialog', { name: 'How it is played' });
  const choices = ['Contact', 'Muted (con sordino)', 'Stroke', 'Harmonic', 'Dynamic'];
  for (const label of choices) {
    const choice = menu.getByLabel(label, { exact: true });
    await expect(choice).toBeInViewport({ ratio: 1 });
    await choice.click({ trial: true });
  }
}

test('by mouse, notes are dragged, played otherwise, selected together, copied and transposed', async ({
  page,
}) => {
  await page.goto('/');
  await typeNotes(page, 'DB D2, Vc A2 F3');

  // Hovering waits until nothing moves any more.
  await note(page, 'F3').hover();
  const box = await note(page, 'F3').boundingBox();
  if (!box) throw new Error('F3 is not on the bench');
  const [x, y] = [box.x + box.width / 2, box.y + box.height / 2];
  await page.mouse.move(x, y);
  await page.mouse.down();
  await page.mouse.move(x, y - 40, { steps: 4 });
  await expect(page.locator('.told')).toContainText(/Hz, strings? /);
  await page.mouse.up();
  await expect(line(page)).not.toHaveValue(/F3/);
  await page.getByRole('button', { name: 'Undo' }).click();
  await expect(line(page)).toHaveValue('DB D2, Vc A2 F3');

  await note(page, 'A2').click();
  await page.getByRole('button', { name: /How it is played/ }).click();
  await expectAllInSight(page);
  await page.getByLabel('Dynamic', { exact: true }).selectOption('pp');
  await page.getByRole('button', { name: 'Solo', exact: true }).click();
  await expect(line(page)).toHaveValue('DB D2, Vc A2[solo pp] F3');
  await page.keyboard.press('Escape');

  await note(page, 'F3').click({ modifiers: ['Shift'] });
  await expect(hand(page)).toContainText('2 notes');
  await hand(page).getByRole('button', { name: 'Octave up' }).click();
  await expect(line(page)).toHaveValue('DB D2, Vc A3[solo pp] F4');
});

test('by keyboard alone, one gets from a chord symbol to the lanes, joins, copies and pastes', async ({
  page,
}) => {
  await page.goto('/');
  await expect(line(page)).toBeVisible();
  await page.keyboard.press('n');
  await expect(line(page)).toBeFocused();
  await page.keyboard.type('Dm7 close');
  await expect(page.getByText('Dm7: D F A C, in close position.')).toBeVisible();
  await page.keyboard.press('Enter');
  await expect(line(page)).toHaveValue(/^DB D2, Vc \S+, Va \S+, Vn2 \S+, Vn1 \S+$/);

  await line(page).fill('Vc D3 A3');
  await page.keyboard.press('Enter');
  await page.keyboard.press('Tab');
  await page.keyboard.press('l');
  await expect(note(page, 'D3')).toBeFocused();
  await page.keyboard.press('ArrowUp');
  await expect(line(page)).toHaveValue('Vc E♭3 A3');
  await page.keyboard.press('ArrowDown');
  await page.keyboard.press('j');
  await expect(line(page)).toHaveValue('Vc D3+A3');
  await page.keyboard.press('k');
  await expect(line(page)).toHaveValue('Vc D3[locked]+A3');
  await page.keyboard.press('k');
  await page.keyboard.press('Control+c');
  await page.keyboard.press('Control+v');
  await expect(line(page)).toHaveValue('Vc D3+A3 D3');
  await page.keyboard.press('Control+z');
  await expect(line(page)).toHaveValue('Vc D3+A3');

  await page.keyboard.press('?');
  await expect(page.getByRole('dialog').getByText('the notes line')).toBeVisible();
});

test('what cannot be read is told with its place, and nothing below moves', async ({ page }) => {
  await page.goto('/');
  await typeNotes(page, 'Vc A2');
  const before = await page.getByRole('region', { name: 'Bench' }).boundingBox();
  await line(page).fill('Vc Xylophone3 F9, Va [loud');
  await line(page).press('Enter');
  await expect(page.getByText('“F9”: octaves run from 0 to 8')).toBeVisible();
  await expect(page.getByText('“loud” does not say how to play')).toBeVisible();
  expect((await page.getByRole('region', { name: 'Bench' }).boundingBox())?.y).toBe(before?.y);
});

test.describe('by touch', () => {
  test.use({ viewport: { width: 390, height: 844 }, hasTouch: true, isMobile: true });

  test('a section is tapped for a note, which is moved and given a mute', async ({ page }) => {
    await page.goto('/');
    await page.getByRole('button', { name: /violas.*add a note/ }).tap();
    await expect(line(page)).toHaveValue('Va G3');
    await hand(page).getByRole('button', { name: 'Semitone up' }).tap();
    await expect(line(page)).toHaveValue('Va A♭3');
    await page.getByRole('button', { name: /How it is played/ }).tap();
    await expectAllInSight(page);
    await page.getByLabel('Muted (con sordino)').tap();
    await expect(line(page)).toHaveValue('Va A♭3[muted]');
  });
});

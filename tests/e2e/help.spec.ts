import { expect, test, type Page } from '@playwright/test';

const LOW_THIRD = 'DB C2, Vc E2, Va G3, Vn2 C4, Vn1 E4';

/** Goes on with the Tab key until the focus stands on what is looked for, as somebody without a mouse does. */
async function tabTo(page: Page, name: RegExp): Promise<void> {
  /** More stops than the page has. */
  const MOST_STOPS = 120;
  const focused = page.locator(':focus');
  for (let stop = 0; stop < MOST_STOPS; stop += 1) {
    await page.keyboard.press('Tab');
    const label = await focused.evaluateAll(
      ([at]) => at?.getAttribute('aria-label') ?? at?.textContent ?? '',
    );
    if (name.test(label)) return;
  }
  throw new Error(`no stop of the Tab key is called ${String(name)}`);
}

/** The chord's figure and its uncertainty, as the headline gives them. */
async function headline(page: Page): Promise<{ readonly index: number; readonly uncertainty: number }> {
  const text = await page.getByRole('region', { name: 'Muddiness of the chord' }).innerText();
  const [, index, uncertainty] = /^(\d+)[^]*give or take (\d+)/.exec(text) ?? [];
  return { index: Number(index), uncertainty: Number(uncertainty) };
}

test('when the best move is tried by the keys, then the chord clears, and undo brings it back', async ({
  page,
}) => {
  await page.goto('/');
  const notes = page.getByLabel('Notes', { exact: true });
  await expect(notes).toBeVisible();
  await notes.focus();
  await page.keyboard.insertText(LOW_THIRD);
  await page.keyboard.press('Enter');
  await expect(page.getByRole('button', { name: /^Try: / }).first()).toBeVisible();
  const before = await headline(page);

  await tabTo(page, /^Try: /);
  await page.keyboard.press('Enter');
  await expect.poll(async () => (await headline(page)).index).toBeLessThan(before.index - before.uncertainty);

  await page.keyboard.press('Control+z');
  await expect.poll(() => headline(page)).toEqual(before);
  await expect(notes).toHaveValue(LOW_THIRD);
});

test('when a pair is asked about, then the model’s limit stands beside the chart’s', async ({ page }) => {
  await page.goto('/');
  const notes = page.getByLabel('Notes', { exact: true });
  await notes.fill(LOW_THIRD);
  await notes.press('Enter');
  await expect(
    page.getByText(/Chart: not below B♭2\. For these sections the model puts it at /),
  ).toBeVisible();
});

import { expect, test } from '@playwright/test';
import { typeNotes } from './support/lab';

const CHORD = 'DB D2, Vc A2 F3, Va A3, Vn2 D4, Vn1 A4';

test.describe('the engraving', () => {
  test('when a chord is typed, then it stands on five staves, its heads led to its notes in the lanes', async ({
    page,
  }) => {
    await page.goto('/');
    await typeNotes(page, CHORD);
    const system = page.locator('.system.body');
    await expect(system.locator('.vf-stave')).toHaveCount(5);
    await expect(system.locator('.vf-notehead')).toHaveCount(6);
    await expect(system.getByText('div.', { exact: true }).last()).toBeVisible();
    for (const token of await page.locator('[data-voice]').all()) {
      const id = await token.getAttribute('data-voice');
      const end = await system.locator(`[data-leader="${id}"] .end`).boundingBox();
      const box = await token.boundingBox();
      if (!end || !box) throw new Error('a note without its leader');
      // Both are middles, rounded to whole pixels by the browser at most.
      expect(Math.abs(end.y + end.height / 2 - (box.y + box.height / 2))).toBeLessThan(1);
    }
  });

  test('when a note is moved, then its staff follows, and the staves are read out', async ({ page }) => {
    await page.goto('/');
    await typeNotes(page, CHORD);
    await expect(page.locator('.system .vf-stave')).toHaveCount(5);
    const told = page.getByRole('list', { name: 'The staves read out' });
    await expect(told.getByText('Violas, alto clef: A 3.')).toBeAttached();
    await page.locator('[data-lane="viola"]').waitFor();
    const note = page.getByRole('slider', { name: 'A3', exact: true });
    await note.focus();
    await page.keyboard.press('ArrowUp');
    await expect(told.getByText(/^Violas, alto clef: (A sharp|B flat) 3\.$/)).toBeAttached();
    await expect(page.locator('.system .ring')).toHaveCount(1);
  });

  test('when the score is opened, then a click on a chord selects it, and the bench comes back', async ({
    page,
  }) => {
    await page.goto('/');
    await typeNotes(page, CHORD);
    await page.getByRole('button', { name: 'Add a chord like this one' }).click();
    await typeNotes(page, 'DB G1, Vc B2 F3, Va D4, Vn2 G4, Vn1 B4');
    const score = page.getByRole('button', { name: 'Score', exact: true });
    await score.click();
    const view = page.getByRole('region', { name: 'Score' });
    await expect(view.locator('.vf-stave')).toHaveCount(10);
    await view.getByRole('button', { name: 'Chord 1' }).click();
    await expect(page.getByLabel('Notes', { exact: true })).toHaveValue(/DB D2/);
    await expect(view.getByRole('button', { name: 'Chord 1' })).toHaveAttribute('aria-current', 'true');
    await score.click();
    await expect(view).toHaveCount(0);
    await expect(page.locator('.system .vf-stave')).toHaveCount(5);
  });

  test('when the screen is narrow, then the system is a pane of its own', async ({ page }) => {
    await page.setViewportSize({ width: 390, height: 844 });
    await page.goto('/');
    await typeNotes(page, CHORD);
    await expect(page.locator('.system.body')).toHaveCount(0);
    await page.getByRole('button', { name: 'System', exact: true }).click();
    await expect(page.locator('.system .vf-stave')).toHaveCount(5);
    await expect(page.locator('[data-voice]')).toHaveCount(0);
  });
});

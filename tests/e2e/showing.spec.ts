import { readFile } from 'node:fs/promises';
import { expect, test, type Page } from '@playwright/test';
import { typeNotes } from './support/lab';

const LOW_THIRD = 'DB C2, Vc E2, Va G3, Vn2 C4, Vn1 E4';

/** What a reader or a listener could find out: all text, and all names that are read out. */
async function told(page: Page): Promise<string> {
  const projector = page.getByTestId('projector');
  return `${await projector.innerText()} ${await projector.ariaSnapshot()} ${await projector.innerHTML()}`;
}

async function handOn(page: Page, item: string): Promise<void> {
  await page.getByRole('button', { name: 'Hand on' }).click();
  await page.getByRole('menuitem', { name: item }).click();
}

/** Chooses a file of the menu and reads what is handed out. */
async function taken(page: Page, item: string): Promise<{ name: string; bytes: Buffer }> {
  const [download] = await Promise.all([page.waitForEvent('download'), handOn(page, item)]);
  return { name: download.suggestedFilename(), bytes: await readFile(await download.path()) };
}

test.beforeEach(async ({ page }) => {
  await page.goto('/');
  await typeNotes(page, LOW_THIRD);
});

test('when the projector is worked by the keys, then it uncovers step by step and hides what is to come', async ({
  page,
}) => {
  await handOn(page, 'Projector');
  await expect(page.getByTestId('projector')).toContainText('semitones under');
  await page.keyboard.press('s');
  await expect(page.getByTestId('projector')).toContainText('In which register does it cloud?');
  expect(await told(page)).not.toMatch(/semitones under|\d under|give or take|great/);

  await page.keyboard.press('Space');
  await expect(page.getByRole('button', { name: 'Next: overtones' })).toBeVisible();
  await page.keyboard.press('ArrowDown');
  await expect(page.getByRole('button', { name: 'Next: figures' })).toBeVisible();
  expect(await told(page)).not.toMatch(/semitones under|\d under|give or take/);
  await page.keyboard.press('PageDown');
  await expect(page.getByTestId('projector')).toContainText('semitones under');

  await page.keyboard.press('ArrowUp');
  await expect(page.getByTestId('projector')).not.toContainText('semitones under');
  await page.keyboard.press('Escape');
  await expect(page.getByLabel('Notes', { exact: true })).toHaveValue(LOW_THIRD);
});

test('when the projector shows two chords, then the arrows change between them, dark or light', async ({
  page,
}) => {
  await page
    .getByRole('region', { name: 'Progression' })
    .getByRole('button', { name: 'Add a chord like this one' })
    .first()
    .click();
  await typeNotes(page, 'DB C2, Vc C3, Va G3, Vn2 E4, Vn1 C5');
  await handOn(page, 'Projector');
  await expect(page.getByText('2 of 2')).toBeVisible();
  await page.keyboard.press('ArrowLeft');
  await expect(page.getByText('1 of 2')).toBeVisible();
  await expect(page.locator('html')).toHaveAttribute('data-theme', 'dark');
  await page.keyboard.press('l');
  await expect(page.locator('html')).toHaveAttribute('data-theme', 'light');
});

test('when somebody guesses first, then nothing is told before, and both answers after', async ({ page }) => {
  await page.getByRole('button', { name: 'Guess first' }).click();
  const lab = page.locator('main');
  await expect(page.getByText('Listen, then guess')).toBeVisible();
  await expect(lab).not.toContainText('semitones under');
  await expect(lab).not.toContainText('give or take');
  expect(await lab.ariaSnapshot()).not.toMatch(/semitones under|muddiness \d/);

  await page.getByLabel('great', { exact: true }).check();
  await page.getByLabel('over 50').check();
  await page.getByRole('button', { name: 'Uncover' }).click();
  const verdict = page.getByRole('status', { name: 'Your guess' });
  await expect(verdict).toContainText('You: the great octave, over 50.');
  await expect(verdict).toContainText(/The model: cloudiest in the \w+ octave, \d+, give or take \d+\./);
  await expect(lab).toContainText('semitones under');
});

test('when the chord is handed on, then picture, drawing, tables and study open alone', async ({ page }) => {
  const svg = await taken(page, 'SVG');
  expect(svg.name).toMatch(/\.svg$/);
  const drawing = svg.bytes.toString('utf8');
  expect(drawing).toContain('data:font/woff2');
  expect(drawing).not.toMatch(/var\(|(?:src|href)="?https?:/);
  const faults = await page.evaluate((text) => {
    const parsed = new DOMParser().parseFromString(text, 'image/svg+xml');
    return parsed.querySelectorAll('parsererror').length;
  }, drawing);
  expect(faults).toBe(0);

  const png = await taken(page, 'PNG');
  expect(png.bytes.subarray(1, 4).toString('latin1')).toBe('PNG');
  // Width, in the header chunk of the file: twice the drawing's.
  expect(png.bytes.readUInt32BE(16)).toBe(2000);

  const partials = (await taken(page, 'Partials, CSV')).bytes.toString('utf8').split('\r\n');
  expect(partials[0]).toContain('frequency [Hz]');
  expect(partials.find((line) => line.startsWith('Vc,E2'))).toMatch(/,1,82\.407,/);
  const pairs = (await taken(page, 'Pairs of notes, CSV')).bytes.toString('utf8').split('\r\n');
  expect(pairs).toHaveLength(1 + 10);

  const study = await taken(page, 'Save as a file');
  expect(JSON.parse(study.bytes.toString('utf8'))).toMatchObject({ schemaVersion: 1 });
  await typeNotes(page, 'Vc G3');
  await handOn(page, 'Open a file');
  const file = { name: study.name, mimeType: 'application/json', buffer: study.bytes };
  await page.getByLabel('Study file').setInputFiles(file);
  await page.getByRole('button', { name: 'As the draft' }).click();
  await expect(page.getByLabel('Notes', { exact: true })).toHaveValue(LOW_THIRD);
});

test('when the chord is printed, then it is one page, on A4 and on Letter', async ({ page }) => {
  await handOn(page, 'This chord');
  await expect(page.locator('[data-testid="sheet"][data-ready="true"]')).toBeVisible();
  await expect(page.getByTestId('sheet')).toContainText('semitones under');
  for (const format of ['A4', 'Letter']) {
    const paper = (await page.pdf({ format, printBackground: true })).toString('latin1');
    expect(paper.match(/\/Type\s*\/Page\b/g), format).toHaveLength(1);
  }
});

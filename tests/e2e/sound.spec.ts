import { readFile } from 'node:fs/promises';
import { expect, test, type Page } from '@playwright/test';
import { plottedPartials, typeNotes, type PlottedPartial } from './support/lab';
import { record, recorded, rewind, tapSound, type Recording } from './support/recording';
import { linesOf, peakOf, largestBreak, type Line } from './support/spectrum';

/** Long enough for lines 1.4 Hz apart to stand beside each other. */
const SPECTRUM_SECONDS = 3.1;
/** A part is heard for four seconds, of which the onset takes some. */
const HEARD_SECONDS = 1.5;
/** Partials of two notes nearer than this are one line to the ear of the test. */
const APART_HZ = 3;
const QUIET = 1e-4;
/** A note cut off at its peak breaks by 1; a break 50 dB under that is no crack. */
const UNHEARD_BREAK = 10 ** (-50 / 20);

test.beforeEach(async ({ page }) => {
  await tapSound(page);
  // Dry: the room would add to what is plotted.
  await page.addInitScript(() => localStorage.setItem('siltline.playback.room', 'false'));
  await page.goto('/');
});

/** One player in each section: a section's others would stand beside the plotted lines. */
async function soloists(page: Page): Promise<void> {
  await page.getByRole('button', { name: /^Setting/ }).click();
  for (const section of ['first violins', 'second violins', 'violas', 'cellos', 'double basses']) {
    const players = page.getByRole('spinbutton', { name: new RegExp(section, 'i') });
    await players.fill('1');
    await players.press('Tab');
  }
  await page.keyboard.press('Escape');
}

async function hold(page: Page): Promise<void> {
  await page.getByRole('button', { name: 'Hold', exact: true }).click();
  await expect(page.getByRole('button', { name: 'Hold', exact: true })).toHaveAttribute(
    'aria-pressed',
    'true',
  );
  await loudEnough(page);
}

/** Waits until the onset is over: the level meter has stood still for a while. */
async function loudEnough(page: Page): Promise<void> {
  await expect.poll(async () => peakOf(await record(page, 0.2))).toBeGreaterThan(QUIET);
  await record(page, 0.3);
}

function nearest(lines: readonly Line[], frequencyHz: number): Line {
  const distance = (line: Line) => Math.abs(line.frequencyHz - frequencyHz);
  return lines.reduce((best, line) => (distance(line) < distance(best) ? line : best));
}

function standsAlone(partial: PlottedPartial, all: readonly PlottedPartial[]): boolean {
  return all.every(
    (other) => other === partial || Math.abs(other.frequencyHz - partial.frequencyHz) > APART_HZ,
  );
}

/** How much each partial sounds over what is plotted, once the loudest of them is brought to its level. */
function levelDifferences(plotted: readonly PlottedPartial[], lines: readonly Line[]): number[] {
  const raw = plotted.map(({ frequencyHz, levelDb }) => nearest(lines, frequencyHz).levelDb - levelDb);
  const middle = [...raw].sort((a, b) => a - b)[Math.floor(raw.length / 2)] ?? NaN;
  return raw.map((difference) => difference - middle);
}

function cents(a: number, b: number): number {
  return 1200 * Math.log2(a / b);
}

function tail({ left, right }: Recording): Pick<Recording, 'left' | 'right'> {
  const QUARTER = 11025;
  return { left: left.slice(-QUARTER), right: right.slice(-QUARTER) };
}

async function isSilent(page: Page): Promise<void> {
  await expect.poll(async () => peakOf(await record(page, 0.2))).toBe(0);
}

test('when a low chord is held, then its strongest spectral lines are the plotted partials', async ({
  page,
}) => {
  await typeNotes(page, 'DB D2, Vc F2 A2, Va D3, Vn1 A3');
  await soloists(page);
  const plotted = await plottedPartials(page);
  await hold(page);
  const lines = linesOf(await record(page, SPECTRUM_SECONDS));

  for (const line of lines.slice(0, 20)) {
    const offset = plotted.map(({ frequencyHz }) => Math.abs(frequencyHz - line.frequencyHz));
    expect(Math.min(...offset), `a line at ${line.frequencyHz} Hz`).toBeLessThan(1);
  }
  const alone = plotted
    .filter((partial) => standsAlone(partial, plotted))
    .sort((a, b) => b.levelDb - a.levelDb)
    .slice(0, 12);
  expect(alone).toHaveLength(12);
  for (const difference of levelDifferences(alone, lines)) expect(Math.abs(difference)).toBeLessThan(1.5);
});

test('when one note sounds alone, then its partials are multiples of its pitch to a cent, as strong as plotted', async ({
  page,
}) => {
  await typeNotes(page, 'Vc A2');
  await soloists(page);
  const plotted = await plottedPartials(page);
  await hold(page);
  const lines = linesOf(await record(page, SPECTRUM_SECONDS));

  // A2 is two octaves under A4 = 440 Hz.
  const strongest = lines.slice(0, 16);
  for (const { frequencyHz } of strongest) {
    const n = Math.round(frequencyHz / 110);
    expect(Math.abs(cents(frequencyHz, n * 110)), `partial ${n}`).toBeLessThan(1);
  }
  for (const difference of levelDifferences(plotted.slice(0, 16), lines)) {
    expect(Math.abs(difference)).toBeLessThan(1);
  }
});

test('when stop is pressed, then it is silent within half a second, and Escape ends the sound as well', async ({
  page,
}) => {
  await typeNotes(page, 'DB D2, Vc A2 F3, Va A3, Vn1 D4');
  await hold(page);
  await rewind(page);
  await page.getByRole('button', { name: 'Stop', exact: true }).click();
  expect(peakOf(tail(await recorded(page, 1)))).toBe(0);

  await hold(page);
  await rewind(page);
  await page.keyboard.press('Escape');
  expect(peakOf(tail(await recorded(page, 1)))).toBe(0);
});

test('when play is pressed, then the chord is heard once and ends by itself', async ({ page }) => {
  await typeNotes(page, 'Vc C3 G3, Vn1 E4');
  await page.getByRole('button', { name: 'Play chord' }).click();
  await expect.poll(async () => peakOf(await record(page, 0.2))).toBeGreaterThan(QUIET);
  await isSilent(page);
  await expect(page.getByRole('button', { name: 'Stop', exact: true })).toBeDisabled();
});

test('when a pair is heard, then nothing of the other notes sounds', async ({ page }) => {
  await typeNotes(page, 'Vc C2 E2, Vn1 A5');
  await page.getByRole('listitem').getByRole('button', { name: /hear/i }).first().click();
  await loudEnough(page);
  const lines = linesOf(await record(page, HEARD_SECONDS));
  const [strongest] = lines;
  if (!strongest) throw new Error('silence');
  // C2 and E2 in equal temperament, three and two fifths of a tone from A: 440 · 2 ^ (−33 / 12), 440 · 2 ^ (−29 / 12).
  for (const fundamental of [65.41, 82.41]) {
    expect(nearest(lines, fundamental * 2).frequencyHz).toBeCloseTo(fundamental * 2, 0);
  }
  // A5 is an octave over A4.
  const ofTheViolins = lines.filter(({ frequencyHz }) => Math.abs(frequencyHz - 880) < 1);
  for (const { levelDb } of ofTheViolins) expect(levelDb).toBeLessThan(strongest.levelDb - 60);
});

test('when a pair is heard, then it ends by itself, and its button shows so', async ({ page }) => {
  await typeNotes(page, 'Vc C2 E2, Vn1 A5');
  const hear = page.getByRole('listitem').getByRole('button', { name: /hear/i }).first();
  await hear.click();
  await expect(hear).toHaveAttribute('aria-pressed', 'true');
  await loudEnough(page);
  await expect(page.getByRole('button', { name: 'Hold', exact: true })).toHaveAttribute(
    'aria-pressed',
    'false',
  );
  await expect(hear).toHaveAttribute('aria-pressed', 'false');
  await isSilent(page);
});

test('when a chord is held in the room and silenced, then the room falls silent with it', async ({
  page,
}) => {
  await typeNotes(page, 'Va A3, Vn1 E5');
  await page.getByRole('button', { name: /^Sound:/ }).click();
  await page.getByRole('switch', { name: 'Hall' }).click();
  await page.keyboard.press('Escape');
  await hold(page);
  await rewind(page);
  await page.keyboard.press('Escape');
  expect(peakOf(tail(await recorded(page, 0.6)))).toBe(0);
});

test('when a WAV is saved, then it holds the plotted partials at 48 kHz, its peak 1 dB under full scale', async ({
  page,
}) => {
  await typeNotes(page, 'Vc A2');
  await soloists(page);
  const plotted = await plottedPartials(page);
  await page.getByRole('button', { name: /^Sound:/ }).click();
  await page.getByText('Save as WAV').click();
  await page.getByRole('radio', { name: /held/ }).click();
  await page.getByRole('button', { name: 'Make the file' }).click();
  const download = page.waitForEvent('download');
  await page.getByRole('link', { name: /Save .*\.wav/ }).click();
  const sound = readWav(await readFile(await (await download).path()));
  expect(sound.sampleRate).toBe(48_000);
  expect(20 * Math.log10(peakOf(sound))).toBeCloseTo(-1, 1);
  const lines = linesOf(excerpt(sound, 0.4, 3.4));
  for (const difference of levelDifferences(plotted.slice(0, 16), lines)) {
    expect(Math.abs(difference)).toBeLessThan(1);
  }
});

test('when a held note is moved, then the sound follows it without a crack', async ({ page }) => {
  await typeNotes(page, 'Vc A2');
  await soloists(page);
  await hold(page);
  await page.getByRole('slider', { name: 'A2' }).focus();
  await rewind(page);
  for (let step = 0; step < 12; step += 1)
    await page.keyboard.press(step % 2 === 0 ? 'ArrowUp' : 'ArrowDown');
  await page.keyboard.press('ArrowUp');
  const moving = await recorded(page, 1.5);
  expect(largestBreak(moving)).toBeLessThan(UNHEARD_BREAK * peakOf(moving));
  const lines = linesOf(await record(page, SPECTRUM_SECONDS));
  // B flat 2 is a semitone over A2 = 110 Hz.
  const n = Math.round((lines[0]?.frequencyHz ?? 0) / 116.54);
  expect(Math.abs(cents(lines[0]?.frequencyHz ?? 0, n * 110 * 2 ** (1 / 12)))).toBeLessThan(1);
});

test('when playback starts, then it is quiet; and turned up as far as it goes it stays within full scale', async ({
  page,
}) => {
  await typeNotes(page, 'DB E1 B1, Vc E2 G2, Va B2 E3, Vn2 G3, Vn1 B3');
  await hold(page);
  expect(peakOf(await record(page, 1))).toBeLessThan(0.1);
  await rewind(page);
  await page.getByLabel('Volume').fill('0');
  const loud = peakOf(await recorded(page, 2));
  expect(loud).toBeGreaterThan(0.1);
  expect(loud).toBeLessThanOrEqual(1);
});

test('when the tab has slept, then what was held sounds on, and what was stopped meanwhile stays silent', async ({
  page,
}) => {
  await typeNotes(page, 'Vc A2');
  await hold(page);
  const sleep = () => page.evaluate(() => window.soundTape.contexts.at(-1)?.suspend());
  await sleep();
  await page.evaluate(() => document.dispatchEvent(new Event('visibilitychange')));
  await loudEnough(page);
  await sleep();
  await page.getByRole('button', { name: 'Stop', exact: true }).click();
  await page.evaluate(() => window.soundTape.contexts.at(-1)?.resume());
  await isSilent(page);
});

/** A part of a recording, in seconds from the first sound in it. */
function excerpt({ left, right, sampleRate }: Recording, from: number, until: number): Recording {
  const onset = left.findIndex((sample) => Math.abs(sample) > QUIET);
  const cut = (samples: Float32Array) => samples.slice(onset + from * sampleRate, onset + until * sampleRate);
  return { sampleRate, left: cut(left), right: cut(right) };
}

/** A stereo file of 24 bits, as its header says, back as samples. */
function readWav(file: Buffer): Recording {
  const [HEADER, FRAME, FULL] = [44, 6, 2 ** 23];
  expect([file.readUInt16LE(22), file.readUInt16LE(34)]).toEqual([2, 24]);
  const channel = (offset: number) =>
    Float32Array.from(
      { length: (file.length - HEADER) / FRAME },
      (_, index) => file.readIntLE(HEADER + index * FRAME + offset, 3) / FULL,
    );
  return { sampleRate: file.readUInt32LE(24), left: channel(0), right: channel(3) };
}

function strongestLine(sound: Recording): Line {
  const [strongest] = linesOf(sound);
  if (!strongest) throw new Error('silence');
  return strongest;
}

test('when a progression is played, then its chords follow each other in tempo and the playing one is marked', async ({
  page,
}) => {
  await typeNotes(page, 'Vn1 A4');
  await soloists(page);
  await page.getByRole('button', { name: 'Add a chord like this one' }).click();
  await typeNotes(page, 'Vn1 E5');
  const cards = page.locator('[data-chord]');
  await rewind(page);
  await page.getByRole('button', { name: 'Play progression' }).click();
  await expect(cards.nth(0)).toHaveClass(/sounding/);
  await expect(cards.nth(1)).toHaveClass(/sounding/);
  await expect(page.locator('.sounding')).toHaveCount(0);
  const sound = await recorded(page, 1);

  // Four beats each at 60 a minute; A4 is 440 Hz, E5 seven tempered semitones above it.
  const chordSeconds = (4 * 60) / 60;
  const first = strongestLine(excerpt(sound, 0.3, chordSeconds - 0.1));
  const second = strongestLine(excerpt(sound, chordSeconds + 0.3, 2 * chordSeconds - 0.1));
  expect(Math.abs(cents(first.frequencyHz / Math.round(first.frequencyHz / 440), 440))).toBeLessThan(1);
  const e5 = 440 * 2 ** (7 / 12);
  expect(Math.abs(cents(second.frequencyHz / Math.round(second.frequencyHz / e5), e5))).toBeLessThan(1);
});

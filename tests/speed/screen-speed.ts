import { mkdtemp, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { chromium, type Browser, type CDPSession } from '@playwright/test';
import { startProduct } from '../support/product';
import { framesWhileDragging, type FrameFigures } from './frames';

/**
 * What a visitor's first minute costs, in Chromium with its processor slowed four times, and how a drag keeps up.
 * It prints figures beside their marks and fails on none.
 */
const SLOWED = 4;
/** Chromium's own "Fast 3G": 1.6 Mbit/s down, 750 kbit/s up; latency as its request throttling takes it. */
const FAST_3G = { downloadThroughput: 1_600_000 / 8, uploadThroughput: 750_000 / 8, latency: 150 };
const FIRST_CHORD = 'DB C2, Vc E2, Va G3, Vn2 C4, Vn1 E4';
const EIGHT_VOICES = 'DB D2, Vc A2 D3, Va F3 A3, Vn2 D4 F4, Vn1 A4';
const KILOBYTE = 1000;

const LAUNCH = [
  '--no-sandbox',
  '--disable-gpu',
  '--disable-quic',
  '--no-first-run',
  '--disable-background-networking',
];

interface FirstVisit {
  /** From the navigation until the notes line takes keys. */
  readonly usableMs: number;
  /** From the navigation until a typed chord shows its registers. */
  readonly judgedMs: number;
  readonly codeBytes: number;
  readonly files: readonly { readonly path: string; readonly bytes: number }[];
}

function say(what: string, figure: string, mark: string): void {
  console.log(`${what.padEnd(62)} ${figure.padStart(12)}   mark ${mark}`);
}

/** Every script and style that is fetched, with the bytes that came over the wire. */
async function countCode(session: CDPSession) {
  const paths = new Map<string, string>();
  const files: { path: string; bytes: number }[] = [];
  session.on('Network.responseReceived', ({ requestId, response, type }) => {
    if (type === 'Script' || type === 'Stylesheet' || /\.(js|css)$/.test(new URL(response.url).pathname))
      paths.set(requestId, new URL(response.url).pathname);
  });
  session.on('Network.loadingFinished', ({ requestId, encodedDataLength }) => {
    const path = paths.get(requestId);
    if (path) files.push({ path, bytes: encodedDataLength });
  });
  await session.send('Network.enable');
  return files;
}

async function firstVisit(browser: Browser, url: string): Promise<FirstVisit> {
  const context = await browser.newContext({ viewport: { width: 1440, height: 900 } });
  const page = await context.newPage();
  const session = await context.newCDPSession(page);
  const files = await countCode(session);
  await session.send('Emulation.setCPUThrottlingRate', { rate: SLOWED });
  await session.send('Network.emulateNetworkConditions', { offline: false, ...FAST_3G });
  const began = performance.now();
  await page.goto(url, { waitUntil: 'commit' });
  const notes = page.getByLabel('Notes', { exact: true });
  await notes.fill(FIRST_CHORD);
  const usableMs = performance.now() - began;
  await notes.press('Enter');
  await page.getByText('great', { exact: true }).first().waitFor();
  const judgedMs = performance.now() - began;
  const fetched = [...files];
  await context.close();
  const codeBytes = fetched.reduce((sum, { bytes }) => sum + bytes, 0);
  return { usableMs, judgedMs, codeBytes, files: fetched };
}

async function drag(browser: Browser, url: string): Promise<FrameFigures> {
  const context = await browser.newContext({ viewport: { width: 1440, height: 900 } });
  const page = await context.newPage();
  await page.goto(url);
  const notes = page.getByLabel('Notes', { exact: true });
  await notes.fill(EIGHT_VOICES);
  await notes.press('Enter');
  await page.getByRole('slider', { name: /A4/ }).waitFor();
  const session = await context.newCDPSession(page);
  await session.send('Emulation.setCPUThrottlingRate', { rate: SLOWED });
  const figures = await framesWhileDragging(page, page.getByRole('slider', { name: /A4/ }));
  await context.close();
  return figures;
}

async function measure(url: string): Promise<void> {
  const browser = await chromium.launch({ executablePath: '/usr/bin/chromium', args: LAUNCH });
  try {
    const visit = await firstVisit(browser, url);
    console.log(`Chromium ${browser.version()}, processor slowed ${SLOWED} times`);
    say(
      'first visit: JavaScript and CSS until a chord shows, gzipped',
      `${Math.round(visit.codeBytes / KILOBYTE)} kB`,
      '280 kB',
    );
    say(
      'first visit, fast 3G: until the notes line takes keys',
      `${Math.round(visit.usableMs)} ms`,
      '2500 ms',
    );
    say(
      'first visit, fast 3G: until a typed chord shows its registers',
      `${Math.round(visit.judgedMs)} ms`,
      'none',
    );
    for (const { path, bytes } of [...visit.files].sort((a, b) => b.bytes - a.bytes))
      console.log(`  ${(bytes / KILOBYTE).toFixed(1).padStart(7)} kB  ${path}`);
    const frames = await drag(browser, url);
    say('drag, 8 voices of 32 partials: frames a second', frames.perSecond.toFixed(1), '55');
    say('drag: the longest frame', `${Math.round(frames.longestMs)} ms`, 'none');
    say('drag: from a move to the figures and plots, middle', `${frames.followFrames} frames`, '2 frames');
  } finally {
    await browser.close();
  }
}

async function main(): Promise<void> {
  const running = process.argv[2];
  if (running) return measure(running);
  const folder = await mkdtemp(join(tmpdir(), 'siltline-speed-'));
  const product = await startProduct({ DATA_DIR: folder });
  try {
    await measure(product.url);
  } finally {
    await product.end();
    await rm(folder, { recursive: true, force: true });
  }
}

await main();

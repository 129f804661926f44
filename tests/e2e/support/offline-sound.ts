import { fileURLToPath } from 'node:url';
import type { Page } from '@playwright/test';
import { build } from 'vite';
import type { TimedSound } from '@/audio/schedule';
import type { Recording } from './recording';

/** What is to be made by calculation. */
export interface OfflineOrder {
  readonly schedule: readonly TimedSound[];
  readonly loudest: number;
  readonly room: boolean;
  readonly sampleRate: number;
  /** Only how long it took is asked for. */
  readonly soundOnly?: boolean;
}

/** Samples as base64, and how long they took. */
export interface OfflineTape {
  readonly left: string;
  readonly right: string;
  readonly milliseconds: number;
  readonly seconds: number;
}

const ROOT = fileURLToPath(new URL('../../..', import.meta.url));
let bundle: Promise<string> | null = null;

/** The program's own modules that make sound, as one script. */
async function soundScript(): Promise<string> {
  const built = await build({
    configFile: false,
    root: ROOT,
    logLevel: 'error',
    resolve: { alias: { '@': `${ROOT}src` } },
    build: {
      write: false,
      minify: false,
      lib: { entry: `${ROOT}tests/e2e/support/offline-entry.ts`, formats: ['iife'], name: 'sound' },
    },
  });
  const [output] = Array.isArray(built) ? built : [built];
  if (!output || !('output' in output)) throw new Error('nothing was built');
  return output.output[0].code;
}

/** Lays the program's way of the sound into an empty page. */
export async function openSoundPage(page: Page): Promise<void> {
  bundle ??= soundScript();
  await page.goto('about:blank');
  await page.evaluate(() => Object.assign(window, { TONE_SILENCE_LOGGING: true }));
  await page.addScriptTag({ content: await bundle });
}

function decoded(base64: string): Float32Array {
  return new Float32Array(Uint8Array.from(Buffer.from(base64, 'base64')).buffer);
}

/** The sound of a schedule, sample for sample. */
export async function renderOffline(page: Page, order: OfflineOrder): Promise<Recording> {
  const { left, right } = await page.evaluate((asked) => window.renderOffline(asked), order);
  return { sampleRate: order.sampleRate, left: decoded(left), right: decoded(right) };
}

/**
 * Prints how fast the sound is; nothing here fails on time. What it needs: `SPEED_URL`, where the program runs.
 * The key's way is from the press to the first sample that is not 0, on the audio clock and to the loudspeaker.
 */
import { chromium, type Page } from '@playwright/test';
import { loudestLevel } from '@/audio/levels';
import { analyseChord } from '#shared/voicing/analysis';
import { openSoundPage } from '../e2e/support/offline-sound';
import { typeNotes } from '../e2e/support/lab';
import { chordOf } from '../support/typed-chords';
import { EVEN_SETTINGS } from '../support/voicings';

const FULL_CHORD = 'DB C2, Vc G2 C3, Va E3 G3, Vn2 C4, Vn1 E4 G4';
const RENDER_SECONDS = 20;
const PRESSES = 9;
/** A busy machine may take long to fetch what makes sound; that is not what is measured. */
const LOADED_WITHIN = 120_000;
const ARGUMENTS = [
  '--no-sandbox',
  '--disable-gpu',
  '--disable-quic',
  '--autoplay-policy=no-user-gesture-required',
];

/** A processor in the audio thread that tells when the first sample came. */
const LISTENER = `registerProcessor('first-sample', class extends AudioWorkletProcessor {
  constructor() { super(); this.quiet = true; this.port.onmessage = () => { this.quiet = true; }; }
  process([input]) {
    const at = input[0] ? input[0].findIndex((sample) => sample !== 0) : -1;
    if (at >= 0 && this.quiet) { this.quiet = false; this.port.postMessage(currentTime + at / sampleRate); }
    return true;
  }
});`;

/** Lays the listener before whatever the page connects to the loudspeaker. */
const TAP = `(() => {
  const connect = AudioNode.prototype.connect;
  AudioNode.prototype.connect = function (target, ...rest) {
    if (target instanceof AudioDestinationNode && this.context instanceof AudioContext && !window.tapped) {
      window.tapped = this.context;
      const url = URL.createObjectURL(new Blob([${JSON.stringify(LISTENER)}], { type: 'text/javascript' }));
      this.context.audioWorklet.addModule(url).then(() => {
        const node = new AudioWorkletNode(this.context, 'first-sample', { numberOfOutputs: 0 });
        connect.call(this, node);
        window.firstSample = () => new Promise((resolve) => {
          node.port.onmessage = ({ data }) => {
            const { contextTime, performanceTime } = this.context.getOutputTimestamp();
            resolve({ clock: data - window.pressed.clock, out: performanceTime + (data - contextTime) * 1000 - window.pressed.at });
          };
          node.port.postMessage('listen');
        });
      });
    }
    return connect.call(this, target, ...rest);
  };
  addEventListener('keydown', () => {
    window.pressed = { at: performance.now(), clock: window.tapped ? window.tapped.currentTime : 0 };
  }, true);
})();`;

interface FirstSample {
  readonly clock: number;
  readonly out: number;
}

declare global {
  interface Window {
    firstSample?: () => Promise<FirstSample>;
  }
}

function middle(numbers: readonly number[]): number {
  return [...numbers].sort((a, b) => a - b)[Math.floor(numbers.length / 2)] ?? NaN;
}

async function pressAndListen(page: Page): Promise<FirstSample> {
  const heard = page.evaluate(() => window.firstSample?.());
  await page.keyboard.press('Space');
  const first = await heard;
  if (!first) throw new Error('nothing listens');
  await page.keyboard.press('Escape');
  await page.waitForFunction(
    () => document.querySelector('[aria-label="Level"]')?.getAttribute('aria-valuetext') === 'silent',
  );
  return first;
}

async function measureStart(page: Page, url: string): Promise<void> {
  await page.addInitScript(TAP);
  await page.goto(url);
  await typeNotes(page, FULL_CHORD);
  await page.getByLabel('Notes', { exact: true }).blur();
  await page.keyboard.press('Space');
  await page.waitForFunction(() => window.firstSample !== undefined, undefined, { timeout: LOADED_WITHIN });
  await page.keyboard.press('Escape');
  const all: FirstSample[] = [];
  while (all.length < PRESSES) all.push(await pressAndListen(page));
  const clock = all.map((first) => first.clock * 1000);
  const out = all.map((first) => first.out);
  console.log(
    `key to first sample, audio clock: middle ${middle(clock).toFixed(1)} ms, longest ${Math.max(...clock).toFixed(1)} ms`,
  );
  console.log(
    `key to loudspeaker: middle ${middle(out).toFixed(1)} ms, longest ${Math.max(...out).toFixed(1)} ms (mark: 60 ms)`,
  );
}

async function measureShare(page: Page): Promise<void> {
  await openSoundPage(page);
  const sounds = analyseChord(chordOf(FULL_CHORD), EVEN_SETTINGS).voices;
  const loudest = loudestLevel([sounds]);
  const order = {
    schedule: [{ key: 'chord', startSeconds: 0, seconds: RENDER_SECONDS, sounds }],
    ...{ loudest, sampleRate: 48000, soundOnly: true },
  };
  for (const room of [false, true]) {
    const { milliseconds, seconds } = await page.evaluate((asked) => window.renderOffline(asked), {
      ...order,
      room,
    });
    const share = milliseconds / (seconds * 1000);
    console.log(
      `${sounds.length} voices with ensembles, ${room ? 'in the room' : 'dry'}: ${(share * 100).toFixed(1)} % of one core (mark: 33 %)`,
    );
  }
}

const { SPEED_URL } = process.env;
const browser = await chromium.launch({ executablePath: '/usr/bin/chromium', args: ARGUMENTS });
await measureShare(await browser.newPage());
// The listener is a script from memory, which the program's own policy would not let in.
if (SPEED_URL) await measureStart(await (await browser.newContext({ bypassCSP: true })).newPage(), SPEED_URL);
else console.log('key to first sample: not measured, SPEED_URL is not set');
await browser.close();

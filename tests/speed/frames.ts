import type { Locator, Page } from '@playwright/test';

/** How the page kept up with a note that was dragged. */
export interface FrameFigures {
  readonly perSecond: number;
  readonly longestMs: number;
  /** Frames from a move of the pointer until the note's reading has changed, the middle of all moves. */
  readonly followFrames: number;
}

const STEPS = 90;
/** A semitone is a few pixels high: each move goes about one. */
const STEP_PX = 5;
const TURN = 18;

/** Counts frames in the page, and for each change of pitch the frames until the registers' figures were redrawn. */
async function beginCounting(page: Page): Promise<void> {
  // The runner marks functions with a name by a call that the page does not have.
  await page.evaluate('globalThis.__name = (named) => named');
  await page.evaluate(() => {
    const times: number[] = [];
    const follow: number[] = [];
    let movedAt = -1;
    const tick = (time: number) => {
      times.push(time);
      requestAnimationFrame(tick);
    };
    requestAnimationFrame(tick);
    addEventListener('pointermove', () => (movedAt = movedAt < 0 ? times.length : movedAt), true);
    new MutationObserver(() => {
      if (movedAt >= 0) follow.push(times.length - movedAt);
      movedAt = -1;
    }).observe(document.body, { attributes: true, attributeFilter: ['aria-valuenow'], subtree: true });
    Object.assign(window, { counted: { times, follow } });
  });
}

interface Counted {
  readonly times: readonly number[];
  readonly follow: readonly number[];
}

function figuresOf({ times, follow }: Counted): FrameFigures {
  const gaps = times.slice(1).map((time, index) => time - (times[index] ?? time));
  const whole = gaps.reduce((sum, gap) => sum + gap, 0);
  const sorted = [...follow].sort((a, b) => a - b);
  return {
    perSecond: (gaps.length / whole) * 1000,
    longestMs: Math.max(...gaps),
    followFrames: sorted[Math.floor(sorted.length / 2)] ?? Number.NaN,
  };
}

/** Drags a note up and down over some octaves, a move for each frame. */
export async function framesWhileDragging(page: Page, note: Locator): Promise<FrameFigures> {
  const box = await note.boundingBox();
  if (!box) throw new Error('There is no note to drag.');
  const x = box.x + box.width / 2;
  let y = box.y + box.height / 2;
  await page.mouse.move(x, y);
  await page.mouse.down();
  await beginCounting(page);
  for (let step = 0; step < STEPS; step += 1) {
    y += Math.floor(step / TURN) % 2 === 0 ? STEP_PX : -STEP_PX;
    await page.mouse.move(x, y);
    await page.evaluate(() => new Promise(requestAnimationFrame));
  }
  const counted: Counted = await page.evaluate(() => {
    const found: unknown = Reflect.get(window, 'counted');
    return found as { times: number[]; follow: number[] };
  });
  await page.mouse.up();
  return figuresOf(counted);
}

import { flushPromises } from '@vue/test-utils';
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import { effectScope, ref, shallowRef } from 'vue';
import { useHelpfulMoves } from '@/composables/helpful-moves';
import { judgeIn, type Judge } from '@/composables/judge';
import { EVEN_SETTINGS, voicing } from '../../support/voicings';

const askedOf: string[][] = [];
const judge: Judge = {
  ask: (_kind, question) => {
    // A worker is sent copies: what cannot be copied cannot be asked.
    const copy = structuredClone(question);
    if ('chord' in copy) askedOf.push(copy.chord.voices.map(({ pitch }) => pitch));
    return Promise.resolve([]);
  },
};
const REST_MS = 1000;

describe('the moves of a chord', () => {
  beforeEach(() => {
    vi.useFakeTimers();
    askedOf.length = 0;
  });
  afterEach(() => vi.useRealTimers());

  it('when a note is dragged, then only the chord that stands still is asked about', async () => {
    const chord = shallowRef(voicing('C2 E2'));
    const scope = effectScope();
    const found = scope.run(() =>
      useHelpfulMoves(
        () => chord.value,
        () => EVEN_SETTINGS,
        () => true,
        judge,
      ),
    );
    await flushPromises();
    expect(found?.state.value).toBe('ready');
    for (const pitch of ['F2', 'F#2', 'G2']) {
      chord.value = voicing(`C2 ${pitch}`);
      await flushPromises();
    }
    expect(found?.state.value).toBe('waiting');
    await vi.advanceTimersByTimeAsync(REST_MS);
    expect(askedOf).toEqual([
      ['C2', 'E2'],
      ['C2', 'G2'],
    ]);
    expect(found?.state.value).toBe('ready');
    scope.stop();
  });

  it('when nobody wants moves, then none are asked for until somebody does', async () => {
    const wanted = ref(false);
    const scope = effectScope();
    const chord = voicing('C2 E2');
    scope.run(() =>
      useHelpfulMoves(
        () => chord,
        () => EVEN_SETTINGS,
        () => wanted.value,
        judge,
      ),
    );
    await flushPromises();
    expect(askedOf).toEqual([]);
    wanted.value = true;
    await flushPromises();
    expect(askedOf).toEqual([['C2', 'E2']]);
    scope.stop();
  });
});

/** A worker that answers when it is told to. */
class SlowWorker extends EventTarget {
  readonly received: { readonly number: number }[] = [];
  ended = false;

  postMessage(question: { readonly number: number }): void {
    this.received.push(question);
  }

  terminate(): void {
    this.ended = true;
  }
}

describe('a judge beside the page', () => {
  const question = { chord: voicing('C2 E2'), settings: EVEN_SETTINGS };

  it('when answers come in another order, then each goes to its own question', async () => {
    const worker = new SlowWorker();
    const slow = judgeIn(() => worker as unknown as Worker);
    const [first, second] = [slow.ask('moves', question), slow.ask('moves', question)];
    const [one, two] = worker.received;
    worker.dispatchEvent(new MessageEvent('message', { data: { number: two?.number, answer: ['second'] } }));
    worker.dispatchEvent(new MessageEvent('message', { data: { number: one?.number, answer: ['first'] } }));
    await expect(first).resolves.toEqual(['first']);
    await expect(second).resolves.toEqual(['second']);
  });

  it('when the worker stops, then what was asked fails and the next question starts another', async () => {
    const workers: SlowWorker[] = [];
    const slow = judgeIn(() => {
      workers.push(new SlowWorker());
      return workers.at(-1) as unknown as Worker;
    });
    const asked = slow.ask('moves', question);
    workers[0]?.dispatchEvent(new Event('error'));
    await expect(asked).rejects.toThrow('stopped');
    expect(workers[0]?.ended).toBe(true);
    void slow.ask('moves', question);
    expect(workers).toHaveLength(2);
  });
});

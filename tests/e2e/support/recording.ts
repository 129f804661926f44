import type { Page } from '@playwright/test';

/** What reached the loudspeaker, sample for sample. */
export interface Recording {
  readonly sampleRate: number;
  readonly left: Float32Array;
  readonly right: Float32Array;
}

/** Kept by the page while it is recorded; a stretch is a few milliseconds of both channels. */
interface Tape {
  stretches: { readonly left: Float32Array<ArrayBuffer>; readonly right: Float32Array<ArrayBuffer> }[];
  frames: number;
  sampleRate: number;
  /** The audio contexts that are connected to the loudspeaker, the last one last. */
  readonly contexts: AudioContext[];
}

/** Chromium hands out a track's samples unchanged; TypeScript's library knows it for workers only. */
interface TrackReader {
  readonly readable: ReadableStream<AudioData>;
}

declare global {
  interface Window {
    soundTape: Tape;
    MediaStreamTrackProcessor: new (of: {
      readonly track: MediaStreamTrack;
      readonly maxBufferSize: number;
    }) => TrackReader;
  }
}

/**
 * Lays a tap on whatever the page connects to the loudspeaker. Nothing in the program knows of it: call it
 * before the page opens.
 */
export async function tapSound(page: Page): Promise<void> {
  await page.addInitScript(tapConnections);
}

function tapConnections(): void {
  /** Ten seconds of stretches wait for a busy page before one is lost. */
  const QUEUE = 1000;
  const tape: Tape = { stretches: [], frames: 0, sampleRate: 0, contexts: [] };
  window.soundTape = tape;
  const taps = new WeakMap<AudioContext, MediaStreamAudioDestinationNode>();
  const connect: (this: AudioNode, target: AudioNode) => AudioNode = AudioNode.prototype.connect;

  function keep(data: AudioData): void {
    const [left, right] = [0, data.numberOfChannels - 1].map((planeIndex) => {
      const plane = new Float32Array(data.numberOfFrames);
      data.copyTo(plane, { planeIndex, format: 'f32-planar' });
      return plane;
    });
    if (!left || !right) return;
    tape.sampleRate = data.sampleRate;
    tape.frames += data.numberOfFrames;
    tape.stretches.push({ left, right });
    data.close();
  }

  function layTap(context: AudioContext): MediaStreamAudioDestinationNode {
    const tap = new MediaStreamAudioDestinationNode(context, { channelCount: 2 });
    const [track] = tap.stream.getAudioTracks();
    if (!track) throw new Error('no audio track to record');
    tape.contexts.push(context);
    taps.set(context, tap);
    const reader = new window.MediaStreamTrackProcessor({ track, maxBufferSize: QUEUE });
    void reader.readable.pipeTo(new WritableStream({ write: keep }));
    return tap;
  }

  Object.defineProperty(AudioNode.prototype, 'connect', {
    configurable: true,
    value: function tapped(this: AudioNode, ...to: [AudioNode]) {
      const [target] = to;
      const { context } = this;
      if (target instanceof AudioDestinationNode && context instanceof AudioContext) {
        connect.call(this, taps.get(context) ?? layTap(context));
      }
      return connect.apply(this, to);
    },
  });
}

/** Records from now on for a while. */
export async function record(page: Page, seconds: number): Promise<Recording> {
  await rewind(page);
  return recorded(page, seconds);
}

/** Begins the tape anew. */
export async function rewind(page: Page): Promise<void> {
  await page.evaluate(() => {
    window.soundTape.stretches = [];
    window.soundTape.frames = 0;
  });
}

/** Everything on the tape, once it is so long. */
export async function recorded(page: Page, seconds: number): Promise<Recording> {
  await page.waitForFunction((wanted) => {
    const { frames, sampleRate } = window.soundTape;
    return frames > 0 && frames >= wanted * sampleRate;
  }, seconds);
  const tape = await page.evaluate(async () => {
    const { stretches, sampleRate } = window.soundTape;
    const encode = async (parts: Float32Array<ArrayBuffer>[]) => {
      const bytes = new Blob(parts);
      const reader = new FileReader();
      const read = new Promise<string>((resolve) => {
        reader.onload = () => resolve(String(reader.result).replace(/^.*,/, ''));
      });
      reader.readAsDataURL(bytes);
      return read;
    };
    return {
      left: await encode(stretches.map(({ left }) => left)),
      right: await encode(stretches.map(({ right }) => right)),
      sampleRate,
    };
  });
  return { sampleRate: tape.sampleRate, left: decode(tape.left), right: decode(tape.right) };
}

function decode(base64: string): Float32Array {
  const bytes = Uint8Array.from(Buffer.from(base64, 'base64'));
  return new Float32Array(bytes.buffer);
}

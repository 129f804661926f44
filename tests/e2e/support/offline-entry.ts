import { renderSchedule } from '@/audio/render';
import { SECTIONS } from '#shared/strings/sections';
import type { OfflineOrder, OfflineTape } from './offline-sound';

/** Runs in the page of a test: the program's own way of the sound, over what the test orders. */
declare global {
  interface Window {
    renderOffline(order: OfflineOrder): Promise<OfflineTape>;
  }
}

function encoded(samples: Float32Array<ArrayBuffer>): string {
  const bytes = new Uint8Array(samples.buffer);
  const CHUNK = 32768;
  let text = '';
  for (let at = 0; at < bytes.length; at += CHUNK) {
    text += String.fromCharCode(...bytes.subarray(at, at + CHUNK));
  }
  return btoa(text);
}

window.renderOffline = async ({ schedule, loudest, room, sampleRate, soundOnly }) => {
  const began = performance.now();
  const { left, right } = await renderSchedule(schedule, { loudest, room, sampleRate, sections: SECTIONS });
  const milliseconds = performance.now() - began;
  const tape = soundOnly ? { left: '', right: '' } : { left: encoded(left), right: encoded(right) };
  return { ...tape, milliseconds, seconds: left.length / sampleRate };
};

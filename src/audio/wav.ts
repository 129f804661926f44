import type { Decibels, Hertz } from '#shared/units';
import { levelOf } from '@/audio/levels';

export type BitDepth = 16 | 24;

/** Two channels of samples, −1 … 1. */
export interface StereoSound {
  readonly sampleRate: Hertz;
  readonly left: Float32Array;
  readonly right: Float32Array;
}

const CHANNELS = 2;
const PCM = 1;
const BITS_PER_BYTE = 8;
const RIFF_HEADER_BYTES = 8;
const FORMAT_BYTES = 16;
const HEADER_BYTES = 44;

function writeText(view: DataView, at: number, text: string): void {
  [...text].forEach((letter, index) => view.setUint8(at + index, letter.charCodeAt(0)));
}

function writeHeader(view: DataView, sampleRate: Hertz, bits: BitDepth, dataBytes: number): void {
  const frameBytes = (CHANNELS * bits) / BITS_PER_BYTE;
  writeText(view, 0, 'RIFF');
  view.setUint32(4, HEADER_BYTES - RIFF_HEADER_BYTES + dataBytes, true);
  writeText(view, 8, 'WAVEfmt ');
  view.setUint32(16, FORMAT_BYTES, true);
  view.setUint16(20, PCM, true);
  view.setUint16(22, CHANNELS, true);
  view.setUint32(24, sampleRate, true);
  view.setUint32(28, sampleRate * frameBytes, true);
  view.setUint16(32, frameBytes, true);
  view.setUint16(34, bits, true);
  writeText(view, 36, 'data');
  view.setUint32(40, dataBytes, true);
}

function writeSample(view: DataView, at: number, sample: number, bits: BitDepth): void {
  const full = 2 ** (bits - 1) - 1;
  const value = Math.round(Math.min(Math.max(sample, -1), 1) * full);
  if (bits === 16) {
    view.setInt16(at, value, true);
    return;
  }
  view.setInt8(at + 2, value >> 16);
  view.setUint16(at, value & 0xffff, true);
}

/**
 * A stereo sound as a WAV file of whole numbers (PCM).
 * @returns the bytes of the file: 44 of header, then left and right in turn
 * @source Multimedia Programming Interface and Data Specifications 1.0 (IBM and Microsoft 1991), "WAVE", with
 *   the format chunk of PCM; from memory of the specification
 * @example wavOf({ sampleRate: 48000, left: new Float32Array(1), right: new Float32Array(1) }, 16).byteLength // 48
 */
export function wavOf({ sampleRate, left, right }: StereoSound, bits: BitDepth): ArrayBuffer {
  const sampleBytes = bits / BITS_PER_BYTE;
  const dataBytes = left.length * CHANNELS * sampleBytes;
  const bytes = new ArrayBuffer(HEADER_BYTES + dataBytes);
  const view = new DataView(bytes);
  writeHeader(view, sampleRate, bits, dataBytes);
  for (let index = 0, at = HEADER_BYTES; index < left.length; index += 1, at += CHANNELS * sampleBytes) {
    writeSample(view, at, left[index] ?? 0, bits);
    writeSample(view, at + sampleBytes, right[index] ?? 0, bits);
  }
  return bytes;
}

/** The peak of a file under full scale: room for what a player's converter makes between two samples. Chosen. */
export const FILE_PEAK: Decibels = -1;

/**
 * @returns what brings a sound's highest peak to {@link FILE_PEAK}, in decibels; 0 for silence
 * @example peakGain({ sampleRate: 48000, left: Float32Array.of(1), right: Float32Array.of(0) }) // -1
 */
export function peakGain({ left, right }: StereoSound): Decibels {
  const peakOf = (samples: Float32Array) => samples.reduce((most, x) => Math.max(most, Math.abs(x)), 0);
  const peak = levelOf(Math.max(peakOf(left), peakOf(right)));
  return Number.isFinite(peak) ? FILE_PEAK - peak : 0;
}

const MOST_NAME_LETTERS = 80;

/**
 * @param title as somebody wrote it
 * @returns a file name that every system takes: letters, digits, spaces and hyphens of the title, and `.wav`
 * @example wavNameOf('Étude: "low" 1/2') // 'Étude low 1 2.wav'
 */
export function wavNameOf(title: string): string {
  const plain = title
    .normalize('NFC')
    .replaceAll(/[^\p{L}\p{M}\p{N}-]+/gu, ' ')
    .trim()
    .slice(0, MOST_NAME_LETTERS)
    .trim();
  return `${plain || 'Voicing'}.wav`;
}

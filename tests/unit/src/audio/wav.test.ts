import { describe, expect, it } from 'vitest';
import { peakGain, wavNameOf, wavOf } from '@/audio/wav';

const sound = {
  sampleRate: 48_000,
  left: Float32Array.of(0, 1, -1, 0.5),
  right: Float32Array.of(0, -0.5, 2, 0),
};

function textAt(bytes: ArrayBuffer, at: number, length: number): string {
  return String.fromCharCode(...new Uint8Array(bytes, at, length));
}

describe('wavOf', () => {
  it('when it is written, then the header says what follows: PCM, two channels, the rate and the lengths', () => {
    const bytes = wavOf(sound, 16);
    const view = new DataView(bytes);
    expect(textAt(bytes, 0, 4)).toBe('RIFF');
    expect(textAt(bytes, 8, 8)).toBe('WAVEfmt ');
    expect(textAt(bytes, 36, 4)).toBe('data');
    expect(view.getUint32(4, true)).toBe(bytes.byteLength - 8);
    expect([20, 22, 32, 34].map((at) => view.getUint16(at, true))).toEqual([1, 2, 4, 16]);
    expect(view.getUint32(24, true)).toBe(48_000);
    expect(view.getUint32(28, true)).toBe(48_000 * 4);
    expect(view.getUint32(40, true)).toBe(16);
    expect(bytes.byteLength).toBe(44 + 16);
  });

  it('when it has 16 bits, then the channels stand in turn and nothing passes full scale', () => {
    const view = new DataView(wavOf(sound, 16));
    const samples = Array.from({ length: 8 }, (_, index) => view.getInt16(44 + 2 * index, true));
    expect(samples).toEqual([0, 0, 32767, -16383, -32767, 32767, 16384, 0]);
  });

  it('when it has 24 bits, then each sample has three bytes, the lowest first', () => {
    const bytes = new Uint8Array(wavOf(sound, 24), 44);
    expect(bytes).toHaveLength(24);
    expect([...bytes.subarray(6, 9)]).toEqual([0xff, 0xff, 0x7f]);
    expect([...bytes.subarray(12, 15)]).toEqual([0x01, 0x00, 0x80]);
  });
});

describe('peakGain', () => {
  it('when the highest peak is 2, then it is taken back by 6 dB to full scale and by one more', () => {
    expect(peakGain(sound)).toBeCloseTo(-7.02, 2);
  });

  it('when nothing sounds, then nothing is raised', () => {
    expect(peakGain({ sampleRate: 48_000, left: new Float32Array(2), right: new Float32Array(2) })).toBe(0);
  });
});

describe('wavNameOf', () => {
  it('when a title has signs that a file system refuses, then they are left out', () => {
    expect(wavNameOf('Étude: "low" 1/2')).toBe('Étude low 1 2.wav');
    expect(wavNameOf('../../etc')).toBe('etc.wav');
  });

  it('when nothing of a title is left, or it is very long, then there is a name all the same', () => {
    expect(wavNameOf(' /// ')).toBe('Voicing.wav');
    expect(wavNameOf('a'.repeat(300))).toHaveLength(84);
  });
});

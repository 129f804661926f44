import { expect, test, type Page } from '@playwright/test';
import { FULL_CHORD_LEVEL, loudestLevel } from '@/audio/levels';
import { analyseChord, type Partial as SoundPartial, type VoiceSound } from '#shared/voicing/analysis';
import { chordOf } from '../support/typed-chords';
import { EVEN_SETTINGS } from '../support/voicings';
import { openSoundPage, renderOffline } from './support/offline-sound';
import type { Recording } from './support/recording';
import { linesOf, type Line } from './support/spectrum';

/** The program's way of the sound, calculated: no clock, no loudspeaker, nothing that a busy machine delays. */
const SAMPLE_RATE = 48000;
const NOTES_SECONDS = 3.2;
/** The onset is left out: what is compared is the note that stands. */
const STANDS_FROM = 0.4;
/** Partials of two notes nearer than this run into one line. */
const APART_HZ = 3;
/** How far under the strongest partial the others are compared. */
const WITHIN_DB = 50;
const CHORDS = [
  'DB D2, Vc F2 A2, Va D3, Vn1 A3',
  'DB C2, Vc G2, Va E3, Vn2 C4, Vn1 G4',
  'Vc C3, Va E3, Vn2 G3',
  'DB Eb1, Vc Bb2, Va G3, Vn2 Eb4, Vn1 Bb5',
  'Va C4, Vn2 F#4, Vn1 B4 E5',
] as const;

test.beforeEach(async ({ page }) => {
  await openSoundPage(page);
});

function soundsOf(line: string): readonly VoiceSound[] {
  return analyseChord(chordOf(line), EVEN_SETTINGS).voices;
}

const solo = (sound: VoiceSound): VoiceSound => ({ ...sound, players: 1 });

async function standing(
  page: Page,
  sounds: readonly VoiceSound[],
  loudest: number,
  { room = false, seconds = NOTES_SECONDS } = {},
): Promise<Recording> {
  const schedule = [{ key: 'chord', startSeconds: 0, seconds, sounds }];
  const order = { schedule, loudest, room, sampleRate: SAMPLE_RATE };
  const { left, right, sampleRate } = await renderOffline(page, order);
  const cut = (samples: Float32Array) => samples.slice(STANDS_FROM * sampleRate, seconds * sampleRate);
  return { sampleRate, left: cut(left), right: cut(right) };
}

function cents(a: number, b: number): number {
  return 1200 * Math.log2(a / b);
}

function nearest(lines: readonly Line[], frequencyHz: number): Line {
  const distance = (line: Line) => Math.abs(line.frequencyHz - frequencyHz);
  return lines.reduce((best, line) => (distance(line) < distance(best) ? line : best));
}

function strong(partials: readonly SoundPartial[]): readonly SoundPartial[] {
  const loudest = Math.max(...partials.map(({ levelDb }) => levelDb));
  return partials.filter(({ levelDb }) => levelDb > loudest - WITHIN_DB);
}

/** Each line beside its partial, at full scale: the level that the common scale gives it, in both ears together. */
function expectLines(lines: readonly Line[], partials: readonly SoundPartial[], loudest: number): void {
  for (const { n, frequencyHz, levelDb } of partials) {
    const line = nearest(lines, frequencyHz);
    const plotted = levelDb - loudest + FULL_CHORD_LEVEL;
    expect(Math.abs(cents(line.frequencyHz, frequencyHz)), `pitch of partial ${n}`).toBeLessThan(1);
    expect(Math.abs(line.levelDb - plotted), `level of partial ${n}, ${frequencyHz} Hz`).toBeLessThan(1);
  }
}

for (const line of CHORDS) {
  test(`when ${line} is sounded voice by voice, solo and dry, then its strongest lines are its plotted partials`, async ({
    page,
  }) => {
    const sounds = soundsOf(line).map(solo);
    const loudest = loudestLevel([sounds]);
    for (const sound of sounds) {
      const partials = strong(sound.partials);
      const lines = linesOf(await standing(page, [sound], loudest));
      expectLines(lines, partials, loudest);
      for (const { frequencyHz } of lines.slice(0, partials.length)) {
        const miss = Math.min(
          ...sound.partials.map((partial) => Math.abs(cents(frequencyHz, partial.frequencyHz))),
        );
        expect(miss, `a line at ${frequencyHz} Hz`).toBeLessThan(1);
      }
    }
  });

  test(`when the whole of ${line} is sounded, then the lines that nothing coincides with are as plotted`, async ({
    page,
  }) => {
    const sounds = soundsOf(line).map(solo);
    const loudest = loudestLevel([sounds]);
    const partials = strong(sounds.flatMap((sound) => sound.partials));
    const alone = partials.filter((partial) =>
      partials.every(
        (other) => other === partial || Math.abs(other.frequencyHz - partial.frequencyHz) > APART_HZ,
      ),
    );
    expect(alone.length).toBeGreaterThan(partials.length / 4);
    expectLines(linesOf(await standing(page, sounds, loudest)), alone, loudest);
  });
}

/** The joint level of all lines within a quarter tone of a partial, and the middle of their energies. */
function clusterAt(lines: readonly Line[], frequencyHz: number): Line {
  const QUARTER_TONE = 50;
  const DEEP_DB = 60;
  const near = lines.filter((line) => Math.abs(cents(line.frequencyHz, frequencyHz)) < QUARTER_TONE);
  const top = Math.max(...near.map(({ levelDb }) => levelDb));
  const energies = near
    .filter(({ levelDb }) => levelDb > top - DEEP_DB)
    .map((line) => ({ ...line, energy: 10 ** (line.levelDb / 10) }));
  const energy = energies.reduce((sum, line) => sum + line.energy, 0);
  const middle = energies.reduce((sum, line) => sum + line.energy * line.frequencyHz, 0) / energy;
  return { frequencyHz: middle, levelDb: 10 * Math.log10(energy) };
}

/** Long enough for lines 4 cents apart at 220 Hz to stand beside each other. */
const ENSEMBLE_SECONDS = 24;

test('when a section plays, then each partial is several lines whose joint level and middle are as plotted', async ({
  page,
}) => {
  const [sound] = soundsOf('Va A3');
  if (!sound) throw new Error('no sound');
  expect(sound.players).toBe(8);
  const loudest = loudestLevel([[sound]]);
  const lines = linesOf(await standing(page, [sound], loudest, { seconds: ENSEMBLE_SECONDS }));
  for (const { n, frequencyHz, levelDb } of sound.partials.slice(1, 10)) {
    const { frequencyHz: middle, levelDb: joint } = clusterAt(lines, frequencyHz);
    expect(Math.abs(cents(middle, frequencyHz)), `middle of partial ${n}`).toBeLessThan(1);
    expect(Math.abs(joint - (levelDb - loudest + FULL_CHORD_LEVEL)), `level of partial ${n}`).toBeLessThan(1);
  }
  const strongest = lines.filter(
    ({ frequencyHz, levelDb }) =>
      Math.abs(cents(frequencyHz, 3 * 220)) < 12 && levelDb > (lines[0]?.levelDb ?? 0) - 50,
  );
  expect(strongest.length).toBeGreaterThanOrEqual(5);
});

/** How a partial's level in a unison of two lies over what their energies make together. */
async function unisonGains(page: Page, sounds: readonly VoiceSound[]): Promise<readonly number[]> {
  const loudest = loudestLevel([sounds]);
  const { left, right, sampleRate } = await standing(page, sounds, loudest);
  const seconds = left.length / sampleRate;
  const levelAt = (frequencyHz: number): number => {
    const energyOf = (samples: Float32Array): number => {
      let [real, imag] = [0, 0];
      samples.forEach((sample, index) => {
        const phase = (2 * Math.PI * frequencyHz * index) / sampleRate;
        real += sample * Math.cos(phase);
        imag += sample * Math.sin(phase);
      });
      return (real ** 2 + imag ** 2) * (2 / (seconds * sampleRate)) ** 2;
    };
    return 10 * Math.log10(energyOf(left) + energyOf(right));
  };
  const [first] = sounds;
  return (first?.partials ?? []).slice(0, 4).map(({ frequencyHz, n }) => {
    const energy = sounds.reduce((sum, { partials }) => {
      const level = partials.find((partial) => partial.n === n)?.levelDb ?? -Infinity;
      return sum + 10 ** ((level - loudest + FULL_CHORD_LEVEL) / 10);
    }, 0);
    return levelAt(frequencyHz) - 10 * Math.log10(energy);
  });
}

test('when two sections play in exact unison, then no low partial goes out', async ({ page }) => {
  const gains = await unisonGains(page, soundsOf('Va G3, Vn2 G3'));
  for (const gain of gains) {
    expect(gain).toBeGreaterThan(-6);
    expect(gain).toBeLessThan(3.5);
  }
});

test('when a chord sounds in the room, then the room is heard, and discreet', async ({ page }) => {
  const sounds = soundsOf('DB C2, Vc G2, Va E3, Vn2 C4, Vn1 G4');
  const loudest = loudestLevel([sounds]);
  const [dry, wet] = [
    await standing(page, sounds, loudest),
    await standing(page, sounds, loudest, { room: true }),
  ];
  const energy = ({ left, right }: Recording) =>
    [left, right].flatMap((samples) => [...samples]).reduce((sum, sample) => sum + sample ** 2, 0);
  const room = {
    ...wet,
    left: wet.left.map((sample, index) => sample - (dry.left[index] ?? 0)),
    right: wet.right.map((sample, index) => sample - (dry.right[index] ?? 0)),
  };
  expect(10 * Math.log10(energy(room) / energy(dry))).toBeLessThan(-12);
  expect(10 * Math.log10(energy(room) / energy(dry))).toBeGreaterThan(-30);
});

import { beforeEach, expect, test } from 'vitest';
import { z } from 'zod';
import { measureLimits } from '#shared/contracts/measures';
import { midiOfName } from '#shared/pitch/names';
import { createTestApp, type TestApp } from '../support/app';
import { input, numberList, numberOf, publishedRows, toleranceOf } from '../support/published';
import { call, faultPaths } from '../support/scripts';

let at: TestApp;
beforeEach(async () => {
  at = await createTestApp();
});

const roughness = (body: object) => call(at, '/api/measures/roughness', body);
const limits = (body: object) => call(at, '/api/measures/limits', body);
const C_MAJOR = [60, 64, 67];

/*
 * C4 E4 G4. Printed are 0.12 for the exact variant (Harrison & Pearce 2020, after Hutchinson & Knopoff 1978) and
 * 0.7735006 for Sethares 1993. The further digits, the rounded variant (Bigand, Parncutt & Lerdahl 1996) and
 * Vassilakis 2001, eq. 6.23, over ordered pairs, were worked out a second time from the printed formulas, apart from this program.
 */
test.each([
  ['hutchinson-knopoff', 'exact', 11, 0.1202426, 7],
  ['hutchinson-knopoff', 'rounded', 10, 0.087, 4],
  ['sethares', 'exact', 11, 0.7735006, 7],
  ['vassilakis', 'exact', 11, 2.083763, 6],
])(
  'when %s, %s, measures C4 E4 G4 with %i partials, then the value is %d',
  async (model, variant, harmonics, value, digits) => {
    const answer = await roughness({ model, variant, midi: C_MAJOR, harmonics });
    expect(answer.status).toBe(200);
    expect(answer.body.value).toBeCloseTo(value, digits);
    expect(answer.body.source).toMatch(/\d{4}/);
  },
);

const MODELS = { hutch: 'hutchinson-knopoff', seth: 'sethares', vass: 'vassilakis' } as const;
const published = [
  ...Object.entries(MODELS).flatMap(([prefix, model]) =>
    publishedRows('roughness', `dcd.${prefix}`).map((row) => ({ row, model })),
  ),
  ...publishedRows('roughness', 'hk.bigand96').map((row) => ({ row, model: MODELS.hutch })),
  ...publishedRows('roughness', 'hk.test').map((row) => ({ row, model: MODELS.hutch })),
].filter(({ row }) => !row.note?.startsWith('EXCLUDE'));

test('when the chords of the published tables are sent, then the published values come back', async () => {
  const far: string[] = [];
  for (const { row, model } of published) {
    const rounding = input(row, 'partial_rounding', z.string());
    const { body } = await roughness({
      model,
      variant: rounding === 'nearest semitone' ? 'rounded' : 'exact',
      midi: input(row, 'midi', numberList),
      harmonics: input(row, 'num_harmonics', z.number()),
    });
    if (!(Math.abs(body.value - numberOf(row)) <= toleranceOf(row))) far.push(`${row.id}: ${body.value}`);
  }
  expect(published.length).toBeGreaterThan(50);
  expect(far).toEqual([]);
}, 60_000);

test('when no variant is named, then partials lie exactly', async () => {
  const body = { model: 'sethares', midi: C_MAJOR, harmonics: 11 };
  expect((await roughness(body)).body).toEqual((await roughness({ ...body, variant: 'exact' })).body);
});

test.each([
  ['no note', { midi: [] }, ['body.midi']],
  ['41 notes', { midi: Array.from({ length: 41 }, (_, i) => 30 + i) }, ['body.midi']],
  ['notes out of bounds', { midi: [-1, 60, 128, null] }, ['body.midi.0', 'body.midi.2', 'body.midi.3']],
  ['too many harmonics', { harmonics: 33 }, ['body.harmonics']],
  ['no harmonics', { harmonics: 0 }, ['body.harmonics']],
  ['half a harmonic', { harmonics: 1.5 }, ['body.harmonics']],
  ['an unknown model and variant', { model: 'mine', variant: 'rough' }, ['body.model', 'body.variant']],
  ['something more', { a4Hz: 440 }, ['body']],
])('when roughness is asked for with %s, then each fault is named', async (_what, change, paths) => {
  const answer = await roughness({ model: 'sethares', midi: C_MAJOR, harmonics: 11, ...change });
  expect([answer.status, answer.body.error.code]).toEqual([422, 'input.invalid']);
  expect(faultPaths(answer)).toEqual(paths);
});

/** Dick Lowell & Ken Pullig, Arranging for Large Jazz Ensemble (2003), as transcribed; the octave has no limit. */
const CHART = [
  ['m2', 1, 'E3'],
  ['M2', 2, 'Eb3'],
  ['m3', 3, 'C3'],
  ['M3', 4, 'Bb2'],
  ['P4', 5, 'Bb2'],
  ['A4/d5', 6, 'Bb2'],
  ['P5', 7, 'Bb1'],
  ['m6', 8, 'G2'],
  ['M6', 9, 'F2'],
  ['m7', 10, 'F2'],
  ['M7', 11, 'F2'],
  ['P8', 12, null],
  ['m9', 13, 'E2'],
  ['M9', 14, 'Eb2'],
  ['m10', 15, 'C2'],
  ['M10', 16, 'Bb1'],
];

async function limitsOf(body: object) {
  return measureLimits.response.parse((await limits(body)).body).limits;
}

test('when limits are asked for, then the printed chart stands in them, from the second to the tenth', async () => {
  const told = await limitsOf({ section: 'cello' });
  expect(told.map(({ interval, semitones, chart }) => [interval, semitones, chart])).toEqual(CHART);
});

test('when the model gives limits, then they are notes, near the chart on the whole', async () => {
  const told = await limitsOf({ section: 'cello' });
  const distances = told.flatMap(({ chart, model }) =>
    chart === null || model === null ? [] : [midiOfName(model) - midiOfName(chart)],
  );
  expect(distances.length).toBeGreaterThan(10);
  const mean = distances.reduce((sum, distance) => sum + Math.abs(distance), 0) / distances.length;
  // The chart's published variants lie up to four semitones apart.
  expect(mean).toBeLessThan(4);
});

test('when no upper section is named, then it is as the lower one; players alike in both cancel', async () => {
  const lower = { section: 'cello', players: 8 };
  expect(await limitsOf(lower)).toEqual(await limitsOf({ ...lower, upper: lower }));
  expect(await limitsOf({ section: 'cello', players: 2 })).toEqual(await limitsOf(lower));
});

test('when the upper section is muted and soft, then other limits come out than for two alike', async () => {
  const lower = { section: 'cello', players: 8, dynamic: 'f' };
  const other = { section: 'viola', players: 1, dynamic: 'ppp', technique: { mute: true } };
  expect(await limitsOf({ ...lower, upper: other })).not.toEqual(await limitsOf(lower));
});

test('when limits are asked for with faults, then each is named, those of the upper note too', async () => {
  const answer = await limits({ players: 0, dynamic: 'loud', upper: { section: 'harp', players: 61 } });
  expect(answer.status).toBe(422);
  expect(faultPaths(answer)).toEqual([
    'body.dynamic',
    'body.players',
    'body.section',
    'body.upper.players',
    'body.upper.section',
  ]);
});

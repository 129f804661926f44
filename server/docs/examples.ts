import { createAnalysis } from '#shared/contracts/analysis';
import { measureLimits, measureRoughness } from '#shared/contracts/measures';
import type { BodyInputOf } from '#shared/contracts/endpoint';
import type { Measurements } from '#server/measures/measurements';

/** What is sent in the documents' examples. */
export const EXAMPLE_REQUESTS = {
  analysis: {
    ensemble: {
      players: { violin1: 14, violin2: 12, viola: 10, cello: 8, doubleBass: 6 },
      bass: 'four-string',
    },
    voices: [
      { section: 'doubleBass', pitch: 'C2' },
      { section: 'cello', pitch: 'E2', technique: { mute: true }, dynamic: 'mp' },
      { section: 'viola', pitch: 'G3' },
    ],
  } satisfies BodyInputOf<typeof createAnalysis>,
  roughness: {
    model: 'hutchinson-knopoff',
    variant: 'rounded',
    midi: [60, 64, 67],
    harmonics: 10,
  } satisfies BodyInputOf<typeof measureRoughness>,
  limits: {
    section: 'cello',
    players: 8,
    upper: { section: 'viola', players: 10, dynamic: 'p' },
  } satisfies BodyInputOf<typeof measureLimits>,
};

/** One example for each route: what is sent and what is answered. */
export type Examples = Readonly<
  Record<keyof typeof EXAMPLE_REQUESTS, { readonly request: object; readonly answer: unknown }>
>;

/** Longer lists tell a reader nothing more. */
export const LONG_LIST = 8;
const SHOWN_OF_LONG_LIST = 3;

/** @returns the same with each list of more than eight cut to its first three */
export function shortened(value: unknown): unknown {
  if (Array.isArray(value)) {
    return (value.length > LONG_LIST ? value.slice(0, SHOWN_OF_LONG_LIST) : value).map(shortened);
  }
  if (typeof value !== 'object' || value === null) return value;
  return Object.fromEntries(Object.entries(value).map(([name, inner]) => [name, shortened(inner)]));
}

/** Answers are computed by the program that documents them, so they cannot go out of date. */
export async function makeExamples(measurements: Measurements): Promise<Examples> {
  const { analysis, roughness, limits } = EXAMPLE_REQUESTS;
  const answers = await Promise.all([
    measurements.analyse(createAnalysis.body.parse(analysis)),
    measurements.roughness(measureRoughness.body.parse(roughness)),
    measurements.limits(measureLimits.body.parse(limits)),
  ]);
  return {
    analysis: { request: analysis, answer: shortened(answers[0]) },
    roughness: { request: roughness, answer: shortened(answers[1]) },
    limits: { request: limits, answer: shortened(answers[2]) },
  };
}

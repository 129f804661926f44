import { analysisSchema, type Analysis, type AnalysisRequest } from '#shared/contracts/analysis';
import {
  measureLimits,
  measureRoughness,
  type LimitsAnswer,
  type LimitsRequest,
  type RoughnessAnswer,
  type RoughnessRequest,
} from '#shared/contracts/measures';
import { chordProfileSchema, type ChordProfile } from '#shared/contracts/chord-profiles';
import type { Chord } from '#shared/study/study.document';
import type { SoundSettings } from '#shared/voicing/analysis';
import type { MeasureJob } from '#server/measures/measures.worker';
import { createWorkerPool } from '#server/workers/worker-pool';

/** What is computed beside the event loop. */
export interface Measurements {
  analyse(request: AnalysisRequest): Promise<Analysis>;
  roughness(request: RoughnessRequest): Promise<RoughnessAnswer>;
  limits(request: LimitsRequest): Promise<LimitsAnswer>;
  /** For the table of studies. */
  profile(chord: Chord, settings: SoundSettings): Promise<ChordProfile>;
  close(): Promise<void>;
}

/** One thread: it keeps tables that make the next chord quick, and leaves the other cores to people. */
const WORKERS = 1;
/** Forty voices take up to a second: whoever comes later had better ask again. */
const MOST_WAITING = 60;

/**
 * Forty voices with all their moves and pairs take a good part of a second the first time: in the event loop every
 * page would wait for them.
 */
export function createMeasurements(): Measurements {
  const pool = createWorkerPool<MeasureJob>({
    module: '../measures/measures.worker',
    count: WORKERS,
    mostWaiting: MOST_WAITING,
    busy: 'Too much is being computed at this moment. Please try again in a few seconds.',
  });
  return {
    analyse: async (request) => analysisSchema.parse(await pool.run({ kind: 'analysis', request })),
    roughness: async (request) =>
      measureRoughness.response.parse(await pool.run({ kind: 'roughness', request })),
    limits: async (request) => measureLimits.response.parse(await pool.run({ kind: 'limits', request })),
    profile: async (chord, settings) =>
      chordProfileSchema.parse(await pool.run({ kind: 'profile', chord, settings })),
    close: () => pool.close(),
  };
}

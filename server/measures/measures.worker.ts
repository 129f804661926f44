import { parentPort } from 'node:worker_threads';
import type { Analysis, AnalysisRequest } from '#shared/contracts/analysis';
import type {
  LimitsAnswer,
  LimitsRequest,
  RoughnessAnswer,
  RoughnessRequest,
} from '#shared/contracts/measures';
import type { ChordProfile } from '#shared/contracts/chord-profiles';
import type { Chord } from '#shared/study/study.document';
import { analyseChord, type SoundSettings } from '#shared/voicing/analysis';
import { analyse } from '#server/analyses/analyses.service';
import { measureLimits, measureRoughness } from '#server/measures/measures.service';

export type MeasureJob =
  | { readonly kind: 'analysis'; readonly request: AnalysisRequest }
  | { readonly kind: 'roughness'; readonly request: RoughnessRequest }
  | { readonly kind: 'limits'; readonly request: LimitsRequest }
  | { readonly kind: 'profile'; readonly chord: Chord; readonly settings: SoundSettings };

/** A tenth is more than a small profile shows. */
const FIGURES_PER_POINT = 10;

function rounded(index: number): number {
  return Math.round(index * FIGURES_PER_POINT) / FIGURES_PER_POINT;
}

function profileOf(chord: Chord, settings: SoundSettings): ChordProfile {
  const { index, register, registers } = analyseChord(chord, settings).muddiness;
  const byRegister = registers.map((found) => ({ register: found.register, index: rounded(found.index) }));
  return { name: chord.name, index: rounded(index), register, registers: byRegister };
}

function run(job: MeasureJob): Analysis | RoughnessAnswer | LimitsAnswer | ChordProfile {
  if (job.kind === 'profile') return profileOf(job.chord, job.settings);
  if (job.kind === 'analysis') return analyse(job.request);
  return job.kind === 'roughness' ? measureRoughness(job.request) : measureLimits(job.request);
}

const port = parentPort;
port?.on('message', (job: MeasureJob) => port.postMessage(run(job)));

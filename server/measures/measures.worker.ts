import { parentPort } from 'node:worker_threads';
import type { Analysis, AnalysisRequest } from '#shared/contracts/analysis';
import type {
  LimitsAnswer,
  LimitsRequest,
  RoughnessAnswer,
  RoughnessRequest,
} from '#shared/contracts/measures';
import { analyse } from '#server/analyses/analyses.service';
import { measureLimits, measureRoughness } from '#server/measures/measures.service';

export type MeasureJob =
  | { readonly kind: 'analysis'; readonly request: AnalysisRequest }
  | { readonly kind: 'roughness'; readonly request: RoughnessRequest }
  | { readonly kind: 'limits'; readonly request: LimitsRequest };

function run(job: MeasureJob): Analysis | RoughnessAnswer | LimitsAnswer {
  if (job.kind === 'analysis') return analyse(job.request);
  return job.kind === 'roughness' ? measureRoughness(job.request) : measureLimits(job.request);
}

const port = parentPort;
port?.on('message', (job: MeasureJob) => port.postMessage(run(job)));

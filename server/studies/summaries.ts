import { createHash } from 'node:crypto';
import type { Logger } from 'pino';
import type { Chord } from '#shared/study/study.document';
import type { SoundSettings } from '#shared/voicing/analysis';
import { soundSettingsOf } from '#shared/voicing/settings';
import type { Db } from '#server/db/connection';
import { describeError } from '#server/http/describe-error';
import type { Measurements } from '#server/measures/measurements';
import { findDueStudy, keepSummary, type DueStudy, type Summary } from '#server/studies/summaries.repository';

/** Sums up studies after they were saved, so that a table of them is drawn without their documents. */
export interface Summaries {
  /** A study was saved: do not wait for the next round. */
  kick(): void;
  stop(): Promise<void>;
}

interface SummaryDeps {
  readonly db: Db;
  readonly log: Logger;
  readonly measurements: Pick<Measurements, 'profile'>;
}

const ROUND_MS = 60_000;
/** After this many that could not be summed up, the round ends. */
const MOST_FAILED = 20;

function digestOf({ voices, dynamic }: Chord, settings: SoundSettings): string {
  return createHash('sha256')
    .update(JSON.stringify([voices, dynamic, settings]))
    .digest('base64url');
}

/** One chord after another: scripts and lessons, who share the thread, get their turn in between. */
export async function summarise(
  measurements: SummaryDeps['measurements'],
  { document, known }: Pick<DueStudy, 'document' | 'known'>,
): Promise<Summary> {
  const settings = soundSettingsOf(document);
  const judged = new Map(known.map((profile) => [profile.of, profile]));
  const summary: Summary = [];
  for (const chord of document.chords) {
    const of = digestOf(chord, settings);
    const profile = judged.get(of) ?? { ...(await measurements.profile(chord, settings)), of };
    judged.set(of, profile);
    summary.push({ ...profile, name: chord.name });
  }
  return summary;
}

/** Sums up every study that is due. */
export async function summariseDue({ db, log, measurements }: SummaryDeps): Promise<void> {
  const failed: string[] = [];
  while (failed.length < MOST_FAILED) {
    const due = await findDueStudy(db, failed);
    if (due === null) return;
    try {
      await keepSummary(db, due, await summarise(measurements, due));
    } catch (error) {
      failed.push(due.id);
      log.warn({ study: due.id, fault: describeError(error) }, 'a study could not be summed up');
    }
  }
}

export function startSummaries(deps: SummaryDeps): Summaries {
  let running: Promise<void> | null = null;
  let again = false;
  let stopped = false;

  async function rounds(): Promise<void> {
    do {
      again = false;
      await summariseDue(deps).catch((error: unknown) => {
        deps.log.warn({ fault: describeError(error) }, 'studies could not be summed up');
      });
    } while (again && !stopped);
    running = null;
  }

  function kick(): void {
    again = true;
    if (!stopped) running ??= rounds();
  }

  const timer = setInterval(kick, ROUND_MS);
  timer.unref();
  kick();
  return {
    kick,
    stop: async () => {
      stopped = true;
      clearInterval(timer);
      await running;
    },
  };
}

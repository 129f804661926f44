import { createHash } from 'node:crypto';
import type { Logger } from 'pino';
import { emptyChord, newStudy } from '#shared/study/new-study';
import { comfortableReach } from '#shared/study/reach';
import type { Chord } from '#shared/study/study.document';
import { applyTyped } from '#shared/study/typed.changes';
import { parseTypingLine } from '#shared/study/typing-line';
import type { SoundSettings } from '#shared/voicing/analysis';
import { soundSettingsOf } from '#shared/voicing/settings';
import type { Db } from '#server/db/connection';
import { describeError } from '#server/http/describe-error';
import type { Measurements } from '#server/measures/measurements';
import {
  findDueStudy,
  keepSummary,
  markOutdated,
  type DueStudy,
  type Summary,
} from '#server/studies/summaries.repository';

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

function digest(thing: unknown): string {
  return createHash('sha256').update(JSON.stringify(thing)).digest('base64url');
}

/** A low chord of all sections: whatever changes in the model changes what is said of it. */
function probe(): { chord: Chord; settings: SoundSettings } {
  const study = newStudy('probe-chord');
  const line = 'DB C2, Vc E2 Bb2, Va G3, Vn2 C4, Vn1 E4';
  const { voices } = parseTypingLine(line, 'english', comfortableReach(study.ensemble.bass));
  let last = 0;
  const chord = applyTyped(emptyChord('probe-chord'), voices, () => `probe-${(last += 1)}`);
  return { chord, settings: soundSettingsOf(study) };
}

const EDITION_LENGTH = 8;

/**
 * Names the model by what it says, and makes due what another edition of it summed up: their figures are not to stand
 * in one table.
 */
export async function beginEdition({ db, measurements }: SummaryDeps): Promise<string> {
  const { chord, settings } = probe();
  const edition = digest(await measurements.profile(chord, settings)).slice(0, EDITION_LENGTH);
  await markOutdated(db, edition);
  return edition;
}

/** One chord after another: scripts and lessons, who share the thread, get their turn in between. */
export async function summarise(
  measurements: SummaryDeps['measurements'],
  edition: string,
  { document, known }: Pick<DueStudy, 'document' | 'known'>,
): Promise<Summary> {
  const settings = soundSettingsOf(document);
  const judged = new Map(known.map((profile) => [profile.of, profile]));
  const summary: Summary = [];
  for (const chord of document.chords) {
    const of = `${edition}.${digest([chord.voices, chord.dynamic, settings])}`;
    const profile = judged.get(of) ?? { ...(await measurements.profile(chord, settings)), of };
    judged.set(of, profile);
    summary.push({ ...profile, name: chord.name });
  }
  return summary;
}

/** Sums up every study that is due. */
export async function summariseDue({ db, log, measurements }: SummaryDeps, edition: string): Promise<void> {
  const failed: string[] = [];
  while (failed.length < MOST_FAILED) {
    const due = await findDueStudy(db, failed);
    if (due === null) return;
    try {
      await keepSummary(db, due, await summarise(measurements, edition, due));
    } catch (error) {
      failed.push(due.id);
      log.warn({ study: due.id, fault: describeError(error) }, 'a study could not be summed up');
    }
  }
}

export function startSummaries(deps: SummaryDeps): Summaries {
  let edition: string | null = null;
  let running: Promise<void> | null = null;
  let again = false;
  let stopped = false;

  async function round(): Promise<void> {
    edition ??= await beginEdition(deps);
    await summariseDue(deps, edition);
  }

  async function rounds(): Promise<void> {
    do {
      again = false;
      await round().catch((error: unknown) => {
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

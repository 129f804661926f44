import { until, useEventListener, useTimeoutFn } from '@vueuse/core';
import { watch } from 'vue';
import type { z } from 'zod';
import type { SavedStudy } from '#shared/contracts/studies';
import type { DraftDocument } from '#shared/study/draft';
import { sameStudy } from '#shared/study/study.differences';
import { mergeStudies } from '#shared/study/study.merge';
import { studyDocumentSchema, type StudyDocument } from '#shared/study/study.document';
import { newRequestKey } from '@/api/request-key';
import { saveStudy } from '@/api/studies';
import { deviceKey } from '@/stores/device-key';
import { forgetWork, readWork, writeWork } from '@/stores/kept-work';
import { retryDelayMs } from '@/stores/retry-delay';
import { saveFailureOf } from '@/stores/save-failure';
import type { Sending, StudyDesk } from '@/stores/study-desk';

/** A pause of editing after which the study is saved by itself. */
const PAUSE_MS = 1500;

/** Keeps in the browser what would be lost if the page closed now. */
export function keep(desk: StudyDesk): void {
  const [open, accountId] = [desk.study.value, desk.accountId.value];
  if (!open || !accountId) return;
  desk.taken.value = writeWork(desk.works, open.id, {
    accountId,
    basedOn: desk.basedOn.value,
    document: desk.bench.study,
    pending: desk.sending.value?.body ?? null,
  });
}

/** What stands in the way of saving, said of the chord by its place. */
function unfinishedText(issue: z.core.$ZodIssue | undefined): string {
  const [list, index] = issue?.path ?? [];
  const where = list === 'chords' && typeof index === 'number' ? `Chord ${index + 1}: ` : '';
  return `Not saved yet, but kept in this browser. ${where}${issue?.message ?? ''}.`;
}

/** @returns the bench as a study that can be kept; where it cannot yet, nothing, and the desk says why */
export function finishedDocument(desk: StudyDesk): StudyDocument | null {
  const parsed = studyDocumentSchema.safeParse(desk.bench.study);
  desk.unfinished.value = parsed.success ? null : unfinishedText(parsed.error.issues[0]);
  return parsed.data ?? null;
}

function prepare(desk: StudyDesk): Sending | null {
  const document = desk.bench.dirty ? finishedDocument(desk) : null;
  if (!document) return null;
  const body = {
    document,
    basedOn: desk.basedOn.value,
    requestKey: newRequestKey(),
    deviceKey: deviceKey(desk.storage),
  };
  return { body, revision: desk.bench.revision };
}

/** @returns how a state of the document takes in what others had saved, where the save was merged with that */
function takingIn(sent: Sending, saved: SavedStudy) {
  const base = sent.body.document;
  return (mine: DraftDocument): DraftDocument | null =>
    saved.merged ? mergeStudies({ base, newest: saved.document, mine }) : mine;
}

/** A study that was left while its save was on its way: what the save did not hold stays kept. */
function acceptElsewhere({ works, accountId }: StudyDesk, sent: Sending, saved: SavedStudy): void {
  const work = readWork(works, saved.id, accountId.value ?? '');
  if (!work || sameStudy(work.document, sent.body.document)) return forgetWork(works, saved.id);
  const document = takingIn(sent, saved)(work.document);
  writeWork(works, saved.id, {
    ...work,
    ...(document && { document, basedOn: saved.number }),
    pending: null,
  });
}

function accept(desk: StudyDesk, sent: Sending, saved: SavedStudy): void {
  if (desk.study.value?.id !== saved.id) return acceptElsewhere(desk, sent, saved);
  const { merged, ...study } = saved;
  // What was changed meanwhile where the others had changed it too goes on from the old save: then the two meet.
  if (desk.bench.rebase(takingIn(sent, saved))) desk.basedOn.value = saved.number;
  desk.study.value = study;
  desk.merged.value = merged;
  desk.sending.value = null;
  desk.failure.value = null;
  desk.failures.value = 0;
  if (sent.revision !== null) desk.bench.markSaved(sent.revision);
  else if (sameStudy(saved.document, desk.bench.study)) desk.bench.markSaved();
  if (desk.bench.dirty) keep(desk);
  else forgetWork(desk.works, saved.id);
}

function refuse(desk: StudyDesk, studyId: string, error: unknown): void {
  if (desk.study.value?.id !== studyId) return;
  const found = saveFailureOf(error);
  if (found.kind === 'stale') {
    desk.conflict.value = found.details;
    return;
  }
  desk.failure.value = found;
  if (found.kind === 'passing') desk.failures.value += 1;
  else desk.sending.value = null;
}

/** Sends what is unsaved, one change at a time, until all of it is taken or something stands in the way. */
export async function flush(desk: StudyDesk): Promise<void> {
  const open = desk.study.value;
  if (!open || !desk.maySave.value || desk.inFlight.value || desk.conflict.value) return;
  const next = desk.sending.value ?? prepare(desk);
  if (!next) return;
  desk.sending.value = next;
  keep(desk);
  desk.inFlight.value = true;
  try {
    accept(desk, next, await saveStudy(open.id, next.body));
  } catch (error) {
    refuse(desk, open.id, error);
  } finally {
    desk.inFlight.value = false;
  }
  if (!desk.failure.value) await flush(desk);
}

/** Sends what is unsaved and waits for the answer, so that none comes late to what lies open next. */
export async function settle(desk: StudyDesk): Promise<void> {
  void flush(desk);
  await until(desk.inFlight).toBe(false);
}

/** Saves after a pause of editing, when the connection is back or the reader is, and when somebody has signed in again. */
export function useSavingByItself(desk: StudyDesk): void {
  const pause = useTimeoutFn(() => void flush(desk), PAUSE_MS, { immediate: false });
  const retry = useTimeoutFn(
    () => void flush(desk),
    () => retryDelayMs(desk.failures.value),
    { immediate: false },
  );
  watch(
    () => desk.bench.revision,
    () => {
      if (!desk.maySave.value || !desk.bench.dirty) return;
      if (desk.failure.value?.kind === 'refused') desk.failure.value = null;
      desk.unfinished.value = null;
      keep(desk);
      pause.start();
    },
    { flush: 'sync' },
  );
  watch(desk.failures, (count) => (count > 0 ? retry.start() : retry.stop()));
  watch(
    () => desk.session.account?.id,
    (id) => {
      if (id !== undefined && id === desk.accountId.value) void flush(desk);
    },
  );
  for (const sign of ['online', 'focus']) useEventListener(globalThis, sign, () => void flush(desk));
}

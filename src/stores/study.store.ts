import { defineStore } from 'pinia';
import { computed } from 'vue';
import { mayDoToStudy, type StudyAction } from '#shared/contracts/permissions';
import { forgetAllWork, forgetWorkOfOthers } from '@/stores/kept-work';
import { keepMine, keepMineAsNew, takeTheirs } from '@/stores/study-conflict';
import { layOut, useStudyDesk } from '@/stores/study-desk';
import { copyAsOwn, open, openDraft, saveDraft } from '@/stores/study-opening';
import { flush, useSavingByItself } from '@/stores/study-saving';

/** The study that lies open: opening, saving, and what to do when two saves meet. */
export const useStudyStore = defineStore('study', () => {
  const desk = useStudyDesk();
  useSavingByItself(desk);

  const may = computed(
    () => (action: StudyAction) =>
      desk.study.value !== null && mayDoToStudy(desk.study.value.relation, action),
  );

  /** Forgets everything of whoever was here. */
  function forget(): void {
    layOut(desk, null);
    desk.accountId.value = null;
    desk.status.value = 'idle';
    forgetAllWork(desk.works);
  }

  /** Clears the desk for whoever comes, unless it is theirs already. */
  function clearFor(accountId: string): void {
    if (desk.accountId.value !== null && desk.accountId.value !== accountId) {
      layOut(desk, null);
      openDraft(desk);
    }
    desk.accountId.value = accountId;
    forgetWorkOfOthers(desk.works, accountId);
  }

  return {
    study: desk.study,
    status: desk.status,
    problem: desk.problem,
    conflict: desk.conflict,
    merged: desk.merged,
    keptInBrowser: desk.keptInBrowser,
    maySave: desk.maySave,
    hasUnsaved: desk.hasUnsaved,
    saveState: desk.saveState,
    saveProblem: desk.saveProblem,
    may,
    open: (studyId: string) => open(desk, studyId),
    openDraft: () => openDraft(desk),
    save: () => flush(desk),
    saveDraft: () => saveDraft(desk),
    copyAsOwn: (title: string, requestKey: string) => copyAsOwn(desk, title, requestKey),
    keepMine: () => keepMine(desk),
    takeTheirs: () => takeTheirs(desk),
    keepMineAsNew: () => keepMineAsNew(desk),
    forget,
    clearFor,
  };
});

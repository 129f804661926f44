import { useQueryClient, type InfiniteData } from '@tanstack/vue-query';
import type { ResponseOf } from '#shared/contracts/endpoint';
import type { listStudies, Study, StudyRow } from '#shared/contracts/studies';
import { newRequestKey } from '@/api/request-key';
import { deleteStudy, duplicateStudy, renameStudy, restoreStudy, setStudyTags } from '@/api/studies';

export type Page = ResponseOf<typeof listStudies>;
type Pages = InfiniteData<Page, string | undefined>;

/** Under it stands all that was read of the studies. */
export const STUDIES_KEY = ['studies'];

/** Of a row what its newest save says; the figures follow. */
function renamedRow(row: StudyRow, { number, savedAt, document }: Study): StudyRow {
  return { ...row, number, savedAt, title: document.title, about: document.about, summedUp: false };
}

/** What can be done to a study from the table; its row follows at once. */
export function useStudyChanges() {
  const client = useQueryClient();
  const refresh = () => client.invalidateQueries({ queryKey: STUDIES_KEY });

  function change(alter: (rows: StudyRow[]) => StudyRow[]): void {
    client.setQueriesData<Pages>(
      { queryKey: [...STUDIES_KEY, 'list'] },
      (data) =>
        data && { ...data, pages: data.pages.map((page) => ({ ...page, studies: alter(page.studies) })) },
    );
  }

  const changeRow = (row: StudyRow, alter: (row: StudyRow) => StudyRow) =>
    change((rows) => rows.map((other) => (other.id === row.id ? alter(other) : other)));

  async function rename(row: StudyRow, title: string): Promise<void> {
    const body = { title, basedOn: row.number, requestKey: newRequestKey() };
    const renamed = await renameStudy(row.id, body).finally(refresh);
    changeRow(row, (other) => renamedRow(other, renamed));
  }

  async function tag(row: StudyRow, tags: readonly string[]): Promise<void> {
    const set = await setStudyTags(row.id, { tags: [...tags] });
    changeRow(row, (other) => ({ ...other, tags: set.tags }));
    await refresh();
  }

  async function remove(row: StudyRow): Promise<void> {
    await deleteStudy(row.id);
    change((rows) => rows.filter(({ id }) => id !== row.id));
    void client.invalidateQueries({ queryKey: STUDIES_KEY, refetchType: 'none' });
  }

  const restore = (studyId: string) => restoreStudy(studyId).then(refresh);
  const duplicate = (row: StudyRow) =>
    duplicateStudy(row.id, { requestKey: newRequestKey() }).finally(refresh);

  return { rename, tag, remove, restore, duplicate };
}

import type { StudyRow } from '#shared/contracts/studies';
import { ApiError } from '@/api/api-error';
import { notice } from '@/composables/notices';
import type { useStudiesList } from '@/composables/studies-list';

/** Says what has not been done, and why. */
function told(what: string) {
  return (error: unknown) => {
    if (!(error instanceof ApiError)) throw error;
    notice(`${what} ${error.message}`);
  };
}

/** What is done to a study from its row, with what is said of it. */
export function useRowActions(list: ReturnType<typeof useStudiesList>) {
  async function restore({ id, title }: StudyRow) {
    await list.restore(id).catch(told(`“${title}” is still deleted.`));
  }

  async function remove(row: StudyRow) {
    const { title } = row;
    await list
      .remove(row)
      .then(() => notice(`“${title}” is deleted.`, { label: 'Undo', handler: () => void restore(row) }))
      .catch(told(`“${title}” was not deleted.`));
  }

  async function duplicate(row: StudyRow) {
    await list
      .duplicate(row)
      .then((copy) => notice(`The copy is yours: “${copy.document.title}”.`))
      .catch(told('The copy was not made.'));
  }

  return { remove, duplicate };
}

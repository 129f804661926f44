import { isDuplicate } from '#server/db/faults';

/** @returns whether `insert` put a row down; false when a unique key says that it is there already. */
export async function insertOnce(insert: () => Promise<unknown>): Promise<boolean> {
  try {
    await insert();
    return true;
  } catch (error) {
    if (isDuplicate(error)) return false;
    throw error;
  }
}

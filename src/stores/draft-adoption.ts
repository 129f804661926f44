import type { Account } from '#shared/contracts/accounts';
import { roleMay } from '#shared/contracts/permissions';
import type { Study } from '#shared/contracts/studies';
import { isEmptyStudy } from '#shared/study/study.changes';
import { studyDocumentSchema } from '#shared/study/study.document';
import { createStudy } from '@/api/studies';
import { useBenchStore } from '@/stores/bench.store';
import { draftRequestKey, forgetDraftRequestKey } from '@/stores/draft-request-key';
import { browserStorage, readDraft } from '@/stores/draft-storage';
import { forgetSignUp, signedUpHere } from '@/stores/sign-up-memory';

export type Adoption =
  | { readonly kind: 'none' }
  | { readonly kind: 'adopted'; readonly study: Study }
  /** It did not get through; the draft is where it was. */
  | { readonly kind: 'kept' };

/**
 * Makes the draft in this browser the first study of the person who signed up here. Chords without notes
 * stay behind; asked again after a lost answer, it is still one study.
 */
export async function adoptDraft(account: Account): Promise<Adoption> {
  const storage = browserStorage();
  if (!signedUpHere(storage, account.email) || !roleMay(account.role, 'studies.own')) return { kind: 'none' };
  const kept = readDraft(storage);
  if (kept.kind !== 'draft' || isEmptyStudy(kept.document)) {
    forgetSignUp(storage);
    return { kind: 'none' };
  }
  const chords = kept.document.chords.filter(({ voices }) => voices.length > 0);
  const document = studyDocumentSchema.safeParse({ ...kept.document, chords });
  if (!document.success) return { kind: 'kept' };
  try {
    const study = await createStudy({ document: document.data, requestKey: draftRequestKey(storage) });
    useBenchStore().clearDraft();
    forgetDraftRequestKey(storage);
    forgetSignUp(storage);
    return { kind: 'adopted', study };
  } catch {
    return { kind: 'kept' };
  }
}

import type { Study } from '#shared/contracts/studies';
import { voicingsOf, type Voicing } from '#shared/study/voicing';
import { listStudies, readStudy } from '@/api/studies';
import type { VoicingGroup, VoicingSource } from '@/composables/voicing-sources';

/** The most that one answer may hold. */
const PAGE = 50;

function voicingsIn({ id, document }: Study): readonly Voicing[] {
  return voicingsOf(document, { studyId: id, number: null, from: document.title });
}

function groupOf(study: Study): VoicingGroup {
  const whose = study.relation === 'owner' ? 'yours' : `shared by ${study.ownerName}`;
  const { length } = study.document.chords;
  return {
    id: study.id,
    title: study.document.title,
    detail: `${whose}, ${length === 1 ? '1 chord' : `${length} chords`}`,
    voicings: () => Promise.resolve(voicingsIn(study)),
  };
}

/**
 * The reader's studies and those shared with them.
 * @param openId the study that lies open: it is the progression, and not listed again
 */
export function studiesSource(signedIn: () => boolean, openId: () => string | null): VoicingSource {
  return {
    id: 'studies',
    label: 'Studies',
    unavailable: () =>
      signedIn() ? null : 'Sign in to compare with your studies and those shared with you.',
    searchable: true,
    async page(after) {
      const { studies, next } = await listStudies({ ...(after !== null && { after }), limit: PAGE });
      return { groups: studies.filter(({ id }) => id !== openId()).map(groupOf), next };
    },
    async open({ studyId, number, chordId }) {
      if (studyId === null || number !== null) return null;
      return voicingsIn(await readStudy(studyId)).find(({ chord }) => chord.id === chordId) ?? null;
    },
  };
}

import type { Study, StudyRow } from '#shared/contracts/studies';
import { voicingsOf, type Voicing } from '#shared/study/voicing';
import { listStudies, readStudy } from '@/api/studies';
import type { VoicingGroup, VoicingSource } from '@/composables/voicing-sources';

/** As many as are read in one go. */
const PAGE = 20;

function voicingsIn({ id, document }: Study): readonly Voicing[] {
  return voicingsOf(document, { studyId: id, number: null, from: document.title });
}

function groupOf(row: StudyRow): VoicingGroup {
  const whose = row.relation === 'owner' ? 'yours' : `shared by ${row.ownerName}`;
  return {
    id: row.id,
    title: row.title,
    detail: `${whose}, ${row.chordCount === 1 ? '1 chord' : `${row.chordCount} chords`}`,
    voicings: async () => voicingsIn(await readStudy(row.id)),
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
    async page(search, after) {
      const asked = { ...(search !== '' && { search }), ...(after !== null && { after }), limit: PAGE };
      const { studies, next } = await listStudies(asked);
      return { groups: studies.filter(({ id }) => id !== openId()).map(groupOf), next };
    },
    async open({ studyId, number, chordId }) {
      if (studyId === null || number !== null) return null;
      return voicingsIn(await readStudy(studyId)).find(({ chord }) => chord.id === chordId) ?? null;
    },
  };
}

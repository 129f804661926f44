import type { Version } from '#shared/contracts/versions';
import { voicingsOf, type Voicing } from '#shared/study/voicing';
import { listVersions, readVersion } from '@/api/versions';
import type { VoicingGroup, VoicingSource } from '@/composables/voicing-sources';

async function voicingsIn(studyId: string, number: number): Promise<readonly Voicing[]> {
  const { document, name } = await readVersion(studyId, { kind: 'accepted', number });
  return voicingsOf(document, { studyId, number, from: name ?? `save ${number}` });
}

function groupOf(studyId: string, { number, name, savedAt, savedByName }: Version): VoicingGroup {
  const made = new Date(savedAt).toLocaleString('en-GB', { dateStyle: 'medium', timeStyle: 'short' });
  return {
    id: `version ${number}`,
    title: name ?? made,
    detail: `save ${number} by ${savedByName}${name === null ? '' : `, ${made}`}`,
    voicings: () => voicingsIn(studyId, number),
  };
}

/**
 * Earlier versions of the study that lies open.
 * @param openId the study, where the reader may see its versions
 */
export function versionsSource(openId: () => string | null): VoicingSource {
  return {
    id: 'versions',
    label: 'Versions',
    unavailable: () => (openId() === null ? 'A study of your own has versions once it is saved.' : null),
    searchable: false,
    async page(_search, after) {
      const studyId = openId();
      if (studyId === null) return { groups: [], next: null };
      const before = after === null ? undefined : Number(after);
      const { versions, next } = await listVersions(studyId, { before });
      return {
        groups: versions.map((version) => groupOf(studyId, version)),
        next: next === null ? null : String(next),
      };
    },
    async open({ studyId, number, chordId }) {
      if (number === null) return null;
      const of = studyId ?? openId();
      return of === null
        ? null
        : ((await voicingsIn(of, number)).find(({ chord }) => chord.id === chordId) ?? null);
    },
  };
}

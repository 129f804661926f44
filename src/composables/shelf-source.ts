import type { ShelfVoicing } from '#shared/contracts/shelf';
import { keyName } from '#shared/study/about-study';
import type { Voicing } from '#shared/study/voicing';
import { listShelf } from '@/api/shelf';
import type { VoicingGroup, VoicingSource } from '@/composables/voicing-sources';

/** No link names it: a shelf is its owner's alone. */
function voicingOf({ name, voicing: { chord, ...settings } }: ShelfVoicing): Voicing {
  return { place: null, chord, settings, name, from: 'your shelf' };
}

function groupOf(kept: ShelfVoicing): VoicingGroup {
  return {
    id: kept.id,
    title: kept.name,
    detail: `in ${keyName(kept.voicing.key)}`,
    voicings: () => Promise.resolve([voicingOf(kept)]),
  };
}

/** The voicings that the reader keeps. */
export function shelfSource(signedIn: () => boolean): VoicingSource {
  return {
    id: 'shelf',
    label: 'Shelf',
    unavailable: () => (signedIn() ? null : 'Sign in to compare with voicings on your shelf.'),
    searchable: true,
    async page(search, after) {
      const asked = { ...(search !== '' && { search }), ...(after !== null && { after }) };
      const { voicings, next } = await listShelf(asked);
      return { groups: voicings.map(groupOf), next };
    },
    open: () => Promise.resolve(null),
  };
}

import type { DraftDocument } from '#shared/study/draft';
import { voicingsOf, type Voicing } from '#shared/study/voicing';
import type { VoicingPlace } from '#shared/study/voicing-place';

/** Voicings that belong together: a progression, a study, a version of one. */
export interface VoicingGroup {
  readonly id: string;
  readonly title: string;
  /** Whose it is, when it was saved and the like. */
  readonly detail: string;
  /** Asked for when somebody opens the group. */
  voicings(): Promise<readonly Voicing[]>;
}

export interface VoicingPage {
  readonly groups: readonly VoicingGroup[];
  /** Names the next page; `null` at the end. */
  readonly next: string | null;
}

/** Somewhere that voicings to compare can be had from. A new one is added to the list that the Lab makes. */
export interface VoicingSource {
  readonly id: string;
  /** Of its tab: `This progression`. */
  readonly label: string;
  /** Why it has nothing for this reader; `null` where it may have something. */
  unavailable(): string | null;
  /** Whether its groups can be searched. */
  readonly searchable: boolean;
  /**
   * @param search words to find groups by; empty for all
   * @param after the previous page's `next`
   * @throws ApiError where it cannot be asked
   */
  page(search: string, after: string | null): Promise<VoicingPage>;
  /**
   * Opens what a link names.
   * @returns `null` where the place is none of this source's, or nothing is there any more
   * @throws ApiError where it cannot be asked
   */
  open(place: VoicingPlace): Promise<Voicing | null>;
}

/** The chords of the study that lies open, as they are now. */
export function progressionSource(study: () => DraftDocument, studyId: () => string | null): VoicingSource {
  const voicings = () => voicingsOf(study(), { studyId: null, number: null, from: 'this progression' });
  return {
    id: 'progression',
    label: 'This progression',
    unavailable: () => null,
    searchable: false,
    page: () =>
      Promise.resolve({
        groups: [
          {
            ...{ id: 'progression', title: study().title, detail: 'as it is now' },
            voicings: () => Promise.resolve(voicings()),
          },
        ],
        next: null,
      }),
    open({ studyId: asked, number, chordId }) {
      const isHere = number === null && (asked === null || asked === studyId());
      const found = isHere ? voicings().find(({ chord }) => chord.id === chordId) : undefined;
      return Promise.resolve(found ?? null);
    },
  };
}

/** Asks each source in turn for what a link names. */
export async function openPlace(
  sources: readonly VoicingSource[],
  place: VoicingPlace,
): Promise<Voicing | null> {
  for (const source of sources) {
    const found = source.unavailable() === null ? await source.open(place) : null;
    if (found) return found;
  }
  return null;
}

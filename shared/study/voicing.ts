import type { DraftDocument } from '#shared/study/draft';
import type { Chord } from '#shared/study/study.document';
import type { VoicingPlace } from '#shared/study/voicing-place';

/** What of its study a voicing's sound, its limits and its notes' names depend on. */
export type VoicingSettings = Pick<DraftDocument, 'a4Hz' | 'intonation' | 'ensemble' | 'key' | 'limits'>;

/** A chord taken by itself, with all that it needs to be drawn, judged and heard. */
export interface Voicing {
  /** Where it is kept; `null` where no link can name it. */
  readonly place: VoicingPlace | null;
  readonly chord: Chord;
  readonly settings: VoicingSettings;
  /** What it is called: its own name, or its place in the progression. */
  readonly name: string;
  /** Where it is from, in a few words. */
  readonly from: string;
}

/** Where a progression is kept, and what that is called. */
export interface VoicingOrigin {
  readonly studyId: string | null;
  readonly number: number | null;
  readonly from: string;
}

/**
 * The chords of a progression as voicings.
 * @param study that has them
 * @param origin where it is kept
 * @returns one for each chord, in the order of the progression
 * @example voicingsOf(study, { studyId: null, number: null, from: 'this study' })[0]?.name // 'Chord 1'
 */
export function voicingsOf(study: DraftDocument, origin: VoicingOrigin): readonly Voicing[] {
  const { a4Hz, intonation, ensemble, key, limits } = study;
  const { studyId, number, from } = origin;
  return study.chords.map((chord, index) => ({
    place: { studyId, number, chordId: chord.id },
    chord,
    settings: { a4Hz, intonation, ensemble, key, limits },
    name: chord.name ?? `Chord ${index + 1}`,
    from,
  }));
}

/**
 * What two voicings stand under that is not the same, so that a difference of their figures may be due to it.
 * @returns in the trade's words; nothing where all is the same
 * @example settingDifferences(at440, at442) // ['A4']
 */
export function settingDifferences(a: VoicingSettings, b: VoicingSettings): readonly string[] {
  const [one, other] = [a.ensemble.players, b.ensemble.players];
  const sizes = JSON.stringify(Object.entries(one).sort()) === JSON.stringify(Object.entries(other).sort());
  return [
    ...(a.a4Hz === b.a4Hz ? [] : ['A4']),
    ...(a.intonation === b.intonation ? [] : ['intonation']),
    ...(sizes ? [] : ['players']),
    ...(a.ensemble.bass === b.ensemble.bass ? [] : ['double basses']),
    ...(JSON.stringify(a.limits) === JSON.stringify(b.limits) ? [] : ['low interval limits']),
  ];
}

/** Where a voicing is kept, so that a link can name it. */
export interface VoicingPlace {
  /** The study that it is in; `null` for the one that lies open. */
  readonly studyId: string | null;
  /** The save of that study; `null` for its newest. */
  readonly number: number | null;
  readonly chordId: string;
}

/** `chord`, `study:chord` or `study@12:chord`; ids are letters, digits, - and _. */
const PLACE = /^(?:([A-Za-z0-9_-]{6,64})(?:@([1-9][0-9]{0,8}))?:)?([A-Za-z0-9_-]{6,36})$/;

/**
 * Writes a place as it stands in an address.
 * @example placeText({ studyId: 'study-1', number: 12, chordId: 'chord-1' }) // 'study-1@12:chord-1'
 */
export function placeText({ studyId, number, chordId }: VoicingPlace): string {
  if (studyId === null) return chordId;
  return number === null ? `${studyId}:${chordId}` : `${studyId}@${number}:${chordId}`;
}

/**
 * The inverse of {@link placeText}.
 * @returns `null` for what names no place
 * @example parsePlace('chord-1') // { studyId: null, number: null, chordId: 'chord-1' }
 */
export function parsePlace(text: string): VoicingPlace | null {
  const [, studyId, number, chordId] = PLACE.exec(text) ?? [];
  if (chordId === undefined) return null;
  return { studyId: studyId ?? null, number: number === undefined ? null : Number(number), chordId };
}

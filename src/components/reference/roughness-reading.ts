import type { RoughnessModel } from '#shared/hearing/roughness-models';
import { ROUGHNESS, ROUGHNESS_HARMONICS } from '#shared/hearing/roughness-models';
import { harmonicPartials, type PartialRounding } from '#shared/hearing/partials';
import type { NoteNaming } from '#shared/pitch/display';
import { midiOfName } from '#shared/pitch/names';
import { MAX_VOICES } from '#shared/study/study.document';
import { wordsOf } from '#shared/study/typing-line.words';

/** A published measure with how its partials are made. */
export interface MeasureChoice {
  readonly label: string;
  readonly model: RoughnessModel;
  readonly rounding: PartialRounding;
}

export const MEASURE_IDS = [
  'hutchinsonKnopoffRounded',
  'hutchinsonKnopoff',
  'sethares',
  'vassilakis',
] as const;
export type MeasureId = (typeof MEASURE_IDS)[number];

export const MEASURES: Readonly<Record<MeasureId, MeasureChoice>> = {
  hutchinsonKnopoffRounded: {
    label: 'Hutchinson & Knopoff, partials on the nearest keys',
    model: 'hutchinson-knopoff',
    rounding: 'semitone',
  },
  hutchinsonKnopoff: {
    label: 'Hutchinson & Knopoff, exact partials',
    model: 'hutchinson-knopoff',
    rounding: 'exact',
  },
  sethares: { label: 'Sethares, exact partials', model: 'sethares', rounding: 'exact' },
  vassilakis: { label: 'Vassilakis, exact partials', model: 'vassilakis', rounding: 'exact' },
};

/** How many partials a note may be given; the program’s own tones have as many at most. */
export const PARTIALS_BOUNDS = { min: 1, max: 32 } as const;
/** As many figures as the published tables print. */
const DIGITS = 7;

/** @returns the partials a note that the measure was published with */
export function publishedPartials(id: MeasureId): number {
  return ROUGHNESS_HARMONICS[MEASURES[id].rounding];
}

/** What the typed notes say. */
export interface ReadNotes {
  /** Sounding pitches in scientific notation, in the order typed; none with faults. */
  readonly pitches: readonly string[];
  readonly faults: readonly string[];
}

/**
 * Reads notes as the Lab's line does. Who plays them makes no difference to these measures: sections and joins
 * are passed over.
 */
export function readNotes(text: string, naming: NoteNaming): ReadNotes {
  const words = wordsOf(text, naming);
  const faults = words.flatMap((word) => (word.kind === 'fault' ? [word.message] : []));
  const pitches = words.flatMap((word) => (word.kind === 'note' ? [word.pitch] : []));
  if (pitches.length > MAX_VOICES) faults.push(`A chord has at most ${MAX_VOICES} notes here.`);
  return faults.length > 0 ? { pitches: [], faults } : { pitches, faults };
}

/** A measure's value with what it is the value of. */
export interface MeasuredRoughness {
  readonly value: string;
  readonly source: string;
}

/** @returns the measure of a chord; null for no notes */
export function roughnessOf(
  pitches: readonly string[],
  id: MeasureId,
  harmonics: number,
): MeasuredRoughness | null {
  if (pitches.length === 0) return null;
  const { model, rounding } = MEASURES[id];
  const { measure, source } = ROUGHNESS[model];
  const value = measure(harmonicPartials(pitches.map(midiOfName), harmonics, rounding));
  return { value: value.toPrecision(DIGITS), source };
}

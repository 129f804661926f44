import type { StudiesFilters } from '@/composables/studies-filters';

interface Choice {
  readonly label: string;
  readonly filters: Partial<StudiesFilters>;
}

/** 50 stands at the published limits, 75 halfway from there to the top. */
export const CLOUDED_CHOICES: readonly Choice[] = [
  { label: 'Any', filters: { from: undefined, to: undefined } },
  { label: 'Under 25', filters: { from: undefined, to: 24.9 } },
  { label: '25 to 50', filters: { from: 25, to: 49.9 } },
  { label: '50 to 75', filters: { from: 50, to: 74.9 } },
  { label: '75 and more', filters: { from: 75, to: undefined } },
];

export const WHOSE_CHOICES: readonly Choice[] = [
  { label: 'Everybody’s', filters: { whose: undefined } },
  { label: 'Yours', filters: { whose: 'own' } },
  { label: 'Shared with you', filters: { whose: 'received' } },
];

export function indexOfChoice(choices: readonly Choice[], filters: StudiesFilters): number {
  const isThis = ({ filters: wanted }: Choice) =>
    Object.entries(wanted).every(([name, value]) => new Map(Object.entries(filters)).get(name) === value);
  return Math.max(0, choices.findIndex(isThis));
}

import type { Section } from '#shared/strings/sections';
import { sectionColour } from '@/charts/section-colours';
import { siltColour } from '@/charts/silt';
import { mixOklab } from '@/export/oklab';

/** The colours of a figure. */
export interface Palette {
  readonly page: string;
  readonly surface: string;
  readonly ink: string;
  readonly quiet: string;
  readonly line: string;
  readonly field: string;
  readonly mark: string;
  readonly section: (section: Section) => string;
  /** @param index muddiness, 0 … 100 */
  readonly silt: (index: number) => string;
}

/** The page's own colours, light or dark as it is. */
export const PAGE_PALETTE: Palette = {
  page: 'var(--page)',
  surface: 'var(--surface)',
  ink: 'var(--ink)',
  quiet: 'var(--ink-quiet)',
  line: 'var(--line)',
  field: 'var(--field)',
  mark: 'var(--curve-label)',
  section: sectionColour,
  silt: siltColour,
};

/** The light colours of the page's tokens, for what stands outside of any page. */
export const PAPER_SECTIONS: Readonly<Record<Section, string>> = {
  violin1: '#a3302a',
  violin2: '#bc7410',
  viola: '#3c8060',
  cello: '#2e6fb0',
  doubleBass: '#56358a',
};
/** The ramp's marks at 0, 25, 50, 75 and 100. */
export const PAPER_SILT = ['#d5e7e2', '#a9c7b9', '#c3a063', '#8c5c33', '#46291a'] as const;
const STEP = 25;

function paperSilt(index: number): string {
  const place = Math.min(Math.max(index, 0), 100) / STEP;
  const [lower, upper] = [PAPER_SILT[Math.floor(place)], PAPER_SILT[Math.ceil(place)]];
  return lower && upper ? mixOklab(lower, upper, place % 1) : PAPER_SILT[0];
}

/** Black on white, for print and files. */
export const PAPER_PALETTE: Palette = {
  page: '#ffffff',
  surface: '#ffffff',
  ink: '#000000',
  quiet: '#3c4a4c',
  line: '#c9c9c9',
  field: '#8b9799',
  mark: '#5e3c20',
  section: (section) => PAPER_SECTIONS[section],
  silt: paperSilt,
};

import type { Players } from '#shared/strings/sections';

/** Players per section as a source gives them; where it gives a range, the larger number. */
export interface SectionPreset {
  readonly name: string;
  readonly players: Players;
  readonly source: string;
}

function preset(
  name: string,
  [violin1, violin2, viola, cello, doubleBass]: readonly [number, number, number, number, number],
  source: string,
): SectionPreset {
  return { name, players: { violin1, violin2, viola, cello, doubleBass }, source };
}

const RIMSKY_KORSAKOV =
  'Rimsky-Korsakov, Principles of Orchestration (tr. Agate 1922), vol. I, ch. I A, p. 6';

/** Section sizes in use, large to small. */
export const SECTION_PRESETS: readonly SectionPreset[] = [
  preset(
    'Hundred-player orchestra',
    [18, 16, 14, 12, 10],
    'Gehrkens, Essentials in Conducting (1919), p. 97',
  ),
  preset('Wagner’s Ring', [16, 16, 12, 12, 8], 'the score’s specification, from memory'),
  preset('Symphony', [16, 14, 12, 10, 8], 'Piston, Orchestration (1955), ch. 1, p. 3–4'),
  preset('Full', [16, 14, 12, 10, 10], RIMSKY_KORSAKOV),
  preset('Concert standard', [14, 12, 10, 8, 6], 'Tim Davies, deBreved: String Section Sizes'),
  preset('Studio', [12, 12, 8, 10, 4], 'Tim Davies, deBreved: String Section Sizes'),
  preset('Medium', [12, 10, 8, 6, 6], RIMSKY_KORSAKOV),
  preset('Small', [8, 6, 4, 3, 3], RIMSKY_KORSAKOV),
  preset('Classical', [8, 8, 4, 4, 4], 'general histories, from memory'),
  preset('Solo strings', [1, 1, 1, 1, 1], 'one player a part'),
];

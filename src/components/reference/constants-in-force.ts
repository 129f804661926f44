import { MUDDINESS_CONSTANTS } from '#shared/data/muddiness-constants';
import { FITTED } from '#shared/voicing/calibration/fit';
import type { MuddinessConstants } from '#shared/voicing/muddiness/constants';

type Name = keyof MuddinessConstants;

/** How a constant came to its value. */
export type Origin = 'fitted' | 'set by the chart' | 'part of the form';

export interface ConstantInForce {
  readonly symbol: string;
  /** What stands below the symbol. */
  readonly below?: string;
  readonly name: string;
  readonly value: number;
  readonly unit: string;
  readonly does: string;
  readonly origin: Origin;
}

type Told = Pick<ConstantInForce, 'symbol' | 'below' | 'name' | 'unit' | 'does'>;

const ERB = 'ERB';
const SEMITONES = 'semitones';

/** What each constant does; the order is that of the formulas. */
const TOLD: Readonly<Record<Name, Told>> = {
  peakErb: { symbol: 'p', name: 'peak', unit: ERB, does: 'the distance at which two partials cloud most' },
  sharpness: { symbol: 's', name: 'sharpness', unit: '', does: 'how fast clouding falls away from the peak' },
  reachErb: {
    symbol: '',
    name: 'reach',
    unit: ERB,
    does: 'from here on two partials do not cloud each other',
  },
  fusionErb: {
    symbol: 'c',
    name: 'fusion',
    unit: ERB,
    does: 'within about this much partials fuse, not beat',
  },
  fusionStrength: {
    ...{ symbol: 'κ', name: 'strength of fusion', unit: '' },
    does: 'how much fusing partials clear a pair of voices',
  },
  pooling: {
    ...{ symbol: 'm', name: 'pooling', unit: '' },
    does: '1 adds all pairs of voices; more lets the cloudiest govern',
  },
  windowSemitones: {
    ...{ symbol: 'w', below: 'r', name: 'width for the clouding', unit: SEMITONES },
    does: 'over how much of the axis clouding is gathered',
  },
  localWindowSemitones: {
    ...{ symbol: 'w', below: 'E', name: 'width for what sounds', unit: SEMITONES },
    does: 'over how much of the axis energy is gathered',
  },
  floor: {
    ...{ symbol: 'ε', name: 'floor', unit: '' },
    does: 'how much the voices around count for what sounds at a place',
  },
  cornerHz: {
    ...{ symbol: 'f', below: 'c', name: 'corner', unit: 'Hz' },
    does: 'above it the same roughness counts as harsh rather than muddy',
  },
  slope: { symbol: 'q', name: 'slope', unit: '', does: 'how fast it turns there' },
  threshold: { symbol: 'T', name: 'threshold', unit: '', does: 'the clouding density that scores 50' },
};

/** The constants of the index in force, in the order of its formulas. */
export function constantsInForce(
  constants: MuddinessConstants = MUDDINESS_CONSTANTS,
): readonly ConstantInForce[] {
  // The keys of a record over the names are those names.
  const names = Object.keys(TOLD) as Name[];
  return names.map((name) => ({ ...TOLD[name], value: constants[name], origin: originOf(name) }));
}

function originOf(name: Name): Origin {
  if (name === 'threshold') return 'set by the chart';
  return FITTED.some((fitted) => fitted === name) ? 'fitted' : 'part of the form';
}

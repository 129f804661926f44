import type {
  LimitsAnswer,
  LimitsRequest,
  RoughnessAnswer,
  RoughnessRequest,
} from '#shared/contracts/measures';
import { LOW_INTERVAL_LIMITS } from '#shared/data/low-interval-limits';
import { harmonicPartials } from '#shared/hearing/partials';
import { ROUGHNESS } from '#shared/hearing/roughness-models';
import { pitchName } from '#shared/pitch/names';
import { spellIn } from '#shared/pitch/spelling';
import { DEFAULT_ENSEMBLE } from '#shared/study/study.document';
import { modelLimits } from '#shared/voicing/model-limits';
import type { PlayingSection } from '#shared/voicing/section-pairs';

/** In which the printed chart's notes are spelt, too. */
const SPELLING = { tonic: 'C', mode: 'major' } as const;
const CONCERT_A_HZ = 440;

/** @returns a published model's figure for harmonic tones */
export function measureRoughness({ model, variant, midi, harmonics }: RoughnessRequest): RoughnessAnswer {
  const { measure, source } = ROUGHNESS[model];
  const rounding = variant === 'rounded' ? 'semitone' : 'exact';
  return { value: measure(harmonicPartials(midi, harmonics, rounding)), source };
}

type Playing = Omit<LimitsRequest, 'upper'>;

function sectionOf({ section, players, technique, dynamic }: Playing): PlayingSection {
  return { section, players: players ?? DEFAULT_ENSEMBLE.players[section], technique, dynamic };
}

/** @returns the chart's and the model's lowest lower note of each interval, by name */
export function measureLimits({ upper, ...lower }: LimitsRequest): LimitsAnswer {
  const pair = { lower: sectionOf(lower), upper: sectionOf(upper ?? lower), a4Hz: CONCERT_A_HZ };
  const limits = modelLimits(pair).map(({ interval, semitones, model }) => ({
    interval,
    semitones,
    chart: LOW_INTERVAL_LIMITS.find((printed) => printed.semitones === semitones)?.lowest ?? null,
    model: model === null ? null : pitchName(spellIn(model, SPELLING)),
  }));
  return { limits };
}

import { displayPitch, type NoteNaming } from '#shared/pitch/display';
import { pitchName } from '#shared/pitch/names';
import { spellIn, type SpellingKey } from '#shared/pitch/spelling';
import type { ModelLimit } from '#shared/voicing/model-limits';
import type { PitchAxis } from '@/charts/pitch-axis';

/** A limit drawn at its height: the lowest lower note of an interval. */
export interface LimitMark {
  readonly source: 'chart' | 'model';
  readonly y: number;
  /** Middle of its words, above or under the line so that the two keep apart. */
  readonly labelY: number;
  readonly label: string;
}

const LABEL_OFF = 8;

/**
 * The chart's limit and the model's beside it.
 * @returns the higher one first; none that lies off the axis
 */
export function limitMarks(
  { chart, model }: Pick<ModelLimit, 'chart' | 'model'>,
  axis: PitchAxis,
  naming: NoteNaming,
  key: SpellingKey,
): readonly LimitMark[] {
  const limits = [
    { source: 'chart' as const, midi: chart },
    { source: 'model' as const, midi: model },
  ];
  return limits
    .flatMap(({ source, midi }) => (midi === null ? [] : [{ source, midi }]))
    .filter(({ midi }) => midi >= axis.low && midi <= axis.high)
    .sort((a, b) => b.midi - a.midi)
    .map(({ source, midi }, index) => {
      const y = axis.yOf(midi);
      const label = `${source} ${displayPitch(pitchName(spellIn(midi, key)), naming)}`;
      return { source, y, labelY: index === 0 ? y - LABEL_OFF : y + LABEL_OFF, label };
    });
}

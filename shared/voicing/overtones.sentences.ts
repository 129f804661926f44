import type { ChordAnalysis } from '#shared/voicing/analysis';
import { hertzText } from '#shared/voicing/words';

/**
 * The overtones pane in words, for a reader who cannot see it.
 * @example overtonesSummary(analysis) // '5 voices, 130 partials from 73 Hz to 9800 Hz; the strongest meeting …'
 */
export function overtonesSummary({ voices, pairs }: Pick<ChordAnalysis, 'voices' | 'pairs'>): string {
  const all = voices.flatMap(({ partials }) => partials.map(({ frequencyHz }) => frequencyHz));
  if (all.length === 0) return 'No overtones yet: the chord has no notes.';
  const [low, high] = [hertzText(Math.min(...all)), hertzText(Math.max(...all))];
  const count = `${voices.length} ${voices.length === 1 ? 'voice' : 'voices'}, ${all.length} partials`;
  const strongest = pairs[0]?.meetings[0];
  const meeting = strongest
    ? ` The partials that cloud most stand ${hertzText(strongest.differenceHz)} apart.`
    : '';
  return `${count} from ${low} to ${high}.${meeting}`;
}

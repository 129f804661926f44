import { displayPitch, type NoteNaming } from '#shared/pitch/display';
import { pitchName } from '#shared/pitch/names';
import { spellIn, type SpellingKey } from '#shared/pitch/spelling';
import type { VoiceSound } from '#shared/voicing/analysis';
import type { ModelLimit } from '#shared/voicing/model-limits';
import type { SectionPair } from '#shared/voicing/section-pairs';
import type { Hertz, Midi } from '#shared/units';

/**
 * How the two notes' sections play, whatever they play: what the model's limit depends on.
 * @param lower the lower note
 * @param upper the upper one
 */
export function sectionPairOf(lower: VoiceSound, upper: VoiceSound, a4Hz: Hertz): SectionPair {
  const playing = ({ section, players, technique, dynamic }: VoiceSound) => ({
    ...{ section, players, technique, dynamic },
  });
  return { lower: playing(lower), upper: playing(upper), a4Hz };
}

/**
 * The chart's limit of an interval beside the model's for the sections at hand.
 * @param limit of the interval; none for one that is wider than the tenth or a unison
 * @param key for spelling
 * @example limitText(majorThird, key, 'english')
 * // 'Chart: not below B♭2. For these sections the model puts it at F2.'
 */
export function limitText(limit: ModelLimit | undefined, key: SpellingKey, naming: NoteNaming): string {
  if (!limit) return 'The chart has no limit for this interval.';
  const name = (midi: Midi): string => displayPitch(pitchName(spellIn(midi, key)), naming);
  const chart =
    limit.chart === null ? 'Chart: no limit for this interval.' : `Chart: not below ${name(limit.chart)}.`;
  const model =
    limit.model === null
      ? 'For these sections the model finds none: the two stay at 50 or under wherever they stand.'
      : `For these sections the model puts it at ${name(limit.model)}.`;
  return `${chart} ${model}`;
}

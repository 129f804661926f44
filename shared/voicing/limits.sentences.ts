import { displayPitch, noteName, type NoteNaming } from '#shared/pitch/display';
import { intervalName, withArticle } from '#shared/pitch/interval-names';
import { parsePitch, pitchName } from '#shared/pitch/names';
import { spellIn, type SpellingKey } from '#shared/pitch/spelling';
import { limitsInForce, type OwnLimit } from '#shared/study/own-limits';
import type { LimitFinding, VoiceSound } from '#shared/voicing/analysis';
import type { ModelLimit } from '#shared/voicing/model-limits';
import type { SectionPair } from '#shared/voicing/section-pairs';
import { possessive, semitonesText } from '#shared/voicing/words';
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
 * The lowest note of a chord above a root that is played elsewhere.
 * @param root as a pitch, just below the chord
 * @param lowest the chord's lowest note
 * @param limit that it passes
 * @example rootElsewhereText('C2', E2, limit, 'english')
 * // 'With the root C played elsewhere, the cellos’ E2, a major third above it, stands 10 semitones under its low limit.'
 */
export function rootElsewhereText(
  root: string,
  lowest: VoiceSound,
  { semitonesBelow }: LimitFinding,
  naming: NoteNaming,
): string {
  const [low, high] = [parsePitch(root), parsePitch(lowest.pitch)];
  const interval = low && high ? `, ${withArticle(intervalName(low, high))} above it,` : '';
  const name = low ? noteName(low, naming) : root;
  const note = `${possessive(lowest.section, lowest.players)} ${displayPitch(lowest.pitch, naming)}`;
  const under = `stands ${semitonesText(semitonesBelow)} under its low limit`;
  return `With the root ${name} played elsewhere, ${note}${interval} ${under}.`;
}

/**
 * The limit of an interval that is in force, in the place of the chart's.
 * @param limit the chart's and the model's
 * @param own a study's own limits; none leaves the chart in force
 * @example limitInForce(majorThird, [{ semitones: 4, lowest: 'C3' }]).chart // 48
 */
export function limitInForce(limit: ModelLimit, own: readonly OwnLimit[] | null): ModelLimit {
  if (own === null) return limit;
  const found = limitsInForce(own).find(({ semitones }) => semitones === limit.semitones);
  return { ...limit, chart: found?.lowestMidi ?? null };
}

/**
 * The chart's limit of an interval beside the model's for the sections at hand.
 * @param limit of the interval; none for one that is wider than the tenth or a unison
 * @param key for spelling
 * @param own the chart's place is taken by limits of the study's own
 * @example limitText(majorThird, key, 'english')
 * // 'Chart: not below B♭2. For these sections the model puts it at F2.'
 */
export function limitText(
  limit: ModelLimit | undefined,
  key: SpellingKey,
  naming: NoteNaming,
  own: readonly OwnLimit[] | null = null,
): string {
  if (!limit) return 'The chart has no limit for this interval.';
  const name = (midi: Midi): string => displayPitch(pitchName(spellIn(midi, key)), naming);
  const inForce = limitInForce(limit, own).chart;
  const source = own === null ? 'Chart' : 'Own limits';
  const chart =
    inForce === null ? `${source}: no limit for this interval.` : `${source}: not below ${name(inForce)}.`;
  const model =
    limit.model === null
      ? 'For these sections the model finds none: the two stay at 50 or under wherever they stand.'
      : `For these sections the model puts it at ${name(limit.model)}.`;
  return `${chart} ${model}`;
}

import { SECTION_FACTS, type Section } from '#shared/strings/sections';
import type { Midi } from '#shared/units';
import type { VoiceSound } from '#shared/voicing/analysis';
import { apartText, type SeriesMeeting } from '#shared/voicing/series-meetings';
import { FLOOR_DB, loudestOf, ROOM_DB } from '@/charts/overtones';
import type { PitchAxis } from '@/charts/pitch-axis';
import { spreadLabels } from '@/charts/spread-labels';

/** The number of a partial at the end of its tick. */
export interface SeriesLabel {
  readonly n: number;
  readonly y: number;
  /** From the left of the plot, in per cent of its width. */
  readonly x: number;
}

/** A partial of the series and the one that it meets. */
export interface SeriesBracket {
  readonly key: string;
  readonly path: string;
  readonly labelY: number;
  readonly section: Section;
  readonly label: string;
}

/** From one line of 11-pixel figures to the next. */
const LABEL_GAP = 11;
const BRACKET_GAP = 14;
const ARM = 4;
const LABELS_AT = 12;
const PERCENT = 100;

/**
 * The numbers of a note's partials, from the fundamental up, as many as stand clear of each other.
 * @param voice whose series is shown
 * @param voices of the chord, from whose loudest partial levels are counted
 * @param midiOf the pitch of a frequency on the axis
 */
export function seriesLabels(
  voice: VoiceSound,
  voices: readonly VoiceSound[],
  axis: PitchAxis,
  midiOf: (frequencyHz: number) => Midi,
): readonly SeriesLabel[] {
  const loudest = loudestOf(voices);
  const labels: SeriesLabel[] = [];
  for (const { n, frequencyHz, levelDb } of voice.partials) {
    const [level, midi] = [levelDb - loudest, midiOf(frequencyHz)];
    const y = axis.yOf(midi);
    const last = labels.at(-1);
    if (level <= FLOOR_DB || midi < axis.low || (last && last.y - y < LABEL_GAP)) continue;
    labels.push({ n, y, x: ((level - FLOOR_DB) / (ROOM_DB - FLOOR_DB)) * PERCENT });
  }
  return labels;
}

/**
 * What a note's partials meet, each with the other's section, its partial and how far apart the two stand.
 * @param meetings of the note
 */
export function seriesBrackets(
  meetings: readonly SeriesMeeting[],
  voices: readonly VoiceSound[],
  axis: PitchAxis,
  midiOf: (frequencyHz: number) => Midi,
): readonly SeriesBracket[] {
  const byId = new Map(voices.map((voice) => [voice.id, voice]));
  const found = meetings.flatMap(({ n, frequencyHz, otherId, otherN, otherHz, differenceHz }) => {
    const other = byId.get(otherId);
    const [a, b] = [midiOf(frequencyHz), midiOf(otherHz)];
    if (!other || Math.max(a, b) < axis.low || Math.min(a, b) > axis.high) return [];
    const [top, bottom] = [axis.yOf(Math.max(a, b)), axis.yOf(Math.min(a, b))];
    const label = `${SECTION_FACTS[other.section].mark}${otherN} ${apartText(differenceHz)}`;
    return [{ key: `${n} ${otherId} ${otherN}`, top, bottom, label, section: other.section }];
  });
  const bounds = { top: axis.strip, bottom: axis.height - BRACKET_GAP / 2 };
  const ys = spreadLabels(
    found.map(({ top, bottom }) => (top + bottom) / 2),
    BRACKET_GAP,
    bounds,
  );
  return found.map(({ key, top, bottom, label, section }, index) => {
    const labelY = ys[index] ?? top;
    const path = `M0 ${top}H${ARM}V${bottom}H0M${ARM} ${(top + bottom) / 2}L${LABELS_AT - 2} ${labelY}`;
    return { key, path, labelY, label, section };
  });
}

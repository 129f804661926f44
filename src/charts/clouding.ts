import type { ChordAnalysis, PairShare, VoiceSound } from '#shared/voicing/analysis';
import { hertzText } from '#shared/voicing/words';
import type { Midi } from '#shared/units';
import type { PitchAxis } from '@/charts/pitch-axis';
import { siltColour } from '@/charts/silt';
import { spreadLabels } from '@/charts/spread-labels';

/** A place at which a register clouds most. */
export interface CloudingRow {
  readonly register: string;
  readonly top: number;
  readonly height: number;
  /** 0 … 100. */
  readonly index: number;
  readonly colour: string;
}

/** Two partials that meet, and how far apart they stand. */
export interface MeetingBracket {
  readonly key: string;
  /** From one to the other, with an arm to the label. */
  readonly path: string;
  readonly labelY: number;
  readonly label: string;
}

/** The place is a window of a few semitones: this far to either side it counts at least three fifths. */
const HALF_WINDOW = 2;
/** A register that stands under this has nothing worth a row. */
const LEAST_INDEX = 10;
const MOST_MEETINGS = 4;
const LABEL_GAP = 15;
/** Width of a bracket, in pixels. */
const ARM = 5;
const LABELS_AT = 26;

/** @returns a row at the cloudiest place of every register that clouds */
export function cloudingRows({ muddiness }: ChordAnalysis, axis: PitchAxis): readonly CloudingRow[] {
  return muddiness.registers.flatMap(({ register, index, at }) => {
    if (at === null || index < LEAST_INDEX) return [];
    const [top, bottom] = [axis.yOf(at + HALF_WINDOW), axis.yOf(at - HALF_WINDOW)];
    return [{ register, top, height: bottom - top, index, colour: siltColour(index) }];
  });
}

function frequencyOf(voice: VoiceSound | undefined, n: number): number | null {
  return voice?.partials.find((partial) => partial.n === n)?.frequencyHz ?? null;
}

function strongest(pairs: readonly PairShare[]) {
  return pairs
    .flatMap((pair) =>
      pair.meetings.map((meeting) => ({ pair, meeting, weight: pair.share * meeting.share })),
    )
    .sort((a, b) => b.weight - a.weight)
    .slice(0, MOST_MEETINGS);
}

/**
 * The strongest meetings of partials in the cloudiest register, each with its difference in hertz.
 * @param midiOf the pitch of a frequency on the axis
 */
export function meetingBrackets(
  { voices, pairs }: ChordAnalysis,
  axis: PitchAxis,
  midiOf: (frequencyHz: number) => Midi,
): readonly MeetingBracket[] {
  const byId = new Map(voices.map((voice) => [voice.id, voice]));
  const found = strongest(pairs).flatMap(({ pair, meeting }) => {
    const a = frequencyOf(byId.get(pair.lowerId), meeting.lowerN);
    const b = frequencyOf(byId.get(pair.upperId), meeting.upperN);
    if (a === null || b === null) return [];
    const [top, bottom] = [axis.yOf(midiOf(Math.max(a, b))), axis.yOf(midiOf(Math.min(a, b)))];
    const key = `${pair.lowerId} ${meeting.lowerN} ${pair.upperId} ${meeting.upperN}`;
    return [{ key, top, bottom, label: hertzText(meeting.differenceHz) }];
  });
  const bounds = { top: axis.strip, bottom: axis.height - LABEL_GAP / 2 };
  const ys = spreadLabels(
    found.map(({ top, bottom }) => (top + bottom) / 2),
    LABEL_GAP,
    bounds,
  );
  return found.map(({ key, top, bottom, label }, index) => {
    const labelY = ys[index] ?? top;
    // Each its own column: brackets that overlap would read as one.
    const x = ARM * (index + 1);
    const path = `M${x - ARM + 1} ${top}H${x}V${bottom}H${x - ARM + 1}M${x} ${(top + bottom) / 2}L${LABELS_AT} ${labelY}`;
    return { key, path, labelY, label };
  });
}

import { equalTempered, midiOfFrequency } from '#shared/pitch/tuning';
import type { PairShare, PartialMeeting, VoiceSound } from '#shared/voicing/analysis';
import { AXIS_LOW, windowValue } from '#shared/voicing/muddiness/axis';
import type { JoinedVoice } from '#shared/voicing/muddiness/joined';
import type { MuddinessEntry, MuddinessModel } from '#shared/voicing/muddiness/model';
import { entryOf } from '#shared/voicing/muddiness/model';
import type { RegisterPeak } from '#shared/voicing/muddiness/scores';
import type { Tone } from '#shared/voicing/muddiness/tones';
import { cloudingAt, distanceErb } from '#shared/voicing/muddiness/tones';

/** The partials that a reader can take in at once. */
const MEETINGS_SHOWN = 3;
/** Farther from the place than this many widths the window is under a hundred-thousandth. */
const WINDOW_WIDTHS = 2.5;

/**
 * Which pairs of notes, and which of their partials, make the clouding at a register's cloudiest place.
 * @param peak the place
 * @param voices as they sound
 * @param joined the same with unisons joined, low to high
 * @returns shares of R^m between pairs of notes (they add up to 1) and of r within a pair, largest first
 */
export function explainPeak(
  peak: RegisterPeak,
  voices: readonly Pick<VoiceSound, 'id'>[],
  joined: readonly JoinedVoice[],
  model: MuddinessModel,
): readonly PairShare[] {
  const entries = joined.map((voice) => entryOf(voice, model));
  const pairs = entries.flatMap((upper, second) =>
    entries.slice(0, second).map((lower, first) => ({
      lower,
      upper,
      members: memberPairs(joined[first], joined[second], voices),
      clouding: pairCloudingAt(peak.point, lower, upper, model),
    })),
  );
  const whole = pairs.reduce((sum, { clouding }) => sum + clouding, 0);
  return pairs
    .filter(({ clouding }) => clouding > 0)
    .flatMap(({ lower, upper, members, clouding }) => {
      const meetings = meetingsOf(lower.table.tone, upper.table.tone, peak, model);
      return members.map(({ lowerId, upperId, part }) => ({
        lowerId,
        upperId,
        register: peak.register,
        share: (clouding / whole) * part,
        meetings,
      }));
    })
    .sort((a, b) => b.share - a.share);
}

function pairCloudingAt(
  point: number,
  lower: MuddinessEntry,
  upper: MuddinessEntry,
  { tables }: MuddinessModel,
): number {
  if (lower.energy === 0 || upper.energy === 0) return 0;
  const { from, values } = tables.ofPair(lower.table, upper.table);
  return lower.weight * upper.weight * (values[point - from] ?? 0);
}

/** Voices in unison share what their joint note does, by their energies. */
function memberPairs(
  lower: JoinedVoice | undefined,
  upper: JoinedVoice | undefined,
  voices: readonly Pick<VoiceSound, 'id'>[],
): readonly { lowerId: string; upperId: string; part: number }[] {
  return (lower?.members ?? []).flatMap((a) =>
    (upper?.members ?? []).flatMap((b) => {
      const lowerId = voices[a.index]?.id;
      const upperId = voices[b.index]?.id;
      if (lowerId === undefined || upperId === undefined) return [];
      return [{ lowerId, upperId, part: a.part * b.part }];
    }),
  );
}

function meetingsOf(
  lower: Tone,
  upper: Tone,
  peak: RegisterPeak,
  { constants, axis, a4Hz }: MuddinessModel,
): readonly PartialMeeting[] {
  const place = AXIS_LOW + axis.step * peak.point;
  const reach = constants.windowSemitones * WINDOW_WIDTHS;
  const nearest = { low: equalTempered(place - reach, a4Hz), high: equalTempered(place + reach, a4Hz) };
  const found: PartialMeeting[] = [];
  let whole = 0;
  for (let i = 0; i < lower.frequencies.length; i += 1) {
    const a = lower.frequencies[i] ?? 0;
    if (a > 2 * nearest.high) break;
    for (let j = 0; j < upper.frequencies.length; j += 1) {
      const b = upper.frequencies[j] ?? 0;
      const mean = (a + b) / 2;
      if (mean > nearest.high) break;
      if (mean < nearest.low) continue;
      const weight = windowValue(midiOfFrequency(mean, a4Hz) - place, constants.windowSemitones);
      const amplitude = (lower.amplitudes[i] ?? 0) * (upper.amplitudes[j] ?? 0);
      const clouding = amplitude * cloudingAt(distanceErb(a, b), constants) * weight;
      if (clouding <= 0) continue;
      whole += clouding;
      keepLargest(found, { lowerN: i + 1, upperN: j + 1, differenceHz: Math.abs(a - b), share: clouding });
    }
  }
  return found.map((meeting) => ({ ...meeting, share: meeting.share / whole }));
}

/** Keeps a short list in falling order: most meetings are small and leave it as it is. */
function keepLargest(list: PartialMeeting[], meeting: PartialMeeting): void {
  const last = list[MEETINGS_SHOWN - 1];
  if (last && meeting.share <= last.share) return;
  list.push(meeting);
  list.sort((a, b) => b.share - a.share);
  if (list.length > MEETINGS_SHOWN) list.pop();
}

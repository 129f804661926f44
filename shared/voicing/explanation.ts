import { midiOfFrequency } from '#shared/pitch/tuning';
import type { PairShare, PartialMeeting, VoiceSound } from '#shared/voicing/analysis';
import { WINDOW_REACH } from '#shared/voicing/muddiness/axis';
import type { JoinedVoice } from '#shared/voicing/muddiness/joined';
import type { Density, MuddinessModel } from '#shared/voicing/muddiness/model';
import { forEachMeeting } from '#shared/voicing/muddiness/pairs';
import type { RegisterPeak } from '#shared/voicing/muddiness/scores';
import { cloudingAt } from '#shared/voicing/muddiness/tones';

/** The partials that a reader can take in at once. */
const MEETINGS_SHOWN = 3;
const WINDOW_EXPONENT = 2;

/**
 * Which pairs of notes, and which of their partials, make the clouding at a register's cloudiest place.
 * @param voices as they sound
 * @param joined the same with unisons joined, as the density was taken from
 * @returns shares of R^m between pairs of notes (they add up to 1) and of r within a pair, largest first
 */
export function explainPeak(
  peak: RegisterPeak,
  voices: readonly VoiceSound[],
  joined: readonly JoinedVoice[],
  density: Density,
  model: MuddinessModel,
): readonly PairShare[] {
  const whole = density.pairs.reduce((sum, pair) => sum + pair.at(peak.point), 0);
  if (whole <= 0) return [];
  const shares = density.pairs.flatMap((pair) => {
    const lower = joined[pair.first];
    const upper = joined[pair.second];
    const share = pair.at(peak.point) / whole;
    if (!lower || !upper || share <= 0) return [];
    const meetings = meetingsOf(lower, upper, peak, model);
    return memberPairs(lower, upper, voices).map(({ lowerId, upperId, part }) => ({
      lowerId,
      upperId,
      register: peak.register,
      share: share * part,
      meetings,
    }));
  });
  return shares.sort((a, b) => b.share - a.share);
}

/** Voices in unison share what their joint note does, by their energies. */
function memberPairs(lower: JoinedVoice, upper: JoinedVoice, voices: readonly VoiceSound[]) {
  return lower.members.flatMap((a) =>
    upper.members.flatMap((b) => {
      const lowerId = voices[a.index]?.id;
      const upperId = voices[b.index]?.id;
      return lowerId === undefined || upperId === undefined
        ? []
        : [{ lowerId, upperId, part: a.part * b.part }];
    }),
  );
}

function meetingsOf(
  lower: JoinedVoice,
  upper: JoinedVoice,
  peak: RegisterPeak,
  model: MuddinessModel,
): readonly PartialMeeting[] {
  const found: { meeting: Omit<PartialMeeting, 'share'>; mass: number }[] = [];
  forEachMeeting(lower.tone, upper.tone, (i, j, y) => {
    const a = lower.tone.frequencies[i] ?? 0;
    const b = upper.tone.frequencies[j] ?? 0;
    const weight = windowAt(midiOfFrequency((a + b) / 2, model.a4Hz) - peak.at, model);
    const amplitude = (lower.tone.amplitudes[i] ?? 0) * (upper.tone.amplitudes[j] ?? 0);
    const mass = amplitude * cloudingAt(y, model.constants) * weight;
    if (mass > 0)
      found.push({ meeting: { lowerN: i + 1, upperN: j + 1, differenceHz: Math.abs(a - b) }, mass });
  });
  const whole = found.reduce((sum, { mass }) => sum + mass, 0);
  return found
    .map(({ meeting, mass }) => ({ ...meeting, share: mass / whole }))
    .sort((a, b) => b.share - a.share)
    .slice(0, MEETINGS_SHOWN);
}

function windowAt(distance: number, { constants }: MuddinessModel): number {
  if (Math.abs(distance) > WINDOW_REACH) return 0;
  return Math.exp(-WINDOW_EXPONENT * (distance / constants.windowSemitones) ** 2);
}

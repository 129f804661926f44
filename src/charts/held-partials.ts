import type { Section } from '#shared/strings/sections';
import type { Decibels, Midi } from '#shared/units';
import type { ChordAnalysis, VoiceSound } from '#shared/voicing/analysis';
import { compareVoicings } from '#shared/voicing/comparison';
import { FLOOR_DB, loudestOf } from '@/charts/overtones';
import type { PitchAxis } from '@/charts/pitch-axis';

/** A partial that only one of the two voicings has. */
export interface DifferentPartial {
  readonly key: string;
  readonly section: Section;
  readonly fundamental: boolean;
  /** Where its level stands across the plot, in per cent. */
  readonly x: number;
  readonly y: number;
}

export interface DifferentPartials {
  readonly onlyHeld: readonly DifferentPartial[];
  /** Only the fundamentals: the plot below shows their partials already. */
  readonly onlyNow: readonly DifferentPartial[];
}

interface Shown {
  readonly held: ChordAnalysis;
  readonly now: ChordAnalysis;
  readonly axis: PitchAxis;
  readonly midiOf: (frequencyHz: number) => Midi;
  /** Where the level scale of the plot ends. */
  readonly topDb: Decibels;
}

const PERCENT = 100;

/**
 * The partials that lie in only one of two voicings, on the scales of the overtones' plot: levels count from the
 * loudest partial of the voicing now, so that one level stands at one place.
 * @returns nothing for two voicings that sound the same
 */
export function differentPartials({ held, now, axis, midiOf, topDb }: Shown): DifferentPartials {
  const loudest = loudestOf(now.voices.length > 0 ? now.voices : held.voices);
  const xOf = (levelDb: Decibels): number =>
    (PERCENT * (Math.min(levelDb - loudest, topDb) - FLOOR_DB)) / (topDb - FLOOR_DB);
  const placed = ({ id, section, partials }: VoiceSound): readonly DifferentPartial[] =>
    partials
      .filter(({ levelDb }) => levelDb - loudest > FLOOR_DB)
      .map(({ n, frequencyHz, levelDb }) => ({
        ...{ key: `${id} ${n}`, section, fundamental: n === 1 },
        ...{ x: xOf(levelDb), y: axis.yOf(midiOf(frequencyHz)) },
      }));
  const changes = compareVoicings(held, now).notes.filter(({ kind }) => kind !== 'stays');
  return {
    onlyHeld: changes.flatMap((change) => (change.held ? placed(change.held) : [])),
    onlyNow: changes
      .flatMap((change) => (change.now ? placed(change.now) : []))
      .filter(({ fundamental }) => fundamental),
  };
}

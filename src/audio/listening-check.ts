import { FULL_CHORD_LEVEL } from '@/audio/levels';
import type { TimedSound } from '@/audio/schedule';
import { levelOfPhon } from '#shared/hearing/iso-226-2003';
import { midiOfName } from '#shared/pitch/names';
import { equalTempered } from '#shared/pitch/tuning';
import { techniqueSchema } from '#shared/study/study.document';
import type { Decibels, Hertz, Midi } from '#shared/units';

/** The notes of the check, from one that everything sounds down to where no small loudspeaker goes. Chosen. */
export const CHECK_NOTES = ['C4', 'G3', 'C3', 'A2', 'F2', 'D2', 'B1', 'G1', 'E1', 'C1'] as const;
export type CheckNote = (typeof CHECK_NOTES)[number];

/** A note, or a silence that nobody should say to have heard. */
export type Trial = { readonly kind: 'tone'; readonly note: CheckNote } | { readonly kind: 'silence' };

export interface CheckState {
  readonly trials: readonly Trial[];
  readonly index: number;
  /** How often the present note has not been heard. */
  readonly missed: number;
  readonly lowest: CheckNote | null;
  /** Something was said to be heard where there was nothing. */
  readonly heardNothing: boolean;
  readonly isOver: boolean;
}

/** What is remembered of a loudspeaker: the lowest note heard, or none of them. */
export interface Reach {
  readonly lowest: CheckNote | null;
}

/** The silence comes after one of the first notes have been heard, and before the last of a small loudspeaker. */
const SILENCE_BETWEEN = { least: 1, most: 4 } as const;
/** A note not heard is played once more. */
const CHANCES = 2;

/**
 * Begins a check, with one silence among its notes.
 * @param draw 0 ≤ draw < 1: where the silence comes, so that nobody can know
 * @example beginCheck(0).trials[1].kind // 'silence'
 */
export function beginCheck(draw: number): CheckState {
  const { least, most } = SILENCE_BETWEEN;
  const silentAt = least + Math.floor(draw * (most - least + 1));
  const tones = CHECK_NOTES.map((note): Trial => ({ kind: 'tone', note }));
  const trials = [...tones.slice(0, silentAt), { kind: 'silence' } as const, ...tones.slice(silentAt)];
  return { trials, index: 0, missed: 0, lowest: null, heardNothing: false, isOver: false };
}

function onwards(state: CheckState): CheckState {
  const index = state.index + 1;
  return { ...state, index, missed: 0, isOver: index >= state.trials.length };
}

/**
 * Takes down an answer: a note that is heard leads to a lower one, a note twice not heard ends the check.
 * @returns the same state where it is over
 */
export function answerCheck(state: CheckState, heard: boolean): CheckState {
  const trial = state.trials[state.index];
  if (state.isOver || !trial) return state;
  if (trial.kind === 'silence') return onwards({ ...state, heardNothing: state.heardNothing || heard });
  if (heard) return onwards({ ...state, lowest: trial.note });
  const missed = state.missed + 1;
  return { ...state, missed, isOver: missed >= CHANCES };
}

/** The first, middle note's level under full scale; volume takes off from it. Chosen. */
const FIRST_LEVEL: Decibels = -24;
const MOST_LEVEL: Decibels = -4;
const CONTOUR_PHON = 60;
const CONTOUR_LOW: Hertz = 20;
const A4: Hertz = 440;
export const TRIAL_SECONDS = 1.5;

/**
 * How strong a trial note is: raised along the equal-loudness contour, so that a loudspeaker that sounds it
 * makes it as loud as the first, and none is loud for ears.
 * @returns the peak under full scale, before the volume
 * @source ISO 226:2003, 60 phon
 * @example trialLevel('C4') // -24
 */
export function trialLevel(note: CheckNote): Decibels {
  const contour = (name: CheckNote) =>
    levelOfPhon(CONTOUR_PHON, Math.max(equalTempered(midiOfName(name), A4), CONTOUR_LOW));
  return Math.min(FIRST_LEVEL + contour(note) - contour('C4'), MOST_LEVEL);
}

/** The level of the loudest chord on the scale on which a trial's levels are those under full scale. */
export const TRIAL_SCALE: Decibels = FULL_CHORD_LEVEL;

/** @returns what a trial sounds; a silence lasts as long as a note */
export function trialSchedule(trial: Trial): readonly TimedSound[] {
  const sounds =
    trial.kind === 'silence'
      ? []
      : [
          {
            id: 'trial',
            section: 'viola' as const,
            pitch: trial.note,
            midi: midiOfName(trial.note),
            players: 1,
            technique: techniqueSchema.parse({}),
            dynamic: 'mf' as const,
            partials: [
              {
                n: 1,
                frequencyHz: equalTempered(midiOfName(trial.note), A4),
                levelDb: trialLevel(trial.note),
              },
            ],
          },
        ];
  return [{ key: 'trial', startSeconds: 0, seconds: TRIAL_SECONDS, sounds }];
}

/**
 * @param at the place of what clouds; null where nothing does
 * @returns whether a loudspeaker does not sound it; false while nothing is known of the loudspeaker
 * @example liesBelowReach(40, { lowest: 'C3' }) // true
 */
export function liesBelowReach(at: Midi | null, reach: Reach | null): boolean {
  if (at === null || reach === null) return false;
  return reach.lowest === null || at < midiOfName(reach.lowest);
}

import {
  CLOSE_LOW_CHORDS,
  LOW_FIFTHS,
  OCTAVES_BELOW,
  OPEN_CHORDS,
  PASSING_CHORDS,
} from '#shared/data/model-chords';
import { SCORE_CHORDS } from '#shared/data/score-chords';
import { midiOfName } from '#shared/pitch/names';
import type { Midi } from '#shared/units';
import { dealtVoicing } from '#shared/voicing/calibration/yardsticks';
import type { MuddinessVoice } from '#shared/voicing/muddiness/model';

/** The index of chords dealt as an orchestra deals them: the bottom to the basses, the next note to the cellos. */
export interface DealtChords {
  readonly fifths: readonly number[];
  readonly octaves: readonly number[];
  readonly open: readonly number[];
  /** Chords of scores by their pitches, dealt anew. */
  readonly score: readonly number[];
  readonly close: readonly number[];
  readonly passing: readonly number[];
}

/** @param index of a chord's voices */
export function judgeDealt(index: (voices: readonly MuddinessVoice[]) => number): DealtChords {
  const dealt = (chords: readonly string[]) =>
    chords.map((chord) => index(dealtVoicing(chord.split(' ').map(midiOfName))));
  return {
    fifths: dealt(LOW_FIFTHS),
    octaves: dealt(OCTAVES_BELOW),
    open: dealt(OPEN_CHORDS),
    score: scorePitches().map((pitches) => index(dealtVoicing(pitches))),
    close: dealt(CLOSE_LOW_CHORDS),
    passing: dealt(PASSING_CHORDS),
  };
}

/** The pitches of each chord of a score, each once, low to high. */
function scorePitches(): readonly (readonly Midi[])[] {
  return SCORE_CHORDS.map(({ parts }) =>
    [...new Set(parts.flatMap(([, names]) => names.map(midiOfName)))].sort((a, b) => a - b),
  );
}

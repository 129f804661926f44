import { displayPitch } from '#shared/pitch/display';
import type { Midi } from '#shared/units';
import { OCTAVE, pitchedUpwards } from '#shared/voicing/tips/notes';
import { COMMON_PRACTICE, type Tip, type TipFacts } from '#shared/voicing/tips/tip';

/** Under this a wide space is the usual bottom and nothing to remark: middle C. */
const UPPER_STRINGS_FROM: Midi = 60;
/** The violins’ open G: an octave that lies lower is the bass’s rather than the melody’s. */
const MELODY_FROM: Midi = 55;
/** In two parts there is no telling the melody’s octave from the bass’s. */
const LEAST_VOICES = 3;

/** The melody is the highest voice that is locked; where none is, the highest of all. */
function melodyOf({ chord, analysis }: TipFacts) {
  const locked = new Set(chord.voices.filter((voice) => voice.locked).map(({ id }) => id));
  const notes = pitchedUpwards(analysis.voices);
  return notes.findLast(({ id }) => locked.has(id)) ?? notes.at(-1);
}

/** An octave doubling thickens without a new line. */
export const OCTAVE_UNDER_MELODY: Tip = {
  id: 'octave-under-melody',
  source: `${COMMON_PRACTICE}; the harmonic series`,
  says(facts) {
    const melody = melodyOf(facts);
    if (!melody || facts.analysis.voices.length < LEAST_VOICES) return null;
    const under = facts.analysis.voices.find(
      ({ midi, id }) => id !== melody.id && midi === melody.midi - OCTAVE,
    );
    if (!under || under.midi < MELODY_FROM) return null;
    return `${displayPitch(under.pitch, facts.naming)} doubles the melody an octave below: the melody’s overtones all fall on its own, so the tune grows warmer without a new line to follow.`;
  },
};

/** A wide space among the upper strings is heard as two groups. */
export const GAP_ABOVE: Tip = {
  id: 'gap-above',
  source: `${COMMON_PRACTICE} of part-writing`,
  says({ analysis, naming }) {
    const notes = pitchedUpwards(analysis.voices).filter(({ midi }) => midi >= UPPER_STRINGS_FROM);
    const place = notes.findIndex(({ midi }, index) => {
      const above = notes[index + 1];
      return above !== undefined && above.midi - midi > OCTAVE;
    });
    const [lower, upper] = [notes[place], notes[place + 1]];
    if (!lower || !upper) return null;
    const [low, high] = [displayPitch(lower.pitch, naming), displayPitch(upper.pitch, naming)];
    return `More than an octave lies open between ${low} and ${high}. Upper strings that keep within one blend as one body; further apart they are heard as two.`;
  },
};

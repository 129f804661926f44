/** A frequency in hertz, > 0. */
export type Hertz = number;
/** A level in decibels; every use says what 0 dB is. */
export type Decibels = number;
/** A hundredth of an equal-tempered semitone. */
export type Cents = number;
/** Equal-tempered semitones. */
export type Semitones = number;
/** A MIDI note number, sounding: 60 is C4, middle C. Fractions lie between the keys. */
export type Midi = number;
/** Beats of the study's metre. */
export type Beats = number;

/**
 * Voicings made to be judged, low to high, one section a note: what any player would call open, close and low,
 * or clear. Invented as yardsticks; no published source.
 */
export const OPEN_CHORDS: readonly string[] = [
  'C2 G2 E3 C4 G4',
  'D2 A2 F3 D4 A4',
  'F2 C3 A3 F4 C5',
  'G2 D3 B3 G4 D5',
  'Eb2 Bb2 G3 Eb4 Bb4',
];
export const CLOSE_LOW_CHORDS: readonly string[] = ['D2 F2 A2 D3 A3', 'E2 G2 C3 E3 C4', 'C2 E2 G2 Bb2'];
/** Each has at least one pair under its low interval limit. */
export const PASSING_CHORDS: readonly string[] = [
  'C2 E2 G3 C4 E4',
  'E2 G2 C3 G3 E4',
  'A1 C#2 E2 A3 E4',
  'F2 A2 C3 F3 A3',
  'G2 B2 D3 G3 D4',
];
/** Fifths at the bottom, none under its limit: as double basses and cellos play them. */
export const LOW_FIFTHS: readonly string[] = ['C2 G2', 'D2 A2', 'Eb2 Bb2', 'F2 C3', 'G2 D3', 'A2 E3'];
/** Basses doubled at the octave by the cellos, open above. */
export const OCTAVES_BELOW: readonly string[] = [
  'C2 C3',
  'D2 D3 A3',
  'C2 C3 G3 E4 C5',
  'G1 G2 D3',
  'D2 D3 A3 F4 D5',
  'E1 E2 B2',
];
export const CLEAR_TRIAD = 'C4 E4 G4';
export const MIDDLE_TRIAD = 'C3 E3 G3';

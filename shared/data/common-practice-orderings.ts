/** Two voicings of which arrangers take for granted that the first comes out muddier. */
export interface MuddierThan {
  /** Sounding pitches, low to high, one section a note, ordinary bowing, one dynamic, equal players. */
  readonly muddier: readonly string[];
  readonly clearer: readonly string[];
  readonly why: string;
}

function ordering(muddier: string, clearer: string, why: string): MuddierThan {
  return { muddier: muddier.split(' '), clearer: clearer.split(' '), why };
}

/** @source common practice of string arranging; no published source */
export const COMMON_PRACTICE_ORDERINGS: readonly MuddierThan[] = [
  ordering('C2 E2', 'C2 G2', 'a third at the bottom against a fifth'),
  ordering('C2 G2', 'C2 C3', 'a fifth at the bottom against an octave'),
  ordering('C2 A2', 'C2 G2', 'a sixth at the bottom against a fifth'),
  ordering('C2 E2', 'C2 A2', 'a third at the bottom against a sixth'),
  ordering('C2 E2', 'C2 E3', 'a third against a tenth'),
  ordering('C2 Eb2', 'C2 E2', 'a minor third against a major third'),
  ordering('C2 F2', 'C2 G2', 'a fourth against a fifth'),
  ordering('E2 G2 C3', 'C2 G2 E3', 'first inversion close and low against root position open'),
  ordering('D2 F2 A2 D3 A3', 'D2 A2 F3 D4 A4', 'close against open, five parts'),
  ordering('D2 F2 A2 D3 A3', 'D2 D3 A3 F4 D5', 'close against octave at the bottom'),
  ordering('C2 E2 G2 Bb2', 'C2 Bb2 E3 G3', 'a seventh chord close and low against its shell opened'),
  ordering('C2 E2 G2', 'C3 E3 G3', 'a close triad against the same an octave higher'),
  ordering('C3 E3 G3', 'C4 E4 G4', 'the same, an octave higher again'),
  ordering('C4 E4 G4', 'C5 E5 G5', 'the same, an octave higher again'),
  ordering('F1 F2 D3 A3 D4', 'D1 D2 A3 F4 D5', 'a sixth in the low middle against octaves and open spacing'),
  ordering('Bb1 D2 F2', 'Bb1 F2 D3', 'close against open, same bass'),
  ordering('E2 G#2 B2 E3', 'E2 B2 G#3 E4', 'close against open, same bass'),
  ordering('G2 B2 D3 G3 B3', 'G2 D3 B3 G4 B4', 'close against open, same bass, five parts'),
  ordering('C2 E2 G3 C5', 'C2 C3 G3 E4 C5', 'a third at the bottom against an octave, open above'),
  ordering('A2 C3 E3 A3', 'A3 C4 E4 A4', 'the same chord, an octave higher'),
];

/** A chord to begin with, as it would be typed. */
export interface ExampleChord {
  readonly title: string;
  readonly line: string;
}

/** The same harmony twice, close and low, then opened: made up for the empty bench. */
export const EXAMPLE_CHORDS: readonly ExampleChord[] = [
  { title: 'D minor, close and low', line: 'DB D2, Vc F2 A2, Va D3, Vn2 A3, Vn1 D4' },
  { title: 'The same, opened', line: 'DB D2, Vc D3, Va A3, Vn2 F4, Vn1 D5' },
];

import type { Section } from '#shared/strings/sections';

/** A chord of a published score, part by part; none of its pairs stands under its low interval limit. */
export interface ScoreChord {
  readonly id: string;
  readonly composer: string;
  readonly work: string;
  readonly location: string;
  readonly label: string;
  /** Section and sounding pitches of each part, the top part first. */
  readonly parts: readonly (readonly [Section, readonly string[]])[];
}

/** @source encodings of public-domain scores under CC0 (OpenScore and others), checked where there are two */
export const SCORE_CHORDS: readonly ScoreChord[] = [
  {
    id: 'deb10',
    composer: 'Debussy',
    work: 'String Quartet op.10, I',
    location: 'm.1',
    label: 'G minor',
    parts: [
      ['violin1', ['G4']],
      ['violin2', ['Bb3']],
      ['viola', ['D3']],
      ['cello', ['G2']],
    ],
  },
  {
    id: 'br1-2-1',
    composer: 'Brahms',
    work: 'Symphony 1 op.68, II',
    location: 'm.1',
    label: 'E/G# first inversion',
    parts: [
      ['violin1', ['G#4']],
      ['violin2', ['B3']],
      ['viola', ['E3', 'E4']],
      ['cello', ['E3']],
      ['doubleBass', ['G#1']],
    ],
  },
  {
    id: 'k421-2',
    composer: 'Mozart',
    work: 'String Quartet K.421, II',
    location: 'm.1 beat 2',
    label: 'F major open',
    parts: [
      ['violin1', ['A4']],
      ['violin2', ['F4']],
      ['viola', ['C4']],
      ['cello', ['F3']],
    ],
  },
  {
    id: 'b1-1a',
    composer: 'Beethoven',
    work: 'Symphony 1 op.21, I',
    location: 'm.1 beat 1',
    label: 'C7 (V7/IV), pizz.',
    parts: [
      ['violin1', ['G4', 'Bb4', 'E5']],
      ['violin2', ['G3', 'E4']],
      ['viola', ['C4']],
      ['cello', ['C4']],
      ['doubleBass', ['C3']],
    ],
  },
  {
    id: 'b1-1b',
    composer: 'Beethoven',
    work: 'Symphony 1 op.21, I',
    location: 'm.1 beat 3',
    label: 'F major, pizz.',
    parts: [
      ['violin1', ['F4', 'A4', 'F5']],
      ['violin2', ['A3', 'F4']],
      ['viola', ['F3']],
      ['cello', ['F3']],
      ['doubleBass', ['F2']],
    ],
  },
  {
    id: 'b5-21',
    composer: 'Beethoven',
    work: 'Symphony 5 op.67, I',
    location: 'm.21',
    label: 'G major (half cadence)',
    parts: [
      ['violin1', ['G5']],
      ['violin2', ['G3', 'D4', 'B4']],
      ['viola', ['G3']],
      ['cello', ['G2']],
      ['doubleBass', ['G1']],
    ],
  },
  {
    id: 'b9-3-3',
    composer: 'Beethoven',
    work: 'Symphony 9 op.125, III',
    location: 'm.3',
    label: 'Bb major, open position, no bass',
    parts: [
      ['violin1', ['D5']],
      ['violin2', ['D4']],
      ['viola', ['F3']],
      ['cello', ['Bb2']],
    ],
  },
  {
    id: 'k465-2a',
    composer: 'Mozart',
    work: 'String Quartet K.465, I',
    location: 'm.2 beat 1',
    label: 'Ab major/C (Dissonance opening)',
    parts: [
      ['violin2', ['Eb4']],
      ['viola', ['Ab3']],
      ['cello', ['C3']],
    ],
  },
  {
    id: 'b130-5',
    composer: 'Beethoven',
    work: 'String Quartet op.130, V (Cavatina)',
    location: 'm.1 beat 1',
    label: 'Eb (open, no 5th)',
    parts: [
      ['violin2', ['G4']],
      ['viola', ['G3']],
      ['cello', ['Eb2']],
    ],
  },
  {
    id: 'rav',
    composer: 'Ravel',
    work: 'String Quartet in F, I',
    location: 'm.1',
    label: 'F major',
    parts: [
      ['violin1', ['A4']],
      ['violin2', ['A3']],
      ['viola', ['C3']],
      ['cello', ['F2']],
    ],
  },
  {
    id: 'h74-1b',
    composer: 'Haydn',
    work: 'String Quartet op.74 no.1, I',
    location: 'm.2',
    label: 'C major stops',
    parts: [
      ['violin1', ['G3', 'E4', 'C5']],
      ['violin2', ['G3', 'E4']],
      ['viola', ['C3', 'G3', 'E4']],
      ['cello', ['C2', 'C3']],
    ],
  },
  {
    id: 'b6-5-9',
    composer: 'Beethoven',
    work: 'Symphony 6 op.68, V',
    location: 'm.9',
    label: 'F major',
    parts: [
      ['violin1', ['A5']],
      ['violin2', ['F4', 'A4']],
      ['viola', ['C3', 'A3']],
      ['cello', ['F2', 'C3']],
    ],
  },
  {
    id: 'k465-ii',
    composer: 'Mozart',
    work: 'String Quartet K.465, II',
    location: 'm.1',
    label: 'F major',
    parts: [
      ['violin1', ['C5']],
      ['violin2', ['A4']],
      ['viola', ['C4']],
      ['cello', ['F3']],
    ],
  },
  {
    id: 'b59-3',
    composer: 'Beethoven',
    work: 'String Quartet op.59 no.3, I',
    location: 'm.1',
    label: 'F# dim7',
    parts: [
      ['violin1', ['A4']],
      ['violin2', ['Eb4']],
      ['viola', ['C4']],
      ['cello', ['F#3']],
    ],
  },
  {
    id: 'b18-4',
    composer: 'Beethoven',
    work: 'String Quartet op.18 no.4, I',
    location: 'm.1',
    label: 'C minor low',
    parts: [
      ['violin1', ['C4']],
      ['violin2', ['G3']],
      ['viola', ['Eb3']],
      ['cello', ['C2']],
    ],
  },
  {
    id: 'h76-1',
    composer: 'Haydn',
    work: 'String Quartet op.76 no.1, I',
    location: 'm.1',
    label: 'G major stops',
    parts: [
      ['violin1', ['D4', 'B4', 'G5']],
      ['violin2', ['D4', 'B4', 'G5']],
      ['viola', ['D4', 'B4']],
      ['cello', ['G3']],
    ],
  },
  {
    id: 'sme1',
    composer: 'Smetana',
    work: 'String Quartet no.1, I',
    location: 'm.1',
    label: 'E minor ff stops',
    parts: [
      ['violin1', ['B4', 'G5', 'E6']],
      ['violin2', ['E4', 'B4', 'G5']],
      ['viola', ['E3', 'B3', 'G4']],
      ['cello', ['E2']],
    ],
  },
  {
    id: 'rider-2a',
    composer: 'Haydn',
    work: 'String Quartet op.74 no.3, II',
    location: 'm.1',
    label: 'E major',
    parts: [
      ['violin1', ['G#4']],
      ['violin2', ['E4']],
      ['viola', ['B3']],
      ['cello', ['E3']],
    ],
  },
  {
    id: 'bb3-2a',
    composer: 'Bach',
    work: 'Brandenburg Concerto 3 BWV 1048, II',
    location: 'm.1 beat 1',
    label: 'A minor/C, ten parts',
    parts: [
      ['violin1', ['A4']],
      ['violin2', ['E4']],
      ['violin2', ['E4']],
      ['viola', ['A4']],
      ['viola', ['C4']],
      ['viola', ['E3']],
      ['cello', ['C3']],
      ['doubleBass', ['C2']],
    ],
  },
];

import type { Dynamic, Mode } from '#shared/study/study.document';
import type { Register } from '#shared/voicing/registers';

/** Everybody and everything here is invented: the Saltern School of Music at Averhythe, on the Aver estuary. */
export type DemoPerson = 'isolde' | 'corin' | 'petra' | 'jonah' | 'wen' | 'hal';

export interface DemoChord {
  readonly name: string;
  readonly beats: number;
  /** As one types it on the bench: `DB C2, Vc E2`. */
  readonly line: string;
  readonly dynamic?: Dynamic;
  readonly muted?: boolean;
  readonly cloudsOnPurpose?: readonly Register[];
}

export interface DemoStudy {
  readonly owner: DemoPerson;
  readonly title: string;
  readonly about: string;
  readonly key: { readonly tonic: string; readonly mode: Mode };
  readonly tempoBpm: number;
  readonly chords: readonly DemoChord[];
  readonly shares: readonly { readonly with: DemoPerson; readonly may: 'view' | 'comment' }[];
  /** `chord` counts from 0; without it the remark is on the study. */
  readonly remarks: readonly { readonly by: DemoPerson; readonly chord?: number; readonly text: string }[];
}

const LOW_THIRD: DemoStudy = {
  owner: 'isolde',
  title: 'A low third and its cure',
  about: 'Writing for strings I, week 3. One chord four times: the bottom opens step by step.',
  key: { tonic: 'C', mode: 'major' },
  tempoBpm: 60,
  chords: [
    { name: 'as handed in', beats: 4, line: 'DB C2, Vc E2, Va G3, Vn2 C4, Vn1 E4' },
    { name: 'a fifth', beats: 4, line: 'DB C2, Vc G2, Va E3, Vn2 C4, Vn1 G4' },
    { name: 'a tenth', beats: 4, line: 'DB C2, Vc E3, Va G3, Vn2 C4, Vn1 E4' },
    { name: 'an octave', beats: 4, line: 'DB C2, Vc C3, Va G3, Vn2 E4, Vn1 C5' },
  ],
  shares: [
    { with: 'petra', may: 'comment' },
    { with: 'jonah', may: 'comment' },
    { with: 'wen', may: 'view' },
  ],
  remarks: [
    {
      by: 'isolde',
      chord: 0,
      text: 'Play this one before you look at the figures. Where in the hall would you stop hearing an E?',
    },
    { by: 'jonah', chord: 0, text: 'I hear a C and a growl. The E only comes back when the violas leave.' },
    {
      by: 'isolde',
      chord: 1,
      text: 'Nothing stands under the printed limit any more, and the index has come down to where the limits lie: just bearable, by both. Play both and decide whether you agree.',
    },
    { by: 'petra', chord: 3, text: 'Is the octave too empty in the middle for a final chord?' },
  ],
};

const HEAVY_AND_LIGHT: DemoStudy = {
  owner: 'corin',
  title: 'One harmony, heavy and light',
  about: 'D minor for the lock gates scene: the same three pitch classes from black to nearly nothing.',
  key: { tonic: 'D', mode: 'minor' },
  tempoBpm: 52,
  chords: [
    { name: 'shut', beats: 4, dynamic: 'f', line: 'DB D2, Vc F2 A2, Va D3, Vn2 A3, Vn1 D4' },
    { name: 'ajar', beats: 4, line: 'DB D2, Vc A2, Va F3, Vn2 D4, Vn1 A4' },
    { name: 'open', beats: 4, line: 'DB D2, Vc D3, Va A3, Vn2 F4, Vn1 D5' },
    { name: 'nobody there', beats: 6, dynamic: 'pp', line: 'Vc D3, Va A3, Vn2 F4, Vn1 A4 D5' },
  ],
  shares: [{ with: 'isolde', may: 'comment' }],
  remarks: [
    { by: 'corin', text: 'The director wants the first one held for three bars. Can the basses bear it?' },
    {
      by: 'isolde',
      chord: 0,
      text: 'They can; the listeners are another matter. If you divide the cellos at all, give the lower half the A.',
    },
  ],
};

const DIVIDED_CELLOS: DemoStudy = {
  owner: 'petra',
  title: 'Cellos in four',
  about: 'Eight cellos, two to a part, nobody else. Fifths and tenths at the bottom, thirds only on top.',
  key: { tonic: 'Eb', mode: 'major' },
  tempoBpm: 48,
  chords: [
    { name: 'tonic', beats: 4, dynamic: 'mp', line: 'Vc Eb2 Bb2 G3 Eb4' },
    { name: 'subdominant', beats: 2, dynamic: 'mp', line: 'Vc Ab2 Eb3 C4 Ab4' },
    { name: 'dominant, close', beats: 2, dynamic: 'mp', line: 'Vc Bb2 D3 F3 Ab3' },
    { name: 'dominant, open', beats: 2, dynamic: 'mp', line: 'Vc Bb2 F3 Ab3 D4' },
    { name: 'home', beats: 4, dynamic: 'p', line: 'Vc Eb2 Bb2 G3 Eb4' },
  ],
  shares: [{ with: 'isolde', may: 'comment' }],
  remarks: [
    { by: 'petra', chord: 2, text: 'I kept the close one to compare. It is thicker than I thought.' },
    {
      by: 'isolde',
      chord: 3,
      text: 'Yes, keep this one. Two players on a part also means 6 dB less for each line than the full section.',
    },
  ],
};

const PEDAL: DemoStudy = {
  owner: 'isolde',
  title: 'Over a held G',
  about: 'A pedal in octaves carries almost anything, as long as what moves stays well above it.',
  key: { tonic: 'G', mode: 'major' },
  tempoBpm: 66,
  chords: [
    { name: 'G', beats: 4, line: 'DB G1, Vc G2, Va D4, Vn2 G4, Vn1 B4' },
    { name: 'C over G', beats: 4, line: 'DB G1, Vc G2, Va E4, Vn2 G4, Vn1 C5' },
    { name: 'D over G', beats: 4, line: 'DB G1, Vc G2, Va F#4, Vn2 A4, Vn1 D5' },
    { name: 'the same, let down', beats: 4, line: 'DB G1, Vc A2, Va F#3, Vn2 A3, Vn1 D4' },
    { name: 'G again', beats: 4, line: 'DB G1, Vc G2, Va D4, Vn2 G4, Vn1 B4' },
  ],
  shares: [
    { with: 'petra', may: 'view' },
    { with: 'jonah', may: 'view' },
    { with: 'corin', may: 'view' },
  ],
  remarks: [
    {
      by: 'isolde',
      chord: 3,
      text: 'The dissonance is the same as in the third chord. What changed is only where it meets the pedal.',
    },
  ],
};

const WIDE: DemoStudy = {
  owner: 'corin',
  title: 'Mist over the flats',
  about: 'As wide as the sections go: five octaves and a half with nothing in the middle.',
  key: { tonic: 'E', mode: 'major' },
  tempoBpm: 44,
  chords: [
    { name: 'edges only', beats: 6, dynamic: 'pp', line: 'DB E1, Vc E2, Va G#4, Vn2 E5, Vn1 B5' },
    { name: 'middle filled', beats: 6, dynamic: 'p', line: 'DB E1, Vc B2, Va G#3, Vn2 E4, Vn1 B5' },
    { name: 'high and bare', beats: 6, dynamic: 'pp', line: 'Vc E3, Va B3, Vn2 G#4 B4, Vn1 E6' },
  ],
  shares: [],
  remarks: [],
};

const ON_PURPOSE: DemoStudy = {
  owner: 'jonah',
  title: 'The bar at low water',
  about: 'Exercise: a passage that clouds because it should. The hull touches ground in the third chord.',
  key: { tonic: 'C', mode: 'minor' },
  tempoBpm: 40,
  chords: [
    { name: 'afloat', beats: 4, dynamic: 'p', muted: true, line: 'DB C2, Vc C3, Va G3, Vn2 C4, Vn1 Eb4' },
    { name: 'shoaling', beats: 4, dynamic: 'p', muted: true, line: 'DB C2, Vc Ab2, Va C3, Vn2 F3' },
    {
      name: 'aground',
      beats: 8,
      dynamic: 'pp',
      muted: true,
      cloudsOnPurpose: ['great', 'small'],
      line: 'DB C2, Vc Eb2 Gb2, Va C3',
    },
    { name: 'off again', beats: 4, dynamic: 'mp', line: 'DB C2, Vc C3, Va G3, Vn2 Eb4, Vn1 C5' },
  ],
  shares: [{ with: 'isolde', may: 'comment' }],
  remarks: [
    { by: 'jonah', chord: 2, text: 'On purpose. I want the section to feel the note rather than hear it.' },
    {
      by: 'isolde',
      chord: 2,
      text: 'Then it is right. Tell the players so in the part, or they will try to mend it.',
    },
  ],
};

export const DEMO_STUDIES: readonly DemoStudy[] = [
  LOW_THIRD,
  HEAVY_AND_LIGHT,
  DIVIDED_CELLOS,
  PEDAL,
  WIDE,
  ON_PURPOSE,
];

import { describe, expect, it } from 'vitest';
import { readOut } from '#shared/notation/read-out';
import { scorePlan } from '#shared/notation/score-plan';
import { systemPlan } from '#shared/notation/system-plan';
import { pitchName } from '#shared/pitch/names';
import { newStudy } from '#shared/study/new-study';
import type { Chord, Technique } from '#shared/study/study.document';
import { chordOf } from '../../../support/typed-chords';

const study = { ...newStudy('chord-0'), key: { tonic: 'C', mode: 'major' } } as const;
const CLEFS = 'treble treble alto bass bass'.split(' ');

const clefs = (line: string) => systemPlan(chordOf(line), study, 'english').staves.map(({ clef }) => clef);
const words = (chord: Chord) => systemPlan(chord, study, 'english').staves.map((staff) => staff.words);

function played(line: string, technique: Partial<Technique>): Chord {
  const chord = chordOf(line);
  const voices = chord.voices.map((voice) => ({
    ...voice,
    technique: { ...voice.technique, ...technique },
  }));
  return { ...chord, voices };
}

function progression(...chords: (readonly [line: string, beats: number])[]): readonly Chord[] {
  return chords.map(([line, beats], index) => ({ ...chordOf(line), id: `chord-${index}`, beats }));
}

describe('one chord on five staves', () => {
  it('when sections lie where they mostly lie, then they have their ordinary clefs', () => {
    expect(clefs('DB D2, Vc A2, Va A3, Vn2 D4, Vn1 A4')).toEqual(CLEFS);
    expect(clefs('')).toEqual(CLEFS);
  });

  it('when violas, cellos or basses lie high, then their clef is a higher one', () => {
    expect(clefs('Va D5').at(2)).toBe('treble');
    expect(clefs('Vc G4').at(3)).toBe('tenor');
    expect(clefs('Vc D5').at(3)).toBe('treble');
    // G3 sounding is written G4.
    expect(clefs('DB G3').at(4)).toBe('tenor');
  });

  it('when a section is divided or has a double stop, then words and bracket say so', () => {
    expect(words(chordOf('Vc A2 F3')).at(3)).toEqual(['div.']);
    expect(words(chordOf('Vc A2 F3 C4')).at(3)).toEqual(['div. a 3']);
    expect(words(chordOf('Vc A2+F3')).at(3)).toEqual(['non div.']);
    expect(words(chordOf('Vc A2')).at(3)).toEqual([]);
    const stopped = systemPlan(chordOf('Vc A2+F3'), study, 'english').staves[3]?.chord;
    expect(stopped?.stops).toEqual([[0, 1]]);
  });

  it('when all lines are played alike, then the words stand once; else each line has its own', () => {
    expect(words(played('Vc A2 F3', { contact: 'sulTasto', mute: true })).at(3)).toEqual([
      'div.',
      'con sord.',
      'sul tasto',
    ]);
    const mixed = chordOf('Vc A2 F3');
    const voices = mixed.voices.map((voice) =>
      voice.pitch === 'A2'
        ? { ...voice, technique: { ...voice.technique, stroke: 'pizzicato' as const } }
        : voice,
    );
    expect(words({ ...mixed, voices }).at(3)).toEqual(['div.', '2. pizz.']);
  });

  it('when a tremolo is shared, then it is on the stem and has no word', () => {
    const plan = systemPlan(played('Vc A2 F3', { stroke: 'tremolo' }), study, 'english');
    expect(plan.staves[3]?.chord?.tremolo).toBe(true);
    expect(plan.staves[3]?.words).toEqual(['div.']);
  });

  it('when a harmonic is artificial, then its sound is named as the reader names notes', () => {
    const chord = played('Vn1 B6', { harmonic: 'artificial' });
    expect(words(chord)[0]).toEqual(['sounds B6']);
    expect(systemPlan(chord, study, 'german').staves[0]?.words).toEqual(['sounds H6']);
  });

  it('when a violin lies over the fifth ledger line, then it is written an octave lower under an 8va', () => {
    const staff = systemPlan(chordOf('Vn1 E7'), study, 'english').staves[0];
    expect(staff?.chord?.octaveUp).toBe(true);
    expect(staff?.chord?.notes.map(({ pitch }) => pitchName(pitch))).toEqual(['E6']);
    expect(systemPlan(chordOf('Vn1 C7'), study, 'english').staves[0]?.chord?.octaveUp).toBe(false);
  });

  it('when the staves are read out, then sections, clefs, words and sounding notes are told', () => {
    const chord = chordOf('DB D2, Vc A2 F3');
    expect(readOut(systemPlan(chord, study, 'english'), chord, 'english')).toEqual([
      'First violins: rest.',
      'Second violins: rest.',
      'Violas: rest.',
      'Cellos, bass clef, div.: F 3, A 2.',
      'Double basses, bass clef: D 2.',
    ]);
  });
});

describe('the progression as bars', () => {
  const signs = (chords: readonly Chord[]) =>
    scorePlan(study, chords, 'english').bars.map(({ moments }) =>
      moments.map(
        ({ value, tiedFrom, tiedTo, chordId }) =>
          `${tiedFrom ? '~' : ''}${chordId ? '' : 'rest '}${value.sign}${value.dotted ? '.' : ''}${tiedTo ? '~' : ''}`,
      ),
    );

  it('when chords fill bars, then each bar has its chords', () => {
    expect(signs(progression(['Vc A2', 4], ['Vc A2', 2], ['Vc F2', 2]))).toEqual([['1'], ['2', '2']]);
  });

  it('when a chord is longer than its bar, then it is tied over the bar line, and the last bar filled up', () => {
    expect(signs(progression(['Vc A2', 6]))).toEqual([['1~'], ['~2', 'rest 2']]);
    expect(signs(progression(['Vc A2', 3], ['Vc F2', 5]))).toEqual([['2.', '4~'], ['~1']]);
  });

  it('when an accidental has stood, then it is not repeated in its bar, nor after a tie', () => {
    const chords = progression(['Vc F#3', 2], ['Vc F#3', 3], ['Vc F#3', 3]);
    const written = scorePlan(study, chords, 'english').bars.map(({ moments }) =>
      moments.map(({ staves }) => staves[3]?.chord?.notes[0]?.accidental),
    );
    expect(written).toEqual([
      [1, null],
      [null, 1],
    ]);
  });

  it('when players unite, take the bow again or take mutes off, then words say so once', () => {
    const [first, second, third] = progression(['Vc A2 F3', 4], ['Vc A2', 4], ['Vc A2', 4]);
    if (!first || !second || !third) throw new Error('three chords');
    const pizzicato = first.voices.map((voice) => ({
      ...voice,
      technique: { ...voice.technique, stroke: 'pizzicato' as const, mute: true },
    }));
    const plan = scorePlan(study, [{ ...first, voices: pizzicato }, second, third], 'english');
    expect(plan.bars.map(({ moments }) => moments[0]?.staves[3]?.words)).toEqual([
      ['div.', 'pizz.', 'con sord.'],
      ['unis.', 'arco', 'senza sord.'],
      [],
    ]);
  });

  it('when a passage lies high, then its clef changes before the bar line; for one note it does not', () => {
    const passage = progression(['Vc A2', 4], ['Vc D5', 4], ['Vc E5', 4]);
    const bars = scorePlan(study, passage, 'english').bars;
    expect(bars.map((bar) => bar.clefs[3])).toEqual(['bass', 'treble', 'treble']);
    expect(bars[0]?.clefsAfter[3]).toBe('treble');
    // F4 in the bass clef has two ledger lines.
    const alone = progression(['Vc A2', 4], ['Vc F4', 4], ['Vc A2', 4]);
    expect(scorePlan(study, alone, 'english').bars.map((bar) => bar.clefs[3])).toEqual([
      'bass',
      'bass',
      'bass',
    ]);
  });

  it('when the dynamic stays, then it is written once', () => {
    const plan = scorePlan(study, progression(['Vc A2', 4], ['Vc F2', 4]), 'english');
    expect(plan.bars.map(({ moments }) => moments[0]?.staves[3]?.dynamics)).toEqual([['mf'], []]);
  });

  it('when a chord has no notes, then its bar is silent', () => {
    const [first] = progression(['Vc A2', 4]);
    const empty = { ...chordOf(''), id: 'chord-9', beats: 4 };
    if (!first) throw new Error('a chord');
    expect(scorePlan(study, [first, empty], 'english').bars.map(({ silent }) => silent)).toEqual([
      false,
      true,
    ]);
  });
});

import { describe, expect, it } from 'vitest';
import { setAccidentals } from '#shared/notation/accidentals';
import { signatureAlterations, signatureOf } from '#shared/notation/key-signature';
import { stepOf, writtenNotes } from '#shared/notation/written-notes';
import { parsePitch, pitchName, type Pitch } from '#shared/pitch/names';
import type { Section } from '#shared/strings/sections';
import { newVoice } from '#shared/study/new-study';
import type { Technique } from '#shared/study/study.document';

function pitches(...names: string[]): readonly Pitch[] {
  return names.map((name) => {
    const pitch = parsePitch(name);
    if (!pitch) throw new Error(name);
    return pitch;
  });
}

describe('the key signature', () => {
  it('when a key is major, minor or a church mode, then its signature is the trade’s', () => {
    expect(signatureOf({ tonic: 'C', mode: 'major' })).toBe(0);
    expect(signatureOf({ tonic: 'A', mode: 'major' })).toBe(3);
    expect(signatureOf({ tonic: 'C', mode: 'minor' })).toBe(-3);
    // B flat Dorian has the signature of A flat major.
    expect(signatureOf({ tonic: 'Bb', mode: 'dorian' })).toBe(-4);
    expect(signatureOf({ tonic: 'F', mode: 'lydian' })).toBe(0);
    expect(signatureOf({ tonic: 'E', mode: 'phrygian' })).toBe(0);
    expect(signatureOf({ tonic: 'B', mode: 'locrian' })).toBe(0);
  });

  it('when a signature would need double accidentals, then there is none', () => {
    // G sharp major would have eight sharps.
    expect(signatureOf({ tonic: 'G#', mode: 'major' })).toBe(0);
  });

  it('when it has signs, then they alter the letters in the order of fifths', () => {
    expect([...signatureAlterations(-2)]).toEqual([
      ['B', -1],
      ['E', -1],
    ]);
    expect([...signatureAlterations(1)]).toEqual([['F', 1]]);
  });
});

describe('accidentals', () => {
  const flat = signatureAlterations(-1);

  it('when a note is as the signature says, then it has none; else its own', () => {
    expect(setAccidentals(pitches('Bb3', 'B4', 'F#3', 'F4'), flat, new Map()).written).toEqual([
      null,
      0,
      1,
      null,
    ]);
  });

  it('when an accidental has stood in the bar, then it holds for its octave alone', () => {
    const { inForce } = setAccidentals(pitches('F#4'), flat, new Map());
    expect(setAccidentals(pitches('F#4', 'F#5'), flat, inForce).written).toEqual([null, 1]);
    expect(setAccidentals(pitches('F4'), flat, inForce).written).toEqual([0]);
  });

  it('when two notes share a line, then both have their accidental', () => {
    expect(setAccidentals(pitches('D4', 'Db4'), new Map(), new Map()).written).toEqual([0, -1]);
  });
});

describe('written notes', () => {
  const written = (section: Section, pitch: string, technique: Partial<Technique> = {}) => {
    const voice = newVoice('voice-1', section, pitch);
    const own = { ...voice, technique: { ...voice.technique, ...technique } };
    return writtenNotes(own, 'four-string').map((note) => ({ ...note, pitch: pitchName(note.pitch) }));
  };
  const plain = { voiceId: 'voice-1', head: 'ordinary', circled: false };

  it('when the double bass plays, then it is written an octave up; the others as they sound', () => {
    expect(written('doubleBass', 'D2')).toEqual([{ ...plain, pitch: 'D3' }]);
    expect(written('cello', 'D2')).toEqual([{ ...plain, pitch: 'D2' }]);
  });

  it('when a harmonic is natural, then it stands where it sounds, with a circle', () => {
    expect(written('cello', 'A4', { harmonic: 'natural' })).toEqual([
      { ...plain, pitch: 'A4', circled: true },
    ]);
  });

  it('when a harmonic is artificial, then it is stopped two octaves lower and touched a fourth above', () => {
    expect(written('violin1', 'E6', { harmonic: 'artificial' })).toEqual([
      { ...plain, pitch: 'E4' },
      { ...plain, pitch: 'A4', head: 'touched' },
    ]);
    // A fourth over F is B flat, over F sharp B.
    expect(written('violin1', 'F6', { harmonic: 'artificial' })[1]?.pitch).toBe('Bb4');
    expect(written('violin1', 'F#6', { harmonic: 'artificial' })[1]?.pitch).toBe('B4');
  });

  it('when a harmonic is artificial and cannot be stopped, then it is marked with a circle', () => {
    expect(written('violin1', 'G4', { harmonic: 'artificial' })).toEqual([
      { ...plain, pitch: 'G4', circled: true },
    ]);
  });

  it('when letters rise, then so do the steps, by seven an octave', () => {
    expect(stepOf({ letter: 'C', octave: 4 })).toBe(28);
    expect(stepOf({ letter: 'B', octave: 4 })).toBe(34);
    expect(stepOf({ letter: 'C', octave: 5 })).toBe(35);
  });
});

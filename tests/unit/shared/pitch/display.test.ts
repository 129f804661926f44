import { describe, expect, it } from 'vitest';
import { displayPitch, NOTE_NAMINGS, noteName, spokenPitch } from '#shared/pitch/display';
import { isLetter, LETTER_SEMITONES, type Pitch } from '#shared/pitch/names';
import { readNote } from '#shared/pitch/reading';

describe('note names', () => {
  it('when names are English, then accidentals are signs', () => {
    expect(displayPitch('Bb2', 'english')).toBe('B♭2');
    expect(displayPitch('F##3', 'english')).toBe('F♯♯3');
  });

  it('when names are German, then B is the flattened H and the vowels are shortened', () => {
    const names = ['Bb', 'B', 'Eb', 'Ab', 'F#', 'Cb', 'Abb', 'Bbb', 'C##', 'Db'];
    const shown = names.map((name) => displayPitch(`${name}3`, 'german').slice(0, -1));
    expect(shown.join(' ')).toBe('B H Es As Fis Ces Ases Heses Cisis Des');
  });

  it('when names are solfège, then syllables stand for letters', () => {
    expect(displayPitch('Bb2', 'solfege')).toBe('si♭2');
    expect(displayPitch('G#4', 'solfege')).toBe('sol♯4');
  });

  it('when a name is read aloud, then its accidental is a word', () => {
    expect(spokenPitch('Bb2', 'english')).toBe('B flat 2');
    expect(spokenPitch('Eb2', 'german')).toBe('Es2');
  });

  it('when a shown name is typed again, then it is the same note', () => {
    for (const naming of NOTE_NAMINGS) {
      for (const letter of Object.keys(LETTER_SEMITONES).filter(isLetter)) {
        for (const alteration of [-2, -1, 0, 1, 2]) {
          const pitch: Pitch = { letter, alteration, octave: 4 };
          expect(readNote(noteName(pitch, naming), naming)).toEqual({ letter, alteration });
        }
      }
    }
  });

  it('when a text is no name, then it is not read', () => {
    expect(readNote('H', 'english')).toBeNull();
    expect(readNote('hb', 'english')).toBeNull();
    expect(readNote('cconstructor', 'english')).toBeNull();
    expect(readNote('', 'english')).toBeNull();
    expect(readNote('Cs', 'german')).toBeNull();
    expect(readNote('cbbb', 'english')).toBeNull();
  });
});

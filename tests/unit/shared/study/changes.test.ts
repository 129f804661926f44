import { describe, expect, it } from 'vitest';
import { divide, joinStop, link, linkPartner, stopPartner, unlink } from '#shared/study/joins.changes';
import { emptyChord, newStudy, newVoice } from '#shared/study/new-study';
import {
  addChordAfter,
  changeChord,
  copyChord,
  isEmptyStudy,
  removeChord,
  reorderChord,
  respellStudy,
  setStudy,
} from '#shared/study/study.changes';
import { chordSchema, draftDocumentSchema, MAX_CHORDS, type Chord } from '#shared/study/study.document';
import { applyTyped } from '#shared/study/typed.changes';
import { addVoice, changeSection, moveVoice, removeVoice, setVoice } from '#shared/study/voices.changes';

const bass = newVoice('bass-1', 'doubleBass', 'D2');
const cello = newVoice('cello-1', 'cello', 'D3');
const upper = newVoice('cello-2', 'cello', 'A3');
const chord: Chord = { ...emptyChord('chord-1'), voices: [bass, cello, upper] };
const key = { tonic: 'D', mode: 'minor' } as const;
const pitches = ({ voices }: Chord) => voices.map(({ pitch }) => pitch).join(' ');
const voiceOf = ({ voices }: Chord, id: string) => {
  const voice = voices.find((other) => other.id === id);
  if (!voice) throw new Error(`no voice ${id}`);
  return voice;
};
const counted = () => {
  let count = 0;
  return () => `made-${(count += 1)}`;
};

describe('changes of a chord', () => {
  it('when a voice is moved, then it alone moves and is spelt by the key', () => {
    expect(pitches(moveVoice(chord, 'cello-1', 46, key))).toBe('D2 Bb2 A3');
  });

  it('when a linked voice is moved, then the other keeps its distance', () => {
    const linked = link(chord, 'bass-1', cello, 'link-1');
    expect(pitches(moveVoice(linked, 'cello-1', 46, key))).toBe('Bb1 Bb2 A3');
    expect(pitches(moveVoice(unlink(linked, 'link-1'), 'cello-1', 46, key))).toBe('D2 Bb2 A3');
  });

  it('when a voice would leave the axis, then it stops at its end', () => {
    expect(pitches(moveVoice(chord, 'bass-1', 0, key))).toBe('A0 D3 A3');
  });

  it('when nothing moves, then the chord is the same one', () => {
    expect(moveVoice(chord, 'bass-1', 38, key)).toBe(chord);
    expect(moveVoice(chord, 'nobody', 38, key)).toBe(chord);
  });

  it('when voices are joined, then they are a double stop until one leaves', () => {
    const joined = joinStop(chord, 'cello-1', upper);
    expect(joined.voices.map(({ stop }) => stop)).toEqual([null, 1, 1]);
    expect(removeVoice(joined, 'cello-1').voices.map(({ stop }) => stop)).toEqual([null, null]);
    expect(changeSection(joined, 'cello-1', 'viola').voices.map(({ stop }) => stop)).toEqual([
      null,
      null,
      null,
    ]);
    expect(divide(joined, voiceOf(joined, 'cello-1')).voices.every(({ stop }) => stop === null)).toBe(true);
  });

  it('when a partner for a double stop is looked for, then it is the nearest of the section', () => {
    expect(stopPartner(chord, cello)?.id).toBe('cello-2');
    expect(stopPartner(chord, bass)).toBeNull();
  });

  it('when a partner for a link is looked for, then it stands in another section at octaves', () => {
    expect(linkPartner(chord, bass)?.id).toBe('cello-1');
    expect(linkPartner(chord, upper)).toBeNull();
  });

  it('when a linked voice is taken away, then the other is linked no more', () => {
    const linked = link(chord, 'bass-1', cello, 'link-1');
    expect(removeVoice(linked, 'bass-1').voices.every(({ link: name }) => name === null)).toBe(true);
  });

  it('when a voice is locked or added, then only that is new', () => {
    expect(setVoice(chord, 'cello-1', { locked: true }).voices.map(({ locked }) => locked)).toEqual([
      false,
      true,
      false,
    ]);
    expect(pitches(addVoice(chord, newVoice('viola-1', 'viola', 'F4')))).toBe('D2 D3 A3 F4');
  });

  it('when a line is typed over a chord, then a note that stood there keeps what is set of it', () => {
    const locked = setVoice(chord, 'cello-2', { locked: true });
    const typed = [
      { section: 'cello', pitch: 'A3', stop: null },
      { section: 'cello', pitch: 'E3', stop: null },
      { section: 'viola', pitch: 'F4', stop: null },
    ] as const;
    const changed = applyTyped(locked, typed, counted());
    expect(changed.voices.map(({ id, locked: lock }) => [id, lock])).toEqual([
      ['cello-2', true],
      ['cello-1', false],
      ['made-1', false],
    ]);
  });

  it('when a chord has been changed in every way, then it is still a chord of the document', () => {
    const joined = joinStop(chord, 'cello-1', upper);
    const linked = link(joined, 'bass-1', voiceOf(joined, 'cello-1'), 'link-1');
    const moved = moveVoice(changeSection(linked, 'bass-1', 'viola'), 'bass-1', 60, key);
    expect(chordSchema.parse(moved)).toEqual(moved);
  });
});

describe('a pitch of the document', () => {
  it.each(['C', 'H2', 'C9', 'C-1'])('when %s stands there, then one fault is told', (pitch) => {
    const voices = [{ ...bass, pitch }];
    expect(chordSchema.safeParse({ ...chord, voices }).error?.issues).toHaveLength(1);
  });
});

describe('changes of a study', () => {
  const study = changeChord(newStudy('chord-1'), 'chord-1', () => chord);

  it('when a study is new, then it is an empty one that the schema accepts', () => {
    expect(isEmptyStudy(newStudy('chord-1'))).toBe(true);
    expect(isEmptyStudy(study)).toBe(false);
    expect(draftDocumentSchema.parse(newStudy('chord-1'))).toEqual(newStudy('chord-1'));
  });

  it('when a chord is copied, then it sounds the same under ids of its own', () => {
    const linked = link(chord, 'bass-1', cello, 'link-1');
    const copy = copyChord(linked, counted());
    expect(pitches(copy)).toBe(pitches(chord));
    const ids = [copy.id, ...copy.voices.map(({ id }) => id), copy.voices[0]?.link];
    expect(new Set(ids).size).toBe(5);
    expect(ids).not.toContain('link-1');
    expect(copy.voices[0]?.link).toBe(copy.voices[1]?.link);
  });

  it('when chords are added, moved and taken away, then the progression follows', () => {
    const two = addChordAfter(study, 'chord-1', emptyChord('chord-2'));
    const three = addChordAfter(two, 'chord-1', emptyChord('chord-3'));
    const order = (s: typeof study) => s.chords.map(({ id }) => id).join(' ');
    expect(order(three)).toBe('chord-1 chord-3 chord-2');
    expect(order(reorderChord(three, 'chord-1', 2))).toBe('chord-3 chord-2 chord-1');
    expect(order(removeChord(three, 'chord-3', 'unused'))).toBe('chord-1 chord-2');
  });

  it('when the last chord is taken away, then an empty one stays', () => {
    const emptied = removeChord(study, 'chord-1', 'chord-9');
    expect(emptied.chords.map(({ id, voices }) => [id, voices.length])).toEqual([['chord-9', 0]]);
  });

  it('when a progression is full, then no chord is added', () => {
    let full = study;
    while (full.chords.length < MAX_CHORDS) {
      full = addChordAfter(full, 'chord-1', emptyChord(`more-${full.chords.length}`));
    }
    expect(addChordAfter(full, 'chord-1', emptyChord('too-many'))).toBe(full);
  });

  it('when the notes are spelt by the key, then they are named anew and sound as before', () => {
    const sharp = setStudy(
      changeChord(study, 'chord-1', () => ({ ...chord, voices: [newVoice('voice-1', 'cello', 'A#2')] })),
      { key: { tonic: 'F', mode: 'major' } },
    );
    expect(respellStudy(sharp).chords[0]?.voices.map(({ pitch }) => pitch)).toEqual(['Bb2']);
  });

  it('when the tempo is set, then nothing else of the study changes', () => {
    expect(setStudy(study, { tempoBpm: 72 })).toEqual({ ...study, tempoBpm: 72 });
  });
});

import { describe, expect, it } from 'vitest';
import { emptyChord, newVoice } from '#shared/study/new-study';
import { fitChord, stepBetween } from '#shared/study/shelved';
import { DEFAULT_ENSEMBLE, type Chord } from '#shared/study/study.document';

const C = { tonic: 'C', mode: 'major' } as const;
const chord = (...notes: (readonly ['cello' | 'doubleBass' | 'viola' | 'violin1', string])[]): Chord => ({
  ...emptyChord('kept-chord'),
  voices: notes.map(([section, pitch], place) => newVoice(`voice-${place}`, section, pitch)),
});
const inKey = (tonic: string) => ({ key: { tonic, mode: 'major' as const }, ensemble: DEFAULT_ENSEMBLE });
let last = 0;
const newId = () => `new-id-${(last += 1)}`;
const notesOf = (fitted: Chord | null) => fitted?.voices.map(({ section, pitch }) => `${section} ${pitch}`);

describe('a voicing from the shelf', () => {
  it('when two keys are given, then the nearer way between their tonics is taken', () => {
    expect(['C', 'Db', 'F#', 'G', 'A', 'B'].map((tonic) => stepBetween(C, { tonic }))).toEqual([
      0, 1, 6, -5, -3, -1,
    ]);
  });

  it('when it is used in its own key, then it has the same notes under new ids', () => {
    const kept = chord(['cello', 'C3'], ['violin1', 'E4']);
    const fitted = fitChord({ chord: kept, key: C }, inKey('C'), 0, newId);
    expect(notesOf(fitted)).toEqual(['cello C3', 'violin1 E4']);
    const ids = new Set([kept, ...kept.voices].map(({ id }) => id));
    expect([fitted, ...(fitted?.voices ?? [])].some((thing) => thing && ids.has(thing.id))).toBe(false);
  });

  it('when it is used in another key, then it is transposed and spelt by that key', () => {
    const kept = { chord: chord(['cello', 'C3'], ['violin1', 'E4']), key: C };
    expect(notesOf(fitChord(kept, inKey('Eb'), 0, newId))).toEqual(['cello Eb3', 'violin1 G4']);
    expect(notesOf(fitChord(kept, inKey('A'), 1, newId))).toEqual(['cello A3', 'violin1 C#5']);
  });

  it('when a section cannot play it there, then all is dealt anew, each where it can be played', () => {
    // The cellos' lowest string is C2: A1 is for the double basses.
    const kept = { chord: chord(['cello', 'C2'], ['viola', 'G3']), key: C };
    const fitted = fitChord(kept, inKey('A'), 0, newId);
    expect(fitted?.voices.map(({ pitch }) => pitch)).toEqual(['A1', 'E3']);
    expect(fitted?.voices[0]?.section).toBe('doubleBass');
  });

  it('when more players are asked for than there are, then the section shares the note as it does by itself', () => {
    const kept = chord(['cello', 'C3']);
    const crowded = { ...kept, voices: kept.voices.map((voice) => ({ ...voice, players: 10 })) };
    expect(fitChord({ chord: crowded, key: C }, inKey('C'), 0, newId)?.voices[0]?.players).toBeNull();
  });

  it('when a note would leave the pitches that a study knows, then it is not fitted', () => {
    expect(fitChord({ chord: chord(['violin1', 'C8']), key: C }, inKey('C'), 1, newId)).toBeNull();
  });
});

import { describe, expect, it } from 'vitest';
import { parsePlace, placeText } from '#shared/study/voicing-place';

describe('where a voicing is kept', () => {
  it.each([
    ['chord-1', { studyId: null, number: null, chordId: 'chord-1' }],
    ['study-1:chord-1', { studyId: 'study-1', number: null, chordId: 'chord-1' }],
    ['study-1@12:chord-1', { studyId: 'study-1', number: 12, chordId: 'chord-1' }],
  ])('when a link says %s, then it names one place, and back', (text, place) => {
    expect(parsePlace(text)).toEqual(place);
    expect(placeText(place)).toBe(text);
  });

  it.each(['', 'x', 'a b c d e f', 'study-1@0:chord-1', 'study-1@:chord-1', ':chord-1', 'one:two:three-3'])(
    'when a link says “%s”, then it names no place',
    (text) => {
      expect(parsePlace(text)).toBeNull();
    },
  );
});

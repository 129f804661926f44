import { describe, expect, it } from 'vitest';
import { applyMove } from '#shared/study/moved.changes';
import { purposeOf, setOnPurpose } from '#shared/study/on-purpose.changes';
import { purposeText } from '#shared/voicing/on-purpose.sentences';
import { chordOf, voicing } from '../../../support/voicings';

describe('what clouds on purpose', () => {
  const chord = voicing('C2 E2');

  it('when a register is marked, then only a figure of that register is meant', () => {
    const marked = setOnPurpose(chord, 'great', true);
    expect(purposeOf(marked, 'great')).toBe('great');
    expect(purposeOf(marked, 'small')).toBeNull();
    expect(purposeOf(setOnPurpose(marked, 'great', false), 'great')).toBeNull();
  });

  it('when the chord is marked, then whatever clouds in it is meant', () => {
    const marked = setOnPurpose(chord, 'chord', true);
    expect(purposeOf(marked, 'small')).toBe('chord');
    expect(purposeOf(marked, null)).toBe('chord');
  });

  it('when it is told, then in a sentence', () => {
    expect(purposeText('chord')).toBe('The chord clouds on purpose.');
    expect(purposeText('great')).toBe('The great octave clouds on purpose.');
  });
});

describe('a move made', () => {
  it('when one note of a double stop is left out, then the other is no double stop any more', () => {
    const chord = chordOf([
      { pitch: 'C3', section: 'cello', stop: 1 },
      { pitch: 'G3', section: 'cello', stop: 1 },
    ]);
    const move = { kind: 'leaveOut', ids: ['voice-1'], pitches: [], section: 'cello' } as const;
    expect(applyMove(chord, move).voices).toMatchObject([{ id: 'voice-0', stop: null }]);
  });
});

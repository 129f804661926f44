import { describe, expect, it } from 'vitest';
import { settledFaults, stretchesOf } from '@/components/bench/typing-text';
import { noteKey } from '@/composables/note-keys';
import { stepKey } from '@/composables/step-keys';

const fault = { start: 3, end: 5, message: 'not a note' };
const plain = { shiftKey: false, ctrlKey: false, metaKey: false, altKey: false };

describe('faults in the typed text', () => {
  it('when a word is faulty, then the text is cut round it', () => {
    expect(stretchesOf('Vc X3 A2', [fault])).toEqual([
      { text: 'Vc ', faulty: false },
      { text: 'X3', faulty: true },
      { text: ' A2', faulty: false },
    ]);
  });

  it('when the word is still being typed, then it is no fault yet', () => {
    expect(settledFaults([fault], 'Vc X3', 5)).toEqual([]);
    expect(settledFaults([fault], 'Vc X3 ', 6)).toEqual([fault]);
  });
});

describe('keys', () => {
  it('when an arrow is pressed on a note, then it moves by a semitone, with Shift by an octave', () => {
    expect(noteKey({ ...plain, key: 'ArrowUp' })).toEqual({ kind: 'move', semitones: 1 });
    expect(noteKey({ ...plain, key: 'ArrowDown', shiftKey: true })).toEqual({ kind: 'move', semitones: -12 });
    expect(noteKey({ ...plain, key: 'ArrowLeft' })).toEqual({ kind: 'section', lanes: -1 });
    expect(noteKey({ ...plain, key: 'ArrowUp', ctrlKey: true })).toBeNull();
    expect(noteKey({ ...plain, key: 'a' })).toBeNull();
  });

  it('when Z is pressed with Ctrl, then the last step is undone, with Shift done again', () => {
    expect(stepKey({ ...plain, ctrlKey: true, key: 'z' })).toBe('undo');
    expect(stepKey({ ...plain, ctrlKey: true, shiftKey: true, key: 'Z' })).toBe('redo');
    expect(stepKey({ ...plain, metaKey: true, key: 'y' })).toBe('redo');
    expect(stepKey({ ...plain, key: 'z' })).toBeNull();
  });
});

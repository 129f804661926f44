/** What a key asks of the note that has the focus. */
export type NoteKey =
  | { readonly kind: 'move'; readonly semitones: number }
  | { readonly kind: 'section'; readonly lanes: number }
  | { readonly kind: 'focus'; readonly steps: number }
  | { readonly kind: 'extend'; readonly steps: number }
  | { readonly kind: 'all' }
  | { readonly kind: 'one' }
  | { readonly kind: 'remove' };

const OCTAVE = 12;

/**
 * Reads a key on a note: up and down by semitones, with Shift by octaves; left and right to the next
 * section; Page Up and Page Down to the next note, with Shift selecting it too; Ctrl A selects all, Escape
 * one alone again; Delete takes away.
 * @returns what is asked, or `null` where the key is somebody else's
 */
export function noteKey(
  event: Pick<KeyboardEvent, 'key' | 'shiftKey' | 'ctrlKey' | 'metaKey' | 'altKey'>,
): NoteKey | null {
  if (event.altKey) return null;
  if (event.ctrlKey || event.metaKey) return event.key.toLowerCase() === 'a' ? { kind: 'all' } : null;
  const semitones = event.shiftKey ? OCTAVE : 1;
  switch (event.key) {
    case 'ArrowUp':
      return { kind: 'move', semitones };
    case 'ArrowDown':
      return { kind: 'move', semitones: -semitones };
    case 'ArrowLeft':
      return { kind: 'section', lanes: -1 };
    case 'ArrowRight':
      return { kind: 'section', lanes: 1 };
    case 'PageUp':
      return { kind: event.shiftKey ? 'extend' : 'focus', steps: 1 };
    case 'PageDown':
      return { kind: event.shiftKey ? 'extend' : 'focus', steps: -1 };
    case 'Escape':
      return { kind: 'one' };
    case 'Delete':
    case 'Backspace':
      return { kind: 'remove' };
    default:
      return null;
  }
}

import { useEventListener, useLocalStorage } from '@vueuse/core';
import { computed, onScopeDispose, shallowReactive, type ComputedRef, type Ref } from 'vue';
import { isTyping } from '@/composables/step-keys';

/** Under which heading of the sheet a key stands. */
export const SHORTCUT_GROUPS = [
  'Going there',
  'The note',
  'Several notes',
  'The chord',
  'Sound',
  'The page',
] as const;
export type ShortcutGroup = (typeof SHORTCUT_GROUPS)[number];

/** A key as the help sheet shows it. */
export interface Shortcut {
  readonly group: ShortcutGroup;
  /** As the sheet writes it: `Shift ↑`, `Ctrl Z`, `N`. */
  readonly keys: readonly string[];
  readonly does: string;
}

/** A single letter that does something wherever no text is written. */
export interface LetterShortcut extends Shortcut {
  /** The letter itself, as a key event names it; compared without case. */
  readonly letter: string;
  readonly run: () => void;
}

/** Keys that are always there; what has a key of its own adds it with `useShortcuts`. */
export const SHORTCUTS: readonly Shortcut[] = [
  { group: 'The note', keys: ['↑', '↓'], does: 'a semitone up or down' },
  { group: 'The note', keys: ['Shift ↑', 'Shift ↓'], does: 'an octave up or down' },
  { group: 'The note', keys: ['←', '→'], does: 'to the section beside' },
  { group: 'The note', keys: ['Page Up', 'Page Down'], does: 'to the next note above or below' },
  { group: 'The note', keys: ['Delete'], does: 'take it away' },
  {
    group: 'Several notes',
    keys: ['Shift click', 'Shift Page Up', 'Shift Page Down'],
    does: 'select one more',
  },
  { group: 'Several notes', keys: ['Ctrl A'], does: 'select all notes of the chord' },
  { group: 'Several notes', keys: ['Esc'], does: 'select one alone again' },
  {
    group: 'Several notes',
    keys: ['Ctrl C', 'Ctrl X', 'Ctrl V'],
    does: 'copy, cut, paste: notes, or a whole chord where all or none are selected',
  },
  { group: 'The chord', keys: ['Ctrl Z', 'Ctrl Shift Z'], does: 'undo, redo' },
  { group: 'The chord', keys: ['Ctrl S'], does: 'save' },
  { group: 'Sound', keys: ['Space'], does: 'play the chord, or stop' },
  { group: 'Sound', keys: ['Esc'], does: 'end all sound at once' },
];

const added = shallowReactive(new Set<Shortcut>());
const LETTERS_KEY = 'siltline.letter-keys';

/** Whether single letters are keys, kept in this browser: some speak to their machine, and every word is letters. */
export function useLetterKeys(): Ref<boolean> {
  return useLocalStorage(LETTERS_KEY, true);
}

/** @returns every key that works at present, for the help sheet */
export function useShortcutList(): ComputedRef<readonly Shortcut[]> {
  return computed(() => [...added, ...SHORTCUTS]);
}

/** Adds keys to the sheet for as long as the caller lives; who adds them listens to them too. */
export function useShortcuts(shortcuts: readonly Shortcut[]): void {
  shortcuts.forEach((shortcut) => added.add(shortcut));
  onScopeDispose(() => shortcuts.forEach((shortcut) => added.delete(shortcut)));
}

/** Whether something over the page, such as a dialog or a menu, has the keys. */
function isCovered(): boolean {
  return document.querySelector('[role="dialog"][aria-modal="true"], .q-dialog__inner, .q-menu') !== null;
}

/** Adds single letters to the sheet and listens to them, but not while text is written or a dialog is open. */
export function useLetterShortcuts(shortcuts: readonly LetterShortcut[]): void {
  const letterKeys = useLetterKeys();
  useShortcuts(shortcuts);
  useEventListener(document, 'keydown', (event) => {
    if (event.ctrlKey || event.metaKey || event.altKey || event.defaultPrevented) return;
    const isHelp = event.key === '?';
    if ((!letterKeys.value && !isHelp) || isTyping(event.target) || isCovered()) return;
    const asked = shortcuts.find(({ letter }) => letter.toLowerCase() === event.key.toLowerCase());
    if (!asked || (event.shiftKey && !isHelp)) return;
    event.preventDefault();
    asked.run();
  });
}

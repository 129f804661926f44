import { useEventListener } from '@vueuse/core';
import type { Playback } from '@/composables/playback-interface';

/** What answers the space bar itself: fields, buttons, links, and whatever says that it is one; a note does not. */
const ANSWERS_SPACE =
  'input, textarea, select, button, a[href], summary, [contenteditable], [role="button"], [role="checkbox"], [role="menuitem"], [role="option"], [role="switch"], [role="tab"], [role="dialog"]';

/** @returns whether the space bar belongs to the element that has the focus */
export function answersSpace(target: EventTarget | null): boolean {
  return target instanceof Element && target.closest(ANSWERS_SPACE) !== null;
}

/**
 * The space bar plays the chord or stops what sounds, where no field or button has the focus; Escape is the
 * panic key: it ends all sound at once, wherever the focus is, and keeps its other meanings.
 */
export function usePlaybackKeys({ mode, status, strike, stop, silence }: Playback): void {
  useEventListener(document, 'keydown', (event) => {
    if (event.key === 'Escape') silence();
    if (event.key !== ' ' || event.defaultPrevented || event.repeat || answersSpace(event.target)) return;
    if (event.ctrlKey || event.altKey || event.metaKey) return;
    event.preventDefault();
    if (mode.value === 'silent' && status.value !== 'loading') void strike();
    else stop();
  });
}

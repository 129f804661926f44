import { useEventListener } from '@vueuse/core';
import { CLIP_TYPE } from '#shared/study/clipboard';
import { isTyping } from '@/composables/step-keys';

/** A clip in both of its forms. */
export interface ClipTexts {
  readonly text: string;
  readonly data: string;
}

export interface ClipboardOwner {
  /** What is copied; `null` leaves the event to the browser. */
  readonly copy: () => ClipTexts | null;
  /** Takes away what was copied to be cut. */
  readonly cut: () => void;
  /** @returns whether it was a clip */
  readonly paste: (text: string, data: string) => boolean;
}

/** Text that the reader has marked on the page is what they want to copy. */
function hasMarkedText(): boolean {
  return (getSelection()?.toString() ?? '') !== '';
}

/** Copies, cuts and pastes by the keys and menus of the browser, but not where text is written. */
export function useClipboard({ copy, cut, paste }: ClipboardOwner): void {
  function give(event: ClipboardEvent): boolean {
    const clip = isTyping(event.target) || hasMarkedText() ? null : copy();
    if (!clip || !event.clipboardData) return false;
    event.clipboardData.setData('text/plain', clip.text);
    event.clipboardData.setData(CLIP_TYPE, clip.data);
    event.preventDefault();
    return true;
  }
  useEventListener(document, 'copy', (event) => void give(event));
  useEventListener(document, 'cut', (event) => {
    if (give(event)) cut();
  });
  useEventListener(document, 'paste', (event) => {
    if (isTyping(event.target) || !event.clipboardData) return;
    const taken = paste(event.clipboardData.getData('text/plain'), event.clipboardData.getData(CLIP_TYPE));
    if (taken) event.preventDefault();
  });
}

/**
 * Copies by a button. Only the plain text goes to the system, for a button may not give more.
 * @returns whether the system took it
 */
export async function copyText(text: string): Promise<boolean> {
  try {
    await navigator.clipboard.writeText(text);
    return true;
  } catch {
    return false;
  }
}

/** @returns the text on the system's clipboard, or `null` where the browser does not give it */
export async function pastedText(): Promise<string | null> {
  try {
    return await navigator.clipboard.readText();
  } catch {
    return null;
  }
}

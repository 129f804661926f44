import { useEventListener } from '@vueuse/core';
import type { Ref } from 'vue';
import type { PitchAxis } from '@/charts/pitch-axis';
import type { AxisViewing } from '@/composables/axis-view';

/** From one press of a key or a button to the next. */
export const ZOOM_STEP = 1.5;
/** Half an octave. */
export const PAN_STEP = 6;
/** A notch of a wheel is about 100 pixels and makes a step of about a seventh. */
const WHEEL = 0.0014;

interface Pinch {
  readonly apart: number;
  readonly middle: number;
}

function pinchOf({ touches }: TouchEvent): Pinch | null {
  const [a, b] = [touches[0], touches[1]];
  if (!a || !b) return null;
  return {
    apart: Math.hypot(a.clientX - b.clientX, a.clientY - b.clientY),
    middle: (a.clientY + b.clientY) / 2,
  };
}

/**
 * Zooms and pans the pitch axis: the wheel with Ctrl, two fingers, and the keys +, −, 0 and Z.
 * @param panes that stand on the axis
 */
export function useAxisGestures(
  panes: Readonly<Ref<HTMLElement | null>>,
  axis: () => PitchAxis,
  viewing: AxisViewing,
): void {
  let pinch: Pinch | null = null;

  function pitchAt(clientY: number): number {
    const { high, semitone, strip } = axis();
    const top = panes.value?.querySelector('.room')?.getBoundingClientRect().top ?? 0;
    return high - (clientY - top - strip) / semitone;
  }

  function wheel(event: WheelEvent): void {
    if (!event.ctrlKey && !event.metaKey) return;
    event.preventDefault();
    if (event.shiftKey) viewing.pan(-event.deltaY / axis().semitone);
    else viewing.zoom(Math.exp(-event.deltaY * WHEEL), pitchAt(event.clientY));
  }

  function touch(event: TouchEvent): void {
    const now = pinchOf(event);
    if (now && pinch) {
      event.preventDefault();
      viewing.zoom(now.apart / Math.max(pinch.apart, 1), pitchAt(now.middle));
      viewing.pan((now.middle - pinch.middle) / axis().semitone);
    }
    pinch = now;
  }

  const acts: Readonly<Record<string, () => void>> = {
    '+': () => viewing.zoom(ZOOM_STEP),
    '=': () => viewing.zoom(ZOOM_STEP),
    '-': () => viewing.zoom(1 / ZOOM_STEP),
    '0': viewing.showAll,
    z: viewing.fit,
  };

  function key(event: KeyboardEvent): void {
    const act = acts[event.key];
    if (!act || event.ctrlKey || event.metaKey || event.altKey) return;
    event.preventDefault();
    act();
  }

  useEventListener(panes, 'wheel', wheel, { passive: false });
  useEventListener(panes, ['touchstart', 'touchmove'], touch, { passive: false });
  useEventListener(panes, ['touchend', 'touchcancel'], () => (pinch = null));
  useEventListener(panes, 'keydown', key);
}

import { computed, shallowRef } from 'vue';
import type { Midi, Semitones } from '#shared/units';
import { fitView, isZoomed, panView, showNote, zoomView, type AxisView } from '@/charts/axis-view';
import { wholeView } from '@/charts/pitch-axis';

/** What of the pitch axis the bench shows; nothing of it is kept. */
export function useAxisView(notes: () => readonly Midi[]) {
  const whole = computed(() => wholeView(notes()));
  /** Nothing while all of the axis is shown, so that it grows with the notes. */
  const asked = shallowRef<AxisView | null>(null);
  const view = computed(() => (asked.value ? panView(asked.value, 0, whole.value) : whole.value));
  const zoomed = computed(() => isZoomed(view.value, whole.value));
  const middle = (): Midi => (view.value.low + view.value.high) / 2;

  function look(next: AxisView): void {
    asked.value = isZoomed(next, whole.value) ? next : null;
  }

  return {
    view,
    zoomed,
    zoom: (factor: number, at: Midi = middle()) => look(zoomView(view.value, factor, at, whole.value)),
    pan: (semitones: Semitones) => look(panView(view.value, semitones, whole.value)),
    fit: () => look(fitView(notes(), whole.value)),
    showAll: () => (asked.value = null),
    /** Moves on where a note would be out of sight. */
    follow: (midi: Midi) => look(showNote(view.value, midi, whole.value)),
  };
}

export type AxisViewing = ReturnType<typeof useAxisView>;

import { computed, watch, type Ref } from 'vue';
import type { Midi } from '#shared/units';
import { pitchAxis } from '@/charts/pitch-axis';
import { useAxisGestures } from '@/composables/axis-gestures';
import { useAxisView } from '@/composables/axis-view';

interface BenchAxis {
  readonly notes: () => readonly Midi[];
  /** Of strip and axis together, in pixels. */
  readonly height: () => number;
  readonly strip: number;
  readonly panes: Readonly<Ref<HTMLElement | null>>;
  /** The note that is kept in sight; null where none is selected. */
  readonly followed: () => Midi | null;
}

/** The one axis of all panes, and how much of it is shown. */
export function useBenchAxis({ notes, height, strip, panes, followed }: BenchAxis) {
  const viewing = useAxisView(notes);
  const axis = computed(() => pitchAxis(notes(), height(), strip, viewing.view.value));
  useAxisGestures(panes, () => axis.value, viewing);
  watch(followed, (midi) => {
    if (midi !== null) viewing.follow(midi);
  });
  return { axis, viewing };
}

import { onScopeDispose, ref } from 'vue';

/** Pixels that a pointer may wander before a press becomes a drag. */
const SLOP = 3;

/** What is told of a drag; a press that goes nowhere tells nothing. */
export interface DragListener {
  readonly start: (id: string) => void;
  /** At most once a frame: how far the pointer has gone from where it was pressed. */
  readonly move: (id: string, dx: number, dy: number) => void;
  readonly end: () => void;
  readonly cancel: () => void;
}

interface Press {
  readonly id: string;
  readonly pointerId: number;
  readonly x: number;
  readonly y: number;
  readonly target: HTMLElement;
}

/** Drags by mouse, pen or finger. Escape gives the drag up. */
export function useNoteDrag(listener: DragListener) {
  const draggedId = ref<string | null>(null);
  let press: Press | null = null;
  let last: PointerEvent | null = null;
  let frame = 0;

  function flush(): void {
    frame = 0;
    if (press && last && draggedId.value)
      listener.move(press.id, last.clientX - press.x, last.clientY - press.y);
  }

  function move(event: PointerEvent): void {
    if (!press || event.pointerId !== press.pointerId) return;
    const far = Math.hypot(event.clientX - press.x, event.clientY - press.y) > SLOP;
    if (!draggedId.value && !far) return;
    if (!draggedId.value) {
      draggedId.value = press.id;
      listener.start(press.id);
    }
    last = event;
    frame ||= requestAnimationFrame(flush);
  }

  function finish(kept: boolean): void {
    if (!press) return;
    const dragged = draggedId.value !== null;
    if (frame) cancelAnimationFrame(frame);
    if (kept) flush();
    frame = 0;
    for (const [type, handler] of handlers) press.target.removeEventListener(type, handler);
    window.removeEventListener('keydown', escape, true);
    [press, last, draggedId.value] = [null, null, null];
    if (dragged) (kept ? listener.end : listener.cancel)();
  }

  function escape(event: KeyboardEvent): void {
    if (event.key !== 'Escape') return;
    event.stopPropagation();
    finish(false);
  }

  const isPointer = (event: Event): event is PointerEvent => 'pointerId' in event;
  const handlers: readonly (readonly [string, (event: Event) => void])[] = [
    ['pointermove', (event) => isPointer(event) && move(event)],
    ['pointerup', () => finish(true)],
    ['pointercancel', () => finish(false)],
  ];

  /** @param id what is pressed */
  function pressed(event: PointerEvent, id: string): void {
    const target = event.currentTarget;
    if (event.button !== 0 || press || !(target instanceof HTMLElement)) return;
    press = { id, pointerId: event.pointerId, x: event.clientX, y: event.clientY, target };
    target.setPointerCapture(event.pointerId);
    for (const [type, handler] of handlers) target.addEventListener(type, handler);
    window.addEventListener('keydown', escape, true);
  }

  onScopeDispose(() => finish(false));
  return { draggedId, pressed };
}

/** What can be asked of the projector by a key. */
export type PresentOrder =
  | 'next-chord'
  | 'previous-chord'
  | 'reveal'
  | 'cover'
  | 'on'
  | 'back'
  | 'strike'
  | 'hold'
  | 'build'
  | 'full-screen'
  | 'stepwise'
  | 'colours'
  | 'louder'
  | 'quieter'
  | 'leave';

/** Page down and up are what a presenter's remote sends. */
const KEYS: ReadonlyMap<string, PresentOrder> = new Map([
  ['ArrowRight', 'next-chord'],
  ['ArrowLeft', 'previous-chord'],
  ['ArrowDown', 'reveal'],
  [' ', 'reveal'],
  ['ArrowUp', 'cover'],
  ['Backspace', 'cover'],
  ['PageDown', 'on'],
  ['PageUp', 'back'],
  ['p', 'strike'],
  ['h', 'hold'],
  ['b', 'build'],
  ['f', 'full-screen'],
  ['s', 'stepwise'],
  ['l', 'colours'],
  ['+', 'louder'],
  ['-', 'quieter'],
  ['Escape', 'leave'],
]);

/**
 * @returns what a key asks for; `null` where it is none of the projector's
 * @example presentOrder({ key: 'P', ctrlKey: false, altKey: false, metaKey: false }) // 'strike'
 */
export function presentOrder(
  event: Pick<KeyboardEvent, 'key' | 'ctrlKey' | 'altKey' | 'metaKey'>,
): PresentOrder | null {
  if (event.ctrlKey || event.altKey || event.metaKey) return null;
  return KEYS.get(event.key) ?? KEYS.get(event.key.toLowerCase()) ?? null;
}

/** A part of the Lab that one goes to. */
export interface LabPlace {
  readonly letter: string;
  readonly label: string;
  readonly does: string;
  /** Where it is; the first thing in it that can have the focus gets it. */
  readonly selector: string;
}

export const PLACES: readonly LabPlace[] = [
  { letter: 'N', label: 'Notes line', does: 'the notes line', selector: '[data-notes-line]' },
  {
    letter: 'L',
    label: 'Lanes',
    does: 'the lanes: the selected note, or the first section',
    selector: '[data-place="lanes"]',
  },
  { letter: 'F', label: 'What clouds', does: 'what clouds, and why', selector: '[data-place="findings"]' },
  {
    letter: 'H',
    label: 'What would help',
    does: 'the moves that would help',
    selector: '[data-place="help"]',
  },
];

const FOCUSABLE = '[role="slider"][tabindex="0"], button:not(:disabled), a[href], input, select';

/** Moves the focus to a part of the Lab; where nothing in it takes the focus, to the part itself. */
export function goTo({ selector }: Pick<LabPlace, 'selector'>): void {
  const place = document.querySelector<HTMLElement>(selector);
  if (!place) return;
  const isField = place instanceof HTMLInputElement;
  const inside = isField
    ? place
    : (firstOf(place, '[role="slider"][tabindex="0"]') ?? firstOf(place, FOCUSABLE));
  const target = inside ?? place;
  if (!inside && !place.hasAttribute('tabindex')) place.setAttribute('tabindex', '-1');
  target.focus();
  target.scrollIntoView({ block: 'nearest' });
  if (isField) place.select();
}

function firstOf(place: HTMLElement, selector: string): HTMLElement | null {
  return place.querySelector<HTMLElement>(selector);
}

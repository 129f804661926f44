/** What is selected besides the note that is pressed. */
export type SelectionChoice =
  | { readonly kind: 'toggle'; readonly id: string }
  /** All notes of the chord. */
  | { readonly kind: 'all' }
  /** The leading note alone again. */
  | { readonly kind: 'one' };

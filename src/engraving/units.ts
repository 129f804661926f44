/** Drawings are measured in tenths of a staff space, as the engraver does; from the top line of a staff down. */
export const SPACE = 10;
/** From the top line of a staff to its bottom line. */
export const STAFF_HEIGHT = 4 * SPACE;
/** Two steps of the scale are a staff space. */
export const STEP = SPACE / 2;

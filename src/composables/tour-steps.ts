/** One step of the tour: what is pointed out, and what a musician would say of it. */
export interface TourStep {
  readonly title: string;
  readonly text: string;
  /** What it stands beside: the first of these that is on the page. */
  readonly places: readonly string[];
}

/** Fixed words: they are set into the page as they stand. */
export const TOUR_STEPS: readonly TourStep[] = [
  {
    title: 'Notes in',
    text: 'Type a line, section by section, or one chord symbol to be dealt. Below, click a lane for a note and drag it, or move it with the arrow keys. An empty draft is lent an example: undo takes it away.',
    places: ['[data-notes-line]'],
  },
  {
    title: 'Where it clouds',
    text: 'Every register has its figure, 0 to 100; at 50 stand two like notes on their published low limit. Press a register to see and hear what makes it.',
    places: ['[data-place="muddiness"]', '[data-place="panes"]'],
  },
  {
    title: 'Why',
    text: 'Whose notes make it, and how far a pair stands under its limit. Hear plays the two alone, Show marks them on the bench.',
    places: ['[data-place="findings"]'],
  },
  {
    title: 'What helps',
    text: 'Single moves, the best first, each with the figure before and after. Hear it, see it, try it; undo takes it back. Where it clouds on purpose, tick that.',
    places: ['[data-place="help"]'],
  },
  {
    title: 'Hear it, keep it',
    text: 'The chord sounds from the very overtones that are drawn. Start softly. Above stand Compare, Hand on and Save; a draft is kept in this browser meanwhile.',
    places: ['[data-place="playback"]'],
  },
];

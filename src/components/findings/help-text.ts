import type { Move } from '#shared/voicing/moves/moves';

/** What is known of the moves: nothing to help, still being worked out, worked out, or not to be had. */
export type HelpState = 'empty' | 'clear' | 'waiting' | 'ready' | 'error';

/** @returns what tells a move from the others of its chord */
export function keyOfMove({ kind, ids, pitches, section }: Move): string {
  return [kind, ...ids, ...pitches, section].join(' ');
}

/** @returns why no move stands here, in words; with moves worked out, that none of them would be heard */
export function noMovesText(state: HelpState, locked: boolean): string {
  switch (state) {
    case 'empty':
      return 'Told here as soon as two notes sound together.';
    case 'clear':
      return 'The chord stands clear as it is.';
    case 'waiting':
      return 'Trying the moves of each note.';
    case 'error':
      return 'The moves could not be tried just now. They will be tried again with the next change.';
    case 'ready': {
      const stay = locked ? ' Locked notes stay where they are.' : '';
      return `No single move clears this chord by more than the figure’s own uncertainty.${stay}`;
    }
  }
}

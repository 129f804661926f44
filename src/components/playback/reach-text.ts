import type { CheckState, Reach } from '@/audio/listening-check';

/** @returns how low a loudspeaker goes, as it stands after "Your loudspeaker" */
function reachWords({ lowest }: Reach): string {
  return lowest === null ? 'was heard with none of the notes' : `was heard down to ${lowest}`;
}

/**
 * @returns what a finished check has found
 * @example resultText({ ...state, lowest: 'C3', heardNothing: false }) // 'Your loudspeaker was heard down to C3. …'
 */
export function resultText({ lowest, heardNothing }: CheckState): string {
  if (heardNothing) {
    return 'A note was said to be heard where there was none, so that this check does not count. Nothing was changed: try it once more, where it is quiet.';
  }
  return `Your loudspeaker ${reachWords({ lowest })}. That is remembered in this browser; check again when you change to another one.`;
}

/** @returns what is said where a chord clouds below what the loudspeaker sounds */
export function belowReachText(reach: Reach): string {
  return `What clouds lies lower than your loudspeaker, which ${reachWords(reach)}.`;
}

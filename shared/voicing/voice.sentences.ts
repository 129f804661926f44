import type { ChordAnalysis, VoiceSound } from '#shared/voicing/analysis';
import { headlineOf } from '#shared/voicing/sentences';
import { hertzText } from '#shared/voicing/words';

/**
 * A note's frequency and who plays it.
 * @example factsOf(sound) // '110 Hz, 8 players'
 */
export function factsOf(sound: VoiceSound | undefined): string {
  if (!sound) return '';
  const fundamental = sound.partials.find(({ n }) => n === 1);
  const players = `${sound.players} ${sound.players === 1 ? 'player' : 'players'}`;
  return fundamental ? `${hertzText(fundamental.frequencyHz)}, ${players}` : players;
}

/**
 * What is told to somebody who listens to the page, once a change has come to rest.
 * @example changeText(analysis) // 'Muddiness 58, cloudiest in the great octave; 2 pairs under their low limits.'
 */
export function changeText(analysis: ChordAnalysis): string {
  const { index, text } = headlineOf(analysis);
  if (index === null) return 'The chord has no notes.';
  return `Muddiness ${index}, ${text}.`;
}

import type { DraftDocument } from '#shared/study/draft';
import { noteName } from '#shared/pitch/display';
import { isLetter } from '#shared/pitch/names';
import { SECTIONS } from '#shared/strings/sections';

/**
 * Says in one line what a study is set to.
 * @returns its subject if it has one, key, A4, players from the first violins down, and whether it has low limits of its own
 * @example aboutStudy(newStudy('chord-1')) // 'C major · A4 = 440 Hz · 14.12.10.8.6'
 */
export function aboutStudy(study: DraftDocument): string {
  const { key, a4Hz, ensemble, about, limits } = study;
  const players = SECTIONS.map((section) => ensemble.players[section]).join('.');
  const facts = [keyName(key), `A4 = ${a4Hz} Hz`, players];
  const own = limits === null ? [] : ['own low limits'];
  return [...(about ? [about] : []), ...facts, ...own].join(' · ');
}

/**
 * @returns a key by its English name
 * @example keyName({ tonic: 'Bb', mode: 'minor' }) // 'B♭ minor'
 */
export function keyName({ tonic, mode }: DraftDocument['key']): string {
  return `${tonicName(tonic)} ${mode}`;
}

const ALTERATIONS: Readonly<Record<string, number>> = { b: -1, '#': 1 };

function tonicName(tonic: string): string {
  const letter = tonic.slice(0, 1);
  if (!isLetter(letter)) return tonic;
  return noteName({ letter, alteration: ALTERATIONS[tonic.slice(1)] ?? 0, octave: 4 }, 'english');
}

import { noteName, type NoteNaming } from '#shared/pitch/display';
import type { ReadNote } from '#shared/pitch/reading';
import type { DealtLine } from '#shared/study/chord-line';
import type { DealWay } from '#shared/study/harmony/deal-choice';
import { chroma, toneName, type ChordTone } from '#shared/study/harmony/harmony';

const WAY_WORDS: Readonly<Record<DealWay, string>> = {
  open: 'in open position',
  close: 'in close position',
  series: 'after the harmonic series',
};

const DEGREE_WORDS: Readonly<Record<number, string>> = {
  1: 'root',
  2: 'second',
  3: 'third',
  4: 'fourth',
  5: 'fifth',
  6: 'sixth',
  7: 'seventh',
  9: 'ninth',
  11: 'eleventh',
  13: 'thirteenth',
};

function nameOf(note: ReadNote, naming: NoteNaming): string {
  return noteName({ ...note, octave: 0 }, naming);
}

/** @returns tones that were left out, by degree and name: `the fifth, G` */
function leftText(root: ReadNote, left: readonly ChordTone[], naming: NoteNaming): string {
  return left
    .map((tone) => `the ${DEGREE_WORDS[tone.degree] ?? 'tone'}, ${nameOf(toneName(root, tone), naming)}`)
    .join(' and ');
}

/**
 * What was understood of a symbol or numeral, and what of it is not played.
 * @example dealtText(dealt, 'english') // 'Dm7: D F A C, in open position.'
 */
export function dealtText({ symbol, harmony, way, left, alsoNote }: DealtLine, naming: NoteNaming): string {
  const { root, tones, bass } = harmony;
  const names = tones.map((tone) => nameOf(toneName(root, tone), naming)).join(' ');
  const below = chroma(bass) === chroma(root) ? '' : ` over ${nameOf(bass, naming)}`;
  const sentences = [
    `${symbol}: ${names}${below}, ${WAY_WORDS[way]}.`,
    left.length > 0 ? `Left out: ${leftText(root, left, naming)}.` : '',
    alsoNote ? `For the note write its section: Vn1 ${symbol}.` : '',
  ];
  return sentences.filter((sentence) => sentence !== '').join(' ');
}

import type { Technique } from '#shared/study/study.document';

const CONTACT_WORDS: Readonly<Record<Technique['contact'], string>> = {
  ordinary: 'ordinario',
  sulTasto: 'sul tasto',
  sulPonticello: 'sul ponticello',
};
const STROKE_WORDS: Readonly<Record<Technique['stroke'], string>> = {
  sustained: 'arco',
  tremolo: 'tremolo',
  pizzicato: 'pizzicato',
};
const HARMONIC_WORDS: Readonly<Record<Technique['harmonic'], string>> = {
  none: 'stopped',
  natural: 'a natural harmonic',
  artificial: 'an artificial harmonic',
};

/**
 * What of a technique is other than it was, in the trade's words.
 * @returns nothing for the same technique
 * @example techniqueChanges(muted, ordinary) // ['senza sordino']
 */
export function techniqueChanges(before: Technique, after: Technique): readonly string[] {
  return [
    ...(before.contact === after.contact ? [] : [CONTACT_WORDS[after.contact]]),
    ...(before.mute === after.mute ? [] : [after.mute ? 'con sordino' : 'senza sordino']),
    ...(before.stroke === after.stroke ? [] : [STROKE_WORDS[after.stroke]]),
    ...(before.harmonic === after.harmonic ? [] : [HARMONIC_WORDS[after.harmonic]]),
  ];
}

import type { Chord } from '#shared/study/study.document';

/** @returns a chord's name, or its place where it has none */
export function chordTitle(chord: Chord, place: number): string {
  return chord.name ?? `Chord ${place}`;
}

/** @returns `1 beat`, `4 beats`, `2.5 beats` */
export function beatsText(beats: number): string {
  return `${beats} ${beats === 1 ? 'beat' : 'beats'}`;
}

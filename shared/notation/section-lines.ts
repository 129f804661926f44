import { midiOfName } from '#shared/pitch/names';
import type { Section } from '#shared/strings/sections';
import type { Voice } from '#shared/study/study.document';

/** What one player of a section has at a time: a note, or the notes of a double stop, from the bottom. */
export type SectionLine = readonly Voice[];

/**
 * A section's lines in one chord, as it is divided.
 * @returns the highest line first
 * @example sectionLines([cello A2, cello F3], 'cello') // F3, A2: two lines, the section is divided
 */
export function sectionLines(voices: readonly Voice[], section: Section): readonly SectionLine[] {
  const lines = new Map<string, Voice[]>();
  for (const voice of voices) {
    if (voice.section !== section) continue;
    const key = voice.stop === null ? voice.id : `stop ${voice.stop}`;
    lines.set(key, [...(lines.get(key) ?? []), voice]);
  }
  const midi = (voice: Voice | undefined): number => (voice ? midiOfName(voice.pitch) : 0);
  return [...lines.values()]
    .map((line) => line.sort((a, b) => midi(a) - midi(b)))
    .sort((a, b) => midi(b.at(-1)) - midi(a.at(-1)));
}

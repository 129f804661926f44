import type { SystemPlan } from '#shared/notation/system-plan';
import { spokenPitch, type NoteNaming } from '#shared/pitch/display';
import { SECTION_FACTS } from '#shared/strings/sections';
import type { Chord } from '#shared/study/study.document';
import { sectionLines } from '#shared/notation/section-lines';

function capital(text: string): string {
  return text.charAt(0).toUpperCase() + text.slice(1);
}

/**
 * The staves read out, for those who cannot see them: sounding pitches, from the highest section down.
 * @param plan of the chord
 * @param chord that it writes
 * @param naming how the reader names notes
 * @returns a sentence for each staff
 * @example readOut(plan, chord, 'english')[4] // 'Double basses, bass clef: D 2.'
 */
export function readOut(plan: SystemPlan, chord: Chord, naming: NoteNaming): readonly string[] {
  return plan.staves.map(({ section, clef, words }) => {
    const lines = sectionLines(chord.voices, section);
    const name = capital(SECTION_FACTS[section].plural);
    if (lines.length === 0) return `${name}: rest.`;
    const notes = lines.map((line) => line.map(({ pitch }) => spokenPitch(pitch, naming)).join(' with '));
    const how = words.length > 0 ? `, ${words.join(', ')}` : '';
    return `${name}, ${clef} clef${how}: ${notes.join(', ')}.`;
  });
}

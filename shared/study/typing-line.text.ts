import { displayPitch, type NoteNaming } from '#shared/pitch/display';
import { SECTIONS } from '#shared/strings/sections';
import { TYPED_SECTIONS } from '#shared/study/section-names';
import type { Chord, Voice } from '#shared/study/study.document';
import { howText } from '#shared/study/typing-line.how';

/** The links of a chord, numbered in the order in which the line comes upon them. */
function linkNumbers(voices: readonly Voice[]): ReadonlyMap<string, number> {
  const numbers = new Map<string, number>();
  for (const { link } of voices) if (link !== null && !numbers.has(link)) numbers.set(link, numbers.size + 1);
  return numbers;
}

function bracket(said: string): string {
  return said === '' ? '' : `[${said}]`;
}

/** Divided notes first come first; a double stop stands where its first note stands. */
function groupsOf(voices: readonly Voice[]): readonly (readonly Voice[])[] {
  const written = new Set<number>();
  return voices
    .filter(({ stop }) => stop === null || (!written.has(stop) && written.add(stop)))
    .map((voice) => (voice.stop === null ? [voice] : voices.filter(({ stop }) => stop === voice.stop)));
}

/** What is said of every note of a divided section is said once, after its name. */
function sectionText(
  voices: readonly Voice[],
  links: ReadonlyMap<string, number>,
  naming: NoteNaming,
): string {
  const saidOf = (voice: Voice): string =>
    bracket(howText({ ...voice, link: voice.link === null ? null : (links.get(voice.link) ?? null) }));
  const [said = '', ...others] = voices.map(saidOf);
  const together = said !== '' && others.length > 0 && others.every((other) => other === said);
  const notes = groupsOf(voices)
    .map((group) =>
      group.map((voice) => displayPitch(voice.pitch, naming) + (together ? '' : saidOf(voice))).join('+'),
    )
    .join(' ');
  return together ? `${said} ${notes}` : notes;
}

/**
 * A chord as the line would be typed, from the bottom of the score: the inverse of `parseTypingLine`.
 * @example typingLineOf(chord, 'english') // 'DB D2, Vc A2+F3, Va A3[solo pp]'
 */
export function typingLineOf(chord: Pick<Chord, 'voices'>, naming: NoteNaming): string {
  const rising = [...SECTIONS].reverse();
  const order = rising.flatMap((section) => chord.voices.filter((voice) => voice.section === section));
  const links = linkNumbers(order);
  return rising
    .map((section) => ({ section, voices: order.filter((voice) => voice.section === section) }))
    .filter(({ voices }) => voices.length > 0)
    .map(({ section, voices }) => `${TYPED_SECTIONS[section]} ${sectionText(voices, links, naming)}`)
    .join(', ');
}

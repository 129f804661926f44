import { displayPitch, type NoteNaming } from '#shared/pitch/display';
import { intervalName, withArticle } from '#shared/pitch/interval-names';
import { parsePitch } from '#shared/pitch/names';
import { SECTION_FACTS } from '#shared/strings/sections';
import type { LimitFinding, VoiceSound } from '#shared/voicing/analysis';
import {
  soundTheSame,
  type IndexChange,
  type LimitChanges,
  type NoteChange,
  type RegisterChange,
  type VoicingComparison,
} from '#shared/voicing/comparison';
import { techniqueChanges } from '#shared/voicing/technique.words';
import { differClearly } from '#shared/voicing/uncertainty';
import { possessive, registerName, semitonesText, sentence } from '#shared/voicing/words';

/** How the two voicings are called: short letters, or names. */
export interface ComparedNames {
  readonly held: string;
  readonly now: string;
}

export const NO_CLEAR_DIFFERENCE = 'no clear difference';

/** @returns a difference of whole figures with its sign: `−38`, `+2`, `0` */
export function differenceText({ held, now }: Pick<IndexChange, 'held' | 'now'>): string {
  const by = Math.round(now) - Math.round(held);
  if (by === 0) return '0';
  return by > 0 ? `+${by}` : `−${-by}`;
}

/**
 * Which of the two is clearer.
 * @example verdictText(comparison, { held: 'A', now: 'B' }) // 'B is clearer than A.'
 */
export function verdictText(comparison: VoicingComparison, names: ComparedNames): string {
  const { held, now, clear } = comparison.index;
  if (soundTheSame(comparison)) return `${names.now} sounds the same as ${names.held}.`;
  if (!clear) return `No clear difference between ${names.held} and ${names.now}.`;
  return now < held
    ? `${names.now} is clearer than ${names.held}.`
    : `${names.now} is more clouded than ${names.held}.`;
}

/**
 * The register that differs most, where one differs clearly.
 * @returns a sentence without its full stop, or nothing
 * @example whereText(registers) // 'most in the great octave, 52 → 14'
 */
export function whereText(registers: readonly RegisterChange[]): string | null {
  const clear = registers.filter((register) => register.clear);
  const by = ({ held, now }: RegisterChange): number => Math.abs(held - now);
  const most = clear.reduce<RegisterChange | null>(
    (largest, register) => (largest && by(largest) >= by(register) ? largest : register),
    null,
  );
  return most && `most in ${registerName(most.register)}, ${Math.round(most.held)} → ${Math.round(most.now)}`;
}

/**
 * What one register has become.
 * @example registerChangeText({ register: 'great', held: 52, now: 14, clear: true }) // 'The great octave: 52 → 14, clearer.'
 */
export function registerChangeText({ register, held, now, clear }: RegisterChange): string {
  const figures = `${Math.round(held)} → ${Math.round(now)}`;
  if (!clear) return sentence(`${registerName(register)}: ${figures}, ${NO_CLEAR_DIFFERENCE}.`);
  return sentence(`${registerName(register)}: ${figures}, ${now < held ? 'clearer' : 'more clouded'}.`);
}

/**
 * What became of one note.
 * @returns a sentence; nothing for a note that stays as it was
 * @example noteChangeText(moved, 'english') // 'The cellos’ B♭2 moves up a fifth, to F3.'
 */
export function noteChangeText(change: NoteChange, naming: NoteNaming): string | null {
  switch (change.kind) {
    case 'stays':
      return null;
    case 'gone':
      return sentence(`${noteOf(change.held, naming)} is gone.`);
    case 'new':
      return sentence(`${noteOf(change.now, naming)} is new.`);
    case 'moved':
      return sentence(`${noteOf(change.held, naming)} moves ${motionText(change.held, change.now, naming)}.`);
    case 'given':
      return sentence(`${noteOf(change.held, naming)} goes ${givenText(change.held, change.now, naming)}.`);
    case 'played':
      return sentence(`${noteOf(change.held, naming)} stays, now ${playedText(change.held, change.now)}.`);
  }
}

/** @returns a sentence for each note that changed, from the top down; one that says so where none did */
export function noteChangeTexts(comparison: VoicingComparison, naming: NoteNaming): readonly string[] {
  const texts = comparison.notes.flatMap((change) => noteChangeText(change, naming) ?? []);
  return texts.length > 0 ? texts : ['Every note is the same in both.'];
}

/**
 * What became of the pairs under their low interval limit.
 * @param held voices of the voicing that is held
 * @param now voices of the one now
 * @example limitChangeTexts(limits, held, now, 'english')[0] // 'The cellos’ A♭2–B♭2 no longer stands …'
 */
export function limitChangeTexts(
  limits: LimitChanges,
  held: readonly VoiceSound[],
  now: readonly VoiceSound[],
  naming: NoteNaming,
): readonly string[] {
  const told = (
    findings: readonly LimitFinding[],
    voices: readonly VoiceSound[],
    say: (pair: string, finding: LimitFinding) => string,
  ): readonly string[] =>
    findings.flatMap((finding) => {
      const pair = pairText(finding, voices, naming);
      return pair === null ? [] : [sentence(say(pair, finding))];
    });
  return [
    ...told(limits.gone, held, (pair) => `${pair}, stood under the low limit and is gone.`),
    ...told(
      limits.come,
      now,
      (pair, { semitonesBelow }) =>
        `${pair}, now stands ${semitonesText(semitonesBelow)} under the low limit.`,
    ),
    ...told(limits.stay, now, (pair) => `${pair}, still stands under the low limit.`),
  ];
}

/**
 * Which of several voicings is the clearest, and which of the others differ from it by less than is sure.
 * @param voicings in any order
 * @returns nothing for fewer than two
 * @example clearestText([{ name: 'open', index: 12 }, { name: 'close', index: 60 }]) // 'Clearest: open.'
 */
export function clearestText(
  voicings: readonly { readonly name: string; readonly index: number }[],
): string | null {
  const [clearest, ...others] = [...voicings].sort((a, b) => a.index - b.index);
  if (!clearest || others.length === 0) return null;
  const alike = others.filter(({ index }) => !differClearly(clearest.index, index)).map(({ name }) => name);
  if (alike.length === others.length) return 'No clear difference between any of them and the lowest figure.';
  const beside = alike.length === 0 ? '' : ` No clear difference from it: ${alike.join(', ')}.`;
  return `Clearest: ${clearest.name}.${beside}`;
}

function noteOf({ section, players, pitch }: VoiceSound, naming: NoteNaming): string {
  return `${possessive(section, players)} ${displayPitch(pitch, naming)}`;
}

function motionText(held: VoiceSound, now: VoiceSound, naming: NoteNaming): string {
  const [from, to] = [parsePitch(held.pitch), parsePitch(now.pitch)];
  const by = from && to ? intervalName(from, to) : semitonesText(Math.abs(now.midi - held.midi));
  return `${now.midi > held.midi ? 'up' : 'down'} ${withArticle(by)}, to ${displayPitch(now.pitch, naming)}`;
}

function givenText(held: VoiceSound, now: VoiceSound, naming: NoteNaming): string {
  const to = `to the ${SECTION_FACTS[now.section].plural}`;
  return held.midi === now.midi ? to : `${to}, ${motionText(held, now, naming)}`;
}

function playedText(held: VoiceSound, now: VoiceSound): string {
  const players = now.players === 1 ? 'by 1 player' : `by ${now.players} players`;
  return [
    ...techniqueChanges(held.technique, now.technique),
    ...(held.players === now.players ? [] : [`${players} instead of ${held.players}`]),
    ...(held.dynamic === now.dynamic ? [] : [`${now.dynamic} instead of ${held.dynamic}`]),
  ].join(', ');
}

/** The pair as the head of a sentence, with its interval. */
function pairText(
  { lowerId, upperId }: LimitFinding,
  voices: readonly VoiceSound[],
  naming: NoteNaming,
): string | null {
  const lower = voices.find(({ id }) => id === lowerId);
  const upper = voices.find(({ id }) => id === upperId);
  if (!lower || !upper) return null;
  const [a, b] = [parsePitch(lower.pitch), parsePitch(upper.pitch)];
  const interval = a && b ? withArticle(intervalName(a, b)) : semitonesText(upper.midi - lower.midi);
  const notes = `${displayPitch(lower.pitch, naming)}–${displayPitch(upper.pitch, naming)}`;
  return `${notes} (${SECTION_FACTS[lower.section].short}, ${SECTION_FACTS[upper.section].short}), ${interval}`;
}

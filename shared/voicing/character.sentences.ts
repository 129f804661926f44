import { displayPitch, noteName, type NoteNaming } from '#shared/pitch/display';
import { pitchName } from '#shared/pitch/names';
import { spellIn, type SpellingKey } from '#shared/pitch/spelling';
import type { ChordCharacter } from '#shared/voicing/character';
import { LOWER_LIMIT_OF_PITCH } from '#shared/voicing/common-fundamental';
import { hertzText, semitonesText } from '#shared/voicing/words';

/** A figure of a chord with its unit, and what it means to somebody who asks. */
export interface CharacterFigure {
  readonly name: string;
  readonly value: string;
  readonly definition: string;
}

const NONE = 'none';
const C4 = 60;
const PERCENT = 100;

/**
 * The figures of a chord besides its muddiness, each with its definition.
 * @param underLimits pairs under their low interval limit
 * @param key for spelling
 * @param naming how the reader names notes
 * @example characterFigures(character, 1, key, 'english')[0] // { name: 'Under low limits', value: '1 pair', … }
 */
export function characterFigures(
  character: ChordCharacter,
  underLimits: number,
  key: SpellingKey,
  naming: NoteNaming,
): readonly CharacterFigure[] {
  const { weight, spread, openness, brightnessHz } = character;
  const note = (midi: number): string => displayPitch(pitchName(spellIn(Math.round(midi), key)), naming);
  return [
    {
      name: 'Under low limits',
      value: underLimits === 1 ? '1 pair' : `${underLimits} pairs`,
      definition:
        'Pairs of notes that stand under the printed low limit of their interval, neighbours or not.',
    },
    {
      name: 'Weight',
      value: weight === null ? NONE : note(weight),
      definition: 'The mean pitch of all partials, each counting by its energy, as the nearest note.',
    },
    {
      name: 'Spread',
      value: semitonesText(spread),
      definition: 'From the lowest to the highest note.',
    },
    {
      name: 'Openness',
      value: openness === null ? NONE : `${openness.toFixed(1)} semitones`,
      definition: 'The mean interval between neighbours; each counts half as much as the one below it.',
    },
    {
      name: 'Brightness',
      value: brightnessHz === null ? NONE : hertzText(brightnessHz),
      definition:
        'The centre of the spectrum: the mean frequency of all partials, each counting by its energy.',
    },
    rootFigure(character, key, naming),
    fundamentalFigure(character),
  ];
}

function rootFigure({ root }: ChordCharacter, key: SpellingKey, naming: NoteNaming): CharacterFigure {
  const about =
    'The note that the chord supports best as its root, and its share of all support (Parncutt 1988).';
  if (!root) return { name: 'Root clarity', value: NONE, definition: about };
  const share = (support: number): string => `${Math.round(support * PERCENT)} %`;
  return {
    name: 'Root clarity',
    value: `${noteName(spellIn(C4 + root.root, key), naming)}, ${share(root.rootSupport)}`,
    definition: `${about} The bass note has ${share(root.bassSupport)}. Ambiguity ${root.ambiguity.toFixed(1)}; 1 would be one root alone.`,
  };
}

function fundamentalFigure({ fundamental }: ChordCharacter): CharacterFigure {
  const about = 'The fundamental of which all notes are whole multiples, within 18 cents.';
  if (!fundamental) {
    return {
      name: 'Common fundamental',
      value: NONE,
      definition: `${about} These notes share none in simple ratios.`,
    };
  }
  const { frequencyHz, multiples } = fundamental;
  const ratios = [...new Set(multiples)].sort((a, b) => a - b).join(' : ');
  const low =
    frequencyHz < LOWER_LIMIT_OF_PITCH
      ? ` It lies under about ${LOWER_LIMIT_OF_PITCH} Hz, where hearing finds no pitch.`
      : '';
  return {
    name: 'Common fundamental',
    value: hertzText(frequencyHz),
    definition: `${about} Here ${ratios}.${low}`,
  };
}

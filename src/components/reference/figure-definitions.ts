import { COVERED, SWOLLEN } from '#shared/voicing/balance';
import { MASKING } from '#shared/voicing/audibility';
import { opennessOf, rootClarity } from '#shared/voicing/character';
import { LOWER_LIMIT_OF_PITCH } from '#shared/voicing/common-fundamental';
import { midiOfName } from '#shared/pitch/names';
import { figureText } from '@/components/reference/calibration-words';

/** A figure that the program shows, as it is to be understood. */
export interface FigureDefinition {
  readonly name: string;
  readonly unit: string;
  readonly definition: string;
  readonly source: string;
}

const PERCENT = 100;
const OWN = 'the program’s own';
const OPEN = ['C2', 'G2', 'E3'] as const;
const TRIAD = ['C4', 'E4', 'G4'] as const;
const midiOf = (names: readonly string[]) => names.map(midiOfName);
const percent = (share: number) => `${Math.round(PERCENT * share)} %`;

function opennessExample(): string {
  const openness = opennessOf(midiOf(OPEN));
  return openness === null ? '' : ` ${OPEN.join(' ')}: ${figureText(openness, 1)} semitones.`;
}

function rootExample(): string {
  const clarity = rootClarity(midiOf(TRIAD));
  if (!clarity) return '';
  const { rootSupport, ambiguity } = clarity;
  return ` ${TRIAD.join(' ')}: C with ${percent(rootSupport)}, ambiguity ${figureText(ambiguity, 2)}.`;
}

/** The figures beside the index, each with its unit and where it comes from. */
export function figureDefinitions(): readonly FigureDefinition[] {
  return [
    {
      ...{ name: 'Weight', unit: 'a note', source: OWN },
      definition: 'The mean pitch of all partials of the chord, each weighing as much as its energy.',
    },
    {
      ...{ name: 'Spread', unit: 'semitones', source: OWN },
      definition: 'From the lowest note to the highest.',
    },
    {
      ...{ name: 'Openness', unit: 'semitones', source: OWN },
      definition: `The mean interval between neighbouring notes, each weighing half of the one below it; notes in unison count once.${opennessExample()}`,
    },
    {
      ...{ name: 'Brightness', unit: 'Hz', source: 'spectral centroid, common practice' },
      definition: 'The mean frequency of all partials, each weighing as much as its energy.',
    },
    {
      ...{ name: 'Root clarity', unit: '% and 1 or more', source: 'Parncutt 1988, 2006' },
      definition: `The best supported root’s share of all support, and the bass note’s; ambiguity is 1 where one key alone is supported.${rootExample()}`,
    },
    {
      ...{ name: 'Common fundamental', unit: 'Hz', source: 'arithmetic; limit of pitch from memory' },
      definition: `The highest frequency of which all notes are whole multiples, as nearly as tempered thirds allow. Near ${LOWER_LIMIT_OF_PITCH} Hz pitch itself ends (Pressnitzer, Patterson & Krumbholz 2001).`,
    },
    {
      ...{ name: 'Register density', unit: 'partials, and dB' },
      definition: `How many partials are heard in a band or register, and their energy together. Heard is what lies above the threshold in quiet and is not masked by a partial ${MASKING} dB louder in the same equivalent rectangular bandwidth.`,
      source: 'Terhardt 1979 for the threshold; level at the listener and masking from memory',
    },
    {
      ...{ name: 'Balance of voices', unit: '% heard', source: OWN },
      definition: `The share of a voice’s energy that is above the threshold and not masked by another voice; covered where it is under ${percent(COVERED)}.`,
    },
    {
      ...{ name: 'Balance of chord tones', unit: 'dB', source: 'a rule of thumb after Stevens, from memory' },
      definition: `The level of all who play a tone, less the mean of the other tones; swollen from ${SWOLLEN} dB above, thin from ${SWOLLEN} dB below: about twice or half as loud.`,
    },
  ];
}

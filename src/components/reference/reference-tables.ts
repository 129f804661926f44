import { INSTRUMENT_BODIES } from '#shared/data/instrument-bodies';
import { LOW_INTERVAL_LIMITS } from '#shared/data/low-interval-limits';
import { DYNAMIC_LEVELS, FORTE_POWER_LEVEL } from '#shared/data/player-levels';
import { SECTION_PRESETS } from '#shared/data/section-presets';
import { EXTENSION_LOWEST, FIFTH_STRING, STRING_RANGES } from '#shared/data/string-ranges';
import { displayPitch, type NoteNaming } from '#shared/pitch/display';
import type { Instrument } from '#shared/strings/sections';
import { SECTION_FACTS, SECTIONS } from '#shared/strings/sections';
import { REGISTER_BOUNDS } from '#shared/voicing/registers';
import { nearestNote } from '@/charts/calibration-fit';
import { figureText, spreadText } from '@/components/reference/calibration-words';

/** A table as the page prints it. */
export interface PrintedTable {
  readonly caption: string;
  readonly columns: readonly { readonly label: string; readonly figures?: boolean }[];
  readonly lines: readonly (readonly string[])[];
}

const INSTRUMENTS = ['violin', 'viola', 'cello', 'doubleBass'] as const satisfies readonly Instrument[];
const NAMES: Readonly<Record<Instrument, string>> = {
  violin: 'Violin',
  viola: 'Viola',
  cello: 'Cello',
  doubleBass: 'Double bass',
};
/** Stands beside every figure that rests on memory of the literature. */
const FROM_MEMORY = '†';
const HALF = 0.5;

/** Which figures of a body are published for its own instrument; see the source of the table. */
const PUBLISHED_BODIES: Readonly<Record<Instrument, readonly ('air' | 'wood' | 'hill')[]>> = {
  violin: ['air', 'wood', 'hill'],
  viola: ['wood'],
  cello: ['wood'],
  doubleBass: [],
};

/** The published chart of low interval limits. */
export function limitsTable(naming: NoteNaming): PrintedTable {
  return {
    caption: 'Low interval limits: lowest lower note',
    columns: [{ label: 'Interval' }, { label: 'Semitones', figures: true }, ...columns('Chart', 'Variants')],
    lines: LOW_INTERVAL_LIMITS.map(({ interval, semitones, lowest, spread }) => [
      ...[interval, String(semitones), displayPitch(lowest, naming), spreadText(spread, naming)],
    ]),
  };
}

/** Open strings and tops, sounding. */
export function rangesTable(naming: NoteNaming): PrintedTable {
  const note = (name: string) => displayPitch(name, naming);
  const top = (name: string) => note(name) + FROM_MEMORY;
  return {
    caption: 'Open strings and ranges, sounding',
    columns: columns('Instrument', 'Open strings, I first', 'At ease to', 'Orchestral to', 'Solo to'),
    lines: INSTRUMENTS.map((instrument) => {
      const { openStrings, comfortableTop, orchestralTop, soloTop } = STRING_RANGES[instrument];
      const strings = openStrings.map(note).join(' ');
      return [NAMES[instrument], strings, top(comfortableTop), top(orchestralTop), top(soloTop)];
    }),
  };
}

/** @returns how low a double bass reaches beyond its open strings */
export function bassText(naming: NoteNaming): string {
  return (
    'The double bass is written an octave higher than it sounds. With the low extension its fourth string ' +
    `reaches ${displayPitch(EXTENSION_LOWEST, naming)}; a fifth string is ${displayPitch(FIFTH_STRING, naming)}.`
  );
}

/** Section sizes in use. */
export function sizesTable(): PrintedTable {
  return {
    caption: 'Section sizes: players',
    columns: [
      { label: 'Ensemble' },
      ...SECTIONS.map((section) => ({ label: SECTION_FACTS[section].short, figures: true })),
      { label: 'Source' },
    ],
    lines: SECTION_PRESETS.map(({ name, players, source }) => [
      ...[name, ...SECTIONS.map((section) => String(players[section])), source],
    ]),
  };
}

/** Where each body helps the sound most. */
export function bodiesTable(): PrintedTable {
  return {
    caption: 'Bodies of the instruments: resonances [Hz]',
    columns: [{ label: 'Instrument' }, ...figureColumns('Air mode', 'Wood modes', 'Bridge hill')],
    lines: INSTRUMENTS.map((instrument) => {
      const { airHz, woodHz, hillHz } = INSTRUMENT_BODIES[instrument];
      const mark = (which: 'air' | 'wood' | 'hill') =>
        PUBLISHED_BODIES[instrument].includes(which) ? '' : FROM_MEMORY;
      return [
        NAMES[instrument],
        `${airHz}${mark('air')}`,
        `${woodHz.join(', ')}${mark('wood')}`,
        `${hillHz}${mark('hill')}`,
      ];
    }),
  };
}

/** How loud one player is, and the dynamics against mf. */
export function levelsTables(): readonly PrintedTable[] {
  return [
    {
      caption: 'One player at forte: sound power level [dB re 1 pW]',
      columns: [{ label: 'Instrument' }, ...figureColumns('Level')],
      lines: INSTRUMENTS.map((name) => [NAMES[name], `${FORTE_POWER_LEVEL[name]}${FROM_MEMORY}`]),
    },
    {
      caption: 'Dynamics against mf [dB]',
      columns: [{ label: 'Dynamic' }, ...figureColumns('Level')],
      lines: Object.entries(DYNAMIC_LEVELS).map(([dynamic, level]) => [
        ...[dynamic, `${figureText(level, 0)}${FROM_MEMORY}`],
      ]),
    },
  ];
}

/** The registers by their octave names. */
export function registersTable(naming: NoteNaming): PrintedTable {
  return {
    caption: 'Registers',
    columns: columns('Register', 'From', 'To'),
    lines: REGISTER_BOUNDS.map(({ register, low, high }) => [
      ...[register, nearestNote(low + HALF, naming), nearestNote(Math.floor(high), naming)],
    ]),
  };
}

function columns(...labels: readonly string[]): PrintedTable['columns'] {
  return labels.map((label) => ({ label }));
}

function figureColumns(...labels: readonly string[]): PrintedTable['columns'] {
  return labels.map((label) => ({ label, figures: true }));
}

import type { ChartData, ChartOptions, Point, PointStyle } from 'chart.js';
import { displayPitch, type NoteNaming } from '#shared/pitch/display';
import { SECTION_FACTS, type Section } from '#shared/strings/sections';
import type { Decibels, Midi } from '#shared/units';
import type { VoiceSound } from '#shared/voicing/analysis';
import { hertzText, sentence } from '#shared/voicing/words';
import type { PitchAxis } from '@/charts/pitch-axis';

/** The colours as the page has them now: a canvas knows no tokens. Six hexadecimal digits. */
export interface ChartColours {
  readonly sections: Readonly<Record<Section, string>>;
  readonly ink: string;
  readonly quiet: string;
  readonly line: string;
  readonly surface: string;
}

export interface OvertonesInput {
  readonly voices: readonly VoiceSound[];
  readonly axis: PitchAxis;
  readonly midiOf: (frequencyHz: number) => Midi;
  readonly colours: ChartColours;
  readonly naming: NoteNaming;
  /** Voices to stand out; with none, all stand alike. */
  readonly emphasised: readonly string[];
}

/** One partial as it is drawn. */
interface Tick {
  readonly voice: VoiceSound;
  readonly n: number;
  readonly frequencyHz: number;
  /** Under the chord's loudest partial. */
  readonly level: Decibels;
  readonly y: number;
}

/** What lies further under the loudest partial is not drawn: it is not heard beside it. */
export const FLOOR_DB: Decibels = -60;
const TICK_STEP_DB = 20;
/** Room for the mark of a fundamental at 0 dB. */
const ROOM_DB = 4;
/** Height of the level scale with its title, in pixels: the chart area above it is the axis, to the pixel. */
export const SCALE_HEIGHT = 40;
const FAINT = '40';
const POINTS_PER_TICK = 3;
const MARKS: Readonly<Record<Section, PointStyle>> = {
  violin1: 'circle',
  violin2: 'rectRot',
  viola: 'rect',
  cello: 'triangle',
  doubleBass: 'rectRounded',
};

/** @returns the level of the chord's loudest partial, from which the pane counts */
export function loudestOf(voices: readonly VoiceSound[]): Decibels {
  return Math.max(...voices.flatMap(({ partials }) => partials.map(({ levelDb }) => levelDb)));
}

/** Longest first, so that where partials coincide the shorter ones stay in sight. */
function ticksOf({ voices, axis, midiOf }: OvertonesInput): readonly Tick[] {
  const loudest = loudestOf(voices);
  return voices
    .flatMap((voice) =>
      voice.partials.map(({ n, frequencyHz, levelDb }) => ({
        ...{ voice, n, frequencyHz, level: levelDb - loudest },
        y: axis.yOf(midiOf(frequencyHz)),
      })),
    )
    .filter(({ level }) => level > FLOOR_DB)
    .sort((a, b) => b.level - a.level);
}

function pointsOf(ticks: readonly Tick[]): Point[] {
  return ticks.flatMap(({ level, y }) => [
    { x: FLOOR_DB, y },
    { x: level, y },
    { x: NaN, y: NaN },
  ]);
}

/**
 * The overtones of a chord as chart.js draws them: each partial a tick from the left to its level, its
 * section's colour, at the height of its pitch on the bench's axis.
 * @returns data of one set, longest tick first
 */
export function overtonesData(input: OvertonesInput): ChartData<'scatter', Point[]> {
  const ticks = ticksOf(input);
  const { colours, emphasised } = input;
  const colourOf = ({ voice }: Tick): string =>
    colours.sections[voice.section] + (emphasised.length === 0 || emphasised.includes(voice.id) ? '' : FAINT);
  const tickAt = (index: number): Tick | undefined => ticks[Math.floor(index / POINTS_PER_TICK)];
  /** The second point of a tick is its end. */
  const isMark = (index: number): boolean => index % POINTS_PER_TICK === 1 && tickAt(index)?.n === 1;
  return {
    datasets: [
      {
        data: pointsOf(ticks),
        showLine: true,
        spanGaps: false,
        borderColor: colours.ink,
        segment: {
          borderColor: ({ p0DataIndex }) => {
            const tick = tickAt(p0DataIndex);
            return tick && colourOf(tick);
          },
          borderWidth: ({ p0DataIndex }) => (tickAt(p0DataIndex)?.n === 1 ? 3 : 1.5),
        },
        pointRadius: ({ dataIndex }) => (isMark(dataIndex) ? 4 : 0),
        pointHoverRadius: 4,
        pointHitRadius: 4,
        pointStyle: ({ dataIndex }) => MARKS[tickAt(dataIndex)?.voice.section ?? 'violin1'],
        pointBorderWidth: 0,
        pointBackgroundColor: ({ dataIndex }) => {
          const tick = tickAt(dataIndex);
          return tick ? colourOf(tick) : colours.ink;
        },
      },
    ],
  };
}

/** @returns what is told of the partial under the pointer */
export function partialText(tick: Tick, naming: NoteNaming): string {
  const { voice, n, frequencyHz, level } = tick;
  const which = n === 1 ? 'fundamental' : `partial ${n}`;
  const note = `${SECTION_FACTS[voice.section].plural} ${displayPitch(voice.pitch, naming)}`;
  return sentence(`${note}, ${which}: ${hertzText(frequencyHz)}, ${levelText(level)}`);
}

/** @returns a level under the loudest partial with a true minus sign: `−12 dB` */
export function levelText(level: Decibels): string {
  return `${Math.round(level)} dB`.replace('-', '−');
}

/**
 * The chart's scales, pinned to the bench: heights are the axis's own pixels.
 * @param input as for the data
 */
export function overtonesOptions(input: OvertonesInput): ChartOptions<'scatter'> {
  const { axis, colours, naming } = input;
  const ticks = ticksOf(input);
  return {
    animation: false,
    responsive: true,
    maintainAspectRatio: false,
    layout: { padding: 0, autoPadding: false },
    interaction: { mode: 'nearest', axis: 'xy', intersect: true },
    scales: {
      x: {
        min: FLOOR_DB,
        max: ROOM_DB,
        afterFit: (scale) => {
          scale.height = SCALE_HEIGHT;
        },
        title: { display: true, text: 'Level [dB]', color: colours.quiet, padding: 0 },
        ticks: {
          stepSize: TICK_STEP_DB,
          includeBounds: false,
          align: 'inner',
          color: colours.quiet,
          callback: (value) => String(value).replace('-', '−'),
        },
        grid: { color: colours.line },
        border: { color: colours.quiet },
      },
      y: { display: false, reverse: true, min: 0, max: axis.height },
    },
    plugins: {
      legend: { display: false },
      tooltip: {
        displayColors: false,
        backgroundColor: colours.ink,
        bodyColor: colours.surface,
        callbacks: {
          label: ({ dataIndex }) => {
            const tick = ticks[Math.floor(dataIndex / POINTS_PER_TICK)];
            return tick ? partialText(tick, naming) : '';
          },
        },
      },
    },
  };
}

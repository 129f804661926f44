import type { ChartData, ChartOptions, Point, PointStyle } from 'chart.js';
import { displayPitch, type NoteNaming } from '#shared/pitch/display';
import { SECTION_FACTS, type Section } from '#shared/strings/sections';
import type { Decibels, Midi } from '#shared/units';
import type { VoiceSound } from '#shared/voicing/analysis';
import { heardNumbers } from '#shared/voicing/heard';
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
export interface Tick {
  readonly voice: VoiceSound;
  readonly n: number;
  readonly frequencyHz: number;
  /** Under the chord's loudest partial. */
  readonly level: Decibels;
  readonly y: number;
  /** Above the threshold in quiet and not masked by the rest of the chord. */
  readonly heard: boolean;
}

/** What lies further under the loudest partial is not drawn: it is not heard beside it. */
export const FLOOR_DB: Decibels = -60;
const TICK_STEP_DB = 20;
/** Room for the mark of a fundamental at 0 dB. */
export const ROOM_DB = 4;
/** Height of the level scale with its title, in pixels: the chart area above it is the axis, to the pixel. */
export const SCALE_HEIGHT = 40;
const FAINT = '30';
/** A masked partial is paler than a heard one, and broken. */
const MASKED = '80';
const MASKED_DASH = [2, 2];
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
export function ticksOf({
  voices,
  axis,
  midiOf,
}: Pick<OvertonesInput, 'voices' | 'axis' | 'midiOf'>): readonly Tick[] {
  const loudest = loudestOf(voices);
  const heard = heardNumbers(voices);
  return voices
    .flatMap((voice) =>
      voice.partials.map(({ n, frequencyHz, levelDb }) => ({
        ...{ voice, n, frequencyHz, level: levelDb - loudest },
        y: axis.yOf(midiOf(frequencyHz)),
        heard: heard.get(voice.id)?.has(n) ?? false,
      })),
    )
    .filter(({ level }) => level > FLOOR_DB)
    .sort((a, b) => b.level - a.level);
}

/** A point of the plot that knows which partial it ends. */
export interface TickPoint extends Point {
  readonly tick: Tick | null;
}

/** From the left to the level; the third point breaks the line. */
function lineOf(tick: Tick): TickPoint[] {
  return [
    { x: FLOOR_DB, y: tick.y, tick: null },
    { x: tick.level, y: tick.y, tick },
    { x: NaN, y: NaN, tick: null },
  ];
}

/**
 * The overtones of a chord as chart.js draws them: each partial a tick from the left to its level, its
 * section's colour, at the height of its pitch on the bench's axis; fundamentals bear their section's mark.
 * @returns two sets: the marks of the fundamentals, and the ticks, longest first
 */
export function overtonesData(input: OvertonesInput): ChartData<'scatter', TickPoint[]> {
  const ticks = ticksOf(input);
  const { colours, emphasised } = input;
  const strengthOf = ({ voice, heard }: Tick): string => {
    if (emphasised.length > 0 && !emphasised.includes(voice.id)) return FAINT;
    return heard ? '' : MASKED;
  };
  const colourOf = (tick: Tick): string => colours.sections[tick.voice.section] + strengthOf(tick);
  const tickAt = (index: number): Tick | undefined => ticks[Math.floor(index / POINTS_PER_TICK)];
  const fundamentals = ticks.filter(({ n }) => n === 1);
  return {
    datasets: [
      {
        data: fundamentals.map((tick) => ({ x: tick.level, y: tick.y, tick })),
        pointRadius: 4,
        pointBorderWidth: 0,
        pointStyle: fundamentals.map(({ voice }) => MARKS[voice.section]),
        pointBackgroundColor: fundamentals.map(colourOf),
      },
      {
        data: ticks.flatMap(lineOf),
        showLine: true,
        spanGaps: false,
        // No option of these points depends on the point, so that chart.js works them out once for all.
        pointRadius: 0,
        pointHitRadius: 4,
        borderColor: colours.ink,
        segment: {
          borderColor: ({ p0DataIndex }) => {
            const tick = tickAt(p0DataIndex);
            return tick && colourOf(tick);
          },
          borderDash: ({ p0DataIndex }) => (tickAt(p0DataIndex)?.heard === false ? MASKED_DASH : undefined),
          borderWidth: ({ p0DataIndex }) => (tickAt(p0DataIndex)?.n === 1 ? 3 : 1.5),
        },
      },
    ],
  };
}

/** @returns what is told of the partial under the pointer */
export function partialText(tick: Tick, naming: NoteNaming): string {
  const { voice, n, frequencyHz, level, heard } = tick;
  const which = n === 1 ? 'fundamental' : `partial ${n}`;
  const note = `${SECTION_FACTS[voice.section].plural} ${displayPitch(voice.pitch, naming)}`;
  return sentence(
    `${note}, ${which}: ${hertzText(frequencyHz)}, ${levelText(level)}${heard ? '' : ', masked'}`,
  );
}

/** @returns a level under the loudest partial with a true minus sign: `−12 dB` */
export function levelText(level: Decibels): string {
  return `${Math.round(level)} dB`.replace('-', '−');
}

function tickOf(raw: unknown): Tick | null {
  // chart.js hands back the very points that overtonesData made.
  return (raw as TickPoint).tick;
}

/** What the scales depend on; they stay the same while notes move. */
export interface OvertonesFrame {
  /** Height of the bench's axis with its strip, in pixels. */
  readonly height: number;
  readonly colours: ChartColours;
  readonly naming: NoteNaming;
}

/** The chart's scales, pinned to the bench: heights are the axis's own pixels. */
export function overtonesOptions({ height, colours, naming }: OvertonesFrame): ChartOptions<'scatter'> {
  return {
    animation: false,
    responsive: true,
    maintainAspectRatio: false,
    layout: { padding: 0, autoPadding: false },
    interaction: { mode: 'nearest', axis: 'xy', intersect: true },
    scales: {
      x: levelScale(colours),
      y: { display: false, ticks: { display: false }, reverse: true, min: 0, max: height },
    },
    plugins: {
      legend: { display: false },
      tooltip: {
        displayColors: false,
        backgroundColor: colours.ink,
        bodyColor: colours.surface,
        callbacks: {
          label: ({ raw }) => {
            const tick = tickOf(raw);
            return tick ? partialText(tick, naming) : '';
          },
        },
      },
    },
  };
}

function levelScale(colours: ChartColours): NonNullable<ChartOptions<'scatter'>['scales']>[string] {
  return {
    min: FLOOR_DB,
    max: ROOM_DB,
    afterFit: (scale) => {
      scale.height = SCALE_HEIGHT;
    },
    title: { display: true, text: 'Level [dB]', color: colours.quiet, padding: 0 },
    ticks: {
      stepSize: TICK_STEP_DB,
      includeBounds: false,
      autoSkip: false,
      maxRotation: 0,
      align: 'inner',
      color: colours.quiet,
      callback: (value) => String(value).replace('-', '−'),
    },
    grid: { color: colours.line },
    border: { color: colours.quiet },
  };
}

import type { ChartData, ChartOptions, Point, PointStyle } from 'chart.js';
import type { LowIntervalLimit } from '#shared/data/low-interval-limits';
import type { CalibratedLimit } from '#shared/data/muddiness-constants';
import { displayPitch, type NoteNaming } from '#shared/pitch/display';
import { pitchName } from '#shared/pitch/names';
import { spellIn } from '#shared/pitch/spelling';
import type { Midi, Semitones } from '#shared/units';
import type { ChartColours } from '@/charts/overtones';

/** One interval: what is published and what the model makes of it; lower notes. */
export interface FitLine {
  readonly interval: string;
  readonly chart: Midi;
  readonly spread: LowIntervalLimit['spread'];
  readonly model: Midi | null;
  readonly leftOut: Midi | null;
}

/** Points of the plot know which interval they belong to. */
export interface FitPoint extends Point {
  readonly line: FitLine | null;
}

type Plain = Pick<ChartColours, 'ink' | 'quiet' | 'line' | 'surface'>;

/** The notes printed are few, and with flats as the chart prints them. */
const FLATS = { tonic: 'C', mode: 'major' } as const;
const OCTAVE: Semitones = 12;
const FIFTH: Semitones = 7;
/** Room above and below the outermost figure. */
const ROOM: Semitones = 2;
const HALF = 0.5;

/** @returns the chart's lines with what the calibration found for each */
export function fitLines(
  limits: readonly LowIntervalLimit[],
  calibrated: readonly CalibratedLimit[],
): readonly FitLine[] {
  return limits.map(({ interval, semitones, lowestMidi, spread }) => {
    const found = calibrated.find((line) => line.semitones === semitones);
    const { model = null, leftOut = null } = found ?? {};
    return { interval, chart: lowestMidi, spread, model, leftOut };
  });
}

/** @returns the key nearest to a pitch between the keys, as the reader names it */
export function nearestNote(midi: Midi, naming: NoteNaming): string {
  return displayPitch(pitchName(spellIn(Math.round(midi), FLATS)), naming);
}

/** @returns a difference in semitones, signed: `+1.6`, `−0.2`, `0.0` */
export function semitonesOff(difference: Semitones): string {
  const text = Math.abs(difference).toFixed(1);
  if (Number(text) === 0) return text;
  return `${difference > 0 ? '+' : '−'}${text}`;
}

/** @returns an interval's figures in one line */
export function fitText(line: FitLine, naming: NoteNaming): readonly string[] {
  const { interval, chart, spread, model, leftOut } = line;
  const note = (midi: Midi) => nearestNote(midi, naming);
  const variants = spread.low === spread.high ? 'alike' : `${note(spread.low)} to ${note(spread.high)}`;
  const against = (midi: Midi | null) =>
    midi === null ? 'no limit' : `${semitonesOff(midi - chart)} semitones from the chart`;
  return [
    `${interval}: chart ${note(chart)}, published variants ${variants}`,
    `model ${against(model)}`,
    `predicted by the others ${against(leftOut)}`,
  ];
}

function marksOf(lines: readonly FitLine[], pitch: (line: FitLine) => Midi | null): FitPoint[] {
  return lines.flatMap((line, x) => {
    const y = pitch(line);
    return y === null ? [] : [{ x, y, line }];
  });
}

/** From the lowest published variant to the highest; the third point breaks the line. */
function spreadsOf(lines: readonly FitLine[]): FitPoint[] {
  return lines.flatMap(({ spread }, x) => [
    { x, y: spread.low, line: null },
    { x, y: spread.high, line: null },
    { x: NaN, y: NaN, line: null },
  ]);
}

interface Mark {
  readonly label: string;
  readonly style: PointStyle;
  readonly radius: number;
  readonly edge: string;
  readonly fill: string;
}

function dataset(data: FitPoint[], { label, style, radius, edge, fill }: Mark) {
  return {
    ...{ label, data, pointStyle: style, pointRadius: radius, pointHoverRadius: radius },
    ...{ pointBorderColor: edge, pointBackgroundColor: fill, pointBorderWidth: 2, pointHitRadius: 6 },
  };
}

/**
 * The calibration's fit as chart.js draws it: for each interval the published limit, the spread of the
 * published variants, the model's limit, and what the other intervals predict when it is left out.
 */
export function calibrationData(
  lines: readonly FitLine[],
  { ink, quiet, surface }: Plain,
): ChartData<'scatter', FitPoint[]> {
  const mark = (label: string, style: PointStyle, radius: number, edge: string, fill: string) => ({
    ...{ label, style, radius, edge, fill },
  });
  return {
    datasets: [
      dataset(
        marksOf(lines, ({ model }) => model),
        mark('Model', 'circle', 4, ink, ink),
      ),
      dataset(
        marksOf(lines, ({ leftOut }) => leftOut),
        mark('Predicted by the others', 'circle', 6, quiet, `${surface}00`),
      ),
      dataset(
        marksOf(lines, ({ chart }) => chart),
        mark('Chart', 'line', 8, ink, ink),
      ),
      {
        ...{ label: 'Published variants', data: spreadsOf(lines), showLine: true, spanGaps: false },
        ...{ pointRadius: 0, pointHitRadius: 0, borderColor: quiet, borderWidth: 5 },
      },
    ],
  };
}

function bounds(lines: readonly FitLine[]): { min: Midi; max: Midi } {
  const all = lines.flatMap(({ chart, spread, model, leftOut }) => [
    ...[chart, spread.low, spread.high, model ?? chart, leftOut ?? chart],
  ]);
  return { min: Math.floor(Math.min(...all)) - ROOM, max: Math.ceil(Math.max(...all)) + ROOM };
}

function lineOf(raw: unknown): FitLine | null {
  // chart.js hands back the very points that calibrationData made.
  return (raw as FitPoint).line;
}

/** The scales: intervals from narrow to wide, lower notes by their names. */
export function calibrationOptions(
  lines: readonly FitLine[],
  { ink, quiet, line, surface }: Plain,
  naming: NoteNaming,
): ChartOptions<'scatter'> {
  const { min, max } = bounds(lines);
  const shared = { grid: { color: line }, border: { color: quiet } };
  const title = (text: string) => ({ display: true, text, color: quiet });
  return {
    ...{ animation: false, responsive: true, maintainAspectRatio: false },
    interaction: { mode: 'nearest', axis: 'xy', intersect: true },
    scales: {
      x: {
        ...{ ...shared, min: -HALF, max: lines.length - HALF, title: title('Interval') },
        afterBuildTicks: (axis) => {
          axis.ticks = lines.map((_, value) => ({ value }));
        },
        ticks: { color: quiet, autoSkip: false, callback: (value) => lines[Number(value)]?.interval ?? '' },
      },
      y: {
        ...{ ...shared, min, max, title: title('Lower note [pitch]') },
        afterBuildTicks: (axis) => {
          axis.ticks = landmarksBetween(min, max).map((value) => ({ value }));
        },
        ticks: { color: quiet, autoSkip: false, callback: (value) => nearestNote(Number(value), naming) },
      },
    },
    plugins: {
      legend: { display: false },
      tooltip: {
        ...{ displayColors: false, backgroundColor: ink, bodyColor: surface },
        callbacks: {
          label: ({ raw }) => {
            const found = lineOf(raw);
            return found ? [...fitText(found, naming)] : '';
          },
        },
      },
    },
  };
}

/** Every C and G: notes that need no accidental, about half an octave apart. */
function landmarksBetween(min: Midi, max: Midi): readonly Midi[] {
  const keys = Array.from({ length: max - min + 1 }, (_, i) => min + i);
  return keys.filter((midi) => midi % OCTAVE === 0 || midi % OCTAVE === FIFTH);
}

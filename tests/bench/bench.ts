import { voicingOf } from '#shared/voicing/calibration/yardsticks';
import { fullAnalysis } from '#shared/voicing/full-analysis';
import { densityOf, peakDensity } from '#shared/voicing/muddiness/model';
import { modelFor } from '#shared/voicing/muddiness/models';
import { plainDensity } from '#shared/voicing/muddiness/plain';
import { voicingJudge } from '#shared/voicing/muddiness/voicing-judge';
import { modelLimits } from '#shared/voicing/model-limits';
import { chordOf, EVEN_SETTINGS } from '../support/voicings';
import { techniqueSchema } from '#shared/study/study.document';
import { microseconds, once, report } from './timing';

/**
 * How quick the index is. Figures are processor time of this process, so that a busy machine matters less; the
 * ratios are of one run.
 */
const MIDI = [38, 45, 53, 62, 69] as const;
const EIGHT_VOICES = chordOf([
  { section: 'doubleBass', pitch: 'C2' },
  { section: 'cello', pitch: 'E2' },
  { section: 'cello', pitch: 'G2' },
  { section: 'viola', pitch: 'C3' },
  { section: 'viola', pitch: 'G3' },
  { section: 'violin2', pitch: 'E4' },
  { section: 'violin2', pitch: 'C4' },
  { section: 'violin1', pitch: 'G4' },
]);

function benchColdAnalysis(): void {
  const cold = once(() => fullAnalysis(EIGHT_VOICES, EVEN_SETTINGS));
  report('full analysis, 8 voices, first of a visit', cold, 30_000);
  const warm = microseconds(() => fullAnalysis(EIGHT_VOICES, EVEN_SETTINGS));
  report('full analysis, 8 voices, warm', warm, 1000);
}

function benchIndex(): void {
  const model = modelFor(440);
  const voices = voicingOf(MIDI);
  const plainVoices = voices.map(({ makeTone, energy }) => ({ tone: makeTone(), energy }));
  const { constants, axis } = model;
  const plain = microseconds(() => plainDensity(plainVoices, constants, 440, axis));
  const quick = microseconds(() => densityOf(model, voices));
  const reference = plainDensity(plainVoices, constants, 440, axis);
  const apart = Math.max(
    ...densityOf(model, voices).map((value, x) => Math.abs(value - (reference[x] ?? NaN))),
  );
  report('index, 5 voices, plain double loop', plain, null);
  report('index, 5 voices, from tables', quick, plain / 5);
  process.stdout.write(
    `  ${(plain / quick).toFixed(1)} times quicker (5 wanted); ${apart.toExponential(1)} apart (1e-9 allowed)\n`,
  );
}

function benchJudge(): void {
  const model = modelFor(440);
  const fields = [28, 37, 46, 55, 64].map((low) => Array.from({ length: 9 }, (_, i) => low + i));
  const parts = fields.map((field) => field.flatMap((midi) => voicingOf([midi])));
  const judge = voicingJudge(parts, model);
  const chosen = new Int32Array(parts.length);
  const voicings = 9 ** 5;
  const all = once(() => {
    for (let number = 0; number < voicings; number += 1) {
      for (let part = 0, rest = number; part < chosen.length; part += 1) {
        chosen[part] = rest % 9;
        rest = Math.floor(rest / 9);
      }
      judge(chosen);
    }
  });
  const perSecond = Math.round(voicings / (all / 1e6));
  process.stdout.write(
    `${perSecond.toLocaleString('en')} whole five-voice voicings a second (300,000 wanted)\n`,
  );
  const voices = [0, 1, 2, 3, 4].flatMap((part) => parts[part]?.[4] ?? []);
  report(
    'the same from the model, one voicing',
    microseconds(() => peakDensity(model, voices)),
    null,
  );
}

function benchLimits(): void {
  const playing = { players: 8, technique: techniqueSchema.parse({}), dynamic: 'mf' as const };
  const pair = {
    lower: { section: 'cello' as const, ...playing },
    upper: { section: 'viola' as const, ...playing },
    a4Hz: 440,
  };
  report(
    'limits of two sections, 16 intervals, first',
    once(() => modelLimits(pair)),
    null,
  );
  report(
    'limits of two sections, 16 intervals, again',
    once(() => modelLimits(pair)),
    null,
  );
}

benchColdAnalysis();
benchIndex();
benchJudge();
benchLimits();

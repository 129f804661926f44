import fc from 'fast-check';
import { expect, it } from 'vitest';
import { voicingOf } from '#shared/voicing/calibration/yardsticks';
import { peakDensity } from '#shared/voicing/muddiness/model';
import { modelFor } from '#shared/voicing/muddiness/models';
import { indexOf } from '#shared/voicing/muddiness/scores';
import { voicingJudge } from '#shared/voicing/muddiness/voicing-judge';

const model = modelFor(440);
/** Parts that never meet in unison: five fields of eight notes. */
const FIELDS = [28, 37, 46, 55, 64].map((lowest) => Array.from({ length: 8 }, (_, i) => lowest + i));

it('when whole voicings are judged from tables, then each has the index that the model gives it, to 1e-9', () => {
  const parts = FIELDS.map((field) => field.flatMap((midi) => voicingOf([midi])));
  const judge = voicingJudge(parts, model);
  const choices = fc.array(fc.integer({ min: 0, max: 7 }), { minLength: 5, maxLength: 5 });
  fc.assert(
    fc.property(choices, (chosen) => {
      const voices = chosen.flatMap((choice, part) => parts[part]?.[choice] ?? []);
      const index = indexOf(peakDensity(model, voices), model.constants.threshold);
      expect(Math.abs(judge(chosen) - index)).toBeLessThanOrEqual(1e-9);
    }),
    { numRuns: 400 },
  );
});

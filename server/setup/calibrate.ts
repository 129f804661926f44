import { writeFileSync } from 'node:fs';
import { fitConstants, START, WHOLE_FIT } from '#shared/voicing/calibration/fit';
import { constantsModule } from '#shared/voicing/calibration/constants-module';
import { calibrationReport } from '#shared/voicing/calibration/report';
import { leaveEachOut } from '#shared/voicing/calibration/uncertainty';

/**
 * Finds the constants of the muddiness index from the cited tables, prints how well they fit, and writes them.
 * `npm run calibrate`, some ten minutes on one core; `-- --dry` prints and writes nothing.
 */
const target = new URL('../../shared/data/muddiness-constants.ts', import.meta.url);
const print = (line: string): void => void process.stdout.write(`${line}\n`);

const { judgement } = fitConstants(START, WHOLE_FIT, undefined, (round, cost) => {
  print(`round ${round + 1}: cost ${cost.toFixed(4)}`);
});
const left = leaveEachOut(judgement.constants, (interval) => print(`without ${interval}`));
for (const line of calibrationReport(judgement, left)) print(line);
if (!process.argv.includes('--dry')) {
  writeFileSync(target, constantsModule(judgement, left, new Date().toISOString().slice(0, 10)));
  print('written: shared/data/muddiness-constants.ts');
}

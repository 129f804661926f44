/** Enough for the compiler to have done its work: it runs beside, and its time counts too. */
const WARM_UP_CALLS = 1000;
const MEASURED_CALLS = 100;
/** What else runs on the machine only ever adds: the least of some rounds is nearest to what the work takes. */
const ROUNDS = 8;

/** Processor time of this process so far, microseconds. */
function processorTime(): number {
  const { user, system } = process.cpuUsage();
  return user + system;
}

/** Processor time of one call, microseconds. */
export function once(work: () => unknown): number {
  const start = processorTime();
  work();
  return processorTime() - start;
}

/** Processor time of a call once it is warm, microseconds: the least of some rounds' means. */
export function microseconds(work: () => unknown): number {
  repeat(work, WARM_UP_CALLS);
  const rounds = Array.from({ length: ROUNDS }, () => {
    const start = processorTime();
    repeat(work, MEASURED_CALLS);
    return (processorTime() - start) / MEASURED_CALLS;
  });
  return Math.min(...rounds);
}

function repeat(work: () => unknown, calls: number): void {
  for (let call = 0; call < calls; call += 1) work();
}

/** Prints a figure beside what is wanted of it. */
export function report(name: string, measured: number, wanted: number | null): void {
  const aim =
    wanted === null ? '' : `, ${wanted.toFixed(0)} wanted: ${measured <= wanted ? 'met' : 'NOT met'}`;
  process.stdout.write(`${name}: ${measured.toFixed(1)} µs${aim}\n`);
}

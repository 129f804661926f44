/**
 * Resolves when the operator, or the machine, asks the program to stop. Later signals ask for nothing more: a terminal
 * sends Ctrl-C to npm and to the program, and npm hands it on once more.
 */
export function untilAskedToStop(): Promise<NodeJS.Signals> {
  return new Promise((resolve) => {
    for (const signal of ['SIGTERM', 'SIGINT'] as const) process.on(signal, () => resolve(signal));
  });
}

import { SettingsError } from '#server/env';
import { describeError } from '#server/http/describe-error';
import { CannotStart } from '#server/setup/data-folder';

type ErrorKind = abstract new (...values: never[]) => Error;

/**
 * Runs a command to its end and leaves the process with 0, or with 1 and what was wrong.
 * @param forOperators errors whose message is all that whoever runs it needs
 */
export async function runCommand(
  work: () => Promise<void>,
  forOperators: readonly ErrorKind[],
): Promise<never> {
  try {
    await work();
    process.exit(0);
  } catch (error) {
    const known = [SettingsError, CannotStart, ...forOperators].some((kind) => error instanceof kind);
    console.error(known && error instanceof Error ? error.message : describeError(error));
    process.exit(1);
  }
}

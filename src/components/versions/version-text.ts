import type { Version } from '#shared/contracts/versions';
import { when } from '#shared/time/when';

/** @returns what a version is called: its name, or else when it was made */
export function versionTitle({ name, savedAt }: Version, now: Date, timeZone: string): string {
  return name ?? when(new Date(savedAt), now, timeZone);
}

/** @returns the saves that it holds, in a few words */
export function versionSaves({ kind, number, firstNumber, merged }: Version): string {
  if (kind === 'set-aside') return `set aside, number ${number}`;
  const saves = firstNumber === number ? `save ${number}` : `saves ${firstNumber} to ${number}`;
  return merged ? `${saves}, merged with others’` : saves;
}

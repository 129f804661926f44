export function lockHolder(file: string): { pid: number } | undefined;
export function tryLock(file: string): (() => void) | undefined;
export function withLock<T>(
  file: string,
  onWait: (pid: number) => void,
  work: () => T | Promise<T>,
): Promise<T>;

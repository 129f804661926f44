/** Long enough for a browser to begin taking the file; common practice. */
const KEPT_MS = 60_000;

/** Hands a file to the reader. */
export function handOut(file: Blob, name: string): void {
  const link = document.createElement('a');
  link.href = URL.createObjectURL(file);
  link.download = name;
  document.body.append(link);
  link.click();
  link.remove();
  setTimeout(() => URL.revokeObjectURL(link.href), KEPT_MS);
}

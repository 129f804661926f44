/** What a file system or a shell may take for something else; control characters too. */
const UNSAFE = /[\p{C}<>:"/\\|?*%$&`'#{}!@=+;,~^[\]()]+/gu;
const SPACES = /[\s.]+/g;
const MOST = 60;
/** Names that one operating system keeps for devices. @source Microsoft: Naming Files, Paths, and Namespaces */
const DEVICES = /^(con|prn|aux|nul|com\d|lpt\d)$/i;

/**
 * A file name made from what people have typed.
 * @param parts title, chord and the like; those without a letter or figure are left out
 * @param extension without its dot
 * @returns letters, figures and hyphens with one dot
 * @example fileName(['The ferry / dusk', 'D♭maj13'], 'svg') // 'the-ferry-dusk-d♭maj13.svg'
 */
export function fileName(parts: readonly string[], extension: string): string {
  const plain = parts
    .map((part) =>
      [...part.normalize('NFC').replace(UNSAFE, ' ').replace(SPACES, ' ').trim().toLowerCase()]
        .slice(0, MOST)
        .join('')
        .trim()
        .replaceAll(' ', '-')
        .replace(/^[-_]+|[-_]+$/g, ''),
    )
    .filter((part) => /[\p{L}\p{N}]/u.test(part));
  const name = plain.join('-') || 'siltline';
  return `${DEVICES.test(name) ? `study-${name}` : name}.${extension}`;
}

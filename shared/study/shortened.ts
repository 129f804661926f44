/**
 * Cuts a text between characters: half of one could not be kept.
 * @param text that may be too long
 * @param most length as documents count it, in UTF-16 units
 * @returns the text, or as many of its first characters as have room
 * @example shortened('Low 🎻', 5) // 'Low '
 */
export function shortened(text: string, most: number): string {
  const characters = Array.from(text);
  let length = text.length;
  while (length > most) length -= characters.pop()?.length ?? length;
  return characters.join('');
}

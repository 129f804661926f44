import type { VoiceSound } from '#shared/voicing/analysis';

/**
 * Whether two voices sound the same from the same seat, so that a held one need not be touched.
 * @example soundsAlike(voice, { ...voice, id: 'other' }) // true
 */
export function soundsAlike(a: VoiceSound, b: VoiceSound): boolean {
  return (
    a.section === b.section &&
    a.technique.stroke === b.technique.stroke &&
    a.players === b.players &&
    a.partials.length === b.partials.length &&
    a.partials.every(({ frequencyHz, levelDb }, index) => {
      const other = b.partials[index];
      return other?.frequencyHz === frequencyHz && other.levelDb === levelDb;
    })
  );
}

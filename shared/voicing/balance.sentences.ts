import { displayPitch, noteName, type NoteNaming } from '#shared/pitch/display';
import { parsePitch } from '#shared/pitch/names';
import type { VoiceSound } from '#shared/voicing/analysis';
import type { ChordBalance, ToneBalance } from '#shared/voicing/balance';
import { possessive, sentence } from '#shared/voicing/words';

const PERCENT = 100;
/** Any octave: the name is told without it. */
const OCTAVE = 4;

/**
 * Who is covered, and which tone of the chord is thin or swollen.
 * @param sounds of the chord
 * @returns a sentence each; one that says so where all is even; none for fewer than two notes
 * @example balanceSentences(balance, sounds, 'english')[0] // 'The violas’ G3 is covered: 32 % of it is heard.'
 */
export function balanceSentences(
  { voices, tones }: ChordBalance,
  sounds: readonly Pick<VoiceSound, 'id' | 'section' | 'pitch' | 'players'>[],
  naming: NoteNaming,
): readonly string[] {
  if (sounds.length < 2) return [];
  const covered = voices.flatMap(({ id, covered: isCovered, heard }) => {
    const sound = sounds.find((other) => other.id === id);
    if (!sound || !isCovered) return [];
    const note = `${possessive(sound.section, sound.players)} ${displayPitch(sound.pitch, naming)}`;
    return [sentence(`${note} is covered: ${Math.round(heard * PERCENT)} % of it is heard.`)];
  });
  const uneven = tones.filter(({ standing }) => standing !== 'even').map((tone) => toneText(tone, naming));
  const all = [...covered, ...uneven];
  return all.length > 0 ? all : ['Nobody is covered, and no chord tone is thin or swollen.'];
}

function toneText({ tone, players, levelDb, standing }: ToneBalance, naming: NoteNaming): string {
  const pitch = parsePitch(`${tone}${OCTAVE}`);
  const name = pitch ? noteName(pitch, naming) : tone;
  const by = Math.round(Math.abs(levelDb ?? 0));
  const who = players === 1 ? '1 player' : `${players} players`;
  return `${name} is ${standing}: ${by} dB ${standing === 'thin' ? 'under' : 'over'} the mean of the other tones, with ${who}.`;
}

import { displayPitch, noteName, type NoteNaming } from '#shared/pitch/display';
import { midiOfName, parsePitch } from '#shared/pitch/names';
import { SECTION_FACTS } from '#shared/strings/sections';
import type { VoiceSound } from '#shared/voicing/analysis';
import type { Move, MoveKind } from '#shared/voicing/moves/moves';
import type { WeighedMove } from '#shared/voicing/moves/weighed-moves';
import { possessive, registerName, sentence } from '#shared/voicing/words';

/** A move as it is told. */
export interface MoveWords {
  /** What a musician would say: `The cellos’ E2 an octave up, to E3`. */
  readonly text: string;
  /** The chord's index, whole. */
  readonly before: number;
  readonly after: number;
  /** How sure the figure after the move is, and what becomes of the register. */
  readonly detail: string;
}

type Sounds = readonly Pick<VoiceSound, 'id' | 'section' | 'pitch' | 'players'>[];

/**
 * Says what a move does to a chord.
 * @param sounds of the chord before the move
 * @param naming how the reader names notes
 * @example moveWords(move, sounds, 'english').text // 'The cellos’ E2 an octave up, to E3'
 */
export function moveWords(move: WeighedMove, sounds: Sounds, naming: NoteNaming): MoveWords {
  const { register, before, after } = move.register;
  const place = registerName(register).replace(/^the /, '');
  const giveOrTake = Math.round(move.uncertainty);
  const sure = giveOrTake > 0 ? `give or take ${giveOrTake}; ` : '';
  const missing = move.lost === null ? null : parsePitch(move.lost);
  const lost = missing ? `; then nobody plays ${noteName(missing, naming)}` : '';
  return {
    text: moveText(move, sounds, naming),
    before: Math.round(move.before),
    after: Math.round(move.after),
    detail: `${sure}${place} ${Math.round(before)} → ${Math.round(after)}${lost}`,
  };
}

/** @returns the move in words, without its figures */
export function moveText(move: Move, sounds: Sounds, naming: NoteNaming): string {
  const lead = sounds.find(({ id }) => id === move.ids[0]);
  if (!lead) return '';
  const note = `${possessive(lead.section, lead.players)} ${displayPitch(lead.pitch, naming)}`;
  const linked = move.ids.length > 1 ? ', with what is linked to it' : '';
  return sentence(`${note} ${goal(move, lead, naming)}${linked}`);
}

function goal(move: Move, lead: Sounds[number], naming: NoteNaming): string {
  const to = move.pitches[0] ?? lead.pitch;
  const up = midiOfName(to) > midiOfName(lead.pitch);
  const words: Readonly<Record<MoveKind, () => string>> = {
    octaveUp: () => `an octave up, to ${displayPitch(to, naming)}`,
    octaveDown: () => `an octave down, to ${displayPitch(to, naming)}`,
    chordTone: () => `${up ? 'up' : 'down'} to ${displayPitch(to, naming)}`,
    section: () => `to the ${SECTION_FACTS[move.section].plural}`,
    leaveOut: () => 'left out',
  };
  return words[move.kind]();
}

import type { Section } from '#shared/strings/sections';
import type { Ensemble, Voice } from '#shared/study/study.document';
import { midiOfName } from '#shared/pitch/names';

type Part = Pick<Voice, 'id' | 'section' | 'pitch' | 'players' | 'stop'>;

/** One line of a divided section: a voice, or the voices of a double stop. */
interface Line {
  readonly voices: readonly Part[];
  readonly set: number | null;
  readonly top: number;
}

/**
 * Players on each voice. Voices of a section share its players: those whose players are set keep them, the
 * others share the rest evenly, the upper lines first where it does not come out even, never fewer than one
 * player a line. The voices of a double stop are one line, played together by all of its players.
 * @param voices of one chord
 * @param ensemble players per section
 * @returns players by voice id, whole numbers of 1 or more
 * @source N. Rimsky-Korsakov, Principles of Orchestration (tr. Agate 1922), ch. I A: division by desks
 * @example playersOf([cello A2, cello F3], { cello: 8, … }) // 4 and 4
 */
export function playersOf(voices: readonly Part[], ensemble: Ensemble): ReadonlyMap<string, number> {
  const players = new Map<string, number>();
  for (const section of new Set(voices.map((voice) => voice.section))) {
    const lines = linesOf(voices, section);
    const free = lines.filter((line) => line.set === null);
    const kept = lines.reduce((sum, line) => sum + (line.set ?? 0), 0);
    const shared = Math.max(ensemble.players[section] - kept, 0);
    for (const line of lines) {
      const count = line.set ?? shareOf(shared, free.length, free.indexOf(line));
      for (const voice of line.voices) players.set(voice.id, count);
    }
  }
  return players;
}

function shareOf(players: number, lines: number, place: number): number {
  const even = Math.floor(players / lines);
  return Math.max(place < players % lines ? even + 1 : even, 1);
}

/** The lines of a section, the highest first, so that the order of the voices does not matter. */
function linesOf(voices: readonly Part[], section: Section): readonly Line[] {
  const groups = new Map<string, Part[]>();
  for (const voice of voices) {
    if (voice.section !== section) continue;
    const key = voice.stop === null ? `voice ${voice.id}` : `stop ${voice.stop}`;
    groups.set(key, [...(groups.get(key) ?? []), voice]);
  }
  return [...groups.values()].map(lineOf).sort((a, b) => b.top - a.top);
}

function lineOf(voices: readonly Part[]): Line {
  const set = voices.flatMap((voice) => voice.players ?? []);
  return {
    voices,
    set: set.length > 0 ? Math.max(...set) : null,
    top: Math.max(...voices.map((voice) => midiOfName(voice.pitch))),
  };
}

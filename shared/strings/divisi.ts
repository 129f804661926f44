import type { Section } from '#shared/strings/sections';
import type { Ensemble, Voice } from '#shared/study/study.document';
import { midiOfName } from '#shared/pitch/names';

type Part = Pick<Voice, 'id' | 'section' | 'pitch' | 'players' | 'stop'>;

/** One line of a divided section: a voice, or the voices of a double stop. */
interface Line {
  readonly ids: string[];
  /** The players set on it; null where it shares. */
  set: number | null;
  top: number;
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
  for (const [section, lines] of linesBySection(voices)) {
    const free = lines.filter((line) => line.set === null);
    const kept = lines.reduce((sum, line) => sum + (line.set ?? 0), 0);
    const shared = Math.max(ensemble.players[section] - kept, 0);
    // The highest first, so that the order of the voices does not matter.
    free.sort((a, b) => b.top - a.top);
    for (const line of lines) {
      const count = line.set ?? shareOf(shared, free.length, free.indexOf(line));
      for (const id of line.ids) players.set(id, count);
    }
  }
  return players;
}

/**
 * Whether players are shared out evenly in every section, so that no change of pitch can change who has how many.
 * @param players by voice id, as from playersOf
 */
export function isEvenlyShared(voices: readonly Part[], players: ReadonlyMap<string, number>): boolean {
  const counts = new Map<Section, number>();
  return voices.every(({ id, section, players: set }) => {
    const count = players.get(id);
    const known = counts.get(section);
    if (set !== null || count === undefined) return false;
    counts.set(section, count);
    return known === undefined || known === count;
  });
}

function shareOf(players: number, lines: number, place: number): number {
  const even = Math.floor(players / lines);
  return Math.max(place < players % lines ? even + 1 : even, 1);
}

function linesBySection(voices: readonly Part[]): ReadonlyMap<Section, readonly Line[]> {
  const sections = new Map<Section, Line[]>();
  const stops = new Map<string, Line>();
  for (const { id, section, stop, players, pitch } of voices) {
    const key = `${section} ${stop ?? id}`;
    const known = stop === null ? undefined : stops.get(key);
    const line = known ?? { ids: [], set: null, top: -Infinity };
    line.ids.push(id);
    line.top = Math.max(line.top, midiOfName(pitch));
    if (players !== null) line.set = Math.max(line.set ?? 0, players);
    if (known) continue;
    stops.set(key, line);
    const lines = sections.get(section);
    if (lines) lines.push(line);
    else sections.set(section, [line]);
  }
  return sections;
}

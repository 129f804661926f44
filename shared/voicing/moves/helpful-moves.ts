import { playersOf } from '#shared/strings/divisi';
import type { Chord, Voice } from '#shared/study/study.document';
import type { SoundSettings } from '#shared/voicing/analysis';
import { inUnison, joinUnisons, muddinessVoice } from '#shared/voicing/muddiness/joined';
import type { MuddinessEntry, MuddinessModel } from '#shared/voicing/muddiness/model';
import { entryOf, highestOf, peakDensity } from '#shared/voicing/muddiness/model';
import { modelFor } from '#shared/voicing/muddiness/models';
import { indexOf } from '#shared/voicing/muddiness/scores';
import type { MuddinessSums } from '#shared/voicing/muddiness/sums';
import { addEntry, clearSums, copySums, sumsOn } from '#shared/voicing/muddiness/sums';
import type { HelpfulMove, Move } from '#shared/voicing/moves/moves';
import { possibleMoves } from '#shared/voicing/moves/possible-moves';
import type { VoiceSource } from '#shared/voicing/sound';
import { bassOf, sourceOf, sourcesOf } from '#shared/voicing/sound';
import { differClearly } from '#shared/voicing/uncertainty';

/** As many as a reader weighs against each other. */
const MOVES_SHOWN = 8;

/**
 * The single moves that clear a chord most, each with the index before and after it.
 * @param chord 0 to 40 voices
 * @param settings what the sound depends on besides
 * @returns the most helpful first, at most eight; none whose difference is not clear
 */
export function helpfulMoves(chord: Chord, settings: SoundSettings): readonly HelpfulMove[] {
  const model = modelFor(settings.a4Hz);
  const { threshold } = model.constants;
  const sources = sourcesOf(chord, settings);
  const before = indexOf(peakDensity(model, joinUnisons(sources, settings.a4Hz)), threshold);
  const trial = trialOf(chord, settings, sources, model);
  return possibleMoves(chord.voices, settings.ensemble.bass)
    .map((move) => ({ ...move, before, after: indexOf(trial(move), threshold) }))
    .filter(({ after }) => after < before && differClearly(after, before))
    .sort((a, b) => a.after - b.after)
    .slice(0, MOVES_SHOWN);
}

/** The voices of a chord after a move. */
export function movedVoices(
  voices: readonly Voice[],
  { kind, ids, pitches, section }: Move,
): readonly Voice[] {
  if (kind === 'leaveOut') return voices.filter(({ id }) => !ids.includes(id));
  return voices.map((voice) => {
    const place = ids.indexOf(voice.id);
    if (place < 0) return voice;
    const pitch = pitches[place] ?? voice.pitch;
    return kind === 'section' ? { ...voice, pitch, section, string: null } : { ...voice, pitch };
  });
}

/**
 * Tries moves of one chord, one after the other. What stays is added up once for all the moves of a voice; where
 * a move changes who plays what, how it is tuned, or makes a unison, the whole chord is added up anew.
 * @returns the highest ρ after a move
 */
function trialOf(
  chord: Chord,
  settings: SoundSettings,
  sources: readonly VoiceSource[],
  model: MuddinessModel,
): (move: Move) => number {
  const rest: Rest = { key: '', sums: sumsOn(model.axis), entries: [], sources: [] };
  return (move) => {
    const voices = movedVoices(chord.voices, move);
    const moved = movedSources(voices, move, chord, settings, sources);
    const known = moved === null ? null : restWithout(move.ids, rest, sources, model);
    if (moved === null || known === null || hasUnison(moved, known.sources)) {
      return peakDensity(
        model,
        joinUnisons(sourcesOf({ ...chord, voices: [...voices] }, settings), settings.a4Hz),
      );
    }
    copySums(known.sums, model.scratch);
    const entries = [...known.entries];
    for (const source of moved) {
      const entry = entryOf(muddinessVoice(source, settings.a4Hz), model);
      addEntry(model.scratch, entry, entries, model);
      entries.push(entry);
    }
    return highestOf(model.scratch, model);
  };
}

/** What stays when some voices move. */
interface Rest {
  key: string;
  readonly sums: MuddinessSums;
  entries: readonly MuddinessEntry[];
  sources: readonly VoiceSource[];
}

function restWithout(
  ids: readonly string[],
  rest: Rest,
  sources: readonly VoiceSource[],
  model: MuddinessModel,
): Rest {
  const key = ids.join(' ');
  if (rest.key === key) return rest;
  rest.key = key;
  rest.sources = sources.filter(({ id }) => !ids.includes(id));
  const entries: MuddinessEntry[] = [];
  clearSums(rest.sums);
  for (const voice of joinUnisons(rest.sources, model.a4Hz)) {
    const entry = entryOf(voice, model);
    addEntry(rest.sums, entry, entries, model);
    entries.push(entry);
  }
  rest.entries = entries;
  return rest;
}

/** The sources of the voices that move; null where those that stay change too. */
function movedSources(
  voices: readonly Voice[],
  { ids }: Move,
  chord: Chord,
  settings: SoundSettings,
  sources: readonly VoiceSource[],
): readonly VoiceSource[] | null {
  if (settings.intonation === 'pure') return null;
  const players = playersOf(voices, settings.ensemble);
  const stays = sources.every(({ id, players: had }) => ids.includes(id) || players.get(id) === had);
  if (!stays) return null;
  const bass = bassOf(voices);
  return voices
    .filter(({ id }) => ids.includes(id))
    .map((voice) =>
      sourceOf(voice, voice.dynamic ?? chord.dynamic, players.get(voice.id) ?? 1, bass, settings),
    );
}

function hasUnison(moved: readonly VoiceSource[], others: readonly VoiceSource[]): boolean {
  return moved.some(
    (voice, i) =>
      others.some((other) => inUnison(voice, other)) ||
      moved.slice(i + 1).some((other) => inUnison(voice, other)),
  );
}

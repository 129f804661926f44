import { isEvenlyShared, playersOf } from '#shared/strings/divisi';
import type { Chord, Voice } from '#shared/study/study.document';
import type { SoundSettings } from '#shared/voicing/analysis';
import type { MuddinessEntry, MuddinessModel } from '#shared/voicing/muddiness/model';
import { highestOf } from '#shared/voicing/muddiness/model';
import type { MuddinessSums } from '#shared/voicing/muddiness/sums';
import { addEntry, addPairs, addSound, clearSums, copySums, sumsOn } from '#shared/voicing/muddiness/sums';
import type { Move } from '#shared/voicing/moves/moves';
import { movedVoices } from '#shared/voicing/moves/moves';
import type { TrialVoice } from '#shared/voicing/moves/trial-voices';
import { joinedEntries, louderVoice, trialVoice } from '#shared/voicing/moves/trial-voices';
import { bassOf, sourceOf, sourcesOf } from '#shared/voicing/sound';

/** Tries moves of one chord, one after the other. */
export interface MoveTrial {
  /** The highest ρ of the chord as it is. */
  readonly before: () => number;
  /**
   * The highest ρ after a move. Where what stays alone is sure to cloud more than `useless`, it is not looked at
   * further and the answer is some density above `useless`.
   */
  readonly after: (move: Move, useless?: number) => number;
}

/** What stays when some voices move, added up once for all the moves of these voices. */
interface Rest {
  key: string;
  readonly sums: MuddinessSums;
  entries: readonly MuddinessEntry[];
  voices: readonly TrialVoice[];
}

/**
 * @param chord 0 to 40 voices
 * @param settings what the sound depends on besides
 * @param model the index's machinery
 */
export function moveTrial(chord: Chord, settings: SoundSettings, model: MuddinessModel): MoveTrial {
  const base = sourcesOf(chord, settings).map((source) => trialVoice(source, model));
  const players = playersOf(chord.voices, settings.ensemble);
  const even = isEvenlyShared(chord.voices, players);
  const rest: Rest = { key: '', sums: sumsOn(model.axis), entries: [], voices: [] };
  const after = (move: Move, useless = Infinity): number => {
    const voices = movedVoices(chord.voices, move);
    const regrouped = move.kind === 'section' || move.kind === 'leaveOut';
    const now = regrouped || !even ? playersOf(voices, settings.ensemble) : players;
    if (settings.intonation === 'pure') {
      const tuned = sourcesOf({ ...chord, voices: [...voices] }, settings);
      return highestAnew(
        tuned.map((source) => trialVoice(source, model)),
        model,
      );
    }
    const moved = voices
      .filter(({ id }) => move.ids.includes(id))
      .map(soundAgain(chord, settings, voices, now, model));
    const stay = base.filter(({ source }) => !move.ids.includes(source.id));
    const stayed = stay.map((voice) => louderVoice(voice, now.get(voice.source.id) ?? 1, model));
    if (stayed.some((voice, i) => voice !== stay[i])) return highestAnew([...stayed, ...moved], model);
    return highestWith(moved, restWithout(move.ids.join(' '), stay, rest, model), useless, model);
  };
  return { before: () => highestAnew(base, model), after };
}

function soundAgain(
  chord: Chord,
  settings: SoundSettings,
  voices: readonly Voice[],
  players: ReadonlyMap<string, number>,
  model: MuddinessModel,
): (voice: Voice) => TrialVoice {
  const bass = bassOf(voices);
  return (voice) => {
    const dynamic = voice.dynamic ?? chord.dynamic;
    return trialVoice(sourceOf(voice, dynamic, players.get(voice.id) ?? 1, bass, settings), model);
  };
}

function restWithout(key: string, stay: readonly TrialVoice[], rest: Rest, model: MuddinessModel): Rest {
  if (rest.key === key) return rest;
  rest.key = key;
  rest.voices = stay;
  rest.entries = joinedEntries(stay, model);
  addAll(rest.sums, rest.entries, model);
  return rest;
}

/** Adds the moved voices to what stays; where that makes a unison everything is added up anew. */
function highestWith(
  moved: readonly TrialVoice[],
  rest: Rest,
  useless: number,
  model: MuddinessModel,
): number {
  const all = [...rest.voices, ...moved];
  const joined = joinedEntries(all, model);
  const { scratch } = model;
  if (joined.length < rest.entries.length + moved.length) {
    addAll(scratch, joined, model);
    return highestOf(scratch, model);
  }
  copySums(rest.sums, scratch);
  for (const { entry } of moved) addSound(scratch, entry);
  // New pairs only add to the clouding: what is there without them is the least that there can be.
  const least = useless === Infinity ? 0 : highestOf(scratch, model);
  if (least > useless) return least;
  const entries = [...rest.entries];
  for (const { entry } of moved) {
    addPairs(scratch, entry, entries, model);
    entries.push(entry);
  }
  return highestOf(scratch, model);
}

function highestAnew(voices: readonly TrialVoice[], model: MuddinessModel): number {
  addAll(model.scratch, joinedEntries(voices, model), model);
  return highestOf(model.scratch, model);
}

function addAll(sums: MuddinessSums, entries: readonly MuddinessEntry[], model: MuddinessModel): void {
  clearSums(sums);
  const added: MuddinessEntry[] = [];
  for (const entry of entries) {
    addEntry(sums, entry, added, model);
    added.push(entry);
  }
}

import { playersGain } from '#shared/acoustics/level';
import { inUnison, joinUnisons, muddinessVoice, powerOf } from '#shared/voicing/muddiness/joined';
import type { MuddinessEntry, MuddinessModel } from '#shared/voicing/muddiness/model';
import { entryOf } from '#shared/voicing/muddiness/model';
import type { VoiceSource } from '#shared/voicing/sound';

/** A voice of a trial: what makes it sound, and how the index hears it. */
export interface TrialVoice {
  readonly source: VoiceSource;
  readonly entry: MuddinessEntry;
}

/** @returns a voice for a trial */
export function trialVoice(source: VoiceSource, model: MuddinessModel): TrialVoice {
  return { source, entry: entryOf(muddinessVoice(source, model.a4Hz), model) };
}

/** @returns the voice with other players; the very same where they are as many */
export function louderVoice(voice: TrialVoice, players: number, model: MuddinessModel): TrialVoice {
  const { source, entry } = voice;
  if (source.players === players) return voice;
  const nominalDb = source.nominalDb + playersGain(players) - playersGain(source.players);
  const energy = powerOf(nominalDb);
  const weight = Math.sqrt(model.power(energy));
  return { source: { ...source, players, nominalDb }, entry: { ...entry, energy, weight } };
}

/** @returns the voices as the index hears them, unisons joined */
export function joinedEntries(
  voices: readonly TrialVoice[],
  model: MuddinessModel,
): readonly MuddinessEntry[] {
  const rising = [...voices].sort((a, b) => a.source.f0Hz - b.source.f0Hz);
  const entries: MuddinessEntry[] = [];
  for (let i = 0; i < rising.length;) {
    const first = rising[i];
    if (!first) break;
    let end = i + 1;
    while (isUnison(first, rising[end])) end += 1;
    entries.push(end === i + 1 ? first.entry : jointEntry(rising.slice(i, end), model));
    i = end;
  }
  return entries;
}

function isUnison(a: TrialVoice, b: TrialVoice | undefined): boolean {
  return b !== undefined && inUnison(a.source, b.source);
}

function jointEntry(group: readonly TrialVoice[], model: MuddinessModel): MuddinessEntry {
  const [joint] = joinUnisons(
    group.map(({ source }) => source),
    model.a4Hz,
  );
  if (!joint) throw new RangeError('no voices to join');
  return entryOf(joint, model);
}

import { LETTER_SEMITONES, midiOfName, parsePitch, pitchName } from '#shared/pitch/names';
import type { ReadNote } from '#shared/pitch/reading';
import { SECTIONS, type PitchRange, type Section } from '#shared/strings/sections';
import type { Reach } from '#shared/study/dealing';
import { lowestOf, topTones, type DealChoice } from '#shared/study/harmony/deal-choice';
import { choiceCost, pairCost, placeCost, type DealtTone } from '#shared/study/harmony/deal-costs';
import { chroma, toneName, toneOf, type ChordTone, type Harmony } from '#shared/study/harmony/harmony';
import type { Voice } from '#shared/study/study.document';
import type { TypedVoice } from '#shared/study/typing-line';
import type { Midi } from '#shared/units';

/** What stays where it is while a chord is dealt round it: the melody. */
export type KeptVoice = Pick<Voice, 'section' | 'pitch' | 'stop'>;

export interface DealtHarmony {
  readonly voices: readonly TypedVoice[];
  /** Tones for which there was no room. */
  readonly left: readonly ChordTone[];
}

const SEMITONES = 12;
const RISING: readonly Section[] = [...SECTIONS].reverse();

function midisOf(note: ReadNote, { low, high }: PitchRange): readonly Midi[] {
  const first = low + ((((chroma(note) - low) % SEMITONES) + SEMITONES) % SEMITONES);
  const count = Math.max(Math.floor((high - first) / SEMITONES) + 1, 0);
  return Array.from({ length: count }, (_, octave) => first + SEMITONES * octave);
}

function bassMidi(harmony: Harmony, choice: DealChoice, range: PitchRange): Midi {
  const low = Math.max(lowestOf(choice), range.low);
  return midisOf(harmony.bass, { low, high: low + SEMITONES - 1 })[0] ?? low;
}

/** The notes that each section might take, from the basses up; what is kept leaves no choice. */
function candidatesOf(
  harmony: Harmony,
  choice: DealChoice,
  reach: Reach,
  kept: readonly KeptVoice[],
): readonly (readonly DealtTone[])[] {
  const top = topTones(harmony.tones, choice.top);
  return RISING.map((section, place) => {
    const own = kept.filter((voice) => voice.section === section).map(({ pitch }) => midiOfName(pitch));
    if (own.length > 0) {
      const midi = Math.max(...own);
      const pitch = parsePitch(kept.find((voice) => midiOfName(voice.pitch) === midi)?.pitch ?? '');
      return [{ midi, tone: (pitch && toneOf(harmony, pitch)) ?? null, kept: true }];
    }
    if (place === 0) {
      const midi = bassMidi(harmony, choice, reach[section]);
      return [{ midi, tone: toneOf(harmony, harmony.bass) ?? null, kept: false }];
    }
    const tones = place === RISING.length - 1 ? top : harmony.tones;
    return tones.flatMap((tone) =>
      midisOf(toneName(harmony.root, tone), reach[section]).map((midi) => ({ midi, tone, kept: false })),
    );
  });
}

interface Found {
  readonly cost: number;
  readonly notes: readonly DealtTone[];
}

/** Tries every way from the bottom up, leaving those that are dearer already than the best one found. */
function cheapest(
  harmony: Harmony,
  choice: DealChoice,
  candidates: readonly (readonly DealtTone[])[],
): Found {
  let best: Found = { cost: Infinity, notes: [] };
  const extend = (notes: readonly DealtTone[], cost: number): void => {
    if (cost >= best.cost) return;
    const place = notes.length;
    if (place === candidates.length) {
      const total = cost + choiceCost(harmony.tones, notes);
      if (total < best.cost) best = { cost: total, notes };
      return;
    }
    const [lower, under] = [notes.at(-1), notes.at(-2)];
    const below = lower && under ? lower.midi - under.midi : null;
    for (const note of candidates[place] ?? []) {
      const pair = lower ? pairCost(choice.way, place - 1, lower, note, below) : 0;
      extend([...notes, note], cost + pair + placeCost(choice.way, place, note));
    }
  };
  extend([], 0);
  return best;
}

function pitchAt(note: ReadNote, midi: Midi): string {
  const octave = (midi - LETTER_SEMITONES[note.letter] - note.alteration) / SEMITONES - 1;
  return pitchName({ ...note, octave });
}

/**
 * Deals a chord to the five sections, one note each: the bass with the basses, wide at the bottom, each section
 * in its comfortable range. Where there is no room for all tones the fifth is left out first, the third and the
 * seventh last; the seventh and what lies above it stand above. What is kept stays, and the rest is laid round it.
 * @param harmony what a symbol or numeral names
 * @param choice open, close or after the harmonic series; what stands on top; how low the basses go
 * @param reach where each section plays comfortably
 * @param kept locked notes
 * @returns the voices from the bottom, and the tones that were left out
 * @source common practice; see the weights in deal-costs
 * @example dealHarmony(D minor, DEFAULT_DEAL, reach, []).voices.length // 5
 */
export function dealHarmony(
  harmony: Harmony,
  choice: DealChoice,
  reach: Reach,
  kept: readonly KeptVoice[],
): DealtHarmony {
  const { notes } = cheapest(harmony, choice, candidatesOf(harmony, choice, reach, kept));
  const voices = RISING.flatMap((section, place): TypedVoice[] => {
    const own = kept.filter((voice) => voice.section === section);
    const note = notes[place];
    if (own.length > 0 || !note) return own.map(({ pitch, stop }) => ({ section, pitch, stop }));
    const name = note.tone ? toneName(harmony.root, note.tone) : harmony.bass;
    return [{ section, pitch: pitchAt(name, note.midi), stop: null }];
  });
  const left = harmony.tones.filter((tone) => !notes.some((note) => note.tone === tone));
  return { voices, left };
}

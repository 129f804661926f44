import type { Section } from '#shared/strings/sections';
import { limitsInForce, type OwnLimit } from '#shared/study/own-limits';
import type { Chord, Dynamic, Ensemble, Intonation, Technique } from '#shared/study/study.document';
import type { Decibels, Hertz, Midi, Semitones } from '#shared/units';
import { explainPeak } from '#shared/voicing/explanation';
import { chordLimits, rootBelow } from '#shared/voicing/limits';
import { joinUnisons, muddinessVoice } from '#shared/voicing/muddiness/joined';
import type { MuddinessModel } from '#shared/voicing/muddiness/model';
import { densityOf } from '#shared/voicing/muddiness/model';
import { modelFor } from '#shared/voicing/muddiness/models';
import { cloudiestOf, indexOf, registerPeaks } from '#shared/voicing/muddiness/scores';
import type { Register } from '#shared/voicing/registers';
import type { VoiceSource } from '#shared/voicing/sound';
import { soundOf, sourcesOf } from '#shared/voicing/sound';
import { uncertaintyOf } from '#shared/voicing/uncertainty';

/** What the sound of a chord, and what is said of it, depend on besides its voices. */
export interface SoundSettings {
  readonly a4Hz: Hertz;
  readonly intonation: Intonation;
  readonly ensemble: Ensemble;
  readonly key: { readonly tonic: string };
  /** A study's own low interval limits; none leaves the published chart in force. */
  readonly limits?: readonly OwnLimit[] | null;
}

/** One partial of one voice. 0 dB is the level of one player's loudest partial at mf before the body. */
export interface Partial {
  /** Its number in the series, 1 the fundamental. */
  readonly n: number;
  readonly frequencyHz: Hertz;
  readonly levelDb: Decibels;
}

/** One voice made to sound. */
export interface VoiceSound {
  readonly id: string;
  readonly section: Section;
  readonly pitch: string;
  readonly midi: Midi;
  readonly players: number;
  readonly technique: Technique;
  readonly dynamic: Dynamic;
  readonly partials: readonly Partial[];
}

/** The clouding of one register: its index and where in it that is reached. */
export interface RegisterMuddiness {
  readonly register: Register;
  /** 0 … 100; 50 stands at the published low interval limits. */
  readonly index: number;
  /** The place on the pitch axis to which the index belongs; null where the index is 0. */
  readonly at: Midi | null;
}

/** A pair of notes that stands under its low interval limit. */
export interface LimitFinding {
  /** A voice, or ROOT_ELSEWHERE. */
  readonly lowerId: string;
  readonly upperId: string;
  /** The chart's name of the interval: `M3`. */
  readonly interval: string;
  /** The lowest lower note that the chart allows, e.g. `Bb2`. */
  readonly limit: string;
  readonly semitonesBelow: Semitones;
}

/** Two partials of different voices and their part in the clouding. */
export interface PartialMeeting {
  readonly lowerN: number;
  readonly upperN: number;
  readonly differenceHz: Hertz;
  /** Of the pair's clouding at the place, 0 … 1. */
  readonly share: number;
}

/** Two notes and their part in the clouding of a register at its cloudiest place. */
export interface PairShare {
  readonly lowerId: string;
  readonly upperId: string;
  readonly register: Register;
  /** Of the register's clouding, 0 … 1; the shares of all pairs add up to 1. */
  readonly share: number;
  /** Largest first, at most three. */
  readonly meetings: readonly PartialMeeting[];
}

/** Everything that the bench shows of one chord. */
export interface ChordAnalysis {
  readonly voices: readonly VoiceSound[];
  readonly muddiness: {
    /** Of the chord: its cloudiest register's. */
    readonly index: number;
    readonly register: Register | null;
    /** Half the width of the band in which the index may lie, points: see bandOf. */
    readonly uncertainty: number;
    /** All seven, low to high. */
    readonly registers: readonly RegisterMuddiness[];
  };
  /** The pairs under their limit, the furthest under first. */
  readonly limits: readonly LimitFinding[];
  /** The root that is played elsewhere, taken just below the lowest note: `C2`. */
  readonly rootElsewhere?: string | null;
  /** What makes the cloudiest register, largest share first. */
  readonly pairs: readonly PairShare[];
}

/**
 * Judges one chord: its voices' partials, the muddiness by register, the pairs under their low interval
 * limit, and which notes and partials make the cloudiest register.
 * @param chord 0 to 40 voices
 * @param settings what the sound depends on besides
 * @throws RangeError where a pitch or the tonic is not a note
 */
export function analyseChord(chord: Chord, settings: SoundSettings): ChordAnalysis {
  const model = modelFor(settings.a4Hz);
  const sources = sourcesOf(chord, settings);
  const joined = joinUnisons(sources, settings.a4Hz);
  const peaks = registerPeaks(densityOf(model, joined), model.axis);
  const cloudiest = cloudiestOf(peaks);
  const { threshold } = model.constants;
  const index = indexOf(cloudiest?.density ?? 0, threshold);
  return {
    voices: sources.map((source) => soundOf(source, shapeOf(source, model))),
    muddiness: {
      index,
      register: cloudiest?.register ?? null,
      uncertainty: uncertaintyOf(index),
      registers: peaks.map(({ register, density, at }) => ({
        register,
        index: indexOf(density, threshold),
        at: density > 0 ? at : null,
      })),
    },
    limits: chordLimits(sources, chord.rootElsewhere, limitsInForce(settings.limits)),
    rootElsewhere: rootBelow(sources, chord.rootElsewhere),
    pairs: cloudiest ? explainPeak(cloudiest, sources, joined, model) : [],
  };
}

/**
 * Which pairs of notes, and which of their partials, make one register's clouding at its cloudiest place.
 * @returns shares that add up to 1, largest first; empty where nothing clouds there
 * @throws RangeError where a pitch or the tonic is not a note
 */
export function explainRegister(
  chord: Chord,
  settings: SoundSettings,
  register: Register,
): readonly PairShare[] {
  const model = modelFor(settings.a4Hz);
  const sources = sourcesOf(chord, settings);
  const joined = joinUnisons(sources, settings.a4Hz);
  const peak = registerPeaks(densityOf(model, joined), model.axis).find(
    (found) => found.register === register,
  );
  return peak && peak.density > 0 ? explainPeak(peak, sources, joined, model) : [];
}

function shapeOf(source: VoiceSource, { tables, a4Hz }: MuddinessModel): readonly Partial[] {
  const { key, makeTone } = muddinessVoice(source, a4Hz);
  return tables.ofTone(key, makeTone).tone.partials;
}

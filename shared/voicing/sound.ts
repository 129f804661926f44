import { nominalLevel } from '#shared/acoustics/level';
import type { ToneSource } from '#shared/acoustics/spectrum';
import { midiOf, midiOfName, parsePitch } from '#shared/pitch/names';
import { frequencyOf } from '#shared/pitch/tuning';
import { playersOf } from '#shared/strings/divisi';
import { harmonicFrequency } from '#shared/strings/harmonics';
import { SECTION_FACTS } from '#shared/strings/sections';
import type { Chord, Voice } from '#shared/study/study.document';
import type { Decibels, Midi } from '#shared/units';
import type { Partial, SoundSettings, VoiceSound } from '#shared/voicing/analysis';

/** A voice with what shapes its tone and what its players give: all but its partials. */
export interface VoiceSource extends ToneSource, Omit<VoiceSound, 'partials'> {
  /** Tells the shapes of tones apart: equal for equal ones. */
  readonly toneKey: string;
  /** What the players give before the body shapes it; 0 dB is one violinist at mf. */
  readonly nominalDb: Decibels;
}

type Sounding = Pick<Chord, 'voices' | 'dynamic'>;

/**
 * What makes the voices of a chord sound: players, tuning and level.
 * @param chord any number of voices
 * @param settings tuning and players
 * @returns one source for each voice, in the same order
 * @throws RangeError where a voice's pitch, or the tonic, is not a note
 */
export function sourcesOf(chord: Sounding, settings: SoundSettings): readonly VoiceSource[] {
  const players = playersOf(chord.voices, settings.ensemble);
  const bass = bassOf(chord.voices);
  return chord.voices.map((voice) =>
    sourceOf(voice, voice.dynamic ?? chord.dynamic, players.get(voice.id) ?? 1, bass, settings),
  );
}

/** @returns the lowest sounding pitch; null for no voices */
export function bassOf(voices: readonly Pick<Voice, 'pitch'>[]): Midi | null {
  return voices.length === 0 ? null : Math.min(...voices.map(({ pitch }) => midiOfName(pitch)));
}

/**
 * @param dynamic the voice's own or its chord's
 * @param players on this voice
 * @param bass the chord's lowest pitch, to which pure intonation tunes
 */
export function sourceOf(
  voice: Voice,
  dynamic: Chord['dynamic'],
  players: number,
  bass: Midi | null,
  settings: SoundSettings,
): VoiceSource {
  const pitch = parsePitch(voice.pitch);
  if (!pitch) throw new RangeError(`not a pitch: ${voice.pitch}`);
  const { id, section, technique } = voice;
  const { instrument } = SECTION_FACTS[section];
  const tuning = { a4Hz: settings.a4Hz, intonation: settings.intonation, tonic: settings.key.tonic, bass };
  const f0Hz = harmonicFrequency(voice, settings.ensemble.bass, settings.a4Hz) ?? frequencyOf(pitch, tuning);
  return {
    id,
    section,
    pitch: voice.pitch,
    midi: midiOf(pitch),
    players,
    technique,
    dynamic,
    instrument,
    f0Hz,
    toneKey: toneKey({ instrument, technique, dynamic, f0Hz }),
    nominalDb: nominalLevel(instrument, dynamic, technique, players),
  };
}

/** @returns what tells a tone's shape from others */
export function toneKey({ instrument, technique, dynamic, f0Hz }: ToneSource): string {
  const { contact, mute, stroke, harmonic } = technique;
  return `${instrument} ${contact} ${String(mute)} ${stroke} ${harmonic} ${dynamic} ${f0Hz}`;
}

/**
 * @param source of a voice
 * @param shape its partials without the voice's level
 * @returns the voice as it sounds
 */
export function soundOf(source: VoiceSource, shape: readonly Partial[]): VoiceSound {
  const { id, section, pitch, midi, players, technique, dynamic, nominalDb } = source;
  const partials = shape.map(({ n, frequencyHz, levelDb }) => ({
    n,
    frequencyHz,
    levelDb: levelDb + nominalDb,
  }));
  return { id, section, pitch, midi, players, technique, dynamic, partials };
}

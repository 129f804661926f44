import { nominalLevel } from '#shared/acoustics/level';
import { spectrumOf } from '#shared/acoustics/spectrum';
import { midiOf, midiOfName, parsePitch } from '#shared/pitch/names';
import { frequencyOf } from '#shared/pitch/tuning';
import { playersOf } from '#shared/strings/divisi';
import { harmonicFrequency } from '#shared/strings/harmonics';
import type { Instrument } from '#shared/strings/sections';
import { SECTION_FACTS } from '#shared/strings/sections';
import type { Chord, Voice } from '#shared/study/study.document';
import type { Decibels, Hertz, Midi } from '#shared/units';
import type { SoundSettings, VoiceSound } from '#shared/voicing/analysis';

/** A voice made to sound, with what the measures need besides. */
export interface SoundingVoice extends VoiceSound {
  readonly instrument: Instrument;
  readonly f0Hz: Hertz;
  /** What the players give before the body shapes it; 0 dB is one violinist at mf. */
  readonly nominalDb: Decibels;
}

/**
 * Makes the voices of a chord sound: their players, tuning, level and partials.
 * @param chord any number of voices
 * @param settings tuning and players
 * @returns one sounding voice for each voice, in the same order
 * @throws RangeError where a voice's pitch is not one
 */
export function soundOf(
  chord: Pick<Chord, 'voices' | 'dynamic'>,
  settings: SoundSettings,
): readonly SoundingVoice[] {
  const players = playersOf(chord.voices, settings.ensemble);
  const bass = chord.voices.reduce<Midi | null>((lowest, voice) => {
    const midi = midiOfName(voice.pitch);
    return lowest === null || midi < lowest ? midi : lowest;
  }, null);
  return chord.voices.map((voice) =>
    soundVoice(voice, voice.dynamic ?? chord.dynamic, players.get(voice.id) ?? 1, bass, settings),
  );
}

function soundVoice(
  voice: Voice,
  dynamic: Chord['dynamic'],
  players: number,
  bass: Midi | null,
  settings: SoundSettings,
): SoundingVoice {
  const pitch = parsePitch(voice.pitch);
  if (!pitch) throw new RangeError(`not a pitch: ${voice.pitch}`);
  const tuning = { a4Hz: settings.a4Hz, intonation: settings.intonation, tonic: settings.key.tonic, bass };
  const instrument = SECTION_FACTS[voice.section].instrument;
  const { technique } = voice;
  const f0Hz = harmonicFrequency(voice, settings.ensemble.bass, settings.a4Hz) ?? frequencyOf(pitch, tuning);
  const nominalDb = nominalLevel(instrument, dynamic, technique, players);
  return {
    id: voice.id,
    section: voice.section,
    pitch: voice.pitch,
    midi: midiOf(pitch),
    players,
    technique,
    dynamic,
    instrument,
    f0Hz,
    nominalDb,
    partials: spectrumOf({ instrument, technique, dynamic, f0Hz }).map((partial) => ({
      ...partial,
      levelDb: partial.levelDb + nominalDb,
    })),
  };
}

import { midiOfName } from '#shared/pitch/names';
import type { Chord, Voice } from '#shared/study/study.document';
import { chordSchema } from '#shared/study/study.document';
import type { SoundSettings } from '#shared/voicing/analysis';
import { sectionFor } from '#shared/voicing/calibration/yardsticks';

/** Eight players in each section, concert pitch, equal temperament. */
export const EVEN_SETTINGS: SoundSettings = {
  a4Hz: 440,
  intonation: 'equal',
  ensemble: {
    players: { violin1: 8, violin2: 8, viola: 8, cello: 8, doubleBass: 8 },
    bass: 'four-string',
  },
  key: { tonic: 'C' },
};

export type VoiceInput = Partial<Omit<Voice, 'technique'>> & {
  readonly pitch: string;
  readonly technique?: Partial<Voice['technique']>;
};

/** A chord of voices; what is left out is ordinary, and the section follows the octave. */
export function chordOf(voices: readonly VoiceInput[], dynamic: Chord['dynamic'] = 'mf'): Chord {
  return chordSchema.parse({
    id: 'chord-1',
    dynamic,
    voices: voices.map((voice, index) => ({
      id: `voice-${index}`,
      section: sectionFor(midiOfName(voice.pitch)),
      ...voice,
    })),
  });
}

/** One section a note, eight players on each: `C2 G2 E3`. */
export function voicing(names: string, dynamic: Chord['dynamic'] = 'mf'): Chord {
  return chordOf(
    names.split(' ').map((pitch) => ({ pitch, players: 8 })),
    dynamic,
  );
}

const KEYS = ['C', 'C#', 'D', 'Eb', 'E', 'F', 'F#', 'G', 'Ab', 'A', 'Bb', 'B'] as const;

/** The name of a key: 60 is C4. */
export function keyName(midi: number): string {
  return `${KEYS[midi % 12] ?? 'C'}${Math.floor(midi / 12) - 1}`;
}

import { midiOfName } from '#shared/pitch/names';
import { equalTempered } from '#shared/pitch/tuning';
import type { Chord } from '#shared/study/study.document';
import type { ChordAnalysis, LimitFinding, PairShare, VoiceSound } from '#shared/voicing/analysis';
import { REGISTERS, type Register } from '#shared/voicing/registers';

const A4_HZ = 440;
const PLAYERS = 8;

/** Voices of a few partials each, every one 6 dB under the one before: made up, to be drawn and told. */
export function soundsOf(chord: Chord, partials = 3): readonly VoiceSound[] {
  return chord.voices.map(({ id, section, pitch, technique }) => {
    const midi = midiOfName(pitch);
    const series = Array.from({ length: partials }, (_, index) => ({
      n: index + 1,
      frequencyHz: (index + 1) * equalTempered(midi, A4_HZ),
      levelDb: -6 * index,
    }));
    return { id, section, pitch, midi, players: PLAYERS, technique, dynamic: 'mf', partials: series };
  });
}

/** An analysis with made-up figures, to see how figures are shown and told. */
export function analysisOf(
  chord: Chord,
  figures: {
    readonly registers?: Partial<Record<Register, { index: number; at: number }>>;
    readonly limits?: readonly LimitFinding[];
    readonly pairs?: readonly PairShare[];
  } = {},
): ChordAnalysis {
  const registers = REGISTERS.map((register) => {
    const { index = 0, at = null } = figures.registers?.[register] ?? {};
    return { register, index, at };
  });
  const cloudiest = registers.reduce((a, b) => (b.index > a.index ? b : a));
  return {
    voices: soundsOf(chord),
    muddiness: {
      index: cloudiest.index,
      uncertainty: 5,
      register: cloudiest.index > 0 ? cloudiest.register : null,
      registers,
    },
    limits: figures.limits ?? [],
    pairs: figures.pairs ?? [],
  };
}

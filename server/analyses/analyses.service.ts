import { MOST_PAIRS_TOLD, type Analysis, type AnalysisRequest } from '#shared/contracts/analysis';
import { chordSchema, type Chord } from '#shared/study/study.document';
import { explainRegister, type PairShare, type SoundSettings } from '#shared/voicing/analysis';
import { fullAnalysis, type FullAnalysis } from '#shared/voicing/full-analysis';
import { roughnessOf } from '#shared/voicing/roughness';

/** The chain of pure fifths needs somewhere to start, and a chord by itself has no key. */
const NO_KEY = { tonic: 'C' };

/** Voices are known by their places. */
const idAt = (place: number): string => `voice-${place}`;

function chordOf({ voices }: AnalysisRequest): Chord {
  return chordSchema.parse({
    id: 'analysed',
    voices: voices.map((voice, place) => ({ id: idAt(place), ...voice })),
  });
}

/** Puts places and pitches for the identifiers that the analysis speaks by. */
class Naming {
  private readonly places: ReadonlyMap<string, number>;

  constructor(private readonly chord: Chord) {
    this.places = new Map(chord.voices.map(({ id }, place) => [id, place]));
  }

  placeOf(id: string): number {
    const place = this.places.get(id);
    if (place === undefined) throw new Error(`no such voice: ${id}`);
    return place;
  }

  pitchOf(id: string): string {
    return this.chord.voices[this.placeOf(id)]?.pitch ?? '';
  }
}

type Named<Part extends keyof Analysis> = (full: FullAnalysis, naming: Naming) => Analysis[Part];

const limits: Named<'limits'> = (full, naming) =>
  full.limits.map(({ lowerId, upperId, interval, limit, semitonesBelow }) => ({
    lower: naming.pitchOf(lowerId),
    upper: naming.pitchOf(upperId),
    interval,
    limit,
    semitonesBelow,
  }));

const balance: Named<'balance'> = ({ balance: { voices, tones }, voices: sounds }, naming) => ({
  voices: voices.map(({ id, heard, covered }, place) => ({
    voice: naming.placeOf(id),
    players: sounds[place]?.players ?? 0,
    heard,
    covered,
  })),
  tones: tones.map(({ ids, ...tone }) => ({ ...tone, voices: ids.map((id) => naming.placeOf(id)) })),
});

const partials: Named<'partials'> = ({ voices }, naming) =>
  voices.flatMap(({ id, partials: series }) =>
    series.map((partial) => ({ voice: naming.placeOf(id), ...partial })),
  );

function moves(full: FullAnalysis, naming: Naming): Analysis['explanation']['moves'] {
  return full.moves.map(({ ids, pitches, ...move }) => ({
    ...move,
    pitches: [...pitches],
    voices: ids.map((id) => naming.placeOf(id)),
  }));
}

type Pair = Analysis['explanation']['registers'][number]['pairs'][number];

function pairOf({ lowerId, upperId, share, meetings }: PairShare, naming: Naming): Pair {
  return {
    lower: naming.pitchOf(lowerId),
    upper: naming.pitchOf(upperId),
    lowerVoice: naming.placeOf(lowerId),
    upperVoice: naming.placeOf(upperId),
    share,
    meetings: [...meetings],
  };
}

/** What is behind each register that clouds. */
function registers(
  { muddiness }: FullAnalysis,
  naming: Naming,
  pairsBehind: (register: PairShare['register']) => readonly PairShare[],
): Analysis['explanation']['registers'] {
  return muddiness.registers
    .filter(({ index }) => index > 0)
    .map(({ register }) => ({
      name: register,
      pairs: pairsBehind(register)
        .slice(0, MOST_PAIRS_TOLD)
        .map((pair) => pairOf(pair, naming)),
    }));
}

function density({ density: { bands, registers: inRegisters } }: FullAnalysis): Analysis['density'] {
  return {
    bands: [...bands],
    registers: inRegisters.map(({ register, ...figure }) => ({ name: register, ...figure })),
  };
}

function character({ character: { fundamental, ...rest } }: FullAnalysis): Analysis['character'] {
  return { ...rest, fundamental: fundamental && { ...fundamental, multiples: [...fundamental.multiples] } };
}

/** Judges a chord by what the bench judges it by, in the words of the API. */
export function analyse(request: AnalysisRequest): Analysis {
  const { a4Hz, intonation, ensemble } = request;
  const settings: SoundSettings = { a4Hz, intonation, ensemble, key: NO_KEY };
  const chord = chordOf(request);
  const full = fullAnalysis(chord, settings);
  const naming = new Naming(chord);
  const { index, uncertainty, registers: byRegister } = full.muddiness;
  const roughness = roughnessOf(full.voices, a4Hz);
  return {
    muddiness: {
      index,
      uncertainty,
      registers: byRegister.map((found) => ({ name: found.register, index: found.index })),
    },
    roughness: {
      hutchinsonKnopoff: roughness['hutchinson-knopoff'],
      sethares: roughness.sethares,
      vassilakis: roughness.vassilakis,
    },
    limits: limits(full, naming),
    density: density(full),
    balance: balance(full, naming),
    character: character(full),
    explanation: {
      registers: registers(full, naming, (register) => explainRegister(chord, settings, register)),
      moves: moves(full, naming),
    },
    partials: partials(full, naming),
  };
}

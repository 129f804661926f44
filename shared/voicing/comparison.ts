import type { ChordAnalysis, LimitFinding, VoiceSound } from '#shared/voicing/analysis';
import { matchNotes } from '#shared/voicing/matching';
import type { Register } from '#shared/voicing/registers';
import { differClearly } from '#shared/voicing/uncertainty';

/** What became of a note of the voicing that is held. */
export type NoteChange =
  /** Same section, same pitch, played alike. */
  | { readonly kind: 'stays'; readonly held: VoiceSound; readonly now: VoiceSound }
  /** Same section and pitch; other players, technique or dynamic. */
  | { readonly kind: 'played'; readonly held: VoiceSound; readonly now: VoiceSound }
  | { readonly kind: 'moved'; readonly held: VoiceSound; readonly now: VoiceSound }
  /** Another section has it now, at the same pitch or another. */
  | { readonly kind: 'given'; readonly held: VoiceSound; readonly now: VoiceSound }
  | { readonly kind: 'gone'; readonly held: VoiceSound; readonly now: null }
  | { readonly kind: 'new'; readonly held: null; readonly now: VoiceSound };

/** An index before and after. */
export interface IndexChange {
  /** 0 … 100. */
  readonly held: number;
  readonly now: number;
  /** Whether they differ by more than their uncertainty: see differClearly. */
  readonly clear: boolean;
}

export interface RegisterChange extends IndexChange {
  readonly register: Register;
}

/** The pairs under their low interval limit, by the voicing that has them. */
export interface LimitChanges {
  /** Only in the held one: they keep their limit now, or are no more. */
  readonly gone: readonly LimitFinding[];
  readonly stay: readonly LimitFinding[];
  /** Only in the one now. */
  readonly come: readonly LimitFinding[];
}

/** Two voicings beside each other. */
export interface VoicingComparison {
  /** Every note of both once, from the top down. */
  readonly notes: readonly NoteChange[];
  readonly index: IndexChange;
  /** All seven, low to high. */
  readonly registers: readonly RegisterChange[];
  readonly limits: LimitChanges;
}

/** What of an analysis is compared. */
export type Compared = Pick<ChordAnalysis, 'voices' | 'muddiness' | 'limits'>;

/**
 * Lays two voicings beside each other.
 * @param held the one that is held
 * @param now the one that it is compared with
 * @example compareVoicings(analysis, analysis).index.clear // false
 */
export function compareVoicings(held: Compared, now: Compared): VoicingComparison {
  return {
    notes: matchNotes(held.voices, now.voices).flatMap((match) => changeOf(match.held, match.now)),
    index: indexChange(held.muddiness.index, now.muddiness.index),
    registers: now.muddiness.registers.map(({ register, index }) => {
      const before = held.muddiness.registers.find((other) => other.register === register);
      return { register, ...indexChange(before?.index ?? 0, index) };
    }),
    limits: limitChanges(held, now),
  };
}

/** @returns whether the two voicings are the same, as far as they sound */
export function soundTheSame({ notes }: VoicingComparison): boolean {
  return notes.every(({ kind }) => kind === 'stays');
}

/** @returns how many pairs stand under their limit in each */
export function underLimits({ gone, stay, come }: LimitChanges): {
  readonly held: number;
  readonly now: number;
} {
  return { held: gone.length + stay.length, now: stay.length + come.length };
}

function indexChange(held: number, now: number): IndexChange {
  return { held, now, clear: differClearly(held, now) };
}

function changeOf(held: VoiceSound | null, now: VoiceSound | null): readonly NoteChange[] {
  if (held && now) return [{ kind: kindOf(held, now), held, now }];
  if (held) return [{ kind: 'gone', held, now: null }];
  return now ? [{ kind: 'new', held: null, now }] : [];
}

function kindOf(held: VoiceSound, now: VoiceSound): 'stays' | 'played' | 'moved' | 'given' {
  if (held.section !== now.section) return 'given';
  if (held.midi !== now.midi) return 'moved';
  return playedAlike(held, now) ? 'stays' : 'played';
}

function playedAlike(a: VoiceSound, b: VoiceSound): boolean {
  return (
    a.players === b.players &&
    a.dynamic === b.dynamic &&
    a.technique.contact === b.technique.contact &&
    a.technique.mute === b.technique.mute &&
    a.technique.stroke === b.technique.stroke &&
    a.technique.harmonic === b.technique.harmonic
  );
}

/** Two pairs are the same pair where the same pitches stand in the same sections. */
function limitKey({ lowerId, upperId }: LimitFinding, { voices }: Compared): string {
  const place = (id: string): string => {
    const voice = voices.find((other) => other.id === id);
    return voice ? `${voice.section} ${voice.midi}` : id;
  };
  return `${place(lowerId)} ${place(upperId)}`;
}

function limitChanges(held: Compared, now: Compared): LimitChanges {
  const before = new Set(held.limits.map((limit) => limitKey(limit, held)));
  const after = new Set(now.limits.map((limit) => limitKey(limit, now)));
  return {
    gone: held.limits.filter((limit) => !after.has(limitKey(limit, held))),
    stay: now.limits.filter((limit) => before.has(limitKey(limit, now))),
    come: now.limits.filter((limit) => !before.has(limitKey(limit, now))),
  };
}

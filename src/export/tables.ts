import { intervalName } from '#shared/pitch/interval-names';
import { parsePitch } from '#shared/pitch/names';
import { SECTION_FACTS } from '#shared/strings/sections';
import type { ChordAnalysis, LimitFinding, PairShare, VoiceSound } from '#shared/voicing/analysis';
import { heardNumbers } from '#shared/voicing/heard';
import { loudestOf } from '@/charts/overtones';
import type { Table } from '@/export/csv';

const PERCENT = 100;

/** Rounded to so many decimals. */
function rounded(figure: number, decimals: number): number {
  return Number(figure.toFixed(decimals));
}

/**
 * Every partial of a chord.
 * @returns a line for each, voice by voice
 */
export function partialsTable({ voices }: ChordAnalysis): Table {
  const loudest = voices.length > 0 ? loudestOf(voices) : 0;
  const heard = heardNumbers(voices);
  const rows = voices.flatMap(({ id, section, pitch, players, dynamic, partials }) =>
    partials.map((partial) => [
      ...[SECTION_FACTS[section].short, pitch, players, dynamic, partial.n],
      ...[rounded(partial.frequencyHz, 3), rounded(partial.levelDb - loudest, 2)],
      heard.get(id)?.has(partial.n) ? 'heard' : 'masked or too soft',
    ]),
  );
  return {
    headings: [
      ...['section', 'note (sounding)', 'players', 'dynamic', 'partial'],
      ...['frequency [Hz]', 'level under the loudest [dB]', 'audibility'],
    ],
    rows,
  };
}

/**
 * Every pair of a chord's notes.
 * @returns a line for each, low pairs first
 */
export function pairsTable({ voices, limits, pairs, muddiness }: ChordAnalysis): Table {
  const rising = [...voices].sort((a, b) => a.midi - b.midi);
  const key = (lower: VoiceSound, upper: VoiceSound): string => `${lower.id} ${upper.id}`;
  const limitOf = new Map<string, LimitFinding>(
    limits.map((limit) => [`${limit.lowerId} ${limit.upperId}`, limit]),
  );
  // Of two notes in unison either may be called the lower.
  const shareOf = new Map<string, PairShare>(
    pairs.flatMap((pair) => [
      [`${pair.lowerId} ${pair.upperId}`, pair] as const,
      [`${pair.upperId} ${pair.lowerId}`, pair] as const,
    ]),
  );
  const rows = rising.flatMap((lower, index) =>
    rising.slice(index + 1).map((upper) => {
      const [a, b] = [parsePitch(lower.pitch), parsePitch(upper.pitch)];
      const limit = limitOf.get(key(lower, upper));
      const share = shareOf.get(key(lower, upper));
      const apart = share?.meetings[0]?.differenceHz;
      return [
        ...[SECTION_FACTS[lower.section].short, lower.pitch, SECTION_FACTS[upper.section].short, upper.pitch],
        a && b ? intervalName(a, b) : '',
        ...[upper.midi - lower.midi, limit?.limit ?? null, limit?.semitonesBelow ?? 0],
        rounded((share?.share ?? 0) * PERCENT, 1),
        apart === undefined ? null : rounded(apart, 2),
      ];
    }),
  );
  const where = muddiness.register ? `the ${muddiness.register} octave` : 'no register';
  return {
    headings: [
      ...['lower section', 'lower note', 'upper section', 'upper note', 'interval', 'width [semitones]'],
      ...['low limit of the lower note', 'under its limit [semitones]'],
      `share of the clouding in ${where} [%]`,
      'strongest partials apart [Hz]',
    ],
    rows,
  };
}

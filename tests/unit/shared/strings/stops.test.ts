import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { z } from 'zod';
import { midiOfName } from '#shared/pitch/names';
import type { Instrument, Section } from '#shared/strings/sections';
import { openStringsOf } from '#shared/strings/ranges';
import { stopFinding } from '#shared/strings/stops';

const tableSchema = z.object({
  source: z.string(),
  rows: z.array(
    z.object({
      instrument: z.enum(['violin', 'viola', 'cello', 'bass']),
      interval: z.string(),
      semitones: z.number(),
      easyLowerNotes: z.array(z.string()),
      awkwardOrHardLowerNotes: z.array(z.string()),
      impossibleLowerNotes: z.array(z.string()),
    }),
  ),
});
const table = tableSchema.parse(
  JSON.parse(readFileSync(new URL('../../../fixtures/published/double-stops.json', import.meta.url), 'utf8')),
);
const PLAYED_BY: Record<string, { instrument: Instrument; section: Section }> = {
  violin: { instrument: 'violin', section: 'violin1' },
  viola: { instrument: 'viola', section: 'viola' },
  cello: { instrument: 'cello', section: 'cello' },
  bass: { instrument: 'doubleBass', section: 'doubleBass' },
};

describe('double stops', () => {
  it.each(table.rows.map((row) => [`${row.instrument} ${row.interval}`, row] as const))(
    'when a stop of %s is laid under the hand, then the rule grades every placing as the table does',
    (_, row) => {
      const player = PLAYED_BY[row.instrument];
      if (!player) throw new Error('unknown instrument');
      const grade = (name: string) =>
        stopFinding(
          [midiOfName(name), midiOfName(name) + row.semitones],
          player.instrument,
          openStringsOf(player.section, 'four-string'),
        ).grade;
      expect(row.easyLowerNotes.filter((name) => grade(name) !== 'easy')).toEqual([]);
      expect(row.awkwardOrHardLowerNotes.filter((name) => grade(name) !== 'awkward')).toEqual([]);
      expect(row.impossibleLowerNotes.filter((name) => grade(name) !== 'not playable')).toEqual([]);
    },
  );

  it('when both notes lie below the second string, then they cannot sound together', () => {
    const finding = stopFinding([49, 51], 'viola', [69, 62, 55, 48]);
    expect(finding).toEqual({
      grade: 'not playable',
      reason: 'no two neighbouring strings have both notes',
    });
  });

  it('when three or four notes are stopped, then they are awkward at best and the reason says how they sound', () => {
    const finding = stopFinding([55, 62, 71], 'violin', [76, 69, 62, 55]);
    expect(finding.grade).toBe('awkward');
    expect(finding.reason).toContain('cannot be held together');
  });

  it('when there are more notes than strings, then the stop is not playable', () => {
    expect(stopFinding([55, 62, 69, 76, 81], 'violin', [76, 69, 62, 55]).grade).toBe('not playable');
  });
});

import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { z } from 'zod';
import { centsOf } from '#shared/pitch/intervals';
import { midiOfName } from '#shared/pitch/names';
import {
  artificialHarmonic,
  harmonicFinding,
  harmonicFrequency,
  naturalHarmonics,
  nodesOf,
} from '#shared/strings/harmonics';
import type { Section } from '#shared/strings/sections';
import { techniqueSchema } from '#shared/study/study.document';

const fixture = z
  .object({
    table: z.array(
      z.object({ partial: z.number(), touchSemitonesAboveOpen: z.number(), soundingSemitones: z.number() }),
    ),
    byString: z.record(z.string(), z.record(z.string(), z.array(z.string()))),
  })
  .parse(
    JSON.parse(
      readFileSync(new URL('../../../fixtures/published/natural-harmonics.json', import.meta.url), 'utf8'),
    ),
  );

const SECTION: Record<string, Section> = {
  violin: 'violin1',
  viola: 'viola',
  cello: 'cello',
  bass: 'doubleBass',
};

const played = (
  section: Section,
  pitch: string,
  harmonic: 'natural' | 'artificial' | 'none',
  string: number | null = null,
) => ({
  section,
  pitch,
  string,
  technique: techniqueSchema.parse({ harmonic }),
});

describe('natural harmonics', () => {
  it.each([2, 3, 4, 5, 6, 7, 8])(
    'when partial %i is touched, then its nodes lie where arithmetic puts them',
    (partial) => {
      const published = fixture.table.filter((row) => row.partial === partial);
      const nodes = nodesOf(partial);
      expect(nodes).toHaveLength(published.length);
      published.forEach((row, i) =>
        expect(Math.abs((nodes[i] ?? NaN) - row.touchSemitonesAboveOpen)).toBeLessThan(0.006),
      );
      published.forEach((row) =>
        expect(Math.abs(centsOf(partial) / 100 - row.soundingSemitones)).toBeLessThan(0.006),
      );
    },
  );

  it('when each open string is gone through, then its partials 2 to 8 sound as the table says', () => {
    for (const [instrument, strings] of Object.entries(fixture.byString)) {
      for (const [open, sounding] of Object.entries(strings)) {
        sounding.forEach((pitch, i) => {
          const ways = naturalHarmonics(
            midiOfName(pitch),
            SECTION[instrument] ?? 'cello',
            'four-string',
            440,
          );
          expect(ways.some((way) => way.open === midiOfName(open) && way.partial === i + 2)).toBe(true);
        });
      }
    }
  });

  it('when C#6 is played on the A string of a cello, then it sounds five times 220 Hz, 14 cents low', () => {
    expect(harmonicFrequency(played('cello', 'C#6', 'natural'), 'four-string', 440)).toBeCloseTo(1100, 9);
    const [way] = naturalHarmonics(midiOfName('C#6'), 'cello', 'four-string', 440);
    expect(way?.centsOff).toBeCloseTo(-13.686, 2);
  });

  it('when no string has the pitch, then it is not playable and has no frequency of its own', () => {
    expect(harmonicFrequency(played('violin1', 'Bb3', 'natural'), 'four-string', 440)).toBeNull();
    expect(harmonicFinding(played('violin1', 'Bb3', 'natural'), 'four-string', 440)?.grade).toBe(
      'not playable',
    );
  });

  it('when the string is named, then only that string counts', () => {
    expect(harmonicFrequency(played('violin1', 'A5', 'natural', 4), 'four-string', 440)).toBeNull();
    expect(harmonicFrequency(played('violin1', 'A5', 'natural', 2), 'four-string', 440)).toBeCloseTo(880, 9);
  });

  it('when the partial is high, then it is awkward; low ones are easy; no harmonic has no finding', () => {
    expect(harmonicFinding(played('cello', 'A4', 'natural'), 'four-string', 440)?.grade).toBe('easy');
    expect(harmonicFinding(played('cello', 'G6', 'natural'), 'four-string', 440)?.grade).toBe('awkward');
    expect(harmonicFinding(played('cello', 'A4', 'none'), 'four-string', 440)).toBeNull();
  });
});

describe('artificial harmonics', () => {
  it('when E6 is played on a violin, then it is stopped at E4 and touched at A4', () => {
    expect(artificialHarmonic(88, 'violin1', 'four-string')).toEqual({ stopped: 64, touched: 69 });
  });

  it('when the stop would lie on or below the lowest string, then there is none', () => {
    expect(artificialHarmonic(55 + 24, 'violin1', 'four-string')).toBeNull();
    expect(harmonicFinding(played('violin1', 'G5', 'artificial'), 'four-string', 440)?.grade).toBe(
      'not playable',
    );
  });

  it('when violins, low cellos and double basses are asked for one, then it is easy, awkward and not playable', () => {
    const grade = (section: Section, pitch: string) =>
      harmonicFinding(played(section, pitch, 'artificial'), 'four-string', 440)?.grade;
    expect(grade('violin1', 'E6')).toBe('easy');
    expect(grade('cello', 'E4')).toBe('awkward');
    expect(grade('doubleBass', 'C5')).toBe('not playable');
  });
});

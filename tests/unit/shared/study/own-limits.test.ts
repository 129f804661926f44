import { describe, expect, it } from 'vitest';
import { LOW_INTERVAL_LIMITS } from '#shared/data/low-interval-limits';
import { aboutStudy } from '#shared/study/about-study';
import { emptyChord, newStudy } from '#shared/study/new-study';
import { limitsInForce, withOwnLimit } from '#shared/study/own-limits';
import { chordSchema, draftDocumentSchema } from '#shared/study/study.document';
import { differencesOf } from '#shared/study/study.differences';

const withLimits = (limits: unknown) => draftDocumentSchema.safeParse({ ...newStudy('chord-1'), limits });

describe('the low interval limits of a study', () => {
  it('when a document was stored before there were any, then the published chart is in force', () => {
    const older: Record<string, unknown> = { ...newStudy('chord-1') };
    delete older.limits;
    expect(draftDocumentSchema.parse(older).limits).toBeNull();
    expect(limitsInForce(null)).toBe(LOW_INTERVAL_LIMITS);
  });

  it('when a chord was stored before its root could be elsewhere, then its bass is its own', () => {
    const older: Record<string, unknown> = { ...emptyChord('chord-1') };
    delete older.rootElsewhere;
    expect(chordSchema.parse(older).rootElsewhere).toBeNull();
    expect(chordSchema.safeParse({ ...older, rootElsewhere: 'Bb' }).success).toBe(true);
    expect(chordSchema.safeParse({ ...older, rootElsewhere: 'H' }).success).toBe(false);
  });

  it('when there is a list, then it takes the place of the whole chart', () => {
    expect(limitsInForce([{ semitones: 7, lowest: 'C3' }])).toMatchObject([
      { interval: 'P5', semitones: 7, lowest: 'C3', lowestMidi: 48 },
    ]);
    expect(limitsInForce([])).toEqual([]);
  });

  it.each([
    [
      'an interval twice',
      [
        { semitones: 7, lowest: 'C3' },
        { semitones: 7, lowest: 'D3' },
      ],
    ],
    ['the octave, which has none', [{ semitones: 12, lowest: 'C3' }]],
    ['a note under every string', [{ semitones: 7, lowest: 'Bb0' }]],
    ['a note far above every limit', [{ semitones: 7, lowest: 'C6' }]],
    ['no note', [{ semitones: 7, lowest: 'low' }]],
  ])('when they name %s, then the document is refused', (_, limits) => {
    expect(withLimits(limits).success).toBe(false);
  });

  it('when one interval is given its own limit, then the others keep the chart’s', () => {
    const own = withOwnLimit(null, 7, 'C3');
    expect(own).toHaveLength(LOW_INTERVAL_LIMITS.length);
    expect(limitsInForce(own).find(({ semitones }) => semitones === 4)?.lowest).toBe('Bb2');
    expect(limitsInForce(own).find(({ semitones }) => semitones === 7)?.lowest).toBe('C3');
    expect(withLimits(own).success).toBe(true);
  });

  it('when an interval is to have none, then it is in force no more; when all say the chart’s, then there are none of its own', () => {
    const without = withOwnLimit(null, 7, null);
    expect(limitsInForce(without).some(({ semitones }) => semitones === 7)).toBe(false);
    expect(withOwnLimit(without, 7, 'Bb1')).toBeNull();
  });

  it('when a study has its own, then its line says so, and so do the differences of two studies', () => {
    const study = newStudy('chord-1');
    const own = { ...study, limits: [{ semitones: 7, lowest: 'C3' }] };
    expect(aboutStudy(own)).toBe('C major · A4 = 440 Hz · 14.12.10.8.6 · own low limits');
    expect(differencesOf(study, own).settings).toEqual(['low interval limits']);
  });

  it('when the root of a chord is played elsewhere in one of two studies, then that chord differs', () => {
    const study = newStudy('chord-1');
    const chords = study.chords.map((chord) => ({ ...chord, rootElsewhere: 'C' }));
    expect(differencesOf(study, { ...study, chords }).chords.map(({ chordId }) => chordId)).toEqual([
      'chord-1',
    ]);
  });
});

import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { siltColour } from '@/charts/silt';
import { spreadLabels } from '@/charts/spread-labels';
import { tokenColumns } from '@/charts/token-columns';

describe('labels that would cover each other', () => {
  it('when two want one place, then they stand around it', () => {
    expect(spreadLabels([10, 12], 10, { top: 0, bottom: 100 })).toEqual([6, 16]);
  });

  it('when they are far apart, then they stay', () => {
    expect(spreadLabels([80, 10], 10, { top: 0, bottom: 100 })).toEqual([80, 10]);
  });

  it('when there is room, then none covers another and their order stays', () => {
    fc.assert(
      fc.property(fc.array(fc.double({ min: 0, max: 400, noNaN: true }), { maxLength: 20 }), (places) => {
        const placed = spreadLabels(places, 10, { top: -1000, bottom: 1000 });
        const order = places.map((_, index) => index).sort((a, b) => (places[a] ?? 0) - (places[b] ?? 0));
        const ys = order.map((index) => placed[index] ?? NaN);
        for (let i = 1; i < ys.length; i += 1) {
          expect((ys[i] ?? 0) - (ys[i - 1] ?? 0)).toBeGreaterThanOrEqual(10 - 1e-9);
        }
      }),
    );
  });
});

describe('notes of one lane', () => {
  it('when they stand close, then they stand side by side', () => {
    const columns = tokenColumns(
      [
        { id: 'a', midi: 40 },
        { id: 'b', midi: 41 },
        { id: 'c', midi: 44 },
      ],
      4,
    );
    expect([...columns].map(([id, { column, columns: all }]) => [id, column, all])).toEqual([
      ['a', 0, 2],
      ['b', 1, 2],
      ['c', 0, 2],
    ]);
  });
});

describe('the silt ramp', () => {
  it('when an index lies on a mark, then it has the mark’s colour; between two, it is mixed', () => {
    expect(siltColour(50)).toBe('var(--silt-50)');
    expect(siltColour(100)).toBe('var(--silt-100)');
    expect(siltColour(140)).toBe('var(--silt-100)');
    expect(siltColour(60)).toBe('color-mix(in oklab, var(--silt-75) 40%, var(--silt-50))');
  });
});

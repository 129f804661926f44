import { describe, expect, it } from 'vitest';
import { scorePlan } from '#shared/notation/score-plan';
import { systemPlan } from '#shared/notation/system-plan';
import { newStudy } from '#shared/study/new-study';
import { barSketch } from '@/engraving/bar-layout';
import { beginningWidth } from '@/engraving/beginning';
import { accidentalRoom } from '@/engraving/room-before';
import { barsWithin, scoreStrip } from '@/engraving/score-strip';
import { staffPlaces } from '@/engraving/staff-places';
import { systemSketch } from '@/engraving/system-sketch';
import { STAFF_HEIGHT } from '@/engraving/units';
import { chordOf } from '../../../support/typed-chords';

const study = newStudy('chord-0');
const LINE = 'DB D2, Vc A2 F#3, Va Ab3 Eb4, Vn2 D4, Vn1 A4 B4';
const many = Array.from({ length: 200 }, (_, index) => ({ ...chordOf(LINE), id: `chord-${index}` }));

describe('staves in a height', () => {
  it('when there is room to spare, then it is shared out evenly', () => {
    const { scale, tops } = staffPlaces(
      [
        { above: 10, below: 10 },
        { above: 10, below: 10 },
      ],
      240,
      1,
    );
    // Two staves of 60 leave 120: 30 over and under each.
    expect(scale).toBe(1);
    expect(tops).toEqual([40, 160]);
  });

  it('when they need more than there is, then they are drawn smaller', () => {
    expect(staffPlaces([{ above: 40, below: 40 }], 60, 1).scale).toBe(0.5);
  });
});

describe('one chord in its pane', () => {
  const room = { width: 112, height: 420, textSize: 12, largest: 0.72 };

  it('when a chord is laid out, then its staves lie within the height, none over another', () => {
    const plan = systemPlan(chordOf(`${LINE} C5 E7`), study, 'english');
    const { tops, scale } = systemSketch(plan, { ...room, beginning: beginningWidth(plan) });
    const ends = tops.map((top) => top + STAFF_HEIGHT * scale);
    tops.slice(1).forEach((top, index) => expect(top).toBeGreaterThan(ends[index] ?? 0));
    expect(tops[0]).toBeGreaterThan(0);
    expect(ends.at(-1)).toBeLessThan(room.height);
  });

  it('when there are many signs, then the heads still stand right of clef, signature and accidentals', () => {
    const flats = { ...study, key: { tonic: 'Cb', mode: 'major' } } as const;
    const plan = systemPlan(chordOf(LINE), flats, 'english');
    const beginning = beginningWidth(plan);
    const { staves, scale } = systemSketch(plan, { ...room, beginning });
    const before = Math.max(...plan.staves.map(({ chord }) => accidentalRoom(chord)));
    for (const { events, width } of staves) {
      expect(width * scale).toBeCloseTo(room.width, 6);
      expect(events[0]?.x).toBeGreaterThanOrEqual(beginning + before);
    }
  });
});

describe('the score', () => {
  const plan = scorePlan(study, many, 'english');

  it('when a bar is laid out, then its moments rise from left to right within it', () => {
    const two = scorePlan(study, many.map((chord) => ({ ...chord, beats: 2 })).slice(0, 2), 'english');
    const [bar] = two.bars;
    if (!bar) throw new Error('a bar');
    const sketch = barSketch(two, bar, { textSize: 16, opens: true });
    const [first, second] = sketch.staves[0]?.events ?? [];
    expect(first?.x).toBeGreaterThan(0);
    expect(second?.x).toBeGreaterThan(first?.x ?? Infinity);
    expect(sketch.width).toBeGreaterThan(second?.x ?? Infinity);
    expect(sketch.spans.map(({ chordId }) => chordId)).toEqual(['chord-0', 'chord-1']);
    expect(sketch.titles.map(({ text }) => text)).toEqual(['1', '2']);
  });

  it('when two hundred chords are scrolled through, then only those near the window are drawn', () => {
    const room = { height: 440, textSize: 11, titles: 22, largest: 0.72, smallest: 0.4 };
    const strip = scoreStrip(plan, room, (id) => id);
    const shown = barsWithin(strip, strip.width / 2, 1200);
    expect(shown.length).toBeGreaterThan(5);
    expect(shown.length).toBeLessThan(60);
    const right = (bar: (typeof shown)[number]) => bar.left + bar.sketch.width * strip.scale;
    expect(shown[0]?.left).toBeLessThan(strip.width / 2);
    expect(Math.max(...shown.map(right))).toBeGreaterThan(strip.width / 2 + 1200);
    expect(new Set(strip.spans.map(({ chordId }) => chordId)).size).toBe(200);
  });
});

import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import type { DraftDocument } from '#shared/study/draft';
import { emptyChord, newStudy, newVoice } from '#shared/study/new-study';
import type { Chord } from '#shared/study/study.document';
import { mergeStudies } from '#shared/study/study.merge';
import { sameStudy } from '#shared/study/study.differences';

const chord = (id: string, pitch = 'C3'): Chord => ({
  ...emptyChord(id),
  voices: [newVoice(`${id}-voice`, 'cello', pitch)],
});
const study = (...chords: Chord[]): DraftDocument => ({ ...newStudy('unused-1'), chords });
const BASE = study(chord('chord-1'), chord('chord-2'), chord('chord-3'));
const with2 = (pitch: string) => study(chord('chord-1'), chord('chord-2', pitch), chord('chord-3'));
const idsOf = (merged: DraftDocument | null) => merged?.chords.map(({ id }) => id);

describe('merging a save with what others saved meanwhile', () => {
  it('when the two changed different chords, then both changes stand', () => {
    const mine = study(chord('chord-1', 'D3'), chord('chord-2'), chord('chord-3'));
    expect(mergeStudies({ base: BASE, newest: with2('E3'), mine })).toEqual(
      study(chord('chord-1', 'D3'), chord('chord-2', 'E3'), chord('chord-3')),
    );
  });

  it('when both changed one chord differently, then they do not merge; alike, then they do', () => {
    expect(mergeStudies({ base: BASE, newest: with2('E3'), mine: with2('F3') })).toBeNull();
    expect(mergeStudies({ base: BASE, newest: with2('E3'), mine: with2('E3') })).toEqual(with2('E3'));
  });

  it('when one took a chord away that the other changed, then they do not merge', () => {
    const without2 = study(chord('chord-1'), chord('chord-3'));
    expect(mergeStudies({ base: BASE, newest: without2, mine: with2('E3') })).toBeNull();
    expect(mergeStudies({ base: BASE, newest: with2('E3'), mine: without2 })).toBeNull();
  });

  it('when one took a chord away that the other left as it was, then it is away', () => {
    const mine = study(chord('chord-1', 'D3'), chord('chord-2'), chord('chord-3'));
    const newest = study(chord('chord-1'), chord('chord-3'));
    expect(mergeStudies({ base: BASE, newest, mine })).toEqual(
      study(chord('chord-1', 'D3'), chord('chord-3')),
    );
  });

  it('when both added chords, then each stands behind the one that it was put behind', () => {
    const newest = study(chord('chord-1'), chord('theirs'), chord('chord-2'), chord('chord-3'));
    const mine = study(
      chord('chord-1'),
      chord('chord-2'),
      chord('mine-1'),
      chord('mine-2'),
      chord('chord-3'),
    );
    expect(idsOf(mergeStudies({ base: BASE, newest, mine }))).toEqual([
      'chord-1',
      'theirs',
      'chord-2',
      'mine-1',
      'mine-2',
      'chord-3',
    ]);
  });

  it('when both added at the same place, then those saved first stand first', () => {
    const newest = study(chord('theirs'), ...BASE.chords);
    const mine = study(chord('mine-1'), ...BASE.chords);
    expect(idsOf(mergeStudies({ base: BASE, newest, mine }))).toEqual([
      'theirs',
      'mine-1',
      'chord-1',
      'chord-2',
      'chord-3',
    ]);
  });

  it('when one moved chords and the other added one, then the new order stands with the new chord in it', () => {
    const moved = study(chord('chord-3'), chord('chord-1'), chord('chord-2'));
    const added = study(chord('chord-1'), chord('added-1'), chord('chord-2'), chord('chord-3'));
    const expected = ['chord-3', 'chord-1', 'added-1', 'chord-2'];
    expect(idsOf(mergeStudies({ base: BASE, newest: moved, mine: added }))).toEqual(expected);
    expect(idsOf(mergeStudies({ base: BASE, newest: added, mine: moved }))).toEqual(expected);
  });

  it('when both moved the chords differently, then they do not merge', () => {
    const newest = study(chord('chord-3'), chord('chord-1'), chord('chord-2'));
    const mine = study(chord('chord-2'), chord('chord-1'), chord('chord-3'));
    expect(mergeStudies({ base: BASE, newest, mine })).toBeNull();
  });

  it('when the two changed different settings, then both stand; the same one differently, then they do not merge', () => {
    const newest = { ...BASE, tempoBpm: 80 };
    expect(mergeStudies({ base: BASE, newest, mine: { ...BASE, title: 'Ebb' } })).toEqual({
      ...BASE,
      tempoBpm: 80,
      title: 'Ebb',
    });
    expect(mergeStudies({ base: BASE, newest, mine: { ...BASE, tempoBpm: 90 } })).toBeNull();
  });

  it('when nothing would be left of the chords, then they do not merge', () => {
    const two = study(chord('chord-1'), chord('chord-2'));
    const [first, second] = [study(chord('chord-1')), study(chord('chord-2'))];
    expect(mergeStudies({ base: two, newest: first, mine: second })).toBeNull();
  });
});

type Edit = 'leave' | 'change' | 'remove';
interface Plan {
  readonly side: 'mine' | 'newest';
  readonly edit: Edit;
  /** How many new chords follow this one, on each side. */
  readonly mineAfter: number;
  readonly newestAfter: number;
}

const planOf = fc.record({
  side: fc.constantFrom('mine' as const, 'newest' as const),
  edit: fc.constantFrom<Edit>('leave', 'change', 'remove'),
  mineAfter: fc.nat(2),
  newestAfter: fc.nat(2),
});

/** One side's state: its own edits of the chords, those of the other left alone, and chords of its own. */
function sideOf(side: Plan['side'], plans: readonly Plan[]): DraftDocument {
  const chords = plans.flatMap((plan, place) => {
    const id = `chord-${place}`;
    const own = plan.side === side ? plan.edit : 'leave';
    const kept = own === 'remove' ? [] : [chord(id, own === 'change' ? 'A3' : 'C3')];
    const count = side === 'mine' ? plan.mineAfter : plan.newestAfter;
    return [...kept, ...Array.from({ length: count }, (_, n) => chord(`${side}-${place}-${n}`, 'G3'))];
  });
  // A chord that nobody touches, so that something is left.
  return study(chord('always'), ...chords);
}

describe('for any changes of different chords', () => {
  const plans = fc.array(planOf, { minLength: 1, maxLength: 8 });

  it('when they are merged, then every change, addition and removal of both is in it, each chord once', () => {
    fc.assert(
      fc.property(plans, (list) => {
        const base = study(chord('always'), ...list.map((_, place) => chord(`chord-${place}`)));
        const [newest, mine] = [sideOf('newest', list), sideOf('mine', list)];
        const merged = mergeStudies({ base, newest, mine });
        const expected = new Map<string, string>([['always', 'C3']]);
        list.forEach((plan, place) => {
          if (plan.edit !== 'remove') expected.set(`chord-${place}`, plan.edit === 'change' ? 'A3' : 'C3');
        });
        for (const { id } of [...newest.chords, ...mine.chords]) {
          if (/^(mine|newest)-/.test(id)) expected.set(id, 'G3');
        }
        const found = merged?.chords.map(({ id, voices }) => [id, voices[0]?.pitch] as const) ?? [];
        expect(found).toHaveLength(expected.size);
        expect(new Map(found)).toEqual(expected);
      }),
    );
  });

  it('when they are merged, then the chords of each side keep the order that they have there', () => {
    fc.assert(
      fc.property(plans, (list) => {
        const base = study(chord('always'), ...list.map((_, place) => chord(`chord-${place}`)));
        const [newest, mine] = [sideOf('newest', list), sideOf('mine', list)];
        const order = idsOf(mergeStudies({ base, newest, mine })) ?? [];
        for (const side of [newest, mine]) {
          const ids = (idsOf(side) ?? []).filter((id) => order.includes(id));
          expect(order.filter((id) => ids.includes(id))).toEqual(ids);
        }
      }),
    );
  });

  it('when one side changed nothing, then the merge is the other side', () => {
    fc.assert(
      fc.property(plans, (list) => {
        const base = study(chord('always'), ...list.map((_, place) => chord(`chord-${place}`)));
        const changed = sideOf('mine', list);
        const [first, second] = [
          mergeStudies({ base, newest: base, mine: changed }),
          mergeStudies({ base, newest: changed, mine: base }),
        ];
        expect(first && sameStudy(first, changed)).toBe(true);
        expect(second && sameStudy(second, changed)).toBe(true);
      }),
    );
  });
});

import { mount, RouterLinkStub } from '@vue/test-utils';
import { Quasar } from 'quasar';
import { describe, expect, it } from 'vitest';
import type { StudyRow } from '#shared/contracts/studies';
import StudiesTable from '@/components/studies/StudiesTable.vue';

const OWN: StudyRow = {
  id: 'study-of-ada-0123456789',
  number: 1,
  title: 'Ebb',
  about: 'a low third',
  key: { tonic: 'C', mode: 'major' },
  relation: 'owner',
  ownerName: 'Ada Fenn',
  savedAt: '2026-03-01T10:00:00.000Z',
  chordCount: 1,
  cloudiest: 71.6,
  summedUp: true,
  chords: [{ name: null, index: 71.6, register: 'great', registers: [{ register: 'great', index: 71.6 }] }],
  tags: ['low', 'week 3'],
};
const SHARED: StudyRow = {
  ...OWN,
  id: 'study-of-bea-0123456789',
  relation: 'comment',
  ownerName: 'Bea',
};

function tableOf(rows: readonly StudyRow[], unsavedIds: readonly string[] = []) {
  const reader = { now: new Date('2026-03-01T10:12:00Z'), timeZone: 'UTC' };
  const sorting = { sort: 'changed', order: 'desc' } as const;
  const wrapper = mount(StudiesTable, {
    props: { rows, sorting, unsavedIds: new Set(unsavedIds), ...reader },
    global: { plugins: [Quasar], stubs: { RouterLink: RouterLinkStub } },
  });
  const cells = (row: number) =>
    wrapper
      .findAll('tbody tr')
      [row]?.findAll('[data-label]')
      .map((cell) => cell.text()) ?? [];
  return { wrapper, cells };
}

describe('the table of studies', () => {
  it('when a study is one’s own, then it says so, with its figure and when it was saved', () => {
    const { cells } = tableOf([OWN]);
    expect(cells(0)).toEqual(['72', 'you', 'change it', '12 minutes ago']);
  });

  it('when it is shared, then it names the owner and what one may do', () => {
    expect(tableOf([OWN, SHARED]).cells(1).slice(1, 3)).toEqual(['Bea', 'write remarks']);
  });

  it('when a profile is known, then it says its figure and register to those who hear the page', () => {
    const { wrapper } = tableOf([OWN]);
    expect(wrapper.get('svg[role="img"]').attributes('aria-label')).toBe(
      'Chord 1: muddiness 72, most in the great octave',
    );
  });

  it('when it is not worked out yet, then no figure is given', () => {
    const { wrapper, cells } = tableOf([
      { ...OWN, cloudiest: null, chords: [], chordCount: 3, summedUp: false },
    ]);
    expect(cells(0)[0]).toBe('…');
    expect(wrapper.get('.profile-cell').text()).toBe('3 chords, being worked out');
  });

  it('when it has more chords than fit, then the rest is counted', () => {
    expect(
      tableOf([{ ...OWN, chordCount: 12 }])
        .wrapper.get('.profile-cell')
        .text(),
    ).toBe('and 11 more');
  });

  it('when a column’s head is pressed, then the table asks to be sorted so, and pressed again the other way round', async () => {
    const { wrapper } = tableOf([OWN]);
    const [title, , clouded, , , saved] = wrapper.findAll('thead th');
    expect(saved?.attributes('aria-sort')).toBe('descending');
    expect(title?.attributes('aria-sort')).toBe('none');
    await clouded?.get('button').trigger('click');
    await saved?.get('button').trigger('click');
    expect(wrapper.emitted('sort')).toEqual([
      [{ sort: 'clouded', order: 'desc' }],
      [{ sort: 'changed', order: 'asc' }],
    ]);
  });

  it('when a tag is pressed, then what has it is asked for', async () => {
    const { wrapper } = tableOf([OWN]);
    await wrapper.get('[aria-label="Show those tagged week 3"]').trigger('click');
    expect(wrapper.emitted('findTag')).toEqual([['week 3']]);
  });

  it('when this browser keeps unsaved changes of a study, then its row says so', () => {
    expect(tableOf([OWN], [OWN.id]).wrapper.get('tbody th').text()).toContain(
      'not saved yet, kept in this browser',
    );
    expect(tableOf([OWN]).wrapper.get('tbody th').text()).not.toContain('not saved yet');
  });
});

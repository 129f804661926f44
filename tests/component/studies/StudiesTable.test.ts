import { mount, RouterLinkStub } from '@vue/test-utils';
import { Quasar } from 'quasar';
import { describe, expect, it } from 'vitest';
import type { StudyRow } from '#shared/contracts/studies';
import { analyseChord } from '#shared/voicing/analysis';
import { soundSettingsOf } from '#shared/voicing/settings';
import StudiesTable from '@/components/studies/StudiesTable.vue';
import { documentOf, studyOf } from '../../support/open-study';

const OWN = studyOf({ ...documentOf('C2', 'E2'), title: 'Ebb', about: 'a low third' });
const SHARED: StudyRow = {
  ...studyOf(documentOf('C3'), 3, 'comment'),
  id: 'study-of-bea-0123456789',
  ownerName: 'Bea',
};

function tableOf(rows: readonly StudyRow[], unsavedIds: readonly string[] = []) {
  const known = new Map(
    rows.flatMap(({ document }) =>
      document.chords.map(
        (chord) => [chord, analyseChord(chord, soundSettingsOf(document)).muddiness] as const,
      ),
    ),
  );
  const reader = { now: new Date('2026-03-01T10:12:00Z'), timeZone: 'UTC' };
  const wrapper = mount(StudiesTable, {
    props: { rows, known, unsavedIds: new Set(unsavedIds), ...reader },
    global: { plugins: [Quasar], stubs: { RouterLink: RouterLinkStub } },
  });
  const cells = (row: number) =>
    wrapper
      .findAll('tbody tr')
      [row]?.findAll('[data-label]')
      .map((cell) => cell.text()) ?? [];
  return { wrapper, known, cells };
}

describe('the table of studies', () => {
  it('when a study is one’s own, then it says so, with its figure and when it was saved', () => {
    const { cells, known } = tableOf([OWN]);
    const [chord] = OWN.document.chords;
    const figure = Math.round((chord && known.get(chord)?.index) ?? Number.NaN);
    expect(cells(0)).toEqual([String(figure), 'you', 'change it', '12 minutes ago']);
  });

  it('when it is shared, then it names the owner and what one may do', () => {
    expect(tableOf([OWN, SHARED]).cells(1).slice(1, 3)).toEqual(['Bea', 'write remarks']);
  });

  it('when a profile is known, then it says its figure and register to those who hear the page', () => {
    const { wrapper } = tableOf([OWN]);
    expect(wrapper.get('svg[role="img"]').attributes('aria-label')).toMatch(
      /^Chord 1: muddiness \d+, most in the great octave$/,
    );
  });

  it('when a chord is not worked out yet, then no figure is given', async () => {
    const { wrapper, cells } = tableOf([OWN]);
    await wrapper.setProps({ known: new Map() });
    expect(cells(0)[0]).toBe('…');
    expect(wrapper.get('svg[role="img"]').attributes('aria-label')).toBe('Chord 1: being worked out');
  });

  it('when this browser keeps unsaved changes of a study, then its row says so', () => {
    expect(tableOf([OWN], [OWN.id]).wrapper.get('tbody th').text()).toContain(
      'not saved yet, kept in this browser',
    );
    expect(tableOf([OWN]).wrapper.get('tbody th').text()).not.toContain('not saved yet');
  });
});

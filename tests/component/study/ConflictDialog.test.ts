import { DOMWrapper, mount } from '@vue/test-utils';
import { Quasar } from 'quasar';
import { nextTick } from 'vue';
import { afterEach, describe, expect, it } from 'vitest';
import { analyseChord } from '#shared/voicing/analysis';
import { soundSettingsOf } from '#shared/voicing/settings';
import ConflictDialog from '@/components/study/ConflictDialog.vue';
import { documentOf, staleOf } from '../../support/open-study';

const LOW_THIRD = documentOf('C2', 'E2');
const TENTH = documentOf('C2', 'E3');

async function dialogOf(byMe = false) {
  const details = staleOf({ ...TENTH, tempoBpm: 72 }, 5);
  const wrapper = mount(ConflictDialog, {
    props: {
      ...{ mine: LOW_THIRD, details, byMe, busy: false, trouble: null },
      ...{ now: new Date('2026-03-01T10:12:00Z'), timeZone: 'UTC' },
    },
    global: { plugins: [Quasar] },
    attachTo: document.body,
  });
  await nextTick();
  const dialog = new DOMWrapper(document.querySelector('[role="dialog"]') ?? document.body);
  const press = (label: string) =>
    dialog
      .findAll('button')
      .find((button) => button.text() === label)
      ?.trigger('click');
  return { wrapper, dialog, press };
}

afterEach(() => {
  document.body.innerHTML = '';
});

describe('the choice between two saves', () => {
  it('when two saves have met, then it says who saved the newer, when, and under which numbers both are kept', async () => {
    const { dialog } = await dialogOf();
    expect(dialog.text()).toContain('Ada Fenn saved this study 12 minutes ago');
    expect(dialog.text()).toContain('set aside, as number 1');
    expect(dialog.text()).toContain('save 5');
  });

  it('when the newer save is the reader’s own, then it says that it was made elsewhere', async () => {
    const { dialog } = await dialogOf(true);
    expect(dialog.text()).toContain(
      'You saved this study 12 minutes ago, in another window or on another machine',
    );
  });

  it('when a chord differs, then both stand side by side with their notes and figures', async () => {
    const { dialog } = await dialogOf();
    const cells = dialog.findAll('td').map((cell) => cell.text());
    const figure = (document: typeof TENTH) => {
      const [chord] = document.chords;
      return chord ? Math.round(analyseChord(chord, soundSettingsOf(document)).muddiness.index) : null;
    };
    expect(cells).toHaveLength(2);
    expect(cells[0]).toContain('Vc C2 E2');
    expect(cells[0]).toContain(`muddiness ${figure(LOW_THIRD)}`);
    expect(cells[1]).toContain('Vc C2 E3');
    expect(cells[1]).toContain(`muddiness ${figure(TENTH)}`);
    expect(dialog.text()).toContain('Also not the same: tempo');
  });

  it.each([
    ['Go on with what is here', 'keepMine'],
    ['Go on with the newer save', 'takeTheirs'],
    ['Keep this as a new study', 'keepMineAsNew'],
  ])('when “%s” is pressed, then that is chosen and nothing else', async (label, event) => {
    const { wrapper, press } = await dialogOf();
    await press(label);
    expect(Object.keys(wrapper.emitted()).filter((name) => /Mine|Theirs/.test(name))).toEqual([event]);
  });

  it('when it is open, then nothing but a choice closes it', async () => {
    const { dialog } = await dialogOf();
    expect(dialog.findAll('button').map((button) => button.text())).toEqual([
      'Go on with what is here',
      'Go on with the newer save',
      'Keep this as a new study',
    ]);
  });
});

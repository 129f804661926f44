import { mount } from '@vue/test-utils';
import { Quasar } from 'quasar';
import { describe, expect, it } from 'vitest';
import { LOW_INTERVAL_LIMITS } from '#shared/data/low-interval-limits';
import { SECTION_PRESETS } from '#shared/data/section-presets';
import LimitsDialog from '@/components/bench/LimitsDialog.vue';
import SectionSizes from '@/components/bench/SectionSizes.vue';
import RootElsewhere from '@/components/progression/RootElsewhere.vue';

const stubs = { DialogFrame: { template: '<div><slot /></div>' } };
const dialog = (limits: { semitones: number; lowest: string }[] | null) =>
  mount(LimitsDialog, {
    props: { modelValue: true, limits, spelling: { tonic: 'F', mode: 'major' }, naming: 'english' },
    global: { plugins: [Quasar], stubs },
  });

describe('the table of low interval limits', () => {
  it('when the chart is in force, then every interval stands beside its printed limit', () => {
    const wrapper = dialog(null);
    const rows = wrapper.findAll('tbody tr');
    expect(rows).toHaveLength(LOW_INTERVAL_LIMITS.length);
    const third = rows.find((row) => row.get('th').text() === 'major third');
    expect(third?.findAll('td')[0]?.text()).toBe('B♭2');
    expect(third?.get('select').element.selectedOptions[0]?.text.trim()).toBe('B♭2');
    expect(wrapper.get('[role="status"]').text()).toBe('The chart is in force.');
  });

  it('when an interval is given another limit, then the whole list is set; and the way back is one button', async () => {
    const wrapper = dialog(null);
    await wrapper.get('[aria-label="fifth, here not below"]').setValue('48');
    const set = wrapper.emitted('set')?.[0]?.[0];
    expect(set).toHaveLength(LOW_INTERVAL_LIMITS.length);
    expect(set).toContainEqual({ semitones: 7, lowest: 'C3' });
    const own = dialog([{ semitones: 7, lowest: 'C3' }]);
    expect(own.get('[role="status"]').text()).toContain('own limits are in force');
    expect(own.get('[aria-label="major third, here not below"]').element).toHaveProperty('value', '');
    await own.get('button').trigger('click');
    expect(own.emitted('set')).toEqual([[null]]);
  });
});

describe('the sizes of the sections', () => {
  it('when they are those of a preset, then it is named with its source; another one sets all five', async () => {
    const studio = SECTION_PRESETS.find(({ name }) => name === 'Studio');
    if (!studio) throw new Error('the studio sections are not among the presets');
    const wrapper = mount(SectionSizes, { props: { players: studio.players } });
    expect(wrapper.text()).toContain(`Source: ${studio.source}`);
    await wrapper.get('select').setValue('Solo strings');
    expect(wrapper.emitted('set')).toEqual([[{ violin1: 1, violin2: 1, viola: 1, cello: 1, doubleBass: 1 }]]);
    await wrapper.setProps({ players: { ...studio.players, cello: 9 } });
    expect(wrapper.get('select').element.value).toBe('own sizes');
  });
});

describe('the root played elsewhere', () => {
  it('when one is chosen, then it is set, and taken away again', async () => {
    const wrapper = mount(RootElsewhere, { props: { root: null } });
    await wrapper.get('select').setValue('Bb');
    await wrapper.setProps({ root: 'Bb' });
    await wrapper.get('select').setValue('');
    expect(wrapper.emitted('set')).toEqual([['Bb'], [null]]);
  });
});

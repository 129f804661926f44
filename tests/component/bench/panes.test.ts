import { mount } from '@vue/test-utils';
import { describe, expect, it } from 'vitest';
import { pitchAxis } from '@/charts/pitch-axis';
import AxisZoom from '@/components/bench/AxisZoom.vue';
import MuddinessPane from '@/components/bench/MuddinessPane.vue';
import OpenStrings from '@/components/bench/OpenStrings.vue';
import OvertonesTable from '@/components/bench/OvertonesTable.vue';
import OvertonesTitle from '@/components/bench/OvertonesTitle.vue';
import SeriesOverlay from '@/components/bench/SeriesOverlay.vue';
import SpacingPane from '@/components/bench/SpacingPane.vue';
import { useAxisView } from '@/composables/axis-view';
import { analysisOf, soundsOf } from '../../support/made-up-analyses';
import { chordOf } from '../../support/typed-chords';

const axis = pitchAxis([], 500, 40);

describe('the muddiness pane', () => {
  it('when a register clouds, then its bar, its figure and its name are shown, the cloudiest one strongest', async () => {
    const analysis = analysisOf(chordOf('Vc A2'), {
      registers: { great: { index: 72.4, at: 40 }, small: { index: 20, at: 50 } },
    });
    const wrapper = mount(MuddinessPane, { props: { analysis, axis, asked: null } });
    const great = wrapper.findAll('li').find((item) => item.text().includes('great'));
    expect(great?.text()).toContain('72');
    expect(great?.get('.bar').attributes('style')).toContain('width: 72%');
    expect(wrapper.findAll('.cloudiest').map((item) => item.text())).toEqual([great?.text()]);
    await great?.get('button').trigger('click');
    await wrapper.setProps({ asked: 'great' });
    await great?.get('button').trigger('click');
    expect(wrapper.emitted('ask')).toEqual([['great'], [null]]);
  });
});

describe('the overtones as a table', () => {
  it('when a note sounds, then each of its partials is a line with frequency and level', () => {
    const wrapper = mount(OvertonesTable, {
      props: { voices: soundsOf(chordOf('Vc A2')), naming: 'english', height: 300 },
    });
    const lines = wrapper
      .findAll('tbody tr')
      .map((line) => line.findAll('th, td').map((cell) => cell.text()));
    expect(lines).toEqual([
      ['Vc A2', '1', '110 Hz', '0 dB'],
      ['Vc A2', '2', '220 Hz', '−6 dB'],
      ['Vc A2', '3', '330 Hz', '−12 dB'],
    ]);
  });
});

describe('the spacing pane', () => {
  it('when a pair stands under its limit, then that is drawn and told, and its limits when asked', async () => {
    const analysis = analysisOf(chordOf('Vc C2 E2'), {
      limits: [{ lowerId: 'note-1', upperId: 'note-2', interval: 'M3', limit: 'Bb2', semitonesBelow: 10 }],
    });
    const wrapper = mount(SpacingPane, {
      props: {
        ...{ analysis, axis, naming: 'english', markedIds: [], brief: false, limit: null },
        spelling: { tonic: 'F', mode: 'major' },
      },
    });
    const bracket = wrapper.get('button');
    expect(bracket.attributes('aria-label')).toBe('C2 to E2: major third, 10 semitones under its low limit');
    expect(wrapper.get('path').classes()).toContain('under');
    expect(wrapper.get('text').text()).toBe('maj 3rd, 10 under');
    await bracket.trigger('click');
    expect(wrapper.emitted('ask')).toEqual([[{ lowerId: 'note-1', upperId: 'note-2' }]]);
    // The major third's printed limit, B♭2, and a made-up one of the model's, F2.
    const limit = { interval: 'M3', semitones: 4, chart: 46, model: 41, exact: 40.5 };
    await wrapper.setProps({ limit, markedIds: ['note-1', 'note-2'] });
    expect(wrapper.findAll('.mark text').map((mark) => mark.text())).toEqual(['chart B♭2', 'model F2']);
    await bracket.trigger('click');
    expect(wrapper.emitted('ask')?.at(-1)).toEqual([null]);
  });
});

describe('the series of one note', () => {
  it('when a note is pointed at, then its partials are numbered and what they meet is read out', () => {
    const voices = soundsOf(chordOf('Vc A2 E3'));
    const midiOf = (hertz: number) => 69 + 12 * Math.log2(hertz / 440);
    const wrapper = mount(SeriesOverlay, {
      props: { voices, id: 'note-1', axis, midiOf, naming: 'english' },
    });
    expect(wrapper.findAll('.numbers text').map((text) => text.text())).toEqual(['1', '2', '3']);
    expect(wrapper.findAll('li').map((item) => item.text())).toContain(
      'Partial 3, 330 Hz, meets partial 2 of the cellos’ E3, together.',
    );
  });
});

describe('what the overtones pane shows', () => {
  it('when the open strings are asked for, then the plot gives way, and comes back', async () => {
    const wrapper = mount(OvertonesTitle, { props: { modelValue: 'plot', covered: false } });
    const strings = wrapper.findAll('button').find((button) => button.text() === 'Open strings');
    await strings?.trigger('click');
    await wrapper.setProps({ modelValue: 'strings' });
    expect(strings?.attributes('aria-pressed')).toBe('true');
    await strings?.trigger('click');
    expect(wrapper.emitted('update:modelValue')).toEqual([['strings'], ['plot']]);
  });

  it('when a chord has an E, then the fifth partial of the cellos’ C string is offered, 14 cents low', () => {
    const wrapper = mount(OpenStrings, {
      props: {
        ...{ voices: soundsOf(chordOf('Vn1 E4')), bass: 'four-string', a4Hz: 440, height: 300 },
        ...{ spelling: { tonic: 'C', mode: 'major' }, naming: 'english' },
      },
    });
    const rows = wrapper.findAll('tbody tr').map((row) => row.text());
    expect(rows.some((row) => /E4, −14 cents.*in this chord.*cellos C2\s*5/.test(row))).toBe(true);
  });
});

describe('the view of the pitch axis', () => {
  it('when it comes closer, then the way back and what is out of sight are told', async () => {
    const notes = [28, 64];
    const viewing = useAxisView(() => notes);
    const wrapper = mount(AxisZoom, { props: { axis, notes, viewing }, global: { stubs: { QIcon: true } } });
    await wrapper.get('[aria-label="Zoom in"]').trigger('click');
    expect(viewing.zoomed.value).toBe(true);
    await wrapper.setProps({ axis: pitchAxis(notes, 500, 40, { low: 40, high: 70 }) });
    expect(wrapper.get('[role="status"]').text()).toBe('out of sight: 1 below');
    await wrapper
      .findAll('button')
      .find((button) => button.text() === 'All')
      ?.trigger('click');
    expect(viewing.zoomed.value).toBe(false);
  });
});

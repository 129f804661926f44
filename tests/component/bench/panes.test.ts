import { mount } from '@vue/test-utils';
import { describe, expect, it } from 'vitest';
import { pitchAxis } from '@/charts/pitch-axis';
import MuddinessPane from '@/components/bench/MuddinessPane.vue';
import OvertonesTable from '@/components/bench/OvertonesTable.vue';
import SpacingPane from '@/components/bench/SpacingPane.vue';
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

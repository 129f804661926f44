import { flushPromises, mount } from '@vue/test-utils';
import { describe, expect, it, vi } from 'vitest';
import { nextTick, ref, shallowRef } from 'vue';
import { voicingsOf } from '#shared/study/voicing';
import type { Side } from '#shared/voicing/blind-rounds';
import { compareVoicings } from '#shared/voicing/comparison';
import BlindDialog from '@/components/compare/BlindDialog.vue';
import CompareFoot from '@/components/compare/CompareFoot.vue';
import { useCompareSound, type ComparedSounds } from '@/composables/compare-sound';
import type { PlaybackMode } from '@/composables/playback-signs';
import { useSourcePages } from '@/composables/source-pages';
import { progressionSource, type VoicingSource } from '@/composables/voicing-sources';
import { useBenchTaking } from '@/pages/lab/compare/bench-taking';
import { useCompareStore } from '@/stores/compare.store';
import { analysisOf, soundsOf } from '../../support/made-up-analyses';
import { atTheDesk, documentOf } from '../../support/open-study';
import { chordOf } from '../../support/typed-chords';

/** The page's notices stand outside what is tested here. */
vi.mock('@/composables/notices', () => ({ notice: vi.fn() }));

const stubs = { 'q-btn': true, 'q-icon': true };

describe('what is held', () => {
  it('when the chord on the bench changes, then A stays as it was and can be brought back in one step', () => {
    const { bench, put } = atTheDesk();
    put('A2');
    const compare = useCompareStore();
    const taking = useBenchTaking(bench, compare);
    compare.holdNow();
    expect(compare.comparing).toBe(true);
    put('C3');
    const pitches = () => [compare.held, compare.now].map((side) => side?.chord.voices[0]?.pitch);
    expect(pitches()).toEqual(['A2', 'C3']);
    expect(compare.held && taking.labelOf(compare.held)).toBe('Bring its notes back');
    if (compare.held) taking.take(compare.held);
    expect(pitches()).toEqual(['A2', 'A2']);
    bench.undo();
    expect(pitches()).toEqual(['A2', 'C3']);
  });

  it('when the chord has been changed before, then A is what it was, and what it is now can be held instead', () => {
    const { put } = atTheDesk();
    put('A2');
    put('C3');
    put('E3');
    const compare = useCompareStore();
    compare.begin();
    const pitches = () => [compare.held, compare.now].map((side) => side?.chord.voices[0]?.pitch);
    expect(pitches()).toEqual(['A2', 'E3']);
    expect(compare.held?.from).toBe('as it was before your changes');
    expect(compare.heldBefore).toBe(true);
    compare.holdNow();
    expect(pitches()).toEqual(['E3', 'E3']);
    expect(compare.heldBefore).toBe(false);
  });

  it('when the chord has only been written, then A is what it is', () => {
    const { put } = atTheDesk();
    put('A2');
    put('A2', 'E3');
    const compare = useCompareStore();
    compare.begin();
    expect(compare.held?.chord.voices.map(({ pitch }) => pitch)).toEqual(['A2', 'E3']);
    expect(compare.held?.from).toBe('as it was when held');
  });

  it('when nothing differs yet, then what would help stays in view until something does, and no longer', () => {
    const { put, bench } = atTheDesk();
    put('A2');
    const compare = useCompareStore();
    compare.begin();
    expect([compare.view, compare.tellsFindings]).toEqual(['findings', true]);
    put('C3');
    expect([compare.view, compare.tellsFindings]).toEqual(['comparison', false]);
    bench.undo();
    expect(compare.view).toBe('comparison');
  });

  it('when something else was asked for meanwhile, then a change leaves that in view', () => {
    const { put } = atTheDesk();
    put('A2');
    const compare = useCompareStore();
    compare.begin();
    compare.show('beside');
    put('C3');
    expect(compare.view).toBe('beside');
  });

  it('when the study is only to be read, then nothing will be tried, and A and B are told at once', () => {
    const { put, bench } = atTheDesk();
    put('A2');
    bench.readOnly = true;
    const compare = useCompareStore();
    compare.begin();
    expect(compare.view).toBe('comparison');
  });

  it('when B comes from another study, then it is looked at, and taken into the progression as a chord of its own', () => {
    const { bench, put } = atTheDesk();
    put('A2');
    const compare = useCompareStore();
    const taking = useBenchTaking(bench, compare);
    compare.holdNow();
    const [other] = voicingsOf(documentOf('E3'), { studyId: 'study-other', number: null, from: 'Other' });
    if (!other) throw new Error('no voicing');
    taking.bring(other);
    expect(compare.guest).toEqual(other);
    expect(bench.study.chords).toHaveLength(1);
    taking.take(other);
    expect(compare.guest).toBeNull();
    expect(bench.study.chords).toHaveLength(2);
    expect(compare.now?.chord.voices[0]?.pitch).toBe('E3');
  });

  it('when the study is only to be read, then nothing can be brought into it', () => {
    const { bench, put } = atTheDesk();
    put('A2');
    bench.readOnly = true;
    const [other] = voicingsOf(documentOf('E3'), { studyId: 'study-other', number: null, from: 'Other' });
    expect(other && useBenchTaking(bench, useCompareStore()).labelOf(other)).toBeNull();
  });

  it('when more than eight are laid side by side, then the first eight stand', () => {
    atTheDesk();
    const compare = useCompareStore();
    const [one] = voicingsOf(documentOf('E3'), { studyId: null, number: null, from: 'here' });
    if (!one) throw new Error('no voicing');
    compare.add(Array.from({ length: 12 }, () => ({ ...one })));
    expect(compare.beside).toHaveLength(8);
  });
});

describe('where voicings come from', () => {
  it('when a link names a chord of the study that lies open, then the progression opens it by either name', async () => {
    const study = documentOf('A2');
    const source = progressionSource(
      () => study,
      () => 'study-open',
    );
    const place = { studyId: null, number: null, chordId: 'chord-one' };
    expect((await source.open(place))?.chord).toBe(study.chords[0]);
    expect((await source.open({ ...place, studyId: 'study-open' }))?.chord).toBe(study.chords[0]);
    expect(await source.open({ ...place, studyId: 'study-other' })).toBeNull();
    expect(await source.open({ ...place, number: 3 })).toBeNull();
  });

  it('when a search overtakes another, then only the last answer is shown', async () => {
    vi.useFakeTimers();
    const answers = new Map<string, (titles: readonly string[]) => void>();
    const source: VoicingSource = {
      ...{ id: 'test', label: 'Test', searchable: true, unavailable: () => null },
      open: () => Promise.resolve(null),
      page: (search) =>
        new Promise((resolve) => {
          answers.set(search, (titles) =>
            resolve({
              groups: titles.map((title) => ({
                ...{ id: title, title, detail: '' },
                voicings: async () => [],
              })),
              next: null,
            }),
          );
        }),
    };
    const shown = shallowRef(source);
    const { groups, query } = useSourcePages(() => shown.value);
    query.value = 'fer';
    await vi.runAllTimersAsync();
    query.value = 'ferry';
    await vi.runAllTimersAsync();
    answers.get('ferry')?.(['The ferry at dusk']);
    answers.get('fer')?.(['Ferns', 'The ferry at dusk']);
    await flushPromises();
    expect(groups.value.map(({ title }) => title)).toEqual(['The ferry at dusk']);
    vi.useRealTimers();
  });
});

describe('the sound of two', () => {
  function player() {
    const mode = ref<PlaybackMode>('silent');
    const side = ref<'a' | 'b'>('a');
    const compareAB = vi.fn(async () => void (mode.value = 'compare'));
    const switchTo = vi.fn((to: 'a' | 'b') => void (side.value = to));
    const stop = vi.fn(() => void (mode.value = 'silent'));
    const sounds = shallowRef<ComparedSounds | null>({
      held: soundsOf(chordOf('Vc A2')),
      now: soundsOf(chordOf('Vc A3')),
    });
    const sound = useCompareSound(() => sounds.value, { mode, side, compareAB, switchTo, stop });
    return { sounds, sound, compareAB, switchTo, stop };
  }

  it('when the key is pressed again and again, then A and B sound in turn and are prepared only once', async () => {
    const { sound, compareAB } = player();
    const heard: (Side | null)[] = [];
    for (let press = 0; press < 3; press += 1) {
      sound.switchOver();
      await flushPromises();
      heard.push(sound.heard.value);
    }
    expect(heard).toEqual(['held', 'now', 'held']);
    expect(compareAB).toHaveBeenCalledTimes(1);
  });

  it('when B changes while it sounds, then both are given anew, and in silence they are not', async () => {
    const { sound, sounds, compareAB, stop } = player();
    const change = async (line: string) => {
      sounds.value = { held: soundsOf(chordOf('Vc A2')), now: soundsOf(chordOf(line)) };
      await nextTick();
    };
    await change('Vc B2');
    expect(compareAB).not.toHaveBeenCalled();
    sound.hear('now');
    await flushPromises();
    await change('Vc C3');
    expect(compareAB).toHaveBeenCalledTimes(2);
    sound.hear('now');
    expect(stop).toHaveBeenCalledTimes(1);
  });
});

describe('a blind round on the page', () => {
  const DialogStub = { template: '<div><slot /></div>' };
  const ButtonStub = { props: ['label'], template: '<button>{{ label }}</button>' };

  function blind() {
    return mount(BlindDialog, {
      props: {
        index: { held: 60, now: 20, clear: true },
        names: { held: 'A (close)', now: 'B (open)' },
        heard: null,
        random: () => 0.9,
      },
      global: { stubs: { 'q-dialog': DialogStub, 'q-btn': ButtonStub }, directives: { 'close-popup': {} } },
    });
  }
  const button = (wrapper: ReturnType<typeof blind>, name: string) =>
    wrapper
      .findAll('button')
      .find((found) => found.text() === name || found.attributes('aria-label') === name);

  it('when it begins, then nothing tells which is which, and an answer needs both to be heard', async () => {
    const wrapper = blind();
    expect(wrapper.text()).not.toMatch(/close|open|60|20/);
    expect(button(wrapper, '1 is clearer')?.attributes('disable')).toBe('true');
    await button(wrapper, 'Hear 1')?.trigger('click');
    await button(wrapper, 'Hear 2')?.trigger('click');
    // Chance, 0.9, has called the voicing now 1.
    expect(wrapper.emitted('hear')).toEqual([['now'], ['held']]);
    expect(button(wrapper, '1 is clearer')?.attributes('disable')).toBe('false');
  });

  it('when it is answered, then the sound ends and the reader is told which was which', async () => {
    const wrapper = blind();
    await button(wrapper, 'Hear 1')?.trigger('click');
    await button(wrapper, 'Hear 2')?.trigger('click');
    await button(wrapper, '1 is clearer')?.trigger('click');
    expect(wrapper.emitted('quiet')).toHaveLength(1);
    expect(wrapper.text()).toContain('1 was B (open), 2 was A (close).');
    expect(wrapper.text()).toContain('in 1 of 1 round');
    await button(wrapper, 'Another round')?.trigger('click');
    expect(wrapper.text()).not.toContain('was B');
    expect(button(wrapper, '1 is clearer')?.attributes('disable')).toBe('true');
  });

  it('when the keys are used, then 1, 2 and X choose what is heard', async () => {
    const wrapper = blind();
    const press = (key: string) => document.dispatchEvent(new KeyboardEvent('keydown', { key }));
    press('2');
    await wrapper.setProps({ heard: 'held' });
    press('x');
    expect(wrapper.emitted('hear')).toEqual([['held'], ['now']]);
    wrapper.unmount();
  });
});

describe('the comparison in words and figures', () => {
  it('when B is clearer, then that, the notes, the limits and a table of both are told', () => {
    const [before, after] = [chordOf('DB D2, Vc F2'), chordOf('DB D2, Vc D3')];
    const limits = [
      { lowerId: 'note-1', upperId: 'note-2', interval: 'm3', limit: 'C3', semitonesBelow: 10 },
    ];
    const [study] = [documentOf('A2')];
    const side = (chord: typeof before, great: number, under: typeof limits) => ({
      voicing: { place: null, chord, settings: study, name: 'x', from: 'y' },
      analysis: analysisOf(chord, { registers: { great: { index: great, at: 40 } }, limits: under }),
    });
    const sides = { held: side(before, 70, limits), now: side(after, 12, []) };
    const wrapper = mount(CompareFoot, {
      props: {
        sides,
        comparison: compareVoicings(sides.held.analysis, sides.now.analysis),
        figures: [{ name: 'Spread', held: '3 semitones', now: '12 semitones' }],
        ...{ naming: 'english', backLabel: null, before: false, asked: false },
      },
      global: { stubs },
    });
    expect(wrapper.text()).toContain('B is clearer than A.');
    expect(wrapper.findAll('li').map((line) => line.text())).toEqual([
      'The cellos’ F2 moves up a major sixth, to D3.',
      'D2–F2 (DB, Vc), a minor third, stood under the low limit and is gone.',
    ]);
    const rows = wrapper.findAll('tbody tr').map((row) => row.findAll('th, td').map((cell) => cell.text()));
    expect(rows).toEqual([
      ['Muddiness', '70', '12', '−58'],
      ['The great octave', '70', '12', '−58'],
      ['Pairs under their low limit', '1', '0', ''],
      ['Spread', '3 semitones', '12 semitones', ''],
    ]);
  });
});

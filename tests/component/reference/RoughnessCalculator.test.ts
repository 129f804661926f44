import { mount } from '@vue/test-utils';
import { describe, expect, it } from 'vitest';
import RoughnessCalculator from '@/components/reference/RoughnessCalculator.vue';

function calculator(naming: 'english' | 'german' = 'english') {
  const wrapper = mount(RoughnessCalculator, { props: { naming } });
  return {
    wrapper,
    type: (notes: string) => wrapper.get('input[type=text]').setValue(notes),
    choose: (measure: string) => wrapper.get('select').setValue(measure),
    value: () => wrapper.get('output').text(),
    faults: () => wrapper.findAll('.faults li').map((item) => item.text()),
  };
}

describe('the calculator of published measures', () => {
  it('when C4 E4 G4 is measured with exact partials, then it is Hutchinson & Knopoff’s value, with its source', async () => {
    const { type, choose, value, wrapper } = calculator();
    await type('C4 E4 G4');
    await choose('hutchinsonKnopoff');
    // The published tests of Harrison & Pearce 2020: 0.120 ± 0.001; to more figures 0.1202426.
    expect(Math.abs(Number(value()) - 0.12)).toBeLessThanOrEqual(0.001);
    expect(Number(value())).toBeCloseTo(0.1202426, 7);
    expect(wrapper.text()).toContain('Hutchinson & Knopoff 1978');
  });

  it('when its partials are moved to the nearest keys, then the other published variant comes out', async () => {
    const { type, choose, value } = calculator();
    await type('C4 E4 G4');
    await choose('hutchinsonKnopoffRounded');
    expect(Number(value())).toBeCloseTo(0.087, 4);
  });

  it.each([
    ['C#3 C#4 F4 G#4', 0.072],
    ['D3 F#3 D4 A4', 0.108],
    ['D#3 G3 D#4 A#4', 0.103],
  ])(
    'when %s is typed, then the roughness printed by Bigand, Parncutt & Lerdahl 1996 comes out',
    async (notes, printed) => {
      const { type, choose, value } = calculator();
      await choose('hutchinsonKnopoffRounded');
      await type(notes);
      // Half of the last printed figure, which is itself rounded.
      expect(Math.abs(Number(value()) - printed)).toBeLessThanOrEqual(0.0006);
    },
  );

  it('when another model is chosen, then its own value and source stand there', async () => {
    const { type, choose, value, wrapper } = calculator();
    await type('C4 E4 G4');
    await choose('sethares');
    // Published beside Sethares's model for 60 64 67 with 11 partials.
    expect(value()).toBe('0.7735006');
    expect(wrapper.text()).toContain('Sethares 1993');
    await choose('vassilakis');
    expect(wrapper.text()).toContain('Vassilakis 2001');
  });

  it('when a note cannot be read, then the field says so, and no value pretends to be one', async () => {
    const { type, faults, wrapper } = calculator();
    await type('C4 X4 G');
    expect(faults()).toEqual([expect.stringContaining('“X4”'), expect.stringContaining('“G”')]);
    const field = wrapper.get('input[type=text]');
    expect(field.attributes('aria-invalid')).toBe('true');
    const described = field.attributes('aria-describedby')?.split(' ') ?? [];
    expect(described).toContain(wrapper.get('.faults').attributes('id'));
    expect(wrapper.find('output').exists()).toBe(false);
  });

  it('when nothing is typed, then it asks for a note', async () => {
    const { type, wrapper, faults } = calculator();
    await type('');
    expect(faults()).toEqual([]);
    expect(wrapper.get('[role=status]').text()).toBe('Type a note to begin.');
  });

  it('when the reader names notes the German way, then H is a note', async () => {
    const { type, faults, wrapper } = calculator('german');
    await type('H3 Es4');
    expect(faults()).toEqual([]);
    expect(wrapper.get('[role=status]').text()).toContain('H3 Es4');
  });

  it('when more partials than there may be are asked for, then the last value stays and the field says so', async () => {
    const { value, wrapper } = calculator();
    const before = value();
    const partials = wrapper.get('input[type=number]');
    await partials.setValue('400');
    expect(value()).toBe(before);
    expect(wrapper.text()).toContain('a number from 1 to 32');
  });
});

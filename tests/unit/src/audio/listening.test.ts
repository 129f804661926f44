import { describe, expect, it } from 'vitest';
import { EVERYBODY, heardOf, heardSections, toggled, WHOLE_CHORD } from '@/audio/listening';
import { SECTIONS } from '#shared/strings/sections';
import { seriesOn, voiceSound } from '../../../support/sounds';

const EIGHT = [0, -6, -9, -12, -14, -15, -17, -18];
const bass = voiceSound('bass', { section: 'doubleBass', midi: 45, partials: seriesOn(110, EIGHT) });
const tenor = voiceSound('tenor', { midi: 57, partials: seriesOn(220, EIGHT) });
const top = voiceSound('top', { section: 'violin1', midi: 81, partials: seriesOn(880, EIGHT) });
const chord = [bass, tenor, top];

describe('heardOf', () => {
  it('when the whole chord is listened to, then it is the chord', () => {
    expect(heardOf(chord, WHOLE_CHORD)).toEqual(chord);
  });

  it('when a pair is listened to, then two voices sound as they do in the chord', () => {
    expect(heardOf(chord, { kind: 'pair', lowerId: 'bass', upperId: 'top' })).toEqual([bass, top]);
  });

  it('when one voice is listened to, then it sounds alone', () => {
    expect(heardOf(chord, { kind: 'voice', id: 'tenor' })).toEqual([tenor]);
  });

  it('when the one-line register is listened to, then only the partials from C4 to B4 sound', () => {
    const heard = heardOf(chord, { kind: 'register', register: 'one-line', a4Hz: 440 });
    // C4 is 261.63 Hz and B4 493.88 Hz at A4 = 440: of A2 the partials 3 and 4, of A3 the second.
    expect(heard.map(({ id, partials }) => [id, partials.map(({ n }) => n)])).toEqual([
      ['bass', [3, 4]],
      ['tenor', [2]],
    ]);
    expect(heard[0]?.partials[0]).toEqual(bass.partials[2]);
  });
});

describe('the mix', () => {
  it('when nobody is singled out, then all sections sound', () => {
    expect(heardSections(EVERYBODY)).toEqual(SECTIONS);
  });

  it('when cellos are soloed, then only they sound, and all again when that is taken back', () => {
    const solo = toggled(EVERYBODY, 'solo', 'cello');
    expect(heardSections(solo)).toEqual(['cello']);
    expect(heardSections(toggled(solo, 'solo', 'cello'))).toEqual(SECTIONS);
  });

  it('when basses are left out, then the others sound', () => {
    const out = toggled(EVERYBODY, 'out', 'doubleBass');
    expect(heardSections(out)).toEqual(SECTIONS.filter((section) => section !== 'doubleBass'));
  });

  it('when a soloed section is left out, then its solo is taken back', () => {
    const mix = toggled(toggled(EVERYBODY, 'solo', 'viola'), 'out', 'viola');
    expect(mix).toEqual({ solo: [], out: ['viola'] });
  });
});

import { describe, expect, it } from 'vitest';
import { analyseChord } from '#shared/voicing/analysis';
import { intervalUnder, notesText, pitchedUpwards } from '#shared/voicing/tips/notes';
import { TRADE_TIPS, tipFor } from '#shared/voicing/tips/trade-tips';
import { chordOf } from '../../../../support/typed-chords';
import { EVEN_SETTINGS } from '../../../../support/voicings';

function factsOf(line: string) {
  const chord = chordOf(line);
  return { chord, analysis: analyseChord(chord, EVEN_SETTINGS), naming: 'english' } as const;
}

/** What one tip says, whatever the others say. */
function saying(id: string, line: string): string | null {
  const tip = TRADE_TIPS.find((known) => known.id === id);
  if (!tip) throw new Error(`no tip is called ${id}`);
  return tip.says(factsOf(line));
}

describe('the tips', () => {
  it('when a third stands low, then its notes are named with the order of the series', () => {
    expect(saying('low-third', 'Vc C2 E2')).toMatch(
      /^The cellos’ C2–E2: a third\. .*first third two octaves up/,
    );
    expect(saying('low-third', 'DB C2, Vc E2')).toMatch(/^The double basses’ C2 and the cellos’ E2/);
    expect(saying('low-third', 'Va C4 E4')).toBeNull();
  });

  // Lowell & Pullig 2003: M3 B♭2, M10 B♭1, M2 E♭3, M9 E♭2.
  it('when a third or second stands low, then the chart tells how low its open form may stand', () => {
    expect(saying('tenth-for-third', 'Vc C2 E2')).toMatch(/major third begin at B♭2, a major tenth at B♭1/);
    expect(saying('low-second', 'Vc C3 D3')).toMatch(/E♭3 for the major second, E♭2 for the ninth/);
    expect(saying('low-second', 'Vc C2 D3')).toBeNull();
  });

  // Half the players are 10 lg 2 = 3.01 dB less, a quarter 6.02 dB.
  it('when a section divides, then what its thinnest line loses is told, of a double stop nothing', () => {
    expect(saying('divided', 'Va D3 A3')).toMatch(/^The violas divided in two: .* 3 dB less/);
    expect(saying('divided', 'Vn1 C5 E5 G5 C6')).toMatch(/^The first violins divided in four: .* 6 dB less/);
    expect(saying('divided', 'Va D3+A3')).toBeNull();
    expect(saying('divided', 'Vc D3, Va A3')).toBeNull();
  });

  it('when exactly two play a line, then that is remarked', () => {
    expect(saying('two-players', 'Vn1 A5[2]')).toMatch(/two players/);
    expect(saying('two-players', 'Vn1 A5[3]')).toBeNull();
  });

  it('when the melody is doubled an octave below, then the locked voice is the melody', () => {
    expect(saying('octave-under-melody', 'Vc C3, Vn2 D4, Vn1 D5')).toMatch(/^D4 doubles the melody/);
    expect(saying('octave-under-melody', 'Vc C3, Vn2 D4, Vn1 A4[locked] D5')).toBeNull();
    expect(saying('octave-under-melody', 'Vc C3, Vn2 E4, Vn1 D5')).toBeNull();
  });

  it('when upper neighbours stand further apart than an octave, then the space is named, but not at the bottom', () => {
    expect(saying('gap-above', 'Vc C3, Va C4, Vn1 D5')).toMatch(/between C4 and D5/);
    expect(saying('gap-above', 'DB C2, Vc G3, Va C4, Vn1 C5')).toBeNull();
  });

  it('when cellos stand an octave over the basses at the bottom, then the reason is told', () => {
    expect(saying('cellos-over-basses', 'DB C2, Vc C3, Va G3')).toMatch(/octave over the basses/);
    expect(saying('cellos-over-basses', 'DB C2, Vc G2')).toBeNull();
  });

  it('when basses play, then their octave of writing is told once they are there', () => {
    expect(saying('basses-sound-lower', 'DB D2')).toMatch(/sound an octave lower than written.* D2 /);
    expect(saying('basses-sound-lower', 'Vc D2')).toBeNull();
  });
});

describe('the choice of a tip', () => {
  it('when several matter, then one is shown, and the next once that is put away', () => {
    const facts = factsOf('DB C2, Vc E2, Va G3');
    expect(tipFor(facts, [])?.id).toBe('low-third');
    expect(tipFor(facts, ['low-third'])?.id).toBe('tenth-for-third');
    expect(tipFor(facts, ['low-third', 'tenth-for-third', 'basses-sound-lower'])).toBeNull();
  });

  it('when there are no notes, then there is no tip, as the examples say', () => {
    const none = { chord: { voices: [] }, analysis: { voices: [], limits: [] }, naming: 'english' } as const;
    expect(tipFor(none, [])).toBeNull();
    expect(intervalUnder(none.analysis, ['M3'])).toBeNull();
    expect(pitchedUpwards([])).toEqual([]);
  });

  it('when tips are listed, then each has an id of its own and says where it is from', () => {
    expect(new Set(TRADE_TIPS.map(({ id }) => id)).size).toBe(TRADE_TIPS.length);
    for (const { source } of TRADE_TIPS) expect(source).not.toBe('');
  });

  it('when one player plays both notes’ section alone, then the owner is named alone', () => {
    const { analysis } = factsOf('Vc C2[solo], Va G3');
    const [lower, upper] = analysis.voices;
    if (!lower || !upper) throw new Error('two voices were typed');
    expect(notesText({ lower, upper }, 'english')).toBe('The cello’s C2 and the violas’ G3');
  });
});

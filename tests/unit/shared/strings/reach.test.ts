import { describe, expect, it } from 'vitest';
import { SECTION_PRESETS } from '#shared/data/section-presets';
import { midiOfName } from '#shared/pitch/names';
import { clefOf, writtenMidi } from '#shared/strings/clefs';
import { playersOf } from '#shared/strings/divisi';
import { openStringsOf, rangeOf } from '#shared/strings/ranges';
import { stoppedFinding, stringReaches, voiceFinding } from '#shared/strings/reach';
import type { Section } from '#shared/strings/sections';
import { SECTIONS } from '#shared/strings/sections';
import { DEFAULT_ENSEMBLE, techniqueSchema } from '#shared/study/study.document';
import { chordOf } from '../../../support/voicings';

const part = (section: Section, pitch: string, string: number | null = null) => ({
  section,
  pitch,
  string,
  technique: techniqueSchema.parse({}),
});
const grade = (section: Section, pitch: string, string: number | null = null) =>
  voiceFinding(part(section, pitch, string), 'four-string', 440).grade;

describe('ranges', () => {
  it.each([
    ['violin1', 'G3', 'E7'],
    ['viola', 'C3', 'E6'],
    ['cello', 'C2', 'A5'],
    ['doubleBass', 'E1', 'Bb3'],
  ] as const)(
    'when the range of %s is asked for, then it runs from %s to %s in orchestral writing',
    (section, low, top) => {
      const range = rangeOf(section, 'four-string');
      expect(range.lowest).toBe(midiOfName(low));
      expect(range.orchestralTop).toBe(midiOfName(top));
      expect(range.comfortableTop).toBeLessThan(range.orchestralTop);
      expect(range.soloTop).toBeGreaterThan(range.orchestralTop);
    },
  );

  it('when the double bass has its extension or fifth string, then it reaches C1 or B0, and nobody else changes', () => {
    expect(rangeOf('doubleBass', 'extension').lowest).toBe(midiOfName('C1'));
    expect(rangeOf('doubleBass', 'five-string').lowest).toBe(midiOfName('B0'));
    expect(openStringsOf('doubleBass', 'five-string')).toHaveLength(5);
    expect(rangeOf('cello', 'five-string')).toEqual(rangeOf('cello', 'four-string'));
  });

  it('when the strings of any section are listed, then they fall and each has a top and a colour', () => {
    for (const section of SECTIONS) {
      const reaches = stringReaches(section, 'five-string');
      reaches.slice(1).forEach((reach, i) => expect(reach.open).toBeLessThan(reaches[i]?.open ?? 0));
      reaches.forEach((reach) => {
        expect(reach.top).toBeGreaterThan(reach.open);
        expect(reach.colour).not.toBe('');
      });
    }
  });
});

describe('what a player says to a note', () => {
  it('when a note lies in, above and below the range, then it is easy, awkward and not playable', () => {
    expect(grade('violin1', 'A4')).toBe('easy');
    expect(grade('cello', 'C5')).toBe('awkward');
    expect(grade('cello', 'C6')).toBe('awkward');
    expect(grade('cello', 'F6')).toBe('not playable');
    expect(grade('violin1', 'F#3')).toBe('not playable');
  });

  it('when a string is named, then the note must lie on it', () => {
    expect(grade('violin1', 'A4', 4)).toBe('easy');
    expect(grade('violin1', 'C4', 3)).toBe('not playable');
    expect(grade('violin1', 'E5', 4)).toBe('awkward');
  });

  it('when a finding is given, then it says why', () => {
    expect(voiceFinding(part('viola', 'B2'), 'four-string', 440)).toEqual({
      grade: 'not playable',
      reason: 'below the lowest note of the violas',
    });
  });

  it('when two voices make a stop, then they are judged together; one alone is not', () => {
    expect(stoppedFinding([part('cello', 'A2'), part('cello', 'F3')], 'four-string')?.grade).toBe('easy');
    expect(stoppedFinding([part('cello', 'C2'), part('cello', 'D2')], 'four-string')?.grade).toBe(
      'not playable',
    );
    expect(stoppedFinding([part('cello', 'C2')], 'four-string')).toBeNull();
  });
});

describe('clefs', () => {
  it('when a passage lies low or high, then its clef is the ordinary one or the higher', () => {
    expect(clefOf('violin2', [55])).toBe('treble');
    expect(clefOf('viola', [60, 72])).toBe('alto');
    expect(clefOf('viola', [76, 81])).toBe('treble');
    expect(clefOf('cello', [36, 62])).toBe('bass');
    expect(clefOf('cello', [64, 69])).toBe('tenor');
    expect(clefOf('cello', [74, 79])).toBe('treble');
    expect(clefOf('cello', [])).toBe('bass');
  });

  it('when the double bass is written, then it stands an octave higher than it sounds', () => {
    expect(writtenMidi('doubleBass', midiOfName('E1'))).toBe(midiOfName('E2'));
    expect(writtenMidi('cello', 36)).toBe(36);
    expect(clefOf('doubleBass', [28])).toBe('bass');
  });
});

describe('divisi', () => {
  const players = (...given: Parameters<typeof chordOf>[0]) => {
    const { voices } = chordOf(given);
    const counts = playersOf(voices, DEFAULT_ENSEMBLE);
    return voices.map(({ id }) => counts.get(id));
  };

  it('when a section plays one note, then all of its players play it', () => {
    expect(players({ section: 'cello', pitch: 'A2' })).toEqual([8]);
  });

  it('when a section divides, then its players share evenly, the upper lines first', () => {
    expect(players({ section: 'viola', pitch: 'A3' }, { section: 'viola', pitch: 'D4' })).toEqual([5, 5]);
    expect(
      players(
        { section: 'viola', pitch: 'A3' },
        { section: 'viola', pitch: 'D4' },
        { section: 'viola', pitch: 'F4' },
      ),
    ).toEqual([3, 3, 4]);
  });

  it('when two voices are one double stop, then all players play both', () => {
    expect(
      players({ section: 'cello', pitch: 'A2', stop: 1 }, { section: 'cello', pitch: 'F3', stop: 1 }),
    ).toEqual([8, 8]);
  });

  it('when players are set on a voice, then the others share the rest', () => {
    expect(
      players(
        { section: 'viola', pitch: 'A3', players: 2 },
        { section: 'viola', pitch: 'D4' },
        { section: 'viola', pitch: 'F4' },
      ),
    ).toEqual([2, 4, 4]);
  });

  it('when there are more lines than players, then each line has one', () => {
    const many = Array.from({ length: 12 }, (_, i) => ({
      section: 'doubleBass' as const,
      pitch: `D${1 + (i % 3)}`,
    }));
    expect(players(...many).every((count) => count === 1)).toBe(true);
  });
});

describe('section sizes', () => {
  it('when a preset is chosen, then every section has players and the source is named', () => {
    SECTION_PRESETS.forEach(({ players, source }) => {
      SECTIONS.forEach((section) => expect(players[section]).toBeGreaterThanOrEqual(1));
      expect(source).not.toBe('');
    });
    expect(SECTION_PRESETS.find(({ name }) => name === 'Concert standard')?.players).toEqual(
      DEFAULT_ENSEMBLE.players,
    );
  });
});

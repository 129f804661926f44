import { describe, expect, it } from 'vitest';
import { MOST_BYTES, readStudyFile, studyFileText } from '@/export/study-file';
import { documentOf } from '../../../support/studies';

const study = documentOf('The ferry at dusk', ['chord-1', 'chord-2']);

/** What is said of a file that holds this. */
function told(value: unknown) {
  const text = JSON.stringify(value);
  const read = readStudyFile(text, text.length);
  return read.kind === 'refused' ? read : { message: 'read', faults: [] };
}

describe('a study as a file', () => {
  it('when it is written and read, then it is the same study', () => {
    const text = studyFileText(study);
    expect(readStudyFile(text, text.length)).toEqual({ kind: 'study', document: study });
    expect(JSON.parse(text)).toMatchObject({ schemaVersion: 1 });
  });

  it('when it is no JSON, of no version, or of a newer one, then the message says so', () => {
    expect(readStudyFile('{"schemaVersion": 1, "ti', 24)).toMatchObject({
      kind: 'refused',
      message: expect.stringContaining('cannot be read as JSON'),
    });
    expect(told({ title: 'x' }).message).toContain('no schemaVersion 1');
    expect(told([]).message).toContain('no schemaVersion 1');
    expect(told({ ...study, schemaVersion: 2 }).message).toContain('newer form (2)');
  });

  it('when it is too large, then it is not read', () => {
    expect(readStudyFile('', MOST_BYTES + 1)).toMatchObject({
      kind: 'refused',
      message: expect.stringContaining('at most 3 MB'),
    });
  });

  it('when a note is none, then its place in the study is told as people count', () => {
    const [first, second] = study.chords;
    const bad = second && {
      ...second,
      voices: second.voices.map((voice, at) => (at === 1 ? { ...voice, pitch: 'H2' } : voice)),
    };
    const { faults } = told({ ...study, chords: [first, bad] });
    expect(faults).toHaveLength(1);
    expect(faults[0]).toMatch(/^chord 2, voice 2, pitch: /);
  });

  it('when there are many faults, then the first are told and the rest counted', () => {
    const chords = study.chords.map((chord) => ({
      ...chord,
      id: 'x',
      beats: -1,
      dynamic: 'loud',
      voices: 1,
    }));
    expect(told({ ...study, chords }).faults.at(-1)).toBe('and 3 more');
  });

  it('when it holds what no study has, then that is refused and never taken over', () => {
    expect(told({ ...study, script: '<script>' }).faults.join()).toContain('script');
  });
});

import { randomUUID } from 'node:crypto';
import { shelvedChordSchema, type ShelfVoicing } from '#shared/contracts/shelf';
import type { Study } from '#shared/contracts/studies';
import { studyDocumentSchema, type StudyDocument } from '#shared/study/study.document';
import type { Somebody } from './people';

/** A study of one open fifth a chord. */
export function documentOf(title: string, chordIds: readonly string[] = ['chord-1']): StudyDocument {
  return studyDocumentSchema.parse({
    schemaVersion: 1,
    title,
    key: { tonic: 'C', mode: 'major' },
    metre: { beats: 4, unit: 4 },
    tempoBpm: 60,
    a4Hz: 440,
    intonation: 'equal',
    ensemble: {
      players: { violin1: 14, violin2: 12, viola: 10, cello: 8, doubleBass: 6 },
      bass: 'four-string',
    },
    chords: chordIds.map((id) => ({
      id,
      voices: [
        { id: `${id}-low`, section: 'doubleBass', pitch: 'C2' },
        { id: `${id}-high`, section: 'cello', pitch: 'G2' },
      ],
    })),
  });
}

export async function makeStudy(owner: Somebody, document = documentOf('A study')): Promise<Study> {
  const answer = await owner.send('POST', '/api/studies', { document, requestKey: randomUUID() });
  if (answer.status !== 200) throw new Error(`no study was made: ${JSON.stringify(answer.body)}`);
  return answer.body;
}

export async function shareWith(owner: Somebody, studyId: string, email: string, may: 'view' | 'comment') {
  const answer = await owner.send('POST', `/api/studies/${studyId}/shares`, { email, may });
  if (answer.status !== 200) throw new Error(`the study was not shared: ${JSON.stringify(answer.body)}`);
  return answer.body;
}

/** What a page sends to save. */
export function saveOf(document: StudyDocument, basedOn: number, requestKey: string = randomUUID()) {
  return { document, basedOn, requestKey };
}

/** What is kept on the shelf: the first chord of {@link documentOf}, under its settings. */
export function voicingOf() {
  const { chords, key, a4Hz, intonation, ensemble } = documentOf('Any');
  return shelvedChordSchema.parse({ chord: chords[0], key, a4Hz, intonation, ensemble });
}

export async function keepOnShelf(owner: Somebody, name: string): Promise<ShelfVoicing> {
  const body = { name, voicing: voicingOf(), requestKey: randomUUID() };
  const answer = await owner.send('POST', '/api/shelf', body);
  if (answer.status !== 200) throw new Error(`the voicing was not kept: ${JSON.stringify(answer.body)}`);
  return answer.body;
}

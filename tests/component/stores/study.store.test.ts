import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import { nextTick } from 'vue';
import { saveStudy } from '#shared/contracts/studies';
import { emptyChord } from '#shared/study/new-study';
import { forgetCsrfToken } from '@/api/csrf';
import { forgetAllWork, readWork } from '@/stores/kept-work';
import { workStorage } from '@/stores/work-storage';
import { atTheDesk, ADA, documentOf, savedOf, staleOf, STUDY_ID, studyOf } from '../../support/open-study';
import { noAnswer, refusal, stubApi, type StubbedRequest } from '../../support/stubbed-api';

const READ = `GET /api/studies/${STUDY_ID}`;
const SAVE = `PUT /api/studies/${STUDY_ID}`;
const PAUSE_MS = 1500;
const FIRST_RETRY_MS = 2000;

const sentIn = (request: StubbedRequest) => saveStudy.body.parse(request.body);
/** Takes a save as the server does: under the next number. */
const take = (request: StubbedRequest) => {
  const { document, basedOn } = sentIn(request);
  return { body: savedOf(document, basedOn + 1) };
};
const reads = (number = 1) => ({ body: studyOf(documentOf('C3'), number) });
const kept = () => readWork(workStorage(), STUDY_ID, ADA.id);

async function opened(routes: Parameters<typeof stubApi>[0]) {
  const api = stubApi({ [READ]: () => reads(), ...routes });
  const desk = atTheDesk();
  await desk.study.open(STUDY_ID);
  const saves = () => api.sent(SAVE).map(sentIn);
  return { ...desk, saves };
}

beforeEach(() => {
  vi.useFakeTimers();
  localStorage.clear();
  forgetAllWork(workStorage());
  forgetCsrfToken();
});
afterEach(() => {
  vi.useRealTimers();
  vi.unstubAllGlobals();
});

describe('saving a study of one’s own', () => {
  it('when it is opened, then it lies on the bench and counts as saved', async () => {
    const { study, bench } = await opened({});
    expect([study.status, study.saveState, bench.study.chords[0]?.voices[0]?.pitch]).toEqual([
      'ready',
      'saved',
      'C3',
    ]);
  });

  it('when editing pauses, then it is saved by itself, on top of the number that it began from', async () => {
    const { study, put, saves } = await opened({ [SAVE]: take });
    put('D3');
    put('E3');
    expect(study.saveState).toBe('unsaved');
    expect(kept()?.document.chords[0]?.voices[0]?.pitch).toBe('E3');
    await vi.advanceTimersByTimeAsync(PAUSE_MS);
    expect(saves().map(({ basedOn, document }) => [basedOn, document.chords[0]?.voices[0]?.pitch])).toEqual([
      [1, 'E3'],
    ]);
    expect([study.saveState, study.study?.number, kept()]).toEqual(['saved', 2, null]);
  });

  it('when it is changed while a save is on its way, then the change follows under a key of its own', async () => {
    const desk = await opened({ [SAVE]: take });
    desk.put('D3');
    const saving = desk.study.save();
    desk.put('E3');
    await saving;
    const [first, second] = desk.saves();
    expect([first?.basedOn, second?.basedOn]).toEqual([1, 2]);
    expect(second?.document.chords[0]?.voices[0]?.pitch).toBe('E3');
    expect(second?.requestKey).not.toBe(first?.requestKey);
    expect(desk.study.saveState).toBe('saved');
  });

  it('when a chord is still empty, then nothing is sent, all is kept, and it says which chord waits', async () => {
    const { study, bench, saves } = await opened({ [SAVE]: take });
    bench.change({ ...bench.study, chords: [...bench.study.chords, emptyChord('chord-two')] });
    await study.save();
    expect(saves()).toEqual([]);
    expect(study.saveProblem).toMatch(/kept in this browser.*Chord 2/);
    expect(kept()?.document.chords).toHaveLength(2);
  });
});

describe('a save that does not get through', () => {
  it('when the connection is lost, then the work is kept and sent again under the same key', async () => {
    const { study, put, saves } = await opened({ [SAVE]: [noAnswer, take] });
    put('D3');
    await study.save();
    expect(study.saveState).toBe('offline');
    expect(kept()?.document.chords[0]?.voices[0]?.pitch).toBe('D3');
    await vi.advanceTimersByTimeAsync(FIRST_RETRY_MS);
    const [first, second] = saves();
    expect(second?.requestKey).toBe(first?.requestKey);
    expect([study.saveState, kept()]).toEqual(['saved', null]);
  });

  it('when the browser says that it is online again, then it is sent at once', async () => {
    const { study, put } = await opened({ [SAVE]: [noAnswer, take] });
    put('D3');
    await study.save();
    window.dispatchEvent(new Event('online'));
    await vi.waitFor(() => expect(study.saveState).toBe('saved'));
  });

  it('when work goes on meanwhile, then what was sent first is settled first and the rest follows', async () => {
    const { study, put, saves } = await opened({ [SAVE]: [noAnswer, take] });
    put('D3');
    await study.save();
    put('E3');
    await study.save();
    expect(saves().map(({ basedOn, document }) => [basedOn, document.chords[0]?.voices[0]?.pitch])).toEqual([
      [1, 'D3'],
      [1, 'D3'],
      [2, 'E3'],
    ]);
    expect(study.saveState).toBe('saved');
  });

  it('when the page is opened anew, then the kept work is on the bench and what was sent is settled', async () => {
    const before = await opened({ [SAVE]: noAnswer });
    before.put('D3');
    await before.study.save();
    before.put('E3');
    const [unanswered] = before.saves();

    const after = await opened({ [SAVE]: take });
    expect(after.bench.study.chords[0]?.voices[0]?.pitch).toBe('E3');
    expect(after.saves()[0]).toEqual(unanswered);
    expect(after.saves()[1]?.document.chords[0]?.voices[0]?.pitch).toBe('E3');
    expect([after.study.saveState, kept()]).toEqual(['saved', null]);
  });

  it('when somebody else signs in on the same browser, then they find nothing of it', async () => {
    const before = await opened({ [SAVE]: noAnswer });
    before.put('D3');
    await before.study.save();
    stubApi({ [READ]: () => reads() });
    const { bench, study } = atTheDesk({ ...ADA, id: 'account-bea' });
    await study.open(STUDY_ID);
    expect(bench.study.chords[0]?.voices[0]?.pitch).toBe('C3');
  });

  it('when somebody else signs in after a session has ended, then the desk is theirs and empty', async () => {
    const { study, bench, put } = await opened({ [SAVE]: () => refusal(401, 'session.required') });
    put('D3');
    await study.save();
    study.clearFor('account-bea');
    expect([study.study, bench.isEmpty, workStorage().getItem(`siltline.unsaved.${STUDY_ID}`)]).toEqual([
      null,
      true,
      null,
    ]);
  });

  it('when the session has ended, then it says so, keeps the work, and saves it after signing in again', async () => {
    const { study, session, put } = await opened({ [SAVE]: [() => refusal(401, 'session.required'), take] });
    put('D3');
    await study.save();
    expect([study.saveState, study.saveProblem]).toEqual(['failed', expect.stringMatching(/sign in again/)]);
    session.account = null;
    await nextTick();
    put('E3');
    expect(kept()?.document.chords[0]?.voices[0]?.pitch).toBe('E3');
    session.account = { ...ADA };
    await vi.waitFor(() => expect(study.saveState).toBe('saved'));
  });
});

describe('a save over somebody’s newer one', () => {
  async function met(routes: Parameters<typeof stubApi>[0] = {}) {
    const stale = () => refusal(409, 'study.stale', staleOf(documentOf('G3'), 5));
    const desk = await opened({ [SAVE]: [stale, take], ...routes });
    desk.put('D3');
    await desk.study.save();
    return desk;
  }

  it('when two saves meet, then both are there to choose from and mine is kept', async () => {
    const { study, bench } = await met();
    expect([study.saveState, study.conflict?.newest.number]).toEqual(['conflict', 5]);
    expect(bench.study.chords[0]?.voices[0]?.pitch).toBe('D3');
    expect(kept()?.document.chords[0]?.voices[0]?.pitch).toBe('D3');
  });

  it('when I go on with mine, then it is saved on top of the newest under a new key', async () => {
    const { study, saves } = await met();
    await study.keepMine();
    const [refused, again] = saves();
    expect([again?.basedOn, again?.document.chords[0]?.voices[0]?.pitch]).toEqual([5, 'D3']);
    expect(again?.requestKey).not.toBe(refused?.requestKey);
    expect([study.saveState, study.study?.number, study.conflict]).toEqual(['saved', 6, null]);
  });

  it('when I take theirs, then it is on the bench, saved, and nothing is sent', async () => {
    const { study, bench, saves } = await met();
    study.takeTheirs();
    expect(bench.study.chords[0]?.voices[0]?.pitch).toBe('G3');
    expect([study.saveState, study.study?.number, kept(), saves().length]).toEqual(['saved', 5, null, 1]);
  });

  it('when I keep mine as a new study, then that is made once, however often I ask', async () => {
    const keys: unknown[] = [];
    const create = (request: StubbedRequest) => {
      keys.push(saveStudy.body.pick({ requestKey: true }).strip().parse(request.body).requestKey);
      const document = { ...documentOf('D3'), title: 'Untitled study (mine)' };
      return { body: { ...studyOf(document), id: 'study-of-my-own-again' } };
    };
    const { study } = await met({ 'POST /api/studies': [(r) => (create(r), noAnswer(r)), create] });
    await expect(study.keepMineAsNew()).rejects.toThrow();
    expect(study.saveState).toBe('conflict');
    const created = await study.keepMineAsNew();
    expect(keys[1]).toBe(keys[0]);
    expect([created?.id, study.study?.id, study.saveState, kept()]).toEqual([
      'study-of-my-own-again',
      'study-of-my-own-again',
      'saved',
      null,
    ]);
  });
});

describe('a save that was merged with what others had saved', () => {
  const MERGED = {
    withNumber: 4,
    savedByNames: ['Bea'],
    chords: [{ change: 'added' as const, place: 2, name: null }],
    settings: [],
    reordered: false,
  };
  const theirs = documentOf('G2').chords.map((chord) => ({ ...chord, id: 'chord-two' }));
  /** As the server answers: what was sent, with the chord that somebody else had added. */
  const merge = (request: StubbedRequest) => {
    const { document } = sentIn(request);
    return { body: savedOf({ ...document, chords: [...document.chords, ...theirs] }, 5, MERGED) };
  };
  const pitches = (document: { chords: readonly { voices: readonly { pitch: string }[] }[] }) =>
    document.chords.map(({ voices }) => voices[0]?.pitch);

  it('when it is answered, then the bench has both, saved, and it is told', async () => {
    const { study, bench, put, saves } = await opened({ [SAVE]: [merge, take] });
    put('D3');
    await study.save();
    expect(pitches(bench.study)).toEqual(['D3', 'G2']);
    expect([study.saveState, study.study?.number, study.merged]).toEqual(['saved', 5, MERGED]);
    expect(saves()).toHaveLength(1);
  });

  it('when notes were put in meanwhile, then they stay, and are saved on top of the merged save', async () => {
    const { study, bench, put, saves } = await opened({ [SAVE]: [merge, take] });
    put('D3');
    const saving = study.save();
    put('E3');
    await saving;
    expect(pitches(bench.study)).toEqual(['E3', 'G2']);
    expect(saves().map(({ basedOn, document }) => [basedOn, pitches(document)])).toEqual([
      [1, ['D3']],
      [5, ['E3', 'G2']],
    ]);
  });

  it('when one’s change is undone, then the others’ stays', async () => {
    const { study, bench, put } = await opened({ [SAVE]: [merge, take] });
    put('D3');
    await study.save();
    bench.undo();
    expect(pitches(bench.study)).toEqual(['C3', 'G2']);
  });
});

describe('a study of somebody else', () => {
  it('when it is opened, then it cannot be changed and nothing is saved', async () => {
    const view = () => ({ body: studyOf(documentOf('C3'), 1, 'view') });
    const { study, bench, put, saves } = await opened({ [READ]: view, [SAVE]: take });
    put('D3');
    await vi.advanceTimersByTimeAsync(PAUSE_MS);
    expect([study.maySave, bench.readOnly, saves()]).toEqual([false, true, []]);
    expect([study.may('annotate'), study.may('share')]).toEqual([false, false]);
  });

  it('when it is not there, then it says so and the bench shows nothing of it', async () => {
    const { study } = await opened({ [READ]: () => refusal(404, 'study.unknown') });
    expect([study.status, study.problem, study.study]).toEqual(['error', 'told: study.unknown', null]);
  });
});

import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import { createStudy } from '#shared/contracts/studies';
import { emptyChord, newStudy } from '#shared/study/new-study';
import { forgetCsrfToken } from '@/api/csrf';
import { adoptDraft } from '@/stores/draft-adoption';
import { readDraft, writeDraft } from '@/stores/draft-storage';
import { rememberSignUp } from '@/stores/sign-up-memory';
import { ADA, atTheDesk, documentOf, studyOf } from '../../support/open-study';
import { noAnswer, stubApi, type StubbedRequest } from '../../support/stubbed-api';

const CREATE = 'POST /api/studies';
const sentIn = (request: StubbedRequest | undefined) => createStudy.body.parse(request?.body);
const create = (request: StubbedRequest) => ({ body: studyOf(sentIn(request).document) });
const notesKept = () => {
  const kept = readDraft(localStorage);
  return kept.kind === 'draft' ? kept.document.chords.flatMap(({ voices }) => voices).length : null;
};

beforeEach(() => {
  localStorage.clear();
  forgetCsrfToken();
  atTheDesk();
});
afterEach(() => vi.unstubAllGlobals());

describe('the draft at the first sign-in', () => {
  it('when somebody signed up here, then their draft becomes a study without its empty chords, and is cleared', async () => {
    const draft = documentOf('A2', 'E3');
    writeDraft(localStorage, { ...draft, chords: [...draft.chords, emptyChord('chord-two')] });
    rememberSignUp(localStorage, 'Ada@River.example');
    const api = stubApi({ [CREATE]: create });
    expect((await adoptDraft(ADA)).kind).toBe('adopted');
    expect(sentIn(api.sent(CREATE)[0]).document).toEqual(draft);
    expect(notesKept()).toBe(0);
  });

  it('when the answer is lost, then the draft stays, and the next try sends the same key', async () => {
    writeDraft(localStorage, documentOf('A2'));
    rememberSignUp(localStorage, ADA.email);
    const api = stubApi({ [CREATE]: [noAnswer, create] });
    expect((await adoptDraft(ADA)).kind).toBe('kept');
    expect(notesKept()).toBe(1);
    expect((await adoptDraft(ADA)).kind).toBe('adopted');
    const [first, second] = api.sent(CREATE).map(sentIn);
    expect(second?.requestKey).toBe(first?.requestKey);
  });

  it('when it has become a study, then signing in again makes no second one', async () => {
    writeDraft(localStorage, documentOf('A2'));
    rememberSignUp(localStorage, ADA.email);
    const api = stubApi({ [CREATE]: create });
    await adoptDraft(ADA);
    writeDraft(localStorage, documentOf('B2'));
    expect((await adoptDraft(ADA)).kind).toBe('none');
    expect(api.sent(CREATE)).toHaveLength(1);
  });

  it('when somebody signs in who did not sign up here, then the draft stays a draft', async () => {
    writeDraft(localStorage, documentOf('A2'));
    rememberSignUp(localStorage, 'bea@river.example');
    const api = stubApi({ [CREATE]: create });
    expect((await adoptDraft(ADA)).kind).toBe('none');
    expect([api.requests.length, notesKept()]).toEqual([0, 1]);
  });

  it('when the draft has no notes, then no study is made of it', async () => {
    writeDraft(localStorage, newStudy('chord-one'));
    rememberSignUp(localStorage, ADA.email);
    const api = stubApi({ [CREATE]: create });
    expect((await adoptDraft(ADA)).kind).toBe('none');
    expect(api.requests).toEqual([]);
  });
});

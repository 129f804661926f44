import { createPinia, setActivePinia } from 'pinia';
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import { forgetCsrfToken } from '@/api/csrf';
import { queryClient } from '@/plugins/query';
import { writeDraft } from '@/stores/draft-storage';
import { forgetAllWork, writeWork } from '@/stores/kept-work';
import { forgetPerson, unsavedWork } from '@/stores/leaving';
import { useSessionStore } from '@/stores/session.store';
import { rememberSignUp } from '@/stores/sign-up-memory';
import { workStorage } from '@/stores/work-storage';
import { ADA, atTheDesk, documentOf, STUDY_ID, studyOf } from '../../support/open-study';
import { noAnswer, stubApi } from '../../support/stubbed-api';

const nobody = () => ({ body: { account: null, demo: false } });
const done = () => ({ body: {} });

beforeEach(() => {
  localStorage.clear();
  forgetAllWork(workStorage());
  forgetCsrfToken();
});
afterEach(() => vi.unstubAllGlobals());

describe('leaving', () => {
  it('when somebody has left, then the next one finds nothing of theirs in the stores, the cache or the browser', async () => {
    stubApi({ [`GET /api/studies/${STUDY_ID}`]: () => ({ body: studyOf(documentOf('C3')) }) });
    const { study, bench, session } = atTheDesk();
    const work = { accountId: ADA.id, basedOn: 1, document: documentOf('D3'), pending: null };
    writeWork(workStorage(), 'study-of-another-day-12', work);
    writeDraft(localStorage, { ...documentOf('A2'), title: 'Ebb' });
    rememberSignUp(localStorage, ADA.email);
    queryClient.setQueryData(['studies'], ['theirs']);
    await study.open(STUDY_ID);
    forgetPerson();
    await workStorage().refresh();
    expect([session.account, study.study, bench.isEmpty]).toEqual([null, null, true]);
    expect(queryClient.getQueryData(['studies'])).toBeUndefined();
    expect(JSON.stringify({ ...localStorage })).not.toMatch(/river\.example|Ebb|D3|C3|A2/);
  });

  it('when work on other studies waits in this browser, then leaving names it, and nothing that is saved', async () => {
    stubApi({ [`GET /api/studies/${STUDY_ID}`]: () => ({ body: studyOf(documentOf('C3')) }) });
    const { study } = atTheDesk();
    await study.open(STUDY_ID);
    expect(unsavedWork()).toEqual([]);
    const document = { ...documentOf('D3'), title: 'Left on the train' };
    const work = { accountId: ADA.id, basedOn: 1, document, pending: null };
    writeWork(workStorage(), 'study-of-another-day-12', work);
    writeWork(workStorage(), 'study-of-somebody-else', { ...work, accountId: 'somebody-else-entirely' });
    expect(unsavedWork().map(({ title }) => title)).toEqual(['Left on the train']);
  });

  it('when the server is away, then one leaves all the same, and the session ends when it is back', async () => {
    const api = stubApi({ 'DELETE /api/session': [noAnswer, done], 'GET /api/session': nobody });
    const { session } = atTheDesk();
    await session.signOut();
    expect(session.account).toBeNull();

    setActivePinia(createPinia());
    await useSessionStore().load();
    expect(api.requests.map(({ method, path }) => `${method} ${path}`).slice(-2)).toEqual([
      'DELETE /api/session',
      'GET /api/session',
    ]);

    setActivePinia(createPinia());
    await useSessionStore().load();
    expect(api.sent('DELETE /api/session')).toHaveLength(2);
  });
});

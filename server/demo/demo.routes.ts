import { Router } from 'express';
import { listDemoPeople, listMails } from '#shared/contracts/demo';
import { listDemoMails } from '#server/demo/mails.repository';
import { DEMO_PEOPLE } from '#server/demo/people';
import type { Deps } from '#server/deps';
import { bind } from '#server/http/bind';

/** Mounted in the demonstration only: elsewhere these addresses name nothing. */
export function demoRoutes({ db }: Deps): Router {
  const router = Router();
  bind(router, listDemoPeople, async () => ({ people: [...DEMO_PEOPLE] }));
  bind(router, listMails, async () => ({ mails: await listDemoMails(db) }));
  return router;
}

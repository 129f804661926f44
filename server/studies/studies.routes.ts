import { Router } from 'express';
import {
  createStudy,
  deleteStudy,
  listStudies,
  readStudy,
  renameStudy,
  restoreStudy,
  saveStudy,
} from '#shared/contracts/studies';
import type { Deps } from '#server/deps';
import { bindFor } from '#server/http/bind';
import { rename, saveDocument } from '#server/studies/saving.service';
import { findStudy } from '#server/studies/studies.repository';
import { listPage, makeStudy, restore, trash } from '#server/studies/studies.service';

export function studyRoutes(deps: Deps): Router {
  const router = Router();

  bindFor(router, 'studies.receive', listStudies, ({ viewer, query }) => listPage(deps, viewer, query));

  bindFor(router, 'studies.own', createStudy, ({ viewer, body }) => makeStudy(deps, viewer, body));

  bindFor(router, 'studies.receive', readStudy, ({ viewer, params }) =>
    findStudy(deps.db, viewer, params.studyId),
  );

  bindFor(router, 'studies.own', saveStudy, ({ viewer, params, body }) =>
    saveDocument(deps, viewer, params.studyId, body),
  );

  bindFor(router, 'studies.own', renameStudy, ({ viewer, params, body }) =>
    rename(deps, viewer, params.studyId, body),
  );

  bindFor(router, 'studies.own', deleteStudy, async ({ viewer, params }) => {
    await trash(deps, viewer, params.studyId);
    return {};
  });

  bindFor(router, 'studies.own', restoreStudy, ({ viewer, params }) => restore(deps, viewer, params.studyId));

  return router;
}

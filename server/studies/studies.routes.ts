import { Router } from 'express';
import {
  createStudy,
  deleteStudy,
  duplicateStudy,
  listDeletedStudies,
  listStudies,
  readStudy,
  readStudyFilters,
  renameStudy,
  restoreStudy,
  saveStudy,
  setStudyTags,
} from '#shared/contracts/studies';
import type { Deps } from '#server/deps';
import { bindFor } from '#server/http/bind';
import { rename, saveDocument } from '#server/studies/saving.service';
import { findStudy } from '#server/studies/studies.repository';
import { duplicate, makeStudy, restore, trash } from '#server/studies/studies.service';
import { deletedPage, filtersFor, setTags, studiesPage } from '#server/studies/table.service';

export function studyRoutes(deps: Deps): Router {
  const router = Router();

  bindFor(router, 'studies.receive', listStudies, ({ viewer, query }) => studiesPage(deps, viewer, query));

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

  bindFor(router, 'studies.receive', readStudyFilters, ({ viewer }) => filtersFor(deps, viewer));

  bindFor(router, 'studies.receive', setStudyTags, ({ viewer, params, body }) =>
    setTags(deps, viewer, params.studyId, body.tags),
  );

  bindFor(router, 'studies.own', duplicateStudy, ({ viewer, params, body }) =>
    duplicate(deps, viewer, params.studyId, body.requestKey),
  );

  bindFor(router, 'studies.own', listDeletedStudies, ({ viewer, query }) => deletedPage(deps, viewer, query));

  return router;
}

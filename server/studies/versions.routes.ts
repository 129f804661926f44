import { Router } from 'express';
import { listVersions, nameVersion, readVersion } from '#shared/contracts/versions';
import type { Deps } from '#server/deps';
import { bindFor } from '#server/http/bind';
import { findVersionFor, renameVersion, versionsPage } from '#server/studies/versions.service';

export function versionRoutes(deps: Pick<Deps, 'db'>): Router {
  const router = Router();

  bindFor(router, 'studies.own', listVersions, ({ viewer, params, query }) =>
    versionsPage(deps, viewer, params.studyId, query),
  );

  bindFor(router, 'studies.own', readVersion, ({ viewer, params }) => findVersionFor(deps, viewer, params));

  bindFor(router, 'studies.own', nameVersion, ({ viewer, params, body }) =>
    renameVersion(deps, viewer, params, body),
  );

  return router;
}

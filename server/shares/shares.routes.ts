import { Router } from 'express';
import { createShare, deleteShare, listShares } from '#shared/contracts/shares';
import type { Deps } from '#server/deps';
import { bindFor } from '#server/http/bind';
import { findShares } from '#server/shares/shares.repository';
import { share, unshare } from '#server/shares/shares.service';
import { accessStudy } from '#server/studies/studies.access';

export function shareRoutes(deps: Deps): Router {
  const router = Router();

  bindFor(router, 'studies.own', listShares, async ({ viewer, params }) => {
    await accessStudy(deps.db, viewer, params.studyId, 'share');
    return { shares: await findShares(deps.db, viewer, params.studyId) };
  });

  bindFor(router, 'studies.own', createShare, ({ viewer, params, body }) =>
    share(deps, viewer, params.studyId, body),
  );

  bindFor(router, 'studies.own', deleteShare, async ({ viewer, params }) => {
    await unshare(deps, viewer, params.studyId, params.shareId);
    return {};
  });

  return router;
}

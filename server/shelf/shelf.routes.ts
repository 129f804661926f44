import { Router } from 'express';
import { deleteVoicing, keepVoicing, listShelf, renameVoicing } from '#shared/contracts/shelf';
import type { Deps } from '#server/deps';
import { bindFor } from '#server/http/bind';
import { keep, renameOnShelf, shelfPage, takeOff } from '#server/shelf/shelf.service';

export function shelfRoutes(deps: Pick<Deps, 'db' | 'clock'>): Router {
  const router = Router();

  bindFor(router, 'studies.own', listShelf, ({ viewer, query }) => shelfPage(deps, viewer, query));

  bindFor(router, 'studies.own', keepVoicing, ({ viewer, body }) => keep(deps, viewer, body));

  bindFor(router, 'studies.own', renameVoicing, ({ viewer, params, body }) =>
    renameOnShelf(deps, viewer, params.voicingId, body.name),
  );

  bindFor(router, 'studies.own', deleteVoicing, async ({ viewer, params }) => {
    await takeOff(deps, viewer, params.voicingId);
    return {};
  });

  return router;
}

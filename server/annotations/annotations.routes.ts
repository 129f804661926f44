import { Router } from 'express';
import { createAnnotation, deleteAnnotation, listAnnotations } from '#shared/contracts/annotations';
import { annotate, readAnnotations, takeAway } from '#server/annotations/annotations.service';
import type { Deps } from '#server/deps';
import { bindFor } from '#server/http/bind';

export function annotationRoutes(deps: Deps): Router {
  const router = Router();

  bindFor(router, 'studies.receive', listAnnotations, async ({ viewer, params }) => ({
    annotations: await readAnnotations(deps, viewer, params.studyId),
  }));

  bindFor(router, 'studies.receive', createAnnotation, ({ viewer, params, body }) =>
    annotate(deps, viewer, params.studyId, body),
  );

  bindFor(router, 'studies.receive', deleteAnnotation, async ({ viewer, params }) => {
    await takeAway(deps, viewer, params.studyId, params.annotationId);
    return {};
  });

  return router;
}

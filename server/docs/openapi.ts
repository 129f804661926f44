import { createDocument, type oas31, type ZodOpenApiOperationObject } from 'zod-openapi';
import { createAnalysis } from '#shared/contracts/analysis';
import { errorBodySchema } from '#shared/contracts/errors';
import { measureLimits, measureRoughness } from '#shared/contracts/measures';
import type { Examples } from '#server/docs/examples';
import { SCRIPT_CALLS_PER_ADDRESS } from '#server/limits/limits.rules';

/** The three routes in the order in which they are read about. */
export const DOCUMENTED = [
  {
    name: 'analysis',
    endpoint: createAnalysis,
    title: 'Analyse a chord',
    about:
      'One chord of one to forty voices, judged as the bench judges it: muddiness by register, published roughness models, low interval limits, density, balance, character, what is behind the figures, and every partial.',
  },
  {
    name: 'roughness',
    endpoint: measureRoughness,
    title: 'Measure roughness by a published model',
    about:
      'Harmonic tones with amplitudes 1/n in equal temperament on 440 Hz, coinciding partials joined: the sounds that the published tables were computed from.',
  },
  {
    name: 'limits',
    endpoint: measureLimits,
    title: 'Low interval limits of two sections',
    about:
      'The lowest lower note of each interval, as the published chart has it and as the model derives it for these players, their technique and dynamic.',
  },
] as const;

const JSON_TYPE = 'application/json';
/** What a caller may be told besides an answer. */
export const ERRORS = {
  '415': 'What was sent is not application/json in UTF-8.',
  '422': 'Some of what was sent cannot be taken; details lists every fault with its path.',
  '429': `More than ${SCRIPT_CALLS_PER_ADDRESS.free} calls in a minute from one address; Retry-After says how long to wait.`,
  '503': 'Too much is being computed, or the database is away; Retry-After says when to ask again.',
} as const;

type Documented = (typeof DOCUMENTED)[number];

function errorResponse(description: string) {
  return { description, content: { [JSON_TYPE]: { schema: errorBodySchema } } };
}

function operationOf(
  { name, endpoint, title, about }: Documented,
  examples: Examples,
): ZodOpenApiOperationObject {
  const { request, answer } = examples[name];
  return {
    operationId: name,
    summary: title,
    description: about,
    security: [],
    requestBody: { required: true, content: { [JSON_TYPE]: { schema: endpoint.body, example: request } } },
    responses: {
      '200': {
        description: 'The figures. In the example, lists longer than eight are cut to their first three.',
        content: { [JSON_TYPE]: { schema: endpoint.response, example: answer } },
      },
      '415': errorResponse(ERRORS['415']),
      '422': errorResponse(ERRORS['422']),
      '429': errorResponse(ERRORS['429']),
      '503': errorResponse(ERRORS['503']),
    },
  };
}

/** The contracts of what scripts and lessons may call, as an OpenAPI document. */
export function openApiDocument(examples: Examples, version: string, publicUrl: string): oas31.OpenAPIObject {
  return createDocument({
    openapi: '3.1.0',
    info: {
      title: 'Siltline for scripts and lessons',
      version,
      description: `What Siltline computes, without an account and without a cookie; nothing is kept. At most ${SCRIPT_CALLS_PER_ADDRESS.free} calls a minute from one address.`,
    },
    servers: [{ url: publicUrl }],
    paths: Object.fromEntries(
      DOCUMENTED.map((documented) => [documented.endpoint.path, { post: operationOf(documented, examples) }]),
    ),
  });
}

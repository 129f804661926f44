import type { RequestHandler, Request, Response, Router } from 'express';
import type { z } from 'zod';
import type { Role } from '#shared/contracts/accounts';
import type { BodyOf, Endpoint, ParamsOf, QueryOf, ResponseOf } from '#shared/contracts/endpoint';
import { roleMay, type RoleAction } from '#shared/contracts/permissions';
import { inputFaults } from '#server/http/input-faults';
import { jsonBody } from '#server/http/json-body';
import { invalidInput, notAllowed, nothingHere, signInNeeded } from '#server/http/request-error';

/** Who is signed in, as the database has them now. */
export interface Viewer {
  readonly id: string;
  readonly email: string;
  readonly name: string;
  readonly role: Role;
}

declare module 'express-serve-static-core' {
  interface Request {
    /** Set after the session is loaded; null for a visitor. */
    viewer?: Viewer | null;
  }
}

export interface Context<E extends Endpoint> {
  readonly params: ParamsOf<E>;
  readonly query: QueryOf<E>;
  readonly body: BodyOf<E>;
  readonly req: Request;
  readonly res: Response;
}

type Handler<E extends Endpoint> = (context: Context<E>) => Promise<ResponseOf<E>>;
type ViewerHandler<E extends Endpoint> = (
  context: Context<E> & { readonly viewer: Viewer },
) => Promise<ResponseOf<E>>;

function parsePart(schema: z.ZodType | undefined, value: unknown, name: string): unknown {
  if (schema === undefined) return undefined;
  const parsed = schema.safeParse(value);
  if (!parsed.success) throw invalidInput(inputFaults(parsed.error, name));
  return parsed.data;
}

/** An address that cannot name anything names nothing: 404, like one that names nothing yet. */
function parseParams(endpoint: Endpoint, params: unknown): unknown {
  if (endpoint.params === undefined) return undefined;
  const parsed = endpoint.params.safeParse(params);
  if (!parsed.success) throw nothingHere();
  return parsed.data;
}

function readContext<E extends Endpoint>(endpoint: E, req: Request, res: Response): Context<E> {
  const params = parseParams(endpoint, req.params);
  const query = parsePart(endpoint.query, req.query, 'query');
  const body = parsePart(endpoint.body, req.body, 'body');
  // The one cast of the binding: each part was just parsed by the schema that its type is inferred from.
  return { params, query, body, req, res } as Context<E>;
}

const VERBS = { GET: 'get', POST: 'post', PUT: 'put', PATCH: 'patch', DELETE: 'delete' } as const;

function register(router: Router, endpoint: Endpoint, handlers: readonly RequestHandler[]): void {
  router.route(endpoint.path)[VERBS[endpoint.method]](...handlers);
}

function bodyReaders(endpoint: Endpoint): readonly RequestHandler[] {
  return endpoint.body === undefined ? [] : jsonBody;
}

function answer(endpoint: Endpoint, res: Response, result: unknown): void {
  // Parsed on the way out too: a column that the contract does not name cannot leave.
  res.json(endpoint.response === undefined ? {} : endpoint.response.parse(result));
}

/** Serves an endpoint to everybody. */
export function bind<E extends Endpoint>(router: Router, endpoint: E, handle: Handler<E>): void {
  register(router, endpoint, [
    ...bodyReaders(endpoint),
    async (req, res) => answer(endpoint, res, await handle(readContext(endpoint, req, res))),
  ]);
}

function requireViewer(req: Request, action: RoleAction): Viewer {
  const viewer = req.viewer ?? null;
  if (viewer === null) throw signInNeeded();
  if (!roleMay(viewer.role, action)) throw notAllowed();
  return viewer;
}

function refuseOthers(action: RoleAction): RequestHandler {
  return (req, _res, next) => {
    requireViewer(req, action);
    next();
  };
}

/** Serves an endpoint to those whose role may do `action`; the others are refused before their input is read. */
export function bindFor<E extends Endpoint>(
  router: Router,
  action: RoleAction,
  endpoint: E,
  handle: ViewerHandler<E>,
): void {
  register(router, endpoint, [
    refuseOthers(action),
    ...bodyReaders(endpoint),
    async (req, res) => {
      const viewer = requireViewer(req, action);
      answer(endpoint, res, await handle({ ...readContext(endpoint, req, res), viewer }));
    },
  ]);
}

import type { z } from 'zod';

type Method = 'GET' | 'POST' | 'PUT' | 'PATCH' | 'DELETE';

/** One route of the wire format: the server parses in and out by it, the client calls by it. */
export interface Endpoint<
  Params extends z.ZodType = z.ZodType,
  Query extends z.ZodType = z.ZodType,
  Body extends z.ZodType = z.ZodType,
  Response extends z.ZodType = z.ZodType,
> {
  readonly method: Method;
  /** With `:name` for each parameter, below the root: `/api/studies/:studyId`. */
  readonly path: string;
  readonly params?: Params;
  readonly query?: Query;
  readonly body?: Body;
  readonly response?: Response;
}

export type ParamsOf<E> = E extends { params: infer S extends z.ZodType } ? z.infer<S> : undefined;
export type QueryOf<E> = E extends { query: infer S extends z.ZodType } ? z.infer<S> : undefined;
export type BodyOf<E> = E extends { body: infer S extends z.ZodType } ? z.infer<S> : undefined;
/** What a caller may send: defaults may be left out. */
export type BodyInputOf<E> = E extends { body: infer S extends z.ZodType } ? z.input<S> : undefined;
export type QueryInputOf<E> = E extends { query: infer S extends z.ZodType } ? z.input<S> : undefined;
export type ResponseOf<E> = E extends { response: infer S extends z.ZodType } ? z.infer<S> : undefined;

/** Keeps the literal types of an endpoint's definition. */
export function defineEndpoint<const E extends Endpoint>(endpoint: E): E {
  return endpoint;
}

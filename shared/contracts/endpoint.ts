import type * as z from 'zod';
import type { Role } from '#shared/domain/vocabulary';

/** Who may make a call. `public` needs no token; otherwise a person of one of the roles, or a push key of the branch named in the path. */
export type Access = 'public' | { readonly roles: readonly Role[]; readonly pushKey: boolean };

/**
 * What an answer may depend on.
 * - `branches`: rows of the branches in the caller's scope.
 * - `network-reference`: those, and pre-aggregated network figures with at least five other branches behind them (rule 21).
 * - `none`: no row of any branch.
 */
export type EndpointScope = 'branches' | 'network-reference' | 'none';

/** What leaves: a JSON schema, a streamed CSV, a page of HTML, an image, a PDF, server-sent events, or nothing (204). */
export type Output = z.ZodType | 'csv' | 'html' | 'image' | 'pdf' | 'events' | 'nothing';

/** A body that is no JSON: the bytes of a JPEG or PNG, or a form with one file in its part `file`. */
export type Upload = 'image' | 'file';

/** What comes in: a JSON schema, an upload, or `null` for nothing. */
export type Input = z.ZodType | Upload | null;

/** One call of the API as both sides see it. Every field is required: leaving one out does not compile. */
export interface Endpoint<
  Params extends z.ZodObject = z.ZodObject,
  Query extends z.ZodObject = z.ZodObject,
  Body extends Input = Input,
  Out extends Output = Output,
> {
  readonly method: 'get' | 'put' | 'post' | 'delete';
  /** Path with `:names`, beginning with `/api`. */
  readonly path: `/api/${string}`;
  readonly topic: string;
  readonly summary: string;
  readonly access: Access;
  readonly scope: EndpointScope;
  readonly params: Params;
  readonly query: Query;
  /** `null`: the call takes no body. */
  readonly body: Body;
  readonly out: Out;
  /** Status codes of success, the usual one first. */
  readonly statuses: readonly number[];
}

/** Declares a call; the identity function that keeps its types. */
export function defineEndpoint<
  Params extends z.ZodObject,
  Query extends z.ZodObject,
  Body extends Input,
  Out extends Output,
>(endpoint: Endpoint<Params, Query, Body, Out>): Endpoint<Params, Query, Body, Out> {
  return endpoint;
}

/** What the call answers, as parsed JSON. */
export type OutOf<E extends Endpoint> = E['out'] extends z.ZodType
  ? z.output<E['out']>
  : E['out'] extends 'nothing'
    ? undefined
    : E['out'] extends 'image' | 'pdf'
      ? Blob
      : string;

export type ParamsOf<E extends Endpoint> = z.output<E['params']>;
export type QueryOf<E extends Endpoint> = z.output<E['query']>;

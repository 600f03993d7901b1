import type { Request, Response, Router } from 'express';
import type * as z from 'zod';
import type { Endpoint, Input, Output } from '#shared/contracts/endpoint';
import type { FieldProblem } from '#shared/contracts/fields';
import { notFound, Refusal, refuseInput } from '#shared/domain/refusal';
import { Scope, type ScopedBranch } from '#db/scope';
import type { Authenticate, Caller } from '../auth/caller';
import { readBody } from './read-body';
import { dropReceived, readUpload, type ReceivedFile, type ReceivedImage } from './read-upload';
import { joined, problemsOf } from '#shared/contracts/read-problems';

/** Everything a handler is given; it never sees the request. */
export interface Call<Params = unknown, Query = unknown, Body = unknown> {
  params: Params;
  query: Query;
  body: Body;
  /** Present unless the call is public. */
  caller: Caller | undefined;
  /** What the caller may see; empty for a public call. */
  scope: Scope;
  /** The branch named in the path, when the path names one. */
  branch: ScopedBranch | undefined;
  ifMatch: string | undefined;
  ifNoneMatch: string | undefined;
  cookie: string | undefined;
  address: string;
  device: string;
}

/** What a handler gives back. `stream` writes an answer of its own and settles when it is done. */
export interface Reply<Out> {
  status?: number;
  body?: Out;
  headers?: Record<string, string>;
  stream?: (response: Response) => Promise<void>;
}

type Parsed<T> = T extends z.ZodType
  ? z.output<T>
  : T extends 'image'
    ? ReceivedImage
    : T extends 'file'
      ? ReceivedFile
      : undefined;
type Answer<O extends Output> = O extends z.ZodType
  ? z.input<O>
  : O extends 'nothing'
    ? undefined
    : O extends 'image' | 'pdf'
      ? Buffer
      : string;

export type Handler<
  P extends z.ZodObject,
  Q extends z.ZodObject,
  B extends Input,
  O extends Output,
> = (
  call: Call<z.output<P>, z.output<Q>, Parsed<B>>,
) => Promise<Reply<Answer<O>>> | Reply<Answer<O>>;

/** What is known of a call before its body is read; `params` only where they have the right shape. */
type Named<P extends z.ZodObject> = Pick<Call, 'caller' | 'scope' | 'branch'> & {
  params: z.output<P> | undefined;
};

/** What of a call is judged beyond its shape. */
export interface Judging<P extends z.ZodObject> {
  /** Whether what the path names is there; judged before the body is read (rule 82). Not asked of a path of the wrong shape. */
  exists?: (call: Named<P> & { params: z.output<P> }) => boolean;
  /** Refuses what the caller may not even ask, before anything of it is read as right or wrong (rules 24 and 82). */
  mayAsk?: (query: Readonly<Record<string, unknown>>, caller: Caller | undefined) => void;
  /** Rules over the raw body that are told together with the problems of shape (rule 57). */
  rules?: (raw: unknown, call: Named<P>) => readonly FieldProblem[];
}

export interface Mounting {
  router: Router;
  authenticate: Authenticate;
  /** All branches there are, to make a scope from a grant. */
  branches: () => readonly ScopedBranch[];
  /** Folder into which uploaded files are received. */
  incoming: string;
  /** Whether the catalogue has a package of this code. */
  hasPackage: (code: string) => boolean;
  /** Every contract mounted, for the tests that walk them. */
  mounted: Endpoint[];
}

/**
 * The only way to register a route: authenticates, checks the role, makes the scope, resolves a branch named in the path,
 * reads and parses the input, calls, and parses the output. The order of refusals is 401, 403, 404, 415, 413, 400, 422 (rule 82).
 */
export function mount<
  P extends z.ZodObject,
  Q extends z.ZodObject,
  B extends Input,
  O extends Output,
>(
  mounting: Mounting,
  endpoint: Endpoint<P, Q, B, O>,
  handler: Handler<P, Q, B, O>,
  { exists, mayAsk, rules }: Judging<P> = {},
): void {
  mounting.mounted.push(endpoint);
  mounting.router[endpoint.method](endpoint.path, async (request: Request, response: Response) => {
    const caller = endpoint.access === 'public' ? undefined : await mounting.authenticate(request);
    if (caller) checkAccess(endpoint, caller);
    mayAsk?.(request.query, caller);
    const scope = caller ? scopeOf(caller, mounting.branches()) : Scope.nothing;
    const code = request.params['branch'];
    const branch = typeof code === 'string' ? scope.branch(code) : undefined;
    if (code !== undefined && !branch) throw notFound();
    const params = endpoint.params.safeParse(request.params);
    const named = { caller, scope, branch, params: params.data };
    if (exists && params.success && !exists({ ...named, params: params.data })) throw notFound();
    const raw = await readInput(endpoint, request, response, mounting.incoming);
    const broken = [
      ...unknownPackages(endpoint.query, request, mounting.hasPackage),
      ...(rules?.(raw, named) ?? []),
    ];
    const input = await orDropped(raw, () => parseInput(endpoint, params, request, raw, broken));
    const reply = await handler({
      ...input,
      caller,
      scope,
      branch,
      ifMatch: header(request, 'if-match'),
      ifNoneMatch: header(request, 'if-none-match'),
      cookie: header(request, 'cookie'),
      address: request.ip ?? 'unknown',
      device: (header(request, 'user-agent') ?? '').slice(0, 200),
    });
    await send(endpoint.out, endpoint.statuses[0] ?? 200, reply, response);
  });
}

/** The branch named in the path; `mount` has refused the call already when it is out of scope. */
export function namedBranch(call: Pick<Call, 'branch'>): ScopedBranch {
  if (!call.branch) throw notFound();
  return call.branch;
}

/** What was sent: the JSON of a body, or an upload; nothing of a call that takes none. */
function readInput(
  { body, path }: Endpoint,
  request: Request,
  response: Response,
  incoming: string,
): Promise<unknown> {
  if (body === null) return Promise.resolve(undefined);
  if (typeof body === 'string') return readUpload(body, request, response, incoming);
  return readBody(request, response, path.endsWith('/batch') ? 'batch' : 'single');
}

/** Parses; a file that was received with a call that is refused is not left lying. */
async function orDropped<T>(raw: unknown, parse: () => T): Promise<T> {
  try {
    return parse();
  } catch (error) {
    await dropReceived(raw);
    throw error;
  }
}

function checkAccess(endpoint: Endpoint, caller: Caller): void {
  if (endpoint.access === 'public') return;
  const allowed =
    caller.kind === 'key' ? endpoint.access.pushKey : endpoint.access.roles.includes(caller.role);
  if (!allowed) {
    throw new Refusal(
      'forbidden',
      caller.kind === 'key'
        ? 'A push key may only send jobs, claims and bookings of its branch.'
        : 'Your role does not have this call.',
    );
  }
}

function scopeOf(caller: Caller, branches: readonly ScopedBranch[]): Scope {
  return caller.kind === 'key'
    ? Scope.ofPushKey(branches, caller.branchId)
    : Scope.ofGrant(branches, caller);
}

function parseInput<P extends z.ZodObject, Q extends z.ZodObject, B extends Input>(
  endpoint: { query: Q; body: B },
  params: z.ZodSafeParseResult<z.output<P>>,
  request: Request,
  raw: unknown,
  broken: readonly FieldProblem[],
): { params: z.output<P>; query: z.output<Q>; body: Parsed<B> } {
  const query = endpoint.query.safeParse(request.query);
  const schema: z.ZodType | null = typeof endpoint.body === 'string' ? null : endpoint.body;
  const body = schema?.safeParse(raw);
  const problems = joined(
    params.success ? [] : problemsOf(params.error),
    query.success ? [] : queryProblems(query.error),
    !body || body.success ? [] : problemsOf(body.error),
    broken,
  );
  if (!params.success || !query.success || (body && !body.success) || problems.length > 0) {
    throw refuseInput(problems);
  }
  return { params: params.data, query: query.data, body: (schema ? body?.data : raw) as Parsed<B> };
}

/** Packages asked for that the catalogue does not have: told with every other problem (rules 57 and 60). */
function unknownPackages(
  query: z.ZodObject,
  request: Request,
  hasPackage: Mounting['hasPackage'],
): FieldProblem[] {
  if (!('package' in query.shape)) return [];
  const asked = [request.query['package']].flat();
  return asked.some((code) => typeof code === 'string' && !hasPackage(code))
    ? [{ path: '/query/package', message: 'no package has this code' }]
    : [];
}

/** Problems of a query at the name of its parameter, whichever of several values is wrong (rule 60). */
function queryProblems(error: z.core.$ZodError): FieldProblem[] {
  return joined(
    problemsOf(error, '/query').map(({ path, message }) => ({
      path: path.split('/').slice(0, 3).join('/'),
      message,
    })),
  );
}

async function send(
  out: Output,
  usual: number,
  reply: Reply<unknown>,
  response: Response,
): Promise<void> {
  response.set('Cache-Control', 'no-store');
  if (reply.headers) response.set(reply.headers);
  if (reply.stream) {
    await reply.stream(response);
    return;
  }
  response.status(reply.status ?? usual);
  if (typeof out === 'object') sendJson(response, out.parse(reply.body));
  else if (out === 'nothing') response.end();
  else if (out === 'image') response.type('image/jpeg').end(reply.body);
  else if (out === 'pdf') response.type('application/pdf').end(reply.body);
  else response.type(out).send(reply.body);
}

/**
 * Sends the answer as it is. Express would hash it into a tag and, where the caller names that of a job, answer "unchanged"
 * though its figures have been restated since: a tag here is for writes (rule 73).
 */
function sendJson(response: Response, body: unknown): void {
  response.type('application/json').end(JSON.stringify(body));
}

function header(request: Request, name: string): string | undefined {
  const value = request.headers[name];
  return Array.isArray(value) ? value.join(', ') : value;
}

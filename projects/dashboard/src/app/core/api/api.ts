import {
  HttpClient,
  HttpContext,
  HttpErrorResponse,
  type HttpEvent,
  HttpEventType,
  type HttpResponse,
} from '@angular/common/http';
import { inject, Injectable } from '@angular/core';
import {
  catchError,
  exhaustMap,
  filter,
  from,
  map,
  type Observable,
  switchMap,
  takeWhile,
  throwError,
  timer,
} from 'rxjs';
import type * as z from 'zod';
import type { Endpoint, OutOf, ParamsOf, QueryOf } from '#shared/contracts/endpoint';
import { NEEDS_TOKEN } from './needs-token';
import { readingOf, type Reading } from './reading';
import { requestUrl } from './request-url';

type Needed<Name extends string, Value> =
  Record<string, never> extends Value
    ? { readonly [K in Name]?: Value }
    : { readonly [K in Name]: Value };
type BodyInput<E extends Endpoint> = E['body'] extends z.ZodType
  ? { readonly body: z.input<E['body']> }
  : E['body'] extends 'image'
    ? { readonly body: Blob }
    : E['body'] extends 'file'
      ? { readonly body: FormData }
      : { readonly body?: undefined };

/** What a call is made with, as its contract asks. */
export type RequestOf<E extends Endpoint> = Needed<'params', ParamsOf<E>> &
  BodyInput<E> & {
    readonly query?: Partial<QueryOf<E>>;
    /** For example `{ 'If-Match': etag }`. */
    readonly headers?: Readonly<Record<string, string>>;
  };

/** What came back. */
export interface Answer<T> {
  readonly body: T;
  readonly etag: string | undefined;
  readonly status: number;
}

/** A file on its way: how much has come, then the file. */
export type Download =
  | { readonly kind: 'coming'; readonly bytes: number }
  | { readonly kind: 'whole'; readonly file: Blob };

/** A file or photo on its way there: how much of it has gone, then what came back. */
export type Upload<T> =
  | { readonly kind: 'going'; readonly bytes: number; readonly of: number | undefined }
  | { readonly kind: 'answered'; readonly answer: Answer<T> };

/** The one way from a page to the server: a contract in, its typed answer out. */
@Injectable({ providedIn: 'root' })
export class Api {
  private readonly http = inject(HttpClient);

  /** Makes the call on subscription; errors are `HttpErrorResponse`, see `describeProblem`. */
  call<E extends Endpoint>(endpoint: E, request: RequestOf<E>): Observable<Answer<OutOf<E>>> {
    const { params, query, body, headers } = request as LooseRequest;
    return this.http
      .request(endpoint.method, requestUrl(endpoint.path, params, query), {
        body,
        headers,
        context: new HttpContext().set(NEEDS_TOKEN, endpoint.access !== 'public'),
        observe: 'response',
        responseType: endpoint.out === 'csv' || endpoint.out === 'html' ? 'text' : 'json',
      } as { observe: 'response'; responseType: 'json' })
      .pipe(map((response) => answerOf<E>(response)));
  }

  /** Sends a file or photo and tells how much of it has gone, then the answer; unsubscribing cancels it. */
  upload<E extends Endpoint>(endpoint: E, request: RequestOf<E>): Observable<Upload<OutOf<E>>> {
    const { params, query, body, headers } = request as LooseRequest;
    return this.http
      .request(endpoint.method, requestUrl(endpoint.path, params, query), {
        body,
        headers,
        context: new HttpContext().set(NEEDS_TOKEN, endpoint.access !== 'public'),
        observe: 'events',
        reportProgress: true,
        responseType: 'json',
      })
      .pipe(
        map((event) => uploadOf<E>(event)),
        filter((step) => step !== undefined),
      );
  }

  /** Fetches a file with the token, which a plain link could not carry; unsubscribing cancels it. */
  download<E extends Endpoint>(endpoint: E, request: RequestOf<E>): Observable<Download> {
    const { params, query, headers } = request as LooseRequest;
    return this.http
      .request(endpoint.method, requestUrl(endpoint.path, params, query), {
        headers,
        context: new HttpContext().set(NEEDS_TOKEN, endpoint.access !== 'public'),
        observe: 'events',
        reportProgress: true,
        responseType: 'blob',
      })
      .pipe(
        catchError((error: unknown) =>
          from(withReadableBody(error)).pipe(switchMap((readable) => throwError(() => readable))),
        ),
        map(downloadOf),
        filter((step) => step !== undefined),
      );
  }

  /**
   * Keeps a call answered for as long as the page lives: made again whenever `request` changes, not made while it is
   * `undefined`. Call it in an injection context.
   */
  read<E extends Endpoint>(
    endpoint: E,
    request: () => RequestOf<E> | undefined,
  ): Reading<OutOf<E>> {
    return readingOf(request, (asked) => this.call(endpoint, asked));
  }

  /** As `read`, but asked again every so many milliseconds while `goesOn` says so of the last answer: work under way on the server. */
  follow<E extends Endpoint>(
    endpoint: E,
    request: () => RequestOf<E> | undefined,
    { every, goesOn }: { readonly every: number; readonly goesOn: (body: OutOf<E>) => boolean },
  ): Reading<OutOf<E>> {
    return readingOf(request, (asked) =>
      timer(0, every).pipe(
        exhaustMap(() => this.call(endpoint, asked)),
        takeWhile((answer) => goesOn(answer.body), true),
      ),
    );
  }
}

interface LooseRequest {
  readonly params?: Readonly<Record<string, unknown>>;
  readonly query?: Readonly<Record<string, unknown>>;
  readonly body?: unknown;
  readonly headers?: Record<string, string>;
}

function answerOf<E extends Endpoint>(response: HttpResponse<unknown>): Answer<OutOf<E>> {
  return {
    body: (response.body ?? undefined) as OutOf<E>,
    etag: response.headers.get('ETag') ?? undefined,
    status: response.status,
  };
}

function uploadOf<E extends Endpoint>(event: HttpEvent<unknown>): Upload<OutOf<E>> | undefined {
  if (event.type === HttpEventType.UploadProgress) {
    return { kind: 'going', bytes: event.loaded, of: event.total };
  }
  if (event.type !== HttpEventType.Response) return undefined;
  return { kind: 'answered', answer: answerOf<E>(event) };
}

function downloadOf(event: HttpEvent<Blob>): Download | undefined {
  if (event.type === HttpEventType.DownloadProgress) return { kind: 'coming', bytes: event.loaded };
  if (event.type !== HttpEventType.Response) return undefined;
  return { kind: 'whole', file: event.body ?? new Blob([]) };
}

/** A refused download carries its problem document as a file; turned back into text, so that it can be told. */
async function withReadableBody(error: unknown): Promise<unknown> {
  if (!(error instanceof HttpErrorResponse) || !(error.error instanceof Blob)) return error;
  const { status, headers } = error;
  return new HttpErrorResponse({ status, headers, error: await error.error.text() });
}

import {
  HttpErrorResponse,
  type HttpEvent,
  type HttpInterceptorFn,
  type HttpRequest,
  HttpResponse,
} from '@angular/common/http';
import { defer, delay, type Observable, of, throwError } from 'rxjs';
import { tagOf } from '#shared/domain/preconditions';

/** How the line treats the next calls: brings both ways, loses the request, loses the answer, or the server refuses. */
export type LineTo =
  'up' | 'down' | 'answer lost' | { readonly status: number; readonly body?: object };

interface Held {
  revision: number;
  body: unknown;
}

/** The server's side of sending jobs, with its preconditions, behind a line that can be made as bad as one likes. */
export class JobServer {
  readonly jobs = new Map<string, Held>();
  readonly photos = new Map<string, unknown>();
  /** Every call that reached the server, as `PUT /path`, in order; with its body. */
  readonly heard: { readonly call: string; readonly body: string }[] = [];
  line: LineTo = 'up';

  readonly interceptor: HttpInterceptorFn = (request) =>
    defer(() => this.answer(request)).pipe(delay(0));

  private answer(request: HttpRequest<unknown>): Observable<HttpEvent<unknown>> {
    if (this.line === 'down') return noAnswer();
    const path = request.url.split('?')[0] ?? '';
    const call = `${request.method.toUpperCase()} ${path}`;
    this.heard.push({ call, body: JSON.stringify(request.body) });
    if (typeof this.line === 'object') return refusal(this.line.status, this.line.body);
    const answered = this.take(request, path.split('/').slice(3).map(decodeURIComponent));
    return this.line === 'answer lost' ? noAnswer() : answered;
  }

  private take(
    request: HttpRequest<unknown>,
    [branch, what, jobRef, photos, photo]: readonly string[],
  ): Observable<HttpEvent<unknown>> {
    const key = what === 'claims' ? `claim ${branch}/${jobRef}` : `${branch}/${jobRef}`;
    const held = this.jobs.get(key);
    if (what !== 'jobs' && what !== 'claims')
      return of(new HttpResponse({ status: 200, body: { status: 'ok' } }));
    if (photos !== undefined && photo !== undefined) {
      if (!held) return refusal(404);
      this.photos.set(photo, request.body);
      return of(new HttpResponse({ status: 201, body: {} }));
    }
    if (request.method.toUpperCase() === 'GET') return held ? sheet(held) : refusal(404);
    const ifMatch = request.headers.get('If-Match');
    const seen = ifMatch === null ? held === undefined : held && tagOf(held.revision) === ifMatch;
    if (!seen) return refusal(412, { detail: 'There already is one: revision 1 by Ilse Torven.' });
    const next = { revision: (held?.revision ?? 0) + 1, body: request.body };
    this.jobs.set(key, next);
    const told = what === 'claims' ? { claimRef: jobRef } : { jobRef };
    return of(response(next, held ? 200 : 201, { ...told, revision: next.revision }));
  }
}

function response(held: Held, status: number, body: object): HttpResponse<unknown> {
  const answer = new HttpResponse<unknown>({ status, body });
  return answer.clone({ headers: answer.headers.set('ETag', tagOf(held.revision)) });
}

function sheet(held: Held): Observable<HttpEvent<unknown>> {
  return of(
    response(held, 200, { ...(held.body as object), money: null, revision: held.revision }),
  );
}

function noAnswer(): Observable<never> {
  return throwError(() => new HttpErrorResponse({ status: 0 }));
}

function refusal(status: number, body: object = {}): Observable<never> {
  return throwError(() => new HttpErrorResponse({ status, error: body }));
}

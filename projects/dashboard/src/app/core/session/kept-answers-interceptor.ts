import {
  HttpErrorResponse,
  type HttpEvent,
  type HttpInterceptorFn,
  HttpResponse,
} from '@angular/common/http';
import { inject } from '@angular/core';
import { catchError, type Observable, of, tap, throwError, timeout } from 'rxjs';
import { keepAnswer, keptAnswer } from '../offline/kept-answers';
import { Session } from './session';

/** What a job can be written with when there is no line: the network's names, and what such a car usually takes. */
const KEPT = /^\/api\/(?:catalogue|branches\/[^/]+\/usual)(?:\?|$)/;
/** How long an answer may take to begin before the one kept stands in for it, ms. */
const PATIENCE = 4_000;

/** Keeps the answers that *Send a job* needs and gives them again when no new one comes. */
export const keptAnswersInterceptor: HttpInterceptorFn = (request, next) => {
  const { method, urlWithParams: url } = request;
  if (method !== 'GET' || !KEPT.test(url)) return next(request);
  const person = inject(Session).person()?.id;
  if (person === undefined) return next(request);
  const kept = keptAnswer(person, url, new Date());
  const answered = next(request).pipe(
    tap((event) => {
      if (event instanceof HttpResponse) keepAnswer(person, url, event.body, new Date());
    }),
  );
  if (kept === undefined) return answered;
  const again = (): Observable<HttpEvent<unknown>> =>
    of(new HttpResponse({ body: kept, status: 200, url }));
  return answered.pipe(
    // The first event only says that the request has gone.
    timeout({ first: PATIENCE, each: PATIENCE, with: again }),
    catchError((error: unknown) => (isNoAnswer(error) ? again() : throwError(() => error))),
  );
};

function isNoAnswer(error: unknown): boolean {
  return error instanceof HttpErrorResponse && (error.status === 0 || error.status >= 502);
}

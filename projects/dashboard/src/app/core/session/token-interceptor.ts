import {
  HttpErrorResponse,
  type HttpEvent,
  type HttpHandlerFn,
  type HttpInterceptorFn,
  type HttpRequest,
} from '@angular/common/http';
import { inject } from '@angular/core';
import { Router } from '@angular/router';
import { catchError, from, type Observable, switchMap, throwError } from 'rxjs';
import { NEEDS_TOKEN } from '../api/needs-token';
import { Session } from './session';

/** Puts the access token on calls that need one; on a 401 renews it once and tries again, then gives up and asks to sign in. */
export const tokenInterceptor: HttpInterceptorFn = (request, next) => {
  if (!request.context.get(NEEDS_TOKEN)) return next(request);
  const session = inject(Session);
  const router = inject(Router);
  return from(session.usableToken()).pipe(
    switchMap((token) =>
      send(request, next, token).pipe(
        catchError((error: unknown) => {
          if (!isUnauthorised(error)) return throwError(() => error);
          return from(session.renew()).pipe(
            switchMap((renewed) => {
              if (renewed) return send(request, next, renewed);
              if (!session.person()) session.end(router.url);
              return throwError(() => error);
            }),
          );
        }),
      ),
    ),
  );
};

function send(
  request: HttpRequest<unknown>,
  next: HttpHandlerFn,
  token: string | undefined,
): Observable<HttpEvent<unknown>> {
  return next(
    token ? request.clone({ setHeaders: { Authorization: `Bearer ${token}` } }) : request,
  );
}

function isUnauthorised(error: unknown): boolean {
  return error instanceof HttpErrorResponse && error.status === 401;
}

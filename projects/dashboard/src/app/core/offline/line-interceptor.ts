import { HttpErrorResponse, type HttpInterceptorFn, HttpResponse } from '@angular/common/http';
import { inject } from '@angular/core';
import { tap } from 'rxjs';
import { Line } from './line';

/** Notes of every call whether it was answered. */
export const lineInterceptor: HttpInterceptorFn = (request, next) => {
  const line = inject(Line);
  return next(request).pipe(
    tap({
      next: (event) => {
        if (event instanceof HttpResponse) line.heard();
      },
      error: (error: unknown) => {
        if (!(error instanceof HttpErrorResponse)) return;
        if (error.status === 0) line.silent();
        else line.heard();
      },
    }),
  );
};

import { isPlatformServer } from '@angular/common';
import { HttpErrorResponse, type HttpInterceptorFn } from '@angular/common/http';
import { inject, PLATFORM_ID } from '@angular/core';
import { Router } from '@angular/router';
import { catchError, throwError } from 'rxjs';

/** Where a session has ended meanwhile, people sign in again and come back to the same page. */
export const signedOutInterceptor: HttpInterceptorFn = (request, next) => {
  const router = inject(Router);
  const onServer = isPlatformServer(inject(PLATFORM_ID));
  return next(request).pipe(
    catchError((error: unknown) => {
      if (!onServer && error instanceof HttpErrorResponse && error.status === 401)
        void router.navigate(['/accounts/sign-in'], { queryParams: { next: router.url, ended: 'yes' } });
      return throwError(() => error);
    }),
  );
};

import {
  FetchBackend,
  HttpBackend,
  type HttpEvent,
  HttpHeaders,
  type HttpRequest,
  HttpResponse,
} from '@angular/common/http';
import { inject, Injectable, REQUEST, REQUEST_CONTEXT } from '@angular/core';
import { map, type Observable } from 'rxjs';

/** What the server hands to a rendering. */
export interface RenderContext {
  nonce: string;
  apiOrigin: string;
  ssrSecret: string;
  visitorAddress: string;
}

/**
 * Rendering on the server: calls to the API go to this process itself, with the visitor's cookie and address. It sits below
 * the transfer cache and drops the answer's cache headers, since the page that carries it is itself private and not stored.
 */
@Injectable()
export class SsrApiBackend implements HttpBackend {
  private readonly backend = inject(FetchBackend);
  private readonly request = inject(REQUEST, { optional: true });
  private readonly context = inject(REQUEST_CONTEXT, { optional: true }) as RenderContext | null;

  handle(asked: HttpRequest<unknown>): Observable<HttpEvent<unknown>> {
    if (!this.request || !this.context) return this.backend.handle(asked);
    const here = new URL(this.request.url).origin;
    const url = new URL(asked.url, here);
    if (url.origin !== here || !url.pathname.startsWith('/api/')) return this.backend.handle(asked);
    const cookie = this.request.headers.get('cookie');
    const own = asked.clone({
      url: this.context.apiOrigin + url.pathname + url.search,
      setHeaders: {
        'x-heddle-ssr': this.context.ssrSecret,
        'x-visitor-address': this.context.visitorAddress,
        ...(cookie ? { cookie } : {}),
      },
    });
    return this.backend.handle(own).pipe(map(withoutCacheHeaders));
  }
}

function withoutCacheHeaders(event: HttpEvent<unknown>): HttpEvent<unknown> {
  if (!(event instanceof HttpResponse)) return event;
  const kept = ['content-type', 'etag'].flatMap((name) => {
    const value = event.headers.get(name);
    return value === null ? [] : [[name, value] as const];
  });
  return event.clone({ headers: new HttpHeaders(Object.fromEntries(kept)) });
}

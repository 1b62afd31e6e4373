import { isPlatformBrowser } from '@angular/common';
import { DOCUMENT, inject, Injectable, PLATFORM_ID, REQUEST } from '@angular/core';

const YEAR = 365 * 24 * 3600;

/** Small choices of the visitor that the server's rendering needs too: read from the request there, from the page here. */
@Injectable({ providedIn: 'root' })
export class Cookies {
  private readonly document = inject(DOCUMENT);
  private readonly request = inject(REQUEST, { optional: true });
  private readonly isBrowser = isPlatformBrowser(inject(PLATFORM_ID));

  read(name: string): string | null {
    const all = this.isBrowser ? this.document.cookie : (this.request?.headers.get('cookie') ?? '');
    const value = new RegExp(`(?:^|;\\s*)${name}=([^;]+)`).exec(all)?.[1];
    if (!value) return null;
    try {
      return decodeURIComponent(value);
    } catch {
      return null;
    }
  }

  /** Null forgets it. */
  write(name: string, value: string | null): void {
    const life = value === null ? 0 : YEAR;
    this.document.cookie = `${name}=${encodeURIComponent(value ?? '')}; path=/; max-age=${life}; samesite=lax`;
  }
}

import { DOCUMENT, inject, Injectable, REQUEST, signal } from '@angular/core';

export type Theme = 'system' | 'light' | 'dark';
const COOKIE = 'heddle-theme';

/** Light, dark, or as the system says. Kept in a cookie, so that the server draws the right one at once. */
@Injectable({ providedIn: 'root' })
export class ThemeChoice {
  private readonly document = inject(DOCUMENT);
  private readonly request = inject(REQUEST, { optional: true });
  private readonly chosen = signal<Theme>('system');
  readonly theme = this.chosen.asReadonly();

  start(): void {
    const cookies = this.request?.headers.get('cookie') ?? this.document.cookie ?? '';
    const kept = new RegExp(`(?:^|;\\s*)${COOKIE}=(light|dark)`).exec(cookies)?.[1];
    this.apply(kept === 'light' || kept === 'dark' ? kept : 'system');
  }

  choose(theme: Theme): void {
    const life = theme === 'system' ? 0 : 365 * 24 * 3600;
    this.document.cookie = `${COOKIE}=${theme}; path=/; max-age=${life}; samesite=lax`;
    this.apply(theme);
  }

  private apply(theme: Theme): void {
    this.chosen.set(theme);
    const root = this.document.documentElement;
    if (theme === 'system') root.removeAttribute('data-theme');
    else root.setAttribute('data-theme', theme);
  }
}

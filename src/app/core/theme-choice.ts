import { DOCUMENT, inject, Injectable, signal } from '@angular/core';
import { Cookies } from './cookies';

export type Theme = 'system' | 'light' | 'dark';
const COOKIE = 'heddle-theme';

/** Light, dark, or as the system says. Kept in a cookie, so that the server draws the right one at once. */
@Injectable({ providedIn: 'root' })
export class ThemeChoice {
  private readonly document = inject(DOCUMENT);
  private readonly cookies = inject(Cookies);
  private readonly chosen = signal<Theme>('system');
  readonly theme = this.chosen.asReadonly();

  start(): void {
    const kept = this.cookies.read(COOKIE);
    this.apply(kept === 'light' || kept === 'dark' ? kept : 'system');
  }

  choose(theme: Theme): void {
    this.cookies.write(COOKIE, theme === 'system' ? null : theme);
    this.apply(theme);
  }

  private apply(theme: Theme): void {
    this.chosen.set(theme);
    const root = this.document.documentElement;
    if (theme === 'system') root.removeAttribute('data-theme');
    else root.setAttribute('data-theme', theme);
  }
}

import { afterNextRender, inject, Injectable, Pipe, type PipeTransform, signal } from '@angular/core';
import { Cookies } from './cookies';
import { SessionStore } from './session-store';

const COOKIE = 'heddle-zone';

/** The viewer's time zone. The server learns it from a cookie that the browser sets; until then it is the association's. */
@Injectable({ providedIn: 'root' })
export class ViewerZone {
  private readonly cookies = inject(Cookies);
  private readonly session = inject(SessionStore);
  private readonly known = signal<string | null>(this.fromCookie());

  constructor() {
    afterNextRender(() => {
      const zone = Intl.DateTimeFormat().resolvedOptions().timeZone;
      this.cookies.write(COOKIE, zone);
      this.known.set(zone);
    });
  }

  zone(): string {
    return this.known() ?? this.session.association().timeZone;
  }

  private fromCookie(): string | null {
    const zone = this.cookies.read(COOKIE);
    if (!zone) return null;
    try {
      new Intl.DateTimeFormat('en', { timeZone: zone });
      return zone;
    } catch {
      return null;
    }
  }
}

/** `'2026-12-16' | day` → "Wed 16 Dec 2026". A day has no time zone. */
@Pipe({ name: 'day' })
export class DayPipe implements PipeTransform {
  private readonly session = inject(SessionStore);

  transform(value: string, width: 'short' | 'long' = 'short'): string {
    const long = width === 'long';
    return new Intl.DateTimeFormat(this.session.locale(), {
      weekday: long ? 'long' : 'short',
      day: 'numeric',
      month: long ? 'long' : 'short',
      year: 'numeric',
      timeZone: 'UTC',
    }).format(new Date(`${value}T00:00:00Z`));
  }
}

/** An instant in the viewer's zone: "Wed 16 Dec 2026, 23:59", with the zone's name where it differs from the association's. */
@Pipe({ name: 'moment', pure: false })
export class MomentPipe implements PipeTransform {
  private readonly session = inject(SessionStore);
  private readonly viewer = inject(ViewerZone);

  transform(value: string, width: 'short' | 'long' = 'short'): string {
    const zone = this.viewer.zone();
    const abroad = zone !== this.session.association().timeZone;
    return new Intl.DateTimeFormat(this.session.locale(), {
      weekday: width,
      day: 'numeric',
      month: width,
      year: 'numeric',
      hour: '2-digit',
      minute: '2-digit',
      timeZone: zone,
      ...(abroad ? { timeZoneName: 'short' } : {}),
    }).format(new Date(value));
  }
}

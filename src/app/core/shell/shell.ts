import {
  ChangeDetectionStrategy,
  Component,
  computed,
  DOCUMENT,
  ElementRef,
  inject,
  signal,
  viewChild,
} from '@angular/core';
import { takeUntilDestroyed } from '@angular/core/rxjs-interop';
import { MatButton } from '@angular/material/button';
import { MatMenu, MatMenuItem, MatMenuTrigger } from '@angular/material/menu';
import { NavigationEnd, Router, RouterLink, RouterLinkActive, RouterOutlet } from '@angular/router';
import { HttpClient } from '@angular/common/http';
import { filter, pairwise } from 'rxjs';
import { ROLE_LABEL, type Session } from '../../../../shared/accounts/accounts-contract';
import { BrandMark } from '../../ui/brand-mark/brand-mark';
import { Notices } from '../notices';
import { SessionStore } from '../session-store';
import { type Theme, ThemeChoice } from '../theme-choice';

interface NavLink {
  label: string;
  path: string;
  exact: boolean;
}

const THEMES: readonly { theme: Theme; label: string }[] = [
  { theme: 'system', label: 'As the system' },
  { theme: 'light', label: 'Light' },
  { theme: 'dark', label: 'Dark' },
];

/** The frame of every page: brand, navigation by role, account menu, footer. */
@Component({
  selector: 'app-shell',
  imports: [BrandMark, MatButton, MatMenu, MatMenuItem, MatMenuTrigger, RouterLink, RouterLinkActive, RouterOutlet],
  templateUrl: './shell.html',
  styleUrl: './shell.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class Shell {
  private readonly router = inject(Router);
  private readonly http = inject(HttpClient);
  private readonly notices = inject(Notices);
  private readonly document = inject(DOCUMENT);
  protected readonly session = inject(SessionStore);
  protected readonly themeChoice = inject(ThemeChoice);
  protected readonly themes = THEMES;
  protected readonly menuOpen = signal(false);
  private readonly main = viewChild.required<ElementRef<HTMLElement>>('main');

  protected readonly links = computed((): NavLink[] => {
    const home = { label: 'Home', path: '/', exact: true };
    if (!this.session.person()) return [home];
    return [
      home,
      { label: 'Profile', path: '/profiles', exact: false },
      { label: 'Applications', path: '/applications', exact: false },
      { label: 'Pairs', path: '/pairings', exact: false },
      ...(this.session.hasRole('coordinator') ? [{ label: 'Cycles', path: '/cycles', exact: false }] : []),
      ...(this.session.hasRole('administrator')
        ? [
            { label: 'People', path: '/accounts/people', exact: false },
            { label: 'Messages', path: '/messages', exact: false },
          ]
        : []),
    ];
  });
  protected readonly roles = computed(() => {
    const roles = this.session.person()?.roles ?? [];
    return roles.length > 0 ? roles.map((role) => ROLE_LABEL[role].toLowerCase()).join(', ') : 'member';
  });

  constructor() {
    const arrivals = this.router.events.pipe(filter((event) => event instanceof NavigationEnd));
    arrivals.pipe(pairwise(), takeUntilDestroyed()).subscribe(([from, to]) => {
      this.menuOpen.set(false);
      const moved = from.urlAfterRedirects.split(/[?#]/)[0] !== to.urlAfterRedirects.split(/[?#]/)[0];
      if (moved) setTimeout(() => this.focusHeading());
    });
  }

  // After a change of page, screen readers and keyboards start at its heading.
  private focusHeading(): void {
    const heading = this.main().nativeElement.querySelector<HTMLElement>('h1') ?? this.main().nativeElement;
    if (!heading.hasAttribute('tabindex')) heading.setAttribute('tabindex', '-1');
    heading.focus({ preventScroll: true });
  }

  protected skip(event: Event): void {
    event.preventDefault();
    this.main().nativeElement.focus();
  }

  protected signOut(): void {
    this.http.delete<Session>('/api/accounts/session').subscribe({
      // A fresh page, so that nothing of the person stays in memory.
      next: () => this.document.location.assign('/'),
      error: (error: unknown) => this.notices.tell(error),
    });
  }
}

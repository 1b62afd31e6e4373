import { inject, Injectable } from '@angular/core';
import { Title } from '@angular/platform-browser';
import { type RouterStateSnapshot, TitleStrategy } from '@angular/router';
import { SessionStore } from './session-store';

/** "Page – Heddle, Association" in the title bar. */
@Injectable()
export class PageTitle extends TitleStrategy {
  private readonly title = inject(Title);
  private readonly session = inject(SessionStore);

  override updateTitle(state: RouterStateSnapshot): void {
    const page = this.buildTitle(state);
    const place = ['Heddle', this.session.association().name].filter(Boolean).join(', ');
    this.title.setTitle(page ? `${page} – ${place}` : place);
  }
}

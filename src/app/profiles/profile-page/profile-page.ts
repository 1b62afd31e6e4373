import { ChangeDetectionStrategy, Component, computed, inject, input } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { RouterLink } from '@angular/router';
import { SessionStore } from '../../core/session-store';
import { PageHeader } from '../../ui/page-header/page-header';
import { ProfilesClient } from '../profiles-client';
import { PublicProfileView } from '../public-profile/public-profile';

/** A profile as others see it; also the preview of one's own. */
@Component({
  selector: 'app-profile-page',
  imports: [MatButton, PageHeader, PublicProfileView, RouterLink],
  template: `
    <div class="page page--narrow">
      @if (profile.hasValue()) {
        <app-page-header [title]="profile.value().name" [subtitle]="profile.value().headline">
          @if (own()) {
            <a matButton="outlined" routerLink="/profiles/mine">Edit</a>
          }
        </app-page-header>
        @if (own()) {
          <p class="notice">This is how others see you before both sides have accepted: no address, nothing private.</p>
        }
        <app-public-profile [profile]="profile.value()" />
      } @else if (profile.error()) {
        <app-page-header title="This profile cannot be shown" />
        <p role="alert">It may not exist, or not be open to you.</p>
      } @else {
        <p aria-busy="true">Loading…</p>
      }
    </div>
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ProfilePage {
  readonly personId = input.required<string>();
  private readonly session = inject(SessionStore);
  protected readonly profile = inject(ProfilesClient).profile(this.personId);
  protected readonly own = computed(() => this.session.person()?.id === this.personId());
}

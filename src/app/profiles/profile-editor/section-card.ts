import { ChangeDetectionStrategy, Component, input } from '@angular/core';
import { MatButton } from '@angular/material/button';
import type { ProfileSection } from '../../../../shared/profiles/profiles-contract';
import { SavedState } from '../../ui/saved-state/saved-state';
import type { SectionSaver } from './section-saver';

/** The frame of a section: heading, who sees it, whether it is saved, and what to do if another tab was faster. */
@Component({
  selector: 'app-section-card',
  imports: [MatButton, SavedState],
  template: `
    <section class="card stack" [attr.id]="'section-' + key()" [attr.aria-labelledby]="'heading-' + key()">
      <div class="spread">
        <div>
          <h2 [attr.id]="'heading-' + key()">{{ heading() }}</h2>
          <p class="muted">{{ seenBy() }}</p>
        </div>
        <app-saved-state [state]="saver().state()" />
      </div>
      @if (saver().other()) {
        <div class="notice notice--warn" role="alert">
          <p>This section was saved meanwhile, perhaps in another tab. What you typed is still here.</p>
          <div class="actions">
            <button matButton="filled" type="button" (click)="saver().keepMine()">Keep what is here</button>
            <button matButton="outlined" type="button" (click)="saver().takeOther()">Take the other version</button>
          </div>
        </div>
      }
      <ng-content />
    </section>
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class SectionCard {
  readonly key = input.required<ProfileSection>();
  readonly heading = input.required<string>();
  readonly seenBy = input.required<string>();
  // The saver's section differs from card to card; the card only shows its state.
  readonly saver = input.required<Pick<SectionSaver<ProfileSection>, 'state' | 'other' | 'keepMine' | 'takeOther'>>();
}

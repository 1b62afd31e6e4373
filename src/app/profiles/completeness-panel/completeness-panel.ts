import { ChangeDetectionStrategy, Component, computed, inject } from '@angular/core';
import { completenessOf } from '../../../../shared/profiles/profile-rules';
import { ProfilesClient } from '../profiles-client';
import { CompletenessMeter } from './completeness-meter';

/** On a member's home: the profile's completeness, until it is complete. */
@Component({
  selector: 'app-completeness-panel',
  imports: [CompletenessMeter],
  template: `
    @if (completeness(); as measured) {
      @if (measured.percent < 100) {
        <app-completeness-meter [completeness]="measured" />
      }
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class CompletenessPanel {
  private readonly profile = inject(ProfilesClient).mine();
  protected readonly completeness = computed(() =>
    this.profile.hasValue() ? completenessOf(this.profile.value()) : null,
  );
}

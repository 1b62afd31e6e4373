import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { RouterLink } from '@angular/router';
import { nextStep } from '../../../shared/applications/application-rules';
import type { OwnApplication } from '../../../shared/applications/applications-contract';
import { MomentPipe } from '../core/moments';
import { counted } from '../ui/format/plural-pipe';
import { StatusBadge } from './status-badge';

/** One's own application in a list: cycle, side, state, and one sentence on what happens next. */
@Component({
  selector: 'app-application-line',
  imports: [MomentPipe, RouterLink, StatusBadge],
  template: `
    <div class="stack stack--tight">
      <div class="spread">
        <a [routerLink]="['/applications', application().cycleId]">{{ application().cycleName }}, {{ part() }}</a>
        <app-status-badge [status]="application().status" />
      </div>
      <p>{{ next() }}</p>
      @if (application().submittedAt; as at) {
        <p class="muted">Sent {{ at | moment }}</p>
      }
    </div>
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ApplicationLine {
  readonly application = input.required<OwnApplication>();
  protected readonly next = computed(() => nextStep(this.application().status, this.application().phase));
  protected readonly part = computed(() => {
    const { side, places } = this.application();
    return side === 'mentor' ? `as a mentor with ${counted(places, 'place', 'places')}` : 'as a mentee';
  });
}

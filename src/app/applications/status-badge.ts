import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { type ApplicationStatus, STATUS_LABEL } from '../../../shared/applications/applications-contract';

const LOOK: Record<ApplicationStatus, string> = {
  draft: 'badge',
  submitted: 'badge badge--waiting',
  admitted: 'badge badge--proven',
  'waiting-list': 'badge badge--waiting',
  withdrawn: 'badge',
};

/** Where an application stands, in a word. */
@Component({
  selector: 'app-status-badge',
  template: `<span [class]="look()">{{ label() }}</span>`,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class StatusBadge {
  readonly status = input.required<ApplicationStatus>();
  protected readonly look = computed(() => LOOK[this.status()]);
  protected readonly label = computed(() => STATUS_LABEL[this.status()]);
}

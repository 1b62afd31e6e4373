import { ChangeDetectionStrategy, Component, computed, inject, input } from '@angular/core';
import { PHASE_LABEL } from '../../../../shared/cycles/cycles-contract';
import { DayPipe } from '../../core/moments';
import { LoadProblem } from '../../ui/load-state/load-problem';
import { Loading } from '../../ui/load-state/loading';
import { PageHeader } from '../../ui/page-header/page-header';
import { ApplicationsClient } from '../applications-client';
import { SideForm } from './side-form';

/** A member applies to one cycle, on one side or on both. */
@Component({
  selector: 'app-application-form-page',
  imports: [DayPipe, LoadProblem, Loading, PageHeader, SideForm],
  templateUrl: './application-form-page.html',
  styles: '.lines { white-space: pre-line; }',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ApplicationFormPage {
  readonly cycleId = input.required<string>();

  private readonly client = inject(ApplicationsClient);
  protected readonly crumbs = [{ label: 'Your applications', link: '/applications' }];
  protected readonly desk = this.client.desk(this.cycleId);
  protected readonly mentors = this.client.listedMentors(this.cycleId);
  protected readonly listed = computed(() => (this.mentors.hasValue() ? this.mentors.value().mentors : []));
  protected readonly phaseLabel = PHASE_LABEL;

  protected reload(): void {
    this.desk.reload();
  }
}

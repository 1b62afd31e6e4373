import { ChangeDetectionStrategy, Component, computed, input, output } from '@angular/core';
import type { Plan, PlanPerson } from '../../../../shared/matching/runs-contract';
import { EmptyState } from '../../ui/empty-state/empty-state';
import { whereabouts } from './plan-view';

/** Who is left out and why, each with the way to the shortage they belong to. */
@Component({
  selector: 'app-left-out-list',
  imports: [EmptyState],
  template: `
    @if (people().length > 0) {
      <ul class="plain-list line-list">
        @for (entry of people(); track entry.person.applicationId) {
          <li>
            <div class="spread">
              <span class="cluster">
                <button type="button" class="link-button" (click)="opened.emit(entry.person.applicationId)">
                  {{ entry.person.name }}
                </button>
                <span class="muted">{{ entry.where }}</span>
              </span>
              @if (entry.because?.shortage !== null && entry.because?.shortage !== undefined) {
                <button type="button" class="link-button" (click)="shortageOpened.emit(entry.because!.shortage!)">
                  Shortage {{ entry.because!.shortage! + 1 }}
                </button>
              }
            </div>
            <p class="muted">{{ entry.because?.text }}</p>
          </li>
        }
      </ul>
    } @else {
      <app-empty-state title="Nobody is left out" text="Every mentee of this run is paired." />
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class LeftOutList {
  readonly plan = input.required<Plan>();
  readonly shown = input.required<(person: PlanPerson) => boolean>();
  readonly opened = output<string>();
  readonly shortageOpened = output<number>();

  protected readonly people = computed(() => {
    const { report, mentees } = this.plan();
    const left = new Set(report.leftOut);
    return mentees
      .filter((person) => left.has(person.applicationId) && this.shown()(person))
      .map((person) => ({ person, where: whereabouts(person), because: report.leftOutBecause[person.applicationId] }));
  });
}

import { ChangeDetectionStrategy, Component, computed, inject, signal } from '@angular/core';
import { MatFormFieldModule } from '@angular/material/form-field';
import { MatSelectModule } from '@angular/material/select';
import { Router } from '@angular/router';
import type { CycleDraft } from '../../../../shared/cycles/cycles-contract';
import type { FieldFault } from '../../../../shared/problems/problems';
import { problemOf } from '../../core/problems';
import { PageHeader } from '../../ui/page-header/page-header';
import { CyclesClient } from '../cycles-client';
import { CycleForm } from './cycle-form';

/** A new cycle, from nothing or with the rules, criteria and texts of an earlier one. */
@Component({
  selector: 'app-new-cycle-page',
  imports: [CycleForm, MatFormFieldModule, MatSelectModule, PageHeader],
  template: `
    <div class="page page--narrow">
      <app-page-header title="New cycle" subtitle="It starts as a draft that only coordinators see." />
      @if (earlier().length > 0) {
        <mat-form-field>
          <mat-label>Take rules, criteria and texts from</mat-label>
          <mat-select [value]="copyFrom()" (valueChange)="copyFrom.set($event)">
            <mat-option [value]="null">Nothing: the default set</mat-option>
            @for (cycle of earlier(); track cycle.id) {
              <mat-option [value]="cycle.id">{{ cycle.name }}</mat-option>
            }
          </mat-select>
        </mat-form-field>
      }
      <app-cycle-form
        [start]="start()"
        [busy]="busy()"
        [refused]="refused()"
        saveLabel="Make the cycle"
        (saved)="create($event)"
        (cancelled)="leave()"
      />
    </div>
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class NewCyclePage {
  private readonly client = inject(CyclesClient);
  private readonly router = inject(Router);
  private readonly cycles = this.client.cycles();
  protected readonly earlier = computed(() => (this.cycles.hasValue() ? this.cycles.value().cycles : []));
  protected readonly copyFrom = signal<string | null>(null);
  private readonly source = this.client.cycle(this.copyFrom);
  /** Texts and ways of the earlier cycle; name and dates are new. */
  protected readonly start = computed((): CycleDraft | null => {
    if (this.copyFrom() === null || !this.source.hasValue()) return null;
    const { introduction, consentText, askFirst, autoAdmit, needsApproval } = this.source.value();
    const none = {
      applicationsOpenOn: '',
      applicationsCloseOn: '',
      answersDueOn: '',
      startsOn: '',
      checkInOn: '',
      endsOn: '',
    };
    return { name: '', introduction, consentText, askFirst, autoAdmit, needsApproval, ...none };
  });
  protected readonly busy = signal(false);
  protected readonly refused = signal<{ title: string; fields: readonly FieldFault[] } | null>(null);

  protected create(draft: CycleDraft): void {
    this.busy.set(true);
    this.client.create({ ...draft, copyFrom: this.copyFrom() }).subscribe({
      next: (cycle) => void this.router.navigate(['/cycles', cycle.id]),
      error: (error: unknown) => {
        const problem = problemOf(error);
        this.busy.set(false);
        this.refused.set({ title: problem.title, fields: problem.fields ?? [] });
      },
    });
  }

  protected leave(): void {
    void this.router.navigate(['/cycles']);
  }
}

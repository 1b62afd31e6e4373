import { ChangeDetectionStrategy, Component, computed, inject, input, linkedSignal, signal } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { Router } from '@angular/router';
import { Cycle, type CycleDraft } from '../../../../shared/cycles/cycles-contract';
import type { FieldFault } from '../../../../shared/problems/problems';
import { CycleStore } from '../../core/cycle-store';
import { Notices } from '../../core/notices';
import { problemOf } from '../../core/problems';
import { Loading } from '../../ui/load-state/loading';
import { PageHeader } from '../../ui/page-header/page-header';
import { CyclesClient } from '../cycles-client';
import { CycleForm } from './cycle-form';

const FIELD_LABEL: Record<keyof CycleDraft, string> = {
  name: 'Name',
  introduction: 'Introduction',
  consentText: 'What applicants agree to',
  askFirst: 'Who is asked first',
  autoAdmit: 'Admission without a decision',
  needsApproval: 'Approval by a second coordinator',
  applicationsOpenOn: 'Applications open',
  applicationsCloseOn: 'Applications close',
  answersDueOn: 'Answers due',
  startsOn: 'Pairs start',
  checkInOn: 'Half-way check-in',
  endsOn: 'End',
};
const FIELDS = Object.keys(FIELD_LABEL) as (keyof CycleDraft)[];

/** Changes name, dates and texts; where a colleague saved meanwhile, both versions are at hand. */
@Component({
  selector: 'app-edit-cycle-page',
  imports: [CycleForm, Loading, MatButton, PageHeader],
  template: `
    <div class="stack">
      <app-page-header title="Dates and texts" />
      @if (theirs(); as other) {
        <div class="notice notice--warn stack stack--tight" role="alert">
          <p><b>A colleague saved this cycle meanwhile.</b> What you typed is still here.</p>
          <ul>
            @for (difference of differences(); track difference.label) {
              <li>{{ difference.label }}: theirs is "{{ difference.theirs }}", yours is "{{ difference.mine }}"</li>
            }
          </ul>
          <div class="cluster">
            <button matButton="outlined" type="button" (click)="saveOver(other.version)">Save mine over it</button>
            <button matButton type="button" (click)="leave()">Take theirs</button>
          </div>
        </div>
      }
      @if (store.cycle(); as cycle) {
        <app-cycle-form
          [start]="cycle"
          [busy]="busy()"
          [refused]="refused()"
          (saved)="save($event, version())"
          (cancelled)="leave()"
        />
      } @else {
        <app-loading />
      }
    </div>
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class EditCyclePage {
  readonly cycleId = input.required<string>();

  private readonly client = inject(CyclesClient);
  private readonly router = inject(Router);
  private readonly notices = inject(Notices);
  protected readonly store = inject(CycleStore);
  /** The version that the form started from. */
  protected readonly version = linkedSignal<Cycle | null, number>({
    source: this.store.cycle,
    computation: (cycle, previous) => previous?.value || (cycle?.version ?? 0),
  });
  protected readonly busy = signal(false);
  protected readonly refused = signal<{ title: string; fields: readonly FieldFault[] } | null>(null);
  protected readonly theirs = signal<Cycle | null>(null);
  private readonly mine = signal<CycleDraft | null>(null);
  protected readonly differences = computed(() => {
    const [mine, theirs] = [this.mine(), this.theirs()];
    if (!mine || !theirs) return [];
    return FIELDS.filter((field) => mine[field] !== theirs[field]).map((field) => ({
      label: FIELD_LABEL[field],
      mine: String(mine[field]),
      theirs: String(theirs[field]),
    }));
  });

  protected save(draft: CycleDraft, version: number): void {
    this.busy.set(true);
    this.mine.set(draft);
    this.client.edit(this.cycleId(), draft, version).subscribe({
      next: () => {
        this.notices.say('Saved.');
        this.store.reload();
        this.leave();
      },
      error: (error: unknown) => {
        const problem = problemOf(error);
        this.busy.set(false);
        const current = problem.code === 'stale' ? Cycle.safeParse(problem.current) : null;
        if (current?.success) this.theirs.set(current.data);
        else this.refused.set({ title: problem.title, fields: problem.fields ?? [] });
      },
    });
  }

  protected saveOver(version: number): void {
    const mine = this.mine();
    if (mine) this.save(mine, version);
  }

  protected leave(): void {
    this.store.reload();
    void this.router.navigate(['/cycles', this.cycleId()]);
  }
}

import { ChangeDetectionStrategy, Component, computed, inject, signal } from '@angular/core';
import { FormControl, ReactiveFormsModule } from '@angular/forms';
import { MatButton } from '@angular/material/button';
import { MatDialog } from '@angular/material/dialog';
import { MatFormFieldModule } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import { RouterLink } from '@angular/router';
import { filter } from 'rxjs';
import { type Cycle, type CyclePhase, PHASE_LABEL } from '../../../../shared/cycles/cycles-contract';
import { mayCancel, mayEdit } from '../../../../shared/cycles/phase-rules';
import { CycleStore } from '../../core/cycle-store';
import { DayPipe } from '../../core/moments';
import { Notices } from '../../core/notices';
import { problemOf } from '../../core/problems';
import { SmallFigures } from '../../ui/big-figure/small-figures';
import { confirmWith } from '../../ui/confirm-dialog/confirm-dialog';
import { counted } from '../../ui/format/plural-pipe';
import { PageHeader } from '../../ui/page-header/page-header';
import { CyclesClient } from '../cycles-client';

/** What moving on means, as a verb for the button. */
const MOVE_LABEL: Partial<Record<CyclePhase, string>> = {
  open: 'Open for applications',
  'applications-closed': 'Close applications',
  matching: 'Start matching',
  'under-way': 'Pairs are under way',
  closing: 'Start closing',
  closed: 'Close the cycle',
};

/** A cycle at a glance: counts, dates, what is missing for the next phase, moving on, back, or cancelling. */
@Component({
  selector: 'app-cycle-overview',
  imports: [
    DayPipe,
    MatButton,
    MatFormFieldModule,
    MatInput,
    PageHeader,
    ReactiveFormsModule,
    RouterLink,
    SmallFigures,
  ],
  templateUrl: './cycle-overview.html',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class CycleOverview {
  private readonly store = inject(CycleStore);
  private readonly client = inject(CyclesClient);
  private readonly notices = inject(Notices);
  private readonly dialog = inject(MatDialog);
  protected readonly cycle = this.store.cycle;
  protected readonly phaseLabel = PHASE_LABEL;
  protected readonly reason = new FormControl('', { nonNullable: true });
  /** Which deed needs a reason before it is done. */
  protected readonly asking = signal<'back' | 'cancel' | null>(null);
  protected readonly refusal = signal('');
  protected readonly busy = signal(false);

  protected readonly figures = computed(() => {
    const counts = this.cycle()?.counts;
    if (!counts) return [];
    return [
      { label: 'Applications', value: counts.applications },
      { label: 'Mentees admitted', value: counts.mentees },
      { label: 'Mentors admitted', value: counts.mentors },
      { label: 'Places', value: counts.places },
      { label: 'To decide', value: counts.undecided },
      { label: 'Waiting list', value: counts.waitingList },
      { label: 'Pairs', value: counts.underWay },
    ];
  });
  protected readonly editable = computed(() => mayEdit(this.cycle()?.phase ?? 'closed'));
  protected readonly cancellable = computed(() => mayCancel(this.cycle()?.phase ?? 'closed'));
  protected readonly blocked = computed(
    () => this.cycle()?.checklist.some((item) => item.blocks && !item.done) ?? false,
  );

  protected moveLabel(phase: CyclePhase): string {
    return MOVE_LABEL[phase] ?? '';
  }

  protected moveOn(cycle: Cycle): void {
    if (cycle.next) this.move(cycle, cycle.next, '');
  }

  protected withReason(cycle: Cycle): void {
    if (this.asking() === 'back' && cycle.previous) return this.move(cycle, cycle.previous, this.reason.value);
    confirmWith(this.dialog, {
      title: `Cancel ${cycle.name}?`,
      text: `${counted(cycle.counts.applications, 'application ends', 'applications end')} with it, open proposals are withdrawn, and everybody who applied gets a message with your reason. This cannot be undone.`,
      confirm: 'Cancel the cycle',
      cancel: 'Keep it',
      tone: 'remove',
    })
      .pipe(filter((went) => went))
      .subscribe(() => this.move(cycle, 'cancelled', this.reason.value));
  }

  private move(cycle: Cycle, to: CyclePhase, reason: string): void {
    this.busy.set(true);
    this.refusal.set('');
    this.client.move(cycle.id, { to, reason }).subscribe({
      next: (moved) => {
        this.busy.set(false);
        this.asking.set(null);
        this.reason.reset();
        this.store.reload();
        this.notices.say(`${moved.name}: ${PHASE_LABEL[moved.phase].toLowerCase()}.`);
      },
      error: (error: unknown) => {
        const problem = problemOf(error);
        this.busy.set(false);
        this.refusal.set([problem.fields?.[0]?.message ?? problem.title, problem.detail].filter(Boolean).join('. '));
      },
    });
  }
}

import { ChangeDetectionStrategy, Component, computed, inject, input, signal } from '@angular/core';
import { FormControl, ReactiveFormsModule } from '@angular/forms';
import { MatButton } from '@angular/material/button';
import { MatCheckbox } from '@angular/material/checkbox';
import { MatDialog } from '@angular/material/dialog';
import { Router, RouterLink } from '@angular/router';
import { filter } from 'rxjs';
import { CycleStore } from '../../core/cycle-store';
import { MomentPipe } from '../../core/moments';
import { Notices } from '../../core/notices';
import { problemOf } from '../../core/problems';
import { confirmWith } from '../../ui/confirm-dialog/confirm-dialog';
import { FitPipe } from '../../ui/format/fit-pipe';
import { counted } from '../../ui/format/plural-pipe';
import { LoadProblem } from '../../ui/load-state/load-problem';
import { Loading } from '../../ui/load-state/loading';
import { PageHeader } from '../../ui/page-header/page-header';
import { MatchingClient } from '../matching-client';

/** Before anything is sent: who gets what, who is left out and what they are told. */
@Component({
  selector: 'app-review-page',
  imports: [
    FitPipe,
    LoadProblem,
    Loading,
    MatButton,
    MatCheckbox,
    MomentPipe,
    PageHeader,
    ReactiveFormsModule,
    RouterLink,
  ],
  templateUrl: './review-page.html',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ReviewPage {
  readonly cycleId = input.required<string>();
  readonly runId = input.required<string>();

  private readonly client = inject(MatchingClient);
  private readonly dialog = inject(MatDialog);
  private readonly router = inject(Router);
  private readonly notices = inject(Notices);
  private readonly store = inject(CycleStore);
  protected readonly resource = this.client.review(this.runId);
  protected readonly review = computed(() => (this.resource.hasValue() ? this.resource.value() : null));
  protected readonly acknowledged = new FormControl(false, { nonNullable: true });
  protected readonly busy = signal(false);
  protected readonly refusal = signal('');

  protected readonly subtitle = computed(() => {
    const review = this.review();
    if (!review) return '';
    return `Round ${review.round}: ${counted(review.proposals, 'proposal', 'proposals')}, ${counted(review.messages, 'message', 'messages')}`;
  });

  protected approve(): void {
    this.refusal.set('');
    this.client.approve(this.runId()).subscribe({
      next: (review) => {
        this.resource.set(review);
        this.notices.say('Approved. Another coordinator can publish this plan now.');
      },
      error: (error: unknown) => {
        const problem = problemOf(error);
        this.refusal.set([problem.title, problem.detail].filter(Boolean).join('. '));
      },
    });
  }

  protected publish(): void {
    const review = this.review();
    if (!review) return;
    if (review.changedSince.length > 0 && !this.acknowledged.value) {
      this.refusal.set('Please look at what has changed since the run, and say that you have.');
      return;
    }
    confirmWith(this.dialog, {
      title: `Publish round ${review.round}?`,
      text: `${counted(review.messages, 'message goes', 'messages go')} out at once. What was published stays as it is.`,
      affectedLabel: `${counted(review.proposals, 'pairing is', 'pairings are')} proposed:`,
      affected: review.pairings.map((pairing) => `${pairing.menteeName} with ${pairing.mentorName}`),
      confirm: `Send ${counted(review.messages, 'message', 'messages')}`,
    })
      .pipe(filter((went) => went))
      .subscribe(() => this.send(review.version));
  }

  private send(version: number): void {
    this.busy.set(true);
    this.refusal.set('');
    this.client.publish(this.runId(), version, this.acknowledged.value).subscribe({
      next: (outcome) => {
        this.notices.say(
          `Round ${outcome.round} is published: ${counted(outcome.proposals, 'proposal', 'proposals')}. Answers will appear here.`,
        );
        this.store.reload();
        void this.router.navigate(['/cycles', this.cycleId(), 'pairings']);
      },
      error: (error: unknown) => {
        const problem = problemOf(error);
        this.busy.set(false);
        this.refusal.set(
          problem.code === 'stale'
            ? 'Somebody else changed this cycle meanwhile. Look at it again before you publish.'
            : [problem.title, problem.detail].filter(Boolean).join('. '),
        );
        this.resource.reload();
      },
    });
  }
}

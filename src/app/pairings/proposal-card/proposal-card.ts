import { ChangeDetectionStrategy, Component, computed, input, linkedSignal, output, signal } from '@angular/core';
import { FormControl, ReactiveFormsModule } from '@angular/forms';
import { MatButton } from '@angular/material/button';
import { MatFormFieldModule } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import type { Observable } from 'rxjs';
import { type AnswerForm, type OwnPairing, PAIRING_STATE_LABEL } from '../../../../shared/pairings/pairings-contract';
import { CAREER_STAGE_LABEL, REGION_LABEL } from '../../../../shared/profiles/profiles-contract';
import { faultOf } from '../../core/form-faults';
import { MomentPipe } from '../../core/moments';
import { problemOf } from '../../core/problems';
import { AnswerThreads } from '../../ui/answer-threads/answer-threads';
import { PersonLine } from '../../ui/person-line/person-line';

/** One proposal: whom, what the two share, until when, and the two answers. Opening it answers nothing. */
@Component({
  selector: 'app-proposal-card',
  imports: [AnswerThreads, MatButton, MatFormFieldModule, MatInput, MomentPipe, PersonLine, ReactiveFormsModule],
  templateUrl: './proposal-card.html',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ProposalCard {
  readonly pairing = input.required<OwnPairing>();
  /** Sends an answer: by sign-in or by link. */
  readonly send = input.required<(form: AnswerForm) => Observable<OwnPairing>>();
  readonly answered = output<OwnPairing>();

  protected readonly stateLabel = PAIRING_STATE_LABEL;
  protected readonly reason = new FormControl('', { nonNullable: true });
  protected readonly declining = linkedSignal({ source: this.pairing, computation: () => false });
  protected readonly busy = signal(false);
  protected readonly refusal = signal('');
  protected readonly faultOf = faultOf;

  protected readonly partnerSide = computed(() => (this.pairing().mySide === 'mentee' ? 'mentor' : 'mentee'));
  protected readonly mentorAnswer = computed(() =>
    this.pairing().mySide === 'mentor' ? this.pairing().myAnswer : this.pairing().partnerAnswer,
  );
  protected readonly menteeAnswer = computed(() =>
    this.pairing().mySide === 'mentee' ? this.pairing().myAnswer : this.pairing().partnerAnswer,
  );
  protected readonly about = computed(() => {
    const { partner } = this.pairing();
    return [
      partner.headline,
      partner.employer,
      partner.region ? REGION_LABEL[partner.region] : '',
      partner.careerStage ? CAREER_STAGE_LABEL[partner.careerStage] : '',
      partner.yearsInPractice === null
        ? ''
        : `${partner.yearsInPractice} ${partner.yearsInPractice === 1 ? 'year' : 'years'} in practice`,
    ].filter(Boolean);
  });
  protected readonly whatNext = computed(() => nextSentence(this.pairing()));

  protected accept(): void {
    this.answer({ answer: 'accepted' });
  }

  protected takeBack(): void {
    this.answer({ answer: 'unanswered' });
  }

  protected decline(): void {
    if (this.reason.value.trim().length < 3) {
      this.reason.setErrors({ server: 'A short reason helps the coordinators find someone who suits better' });
      this.reason.markAsTouched();
      return;
    }
    this.answer({ answer: 'declined', reason: this.reason.value });
  }

  private answer(form: AnswerForm): void {
    this.busy.set(true);
    this.refusal.set('');
    this.send()(form).subscribe({
      next: (pairing) => {
        this.busy.set(false);
        this.answered.emit(pairing);
      },
      error: (error: unknown) => {
        const problem = problemOf(error);
        this.busy.set(false);
        this.refusal.set([problem.title, problem.detail].filter(Boolean).join('. '));
      },
    });
  }
}

function nextSentence(pairing: OwnPairing): string {
  const name = pairing.partner.name;
  if (pairing.state === 'under-way')
    return pairing.mySide === 'mentee'
      ? `You are a pair. Write to ${name} within a week and suggest a time for a first meeting.`
      : `You are a pair. ${name} will write to you; if a week passes, write first.`;
  if (pairing.state !== 'pending') return '';
  if (pairing.myAnswer === 'accepted')
    return `You have accepted. We wait for ${name}, and will write to you either way.`;
  if (pairing.partnerAnswer === 'accepted') return `${name} has accepted and waits for your answer.`;
  return 'Nothing is agreed yet. Contact details are exchanged once both of you have accepted.';
}

import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';

/** How one side has answered a proposal. */
export type ThreadAnswer = 'unanswered' | 'accepted' | 'declined';

/** Both sides' answers as two threads: accepted ones run into the knot, open ones are dashed, declined ones break off. */
@Component({
  selector: 'app-answer-threads',
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './answer-threads.html',
  styleUrl: './answer-threads.scss',
})
export class AnswerThreads {
  readonly mentor = input.required<ThreadAnswer>();
  readonly mentee = input.required<ThreadAnswer>();

  protected readonly inWords = computed(
    () => `Mentor: ${ANSWER_IN_WORDS[this.mentor()]}. Mentee: ${ANSWER_IN_WORDS[this.mentee()]}.`,
  );
  protected readonly joined = computed(() => this.mentor() === 'accepted' && this.mentee() === 'accepted');
}

const ANSWER_IN_WORDS: Record<ThreadAnswer, string> = {
  unanswered: 'not answered yet',
  accepted: 'accepted',
  declined: 'declined',
};

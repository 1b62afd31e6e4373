import { inject, Injectable } from '@angular/core';
import { MatSnackBar } from '@angular/material/snack-bar';
import { problemOf } from './problems';

/** Short sentences at the foot of the page: what happened, and a way to undo it. */
@Injectable({ providedIn: 'root' })
export class Notices {
  private readonly bar = inject(MatSnackBar);

  say(text: string): void {
    this.bar.open(text, 'Close');
  }

  /** Says what happened and offers an action, for as long as undo should be within reach. */
  offer(text: string, action: string, act: () => void): void {
    this.bar.open(text, action, { duration: 15_000 }).onAction().subscribe(act);
  }

  /** Says what the server refused, with its detail. */
  tell(error: unknown): void {
    const problem = problemOf(error);
    this.bar.open([problem.title, problem.detail].filter(Boolean).join('. '), 'Close', { duration: 12_000 });
  }
}

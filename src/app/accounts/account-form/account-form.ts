import { type WritableSignal, signal } from '@angular/core';
import type { FormGroup } from '@angular/forms';
import type { Observable } from 'rxjs';
import { faultsOf } from '../../core/form-faults';
import { applyProblem, problemOf } from '../../core/problems';
import type { FieldFault } from '../../../../shared/problems/problems';

/** What the small forms of this capability share: one submission at a time, and faults beside fields and at the top. */
export class AccountForm<T> {
  readonly busy = signal(false);
  readonly faults: WritableSignal<FieldFault[]> = signal([]);
  readonly title = signal('Some fields need another look');

  constructor(private readonly form: FormGroup) {}

  submit(call: () => Observable<T>, done: (answer: T) => void): void {
    if (this.busy()) return;
    this.form.markAllAsTouched();
    if (this.form.invalid) {
      this.title.set('Some fields need another look');
      this.faults.set(faultsOf(this.form));
      return;
    }
    this.faults.set([]);
    this.busy.set(true);
    call().subscribe({
      next: (answer) => {
        this.busy.set(false);
        done(answer);
      },
      error: (error: unknown) => {
        this.busy.set(false);
        const problem = problemOf(error);
        const rest = applyProblem(this.form, problem);
        this.title.set(problem.title);
        this.faults.set([
          ...faultsOf(this.form),
          ...rest,
          ...(problem.fields ? [] : [{ field: '', message: problem.detail ?? problem.title }]),
        ]);
      },
    });
  }
}

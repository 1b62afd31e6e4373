import { ChangeDetectionStrategy, Component, effect, inject, input, output } from '@angular/core';
import { NonNullableFormBuilder, ReactiveFormsModule } from '@angular/forms';
import { MatButton } from '@angular/material/button';
import { MatCheckbox } from '@angular/material/checkbox';
import { MatFormFieldModule } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import { MatRadioModule } from '@angular/material/radio';
import { type AskFirst, CycleDraft } from '../../../../shared/cycles/cycles-contract';
import type { FieldFault } from '../../../../shared/problems/problems';
import { asContract, faultOf } from '../../core/form-faults';
import { ProblemSummary } from '../../ui/problem-summary/problem-summary';

const DATES = [
  { field: 'applicationsOpenOn', label: 'Applications open on' },
  { field: 'applicationsCloseOn', label: 'Applications close at the end of' },
  { field: 'answersDueOn', label: 'Answers are due at the end of' },
  { field: 'startsOn', label: 'Pairs start on' },
  { field: 'checkInOn', label: 'Half-way check-in on' },
  { field: 'endsOn', label: 'The cycle ends on' },
] as const;

/** Name, dates and texts of a cycle. Each fault stands beside its field. */
@Component({
  selector: 'app-cycle-form',
  imports: [MatButton, MatCheckbox, MatFormFieldModule, MatInput, MatRadioModule, ProblemSummary, ReactiveFormsModule],
  templateUrl: './cycle-form.html',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class CycleForm {
  /** What the fields start with; null for a new cycle. */
  readonly start = input<CycleDraft | null>(null);
  readonly busy = input(false);
  readonly saveLabel = input('Save');
  /** What the server had against it, by field. */
  readonly refused = input<{ title: string; fields: readonly FieldFault[] } | null>(null);
  readonly saved = output<CycleDraft>();
  readonly cancelled = output<void>();

  protected readonly dates = DATES;
  protected readonly faultOf = faultOf;
  protected readonly form = inject(NonNullableFormBuilder).group({
    name: ['', asContract(CycleDraft.shape.name)],
    introduction: ['', asContract(CycleDraft.shape.introduction)],
    consentText: ['', asContract(CycleDraft.shape.consentText)],
    askFirst: 'both' as AskFirst,
    autoAdmit: true,
    needsApproval: false,
    applicationsOpenOn: ['', asContract(CycleDraft.shape.applicationsOpenOn)],
    applicationsCloseOn: ['', asContract(CycleDraft.shape.applicationsCloseOn)],
    answersDueOn: ['', asContract(CycleDraft.shape.answersDueOn)],
    startsOn: ['', asContract(CycleDraft.shape.startsOn)],
    checkInOn: ['', asContract(CycleDraft.shape.checkInOn)],
    endsOn: ['', asContract(CycleDraft.shape.endsOn)],
  });

  constructor() {
    effect(() => {
      const start = this.start();
      if (start && this.form.pristine) this.form.reset(start, { emitEvent: false });
    });
    effect(() => this.showFaults(this.refused()?.fields ?? []));
  }

  protected save(): void {
    const result = CycleDraft.safeParse(this.form.getRawValue());
    if (result.success) return this.saved.emit(result.data);
    this.showFaults(result.error.issues.map((issue) => ({ field: issue.path.join('.'), message: issue.message })));
  }

  private showFaults(faults: readonly FieldFault[]): void {
    for (const fault of faults) this.form.get(fault.field)?.setErrors({ server: fault.message });
    if (faults.length > 0) this.form.markAllAsTouched();
  }
}

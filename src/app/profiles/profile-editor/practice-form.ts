import { ChangeDetectionStrategy, Component, effect, inject, input, output, untracked } from '@angular/core';
import { NonNullableFormBuilder, ReactiveFormsModule } from '@angular/forms';
import { MatFormFieldModule } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import { MatSelectModule } from '@angular/material/select';
import type { CareerStage, MentoringProfile, Sector } from '../../../../shared/profiles/profiles-contract';
import { faultOf } from '../../core/form-faults';
import { SECTORS, STAGES } from './choices';
import { SectionCard } from './section-card';
import { SectionSaver } from './section-saver';

@Component({
  selector: 'app-practice-form',
  imports: [MatFormFieldModule, MatInput, MatSelectModule, ReactiveFormsModule, SectionCard],
  templateUrl: './practice-form.html',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class PracticeForm {
  readonly profile = input.required<MentoringProfile>();
  readonly saved = output<void>();
  private readonly fb = inject(NonNullableFormBuilder);
  protected readonly stages = STAGES;
  protected readonly sectors = SECTORS;
  protected readonly faultOf = faultOf;
  protected readonly form = this.fb.group({
    careerStage: this.fb.control<CareerStage | null>(null),
    yearsInPractice: this.fb.control<number | null>(null),
    sector: this.fb.control<Sector | null>(null),
    credentials: '',
  });
  protected readonly saver = new SectionSaver(
    'practice',
    this.form,
    () => this.form.getRawValue(),
    (content) => this.form.patchValue(content, { emitEvent: false }),
    () => this.saved.emit(),
  );

  constructor() {
    effect(() => {
      const { practice, versions } = this.profile();
      untracked(() => this.saver.start(practice, versions.practice));
    });
  }
}

import { ChangeDetectionStrategy, Component, effect, inject, input, output, untracked } from '@angular/core';
import { NonNullableFormBuilder, ReactiveFormsModule } from '@angular/forms';
import { MatCheckbox } from '@angular/material/checkbox';
import { MatFormFieldModule } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import { MatSelectModule } from '@angular/material/select';
import type { CareerStage, MentoringProfile, SectorWish } from '../../../../shared/profiles/profiles-contract';
import { faultOf } from '../../core/form-faults';
import { SECTOR_WISHES, STAGES } from './choices';
import { SectionCard } from './section-card';
import { SectionSaver } from './section-saver';

@Component({
  selector: 'app-wishes-form',
  imports: [MatCheckbox, MatFormFieldModule, MatInput, MatSelectModule, ReactiveFormsModule, SectionCard],
  templateUrl: './wishes-form.html',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class WishesForm {
  readonly profile = input.required<MentoringProfile>();
  readonly saved = output<void>();
  private readonly fb = inject(NonNullableFormBuilder);
  protected readonly stages = STAGES;
  protected readonly sectorWishes = SECTOR_WISHES;
  protected readonly faultOf = faultOf;
  protected readonly form = this.fb.group({
    hopes: '',
    style: '',
    cannotHelpWith: '',
    wishedYearsMin: this.fb.control<number | null>(null),
    wishedYearsMax: this.fb.control<number | null>(null),
    wishedSector: this.fb.control<SectorWish>('any'),
    wishedStages: this.fb.control<CareerStage[]>([]),
    listed: false,
  });
  protected readonly saver = new SectionSaver(
    'wishes',
    this.form,
    () => this.form.getRawValue(),
    (content) => this.form.patchValue(content, { emitEvent: false }),
    () => this.saved.emit(),
  );

  constructor() {
    effect(() => {
      const { wishes, versions } = this.profile();
      untracked(() => this.saver.start(wishes, versions.wishes));
    });
  }
}

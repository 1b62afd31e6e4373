import { booleanAttribute, ChangeDetectionStrategy, Component, input, linkedSignal, output } from '@angular/core';
import { MatFormFieldModule } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import { numberToText, textToNumber } from './number-text';

/** A number with its unit and its sentence; what is being typed is never rewritten under the cursor. */
@Component({
  selector: 'app-number-field',
  imports: [MatFormFieldModule, MatInput],
  template: `
    <mat-form-field>
      <mat-label>{{ label() }}</mat-label>
      <input
        matInput
        type="number"
        [step]="step()"
        [value]="text()"
        [disabled]="locked()"
        [attr.aria-invalid]="fault() ? 'true' : null"
        (input)="type($event)"
        (change)="leave()"
      />
      @if (unit()) {
        <span matTextSuffix>{{ unit() }}</span>
      }
      @if (fault()) {
        <mat-hint class="fault">{{ fault() }}</mat-hint>
      } @else if (hint()) {
        <mat-hint>{{ hint() }}</mat-hint>
      }
    </mat-form-field>
  `,
  styleUrl: './number-field.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class NumberField {
  readonly label = input.required<string>();
  /** null where an optional number is left empty; NaN while what is typed is no number. */
  readonly value = input.required<number | null>();
  readonly unit = input('');
  readonly hint = input('');
  readonly fault = input('');
  readonly step = input<number | 'any'>(1);
  readonly locked = input(false);
  /** The value is in hundredths, the field in whole points. */
  readonly hundredths = input(false, { transform: booleanAttribute });
  readonly optional = input(false, { transform: booleanAttribute });
  readonly typed = output<number | null>();

  protected readonly text = linkedSignal<number | null, string>({
    source: this.value,
    computation: (value, previous) =>
      previous !== undefined && Object.is(this.read(previous.value), value) ? previous.value : this.write(value),
  });

  protected type(event: Event): void {
    const text = (event.target as HTMLInputElement).value;
    this.text.set(text);
    this.typed.emit(this.read(text));
  }

  /** Shows what was understood, once the field is left. */
  protected leave(): void {
    const value = this.value();
    if (value !== null && !Number.isNaN(value)) this.text.set(this.write(value));
  }

  private read(text: string): number | null {
    return textToNumber(text, { hundredths: this.hundredths(), optional: this.optional() });
  }

  private write(value: number | null): string {
    return numberToText(value, this.hundredths());
  }
}

import { DOCUMENT } from '@angular/common';
import {
  afterRenderEffect,
  ChangeDetectionStrategy,
  Component,
  ElementRef,
  inject,
  input,
  viewChild,
} from '@angular/core';

/** One field that needs another look; `field` is the id of its control, empty for a problem of the whole form. */
export interface FieldProblem {
  readonly field: string;
  readonly message: string;
}

/** What stands in the way of a form, at its top: takes focus when it appears and leads to each field. */
@Component({
  selector: 'app-problem-summary',
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './problem-summary.html',
  styleUrl: './problem-summary.scss',
})
export class ProblemSummary {
  readonly problems = input.required<readonly FieldProblem[]>();
  readonly title = input('Some fields need another look');

  private readonly document = inject(DOCUMENT);
  private readonly box = viewChild<ElementRef<HTMLElement>>('box');

  constructor() {
    // a new list of problems is news even if the box was there before
    afterRenderEffect(() => {
      if (this.problems().length > 0) this.box()?.nativeElement.focus();
    });
  }

  protected leadTo(event: Event, field: string): void {
    event.preventDefault();
    const control = this.document.getElementById(field);
    control?.scrollIntoView({ block: 'center' });
    control?.focus({ preventScroll: true });
  }
}

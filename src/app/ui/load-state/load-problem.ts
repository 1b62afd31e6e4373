import { ChangeDetectionStrategy, Component, input, output } from '@angular/core';
import { MatButton } from '@angular/material/button';

/** Says that something could not be fetched, and offers to try again. */
@Component({
  selector: 'app-load-problem',
  imports: [MatButton],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './load-problem.html',
  styleUrl: './load-problem.scss',
})
export class LoadProblem {
  readonly message = input('This could not be loaded.');
  readonly retried = output<void>();
}

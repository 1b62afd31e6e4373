import { ChangeDetectionStrategy, Component, input } from '@angular/core';

/** What an empty page or list says: what would be here, and, projected, the next step. */
@Component({
  selector: 'app-empty-state',
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './empty-state.html',
  styleUrl: './empty-state.scss',
})
export class EmptyState {
  readonly title = input.required<string>();
  readonly text = input('');
}

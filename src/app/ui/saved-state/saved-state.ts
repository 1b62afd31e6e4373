import { DatePipe } from '@angular/common';
import { ChangeDetectionStrategy, Component, input } from '@angular/core';

/** Where a form's last change is: nothing typed, on its way, kept, or refused with the reason. */
export type Saved =
  | { readonly kind: 'idle' }
  | { readonly kind: 'saving' }
  | { readonly kind: 'saved'; readonly at: Date | string }
  | { readonly kind: 'failed'; readonly message: string };

/** "Saving…", "Saved 14:32" or "Not saved: …", in one quiet line that screen readers follow. */
@Component({
  selector: 'app-saved-state',
  imports: [DatePipe],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './saved-state.html',
  styleUrl: './saved-state.scss',
  host: { role: 'status', '[class]': 'state().kind' },
})
export class SavedState {
  readonly state = input.required<Saved>();
}

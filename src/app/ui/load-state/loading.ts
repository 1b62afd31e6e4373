import { ChangeDetectionStrategy, Component, input } from '@angular/core';

/** Stands where something is on its way: bare warp, and the word for screen readers. */
@Component({
  selector: 'app-loading',
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './loading.html',
  styleUrl: './loading.scss',
  host: { role: 'status', 'aria-busy': 'true' },
})
export class Loading {
  readonly label = input('Loading…');
}

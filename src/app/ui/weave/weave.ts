import { ChangeDetectionStrategy, Component, input } from '@angular/core';

/** How far a stage has come: finished cloth, being woven, or bare warp. */
export type WeaveState = 'done' | 'now' | 'ahead';

/**
 * A strip of cloth that fills its host's width (or height, where a style sheet sets `--weave-lying: none` and
 * `--weave-standing: inline`). The three states differ in texture, so they survive a grey print. Decoration only.
 */
@Component({
  selector: 'app-weave',
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './weave.html',
  styleUrl: './weave.scss',
  host: { 'aria-hidden': 'true', '[class]': 'state()' },
})
export class Weave {
  readonly state = input.required<WeaveState>();
}

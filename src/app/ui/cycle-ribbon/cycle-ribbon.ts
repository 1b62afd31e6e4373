import { ChangeDetectionStrategy, Component, input } from '@angular/core';
import { RouterLink } from '@angular/router';
import { Weave, WeaveState } from '../weave/weave';

/** One station of work in a cycle, e.g. `{ key: 'responses', label: 'Responses', count: '12 of 40', note: 'by 16 Dec' }`. */
export interface RibbonStation {
  readonly key: string;
  readonly label: string;
  /** Where its work is done; null while there is nothing to open. */
  readonly link: string | readonly (string | number)[] | null;
  /** What is counted there, already in words: "239 in". */
  readonly count?: string;
  /** The date in words: "closed 12 Oct". */
  readonly note?: string;
  readonly state: WeaveState;
}

const STATE_IN_WORDS: Record<WeaveState, string> = { done: 'done', now: 'under way', ahead: 'ahead' };

/** The stations of a cycle as a strip of cloth, from left to right, or upright where it is narrow. */
@Component({
  selector: 'app-cycle-ribbon',
  imports: [RouterLink, Weave],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './cycle-ribbon.html',
  styleUrl: './cycle-ribbon.scss',
})
export class CycleRibbon {
  readonly stations = input.required<readonly RibbonStation[]>();
  /** Key of the station whose page is open. */
  readonly here = input<string | null>(null);
  readonly label = input('Stations of this cycle');

  protected readonly inWords = STATE_IN_WORDS;
}

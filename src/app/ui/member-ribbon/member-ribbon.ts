import { ChangeDetectionStrategy, Component, input } from '@angular/core';
import { RouterLink } from '@angular/router';
import { Weave, WeaveState } from '../weave/weave';

/** One step of a member's own way through a cycle. */
export interface MemberStep {
  readonly key: string;
  readonly label: string;
  /** The date in words: "2 October", "by 15 January", "today". */
  readonly date: string;
  readonly state: WeaveState;
  readonly link?: string | readonly (string | number)[] | null;
}

/** A member's steps with their dates, one below the other along a strip of cloth. */
@Component({
  selector: 'app-member-ribbon',
  imports: [RouterLink, Weave],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './member-ribbon.html',
  styleUrl: './member-ribbon.scss',
})
export class MemberRibbon {
  readonly steps = input.required<readonly MemberStep[]>();
  readonly label = input('Your steps');

  protected readonly inWords: Record<WeaveState, string> = { done: 'done', now: 'now', ahead: 'ahead' };
}

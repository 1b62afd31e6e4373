import { ChangeDetectionStrategy, Component, input } from '@angular/core';
import { RouterLink } from '@angular/router';
import { Avatar, Side } from '../avatar/avatar';

/** A person in a list: avatar, name, one line of detail, and whatever is projected at the far end. */
@Component({
  selector: 'app-person-line',
  imports: [Avatar, RouterLink],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './person-line.html',
  styleUrl: './person-line.scss',
})
export class PersonLine {
  readonly name = input.required<string>();
  readonly detail = input('');
  readonly side = input<Side | null>(null);
  readonly photoUrl = input<string | null>(null);
  readonly size = input<'small' | 'medium' | 'large'>('medium');
  readonly link = input<string | readonly (string | number)[] | null>(null);
}

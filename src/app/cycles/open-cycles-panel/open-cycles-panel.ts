import { ChangeDetectionStrategy, Component, computed, inject } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { RouterLink } from '@angular/router';
import { DayPipe } from '../../core/moments';
import { SessionStore } from '../../core/session-store';
import { CyclesClient } from '../cycles-client';

/** On the home page: cycles that take applications, with their dates. */
@Component({
  selector: 'app-open-cycles-panel',
  imports: [DayPipe, MatButton, RouterLink],
  template: `
    @for (cycle of open(); track cycle.id) {
      <section class="card stack" [attr.aria-label]="cycle.name">
        <h2>{{ cycle.name }} is open for applications</h2>
        @if (cycle.introduction) {
          <p class="prose">{{ cycle.introduction }}</p>
        }
        <dl class="pairs">
          <dt>Apply until the end of</dt>
          <dd>{{ cycle.applicationsCloseOn | day: 'long' }}</dd>
          <dt>You hear from us and answer by</dt>
          <dd>{{ cycle.answersDueOn | day: 'long' }}</dd>
          <dt>Pairs meet</dt>
          <dd>{{ cycle.startsOn | day }} – {{ cycle.endsOn | day }}</dd>
        </dl>
        <div class="actions">
          <a matButton="filled" [routerLink]="['/applications', cycle.id]">{{
            session.person() ? 'Apply' : 'Sign in and apply'
          }}</a>
        </div>
      </section>
    } @empty {
      @if (cycles.hasValue()) {
        <section class="card">
          <h2>No cycle is open for applications</h2>
          <p class="muted">When the next one opens, it appears here with its dates.</p>
        </section>
      }
    }
  `,
  styles: ':host { display: contents; }',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class OpenCyclesPanel {
  protected readonly session = inject(SessionStore);
  protected readonly cycles = inject(CyclesClient).cycles();
  protected readonly open = computed(() =>
    this.cycles.hasValue() ? this.cycles.value().cycles.filter((cycle) => cycle.phase === 'open') : [],
  );
}

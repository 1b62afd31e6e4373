import { ChangeDetectionStrategy, Component, input } from '@angular/core';
import type { Completeness } from '../../../../shared/profiles/profile-rules';
import { ShareBar } from '../../ui/share-bar/share-bar';

/** How complete a profile is, and why each missing thing matters for matching. */
@Component({
  selector: 'app-completeness-meter',
  imports: [ShareBar],
  template: `
    <section class="card stack stack--tight" aria-labelledby="completeness">
      <h2 id="completeness">
        {{
          completeness().percent === 100
            ? 'Your profile is complete'
            : 'Your profile is ' + completeness().percent + ' % complete'
        }}
      </h2>
      <app-share-bar [share]="completeness().percent / 100" />
      @if (completeness().missing.length > 0) {
        <ul class="line-list plain-list">
          @for (item of completeness().missing; track item.text) {
            <li class="cluster">
              <a [href]="'/profiles/mine#section-' + item.section">{{ item.text }}</a>
              @if (item.needed) {
                <span class="badge badge--waiting">needed</span>
              }
              <span class="muted">{{ item.why }}</span>
            </li>
          }
        </ul>
      }
    </section>
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class CompletenessMeter {
  readonly completeness = input.required<Completeness>();
}

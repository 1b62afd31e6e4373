import { ChangeDetectionStrategy, Component, input } from '@angular/core';
import type { ImportFault } from '../../../../shared/applications/applications-contract';

/** What is wrong with a file, by line and column. */
@Component({
  selector: 'app-import-faults',
  template: `
    @if (unknownTags().length > 0) {
      <p>
        Tags that the vocabulary lacks: <bdi>{{ unknownTags().join(', ') }}</bdi>. Write them as the vocabulary does, or
        add them there first.
      </p>
    }
    <div class="table-scroll table-scroll--tall" tabindex="0" role="region" aria-label="Faults">
      <table class="data-table data-table--compact">
        <thead>
          <tr>
            <th scope="col" class="number">Line</th>
            <th scope="col">Column</th>
            <th scope="col">Cell</th>
            <th scope="col">What is wrong</th>
          </tr>
        </thead>
        <tbody>
          @for (fault of faults(); track $index) {
            <tr>
              <td class="number">{{ fault.line }}</td>
              <td>{{ fault.column }}</td>
              <td dir="auto">{{ fault.value }}</td>
              <td>{{ fault.message }}</td>
            </tr>
          }
        </tbody>
      </table>
    </div>
    @if (faults().length < count()) {
      <p class="muted">The first {{ faults().length }} of {{ count() }} are shown.</p>
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ImportFaults {
  readonly faults = input.required<readonly ImportFault[]>();
  readonly count = input.required<number>();
  readonly unknownTags = input.required<readonly string[]>();
}

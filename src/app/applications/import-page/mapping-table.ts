import { ChangeDetectionStrategy, Component, computed, input, output } from '@angular/core';
import { MatFormFieldModule } from '@angular/material/form-field';
import { MatSelectModule } from '@angular/material/select';
import {
  IMPORT_FIELDS,
  type ImportField,
  type ImportMapping,
} from '../../../../shared/applications/applications-contract';
import { IMPORT_FIELD_LABEL, REQUIRED_FIELDS } from '../../../../shared/applications/import-columns';

/** One line a field: which column fills it, and what stands there in the first lines of the file. */
@Component({
  selector: 'app-mapping-table',
  imports: [MatFormFieldModule, MatSelectModule],
  template: `
    <div class="table-scroll" tabindex="0" role="region" aria-label="Columns of the file">
      <table class="data-table">
        <thead>
          <tr>
            <th scope="col">Field</th>
            <th scope="col">Column of the file</th>
            <th scope="col">First lines</th>
          </tr>
        </thead>
        <tbody>
          @for (field of fields(); track field.key) {
            <tr>
              <th scope="row">
                {{ field.label }}
                @if (field.required) {
                  <span class="sub">needed</span>
                }
              </th>
              <td>
                <mat-form-field>
                  <mat-label>Column</mat-label>
                  <mat-select
                    [aria-label]="'Column for: ' + field.label"
                    [value]="field.column"
                    [disabled]="disabled()"
                    (valueChange)="choose(field.key, $event)"
                  >
                    <mat-option [value]="undefined">Leave as it is</mat-option>
                    @for (column of columns(); track column) {
                      <mat-option [value]="column">{{ column }}</mat-option>
                    }
                  </mat-select>
                </mat-form-field>
              </td>
              <td class="muted">{{ field.sample }}</td>
            </tr>
          }
        </tbody>
      </table>
    </div>
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class MappingTable {
  readonly columns = input.required<readonly string[]>();
  readonly mapping = input.required<ImportMapping>();
  readonly sample = input.required<readonly Readonly<Record<string, string>>[]>();
  readonly disabled = input(false);
  readonly changed = output<ImportMapping>();

  protected readonly fields = computed(() =>
    IMPORT_FIELDS.map((key) => {
      const column = this.mapping()[key];
      const cells = column === undefined ? [] : this.sample().map((line) => line[column] ?? '');
      return {
        key,
        label: IMPORT_FIELD_LABEL[key],
        required: REQUIRED_FIELDS.includes(key),
        column,
        sample: cells
          .filter((cell) => cell !== '')
          .slice(0, 3)
          .join(' · ')
          .slice(0, 120),
      };
    }),
  );

  protected choose(field: ImportField, column: string | undefined): void {
    const entries = Object.entries({ ...this.mapping(), [field]: column }).filter(([, value]) => value !== undefined);
    this.changed.emit(Object.fromEntries(entries) as ImportMapping);
  }
}

import { ChangeDetectionStrategy, Component, computed, inject, input, signal } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { MatProgressBar } from '@angular/material/progress-bar';
import { RouterLink } from '@angular/router';
import { catchError, EMPTY, finalize, type Observable, of, switchMap } from 'rxjs';
import {
  ImportMapping,
  type ImportPreview,
  type ImportResult,
} from '../../../../shared/applications/applications-contract';
import { mappingFor } from '../../../../shared/applications/import-columns';
import type { ProblemDetails } from '../../../../shared/problems/problems';
import { CycleStore } from '../../core/cycle-store';
import { problemOf } from '../../core/problems';
import { counted, PluralPipe } from '../../ui/format/plural-pipe';
import { PageHeader } from '../../ui/page-header/page-header';
import { ProblemSummary } from '../../ui/problem-summary/problem-summary';
import { ApplicationsClient } from '../applications-client';
import { keep, readKept } from '../kept';
import { type ChosenFile, readChosenFile } from './chosen-file';
import { ImportFaults } from './import-faults';
import { MappingTable } from './mapping-table';

const KEY = 'heddle-import-mapping';

/** Coordinators bring in a list: choose the file, say what its columns mean, see what would happen, import it whole. */
@Component({
  selector: 'app-import-page',
  imports: [ImportFaults, MappingTable, MatButton, MatProgressBar, PageHeader, PluralPipe, ProblemSummary, RouterLink],
  templateUrl: './import-page.html',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ImportPage {
  readonly cycleId = input.required<string>();

  private readonly client = inject(ApplicationsClient);
  private readonly store = inject(CycleStore);
  protected readonly crumbs = computed(() => [{ label: 'Applicants', link: `/cycles/${this.cycleId()}/applications` }]);
  protected readonly file = signal<ChosenFile | null>(null);
  protected readonly preview = signal<ImportPreview | null>(null);
  protected readonly result = signal<ImportResult | null>(null);
  protected readonly problems = signal<{ field: string; message: string }[]>([]);
  protected readonly title = signal('');
  protected readonly busy = signal<'' | 'reading' | 'importing'>('');
  protected readonly ready = computed(() => this.preview()?.faultCount === 0 && this.busy() === '');
  protected readonly outcome = computed(() => {
    const done = this.result();
    if (!done) return '';
    const people = `${counted(done.newPeople, 'new person', 'new people')}, ${counted(done.updatedPeople, 'known person', 'known people')}`;
    const made = `${counted(done.newApplications, 'new application', 'new applications')}, ${counted(done.updatedApplications, 'updated', 'updated')}`;
    return `${counted(done.imported, 'line is', 'lines are')} imported: ${people}; ${made}.`;
  });

  protected async choose(event: Event): Promise<void> {
    const field = event.target as HTMLInputElement;
    const chosen = field.files?.[0];
    // The same file, put right meanwhile, can be chosen again.
    field.value = '';
    if (!chosen) return;
    this.start();
    try {
      const file = await readChosenFile(chosen);
      this.file.set(file);
      this.look(file);
    } catch (error) {
      this.refuse(error instanceof Error ? error.message : 'The file could not be read');
    }
  }

  /** Looks at the file anew with other columns, and remembers them for the next list. */
  protected map(mapping: ImportMapping): void {
    const file = this.file();
    if (!file) return;
    keep(KEY, mapping);
    this.ask(this.client.previewImport(this.cycleId(), { ...file, mapping }));
  }

  protected bringIn(): void {
    const file = this.file();
    const preview = this.preview();
    if (!file || !preview) return;
    this.busy.set('importing');
    this.client
      .importFile(this.cycleId(), { ...file, mapping: preview.mapping })
      .pipe(finalize(() => this.busy.set('')))
      .subscribe({
        next: (result) => {
          this.store.reload();
          this.result.set(result);
          this.preview.set(null);
          this.file.set(null);
        },
        error: (error: unknown) => this.tell(problemOf(error), 'Nothing was imported'),
      });
  }

  private look(file: ChosenFile): void {
    const kept = readKept(KEY, ImportMapping);
    const guessed = this.client.previewImport(this.cycleId(), file);
    this.ask(
      guessed.pipe(
        switchMap((preview) => {
          // The columns chosen last time win where this file still has them; the guess fills what they leave open.
          const fitting = kept && mappingFor(preview.columns, kept);
          const mapping = fitting ? withoutTwice({ ...preview.mapping, ...fitting }, fitting) : preview.mapping;
          const same = JSON.stringify(mapping) === JSON.stringify(preview.mapping);
          return same ? of(preview) : this.client.previewImport(this.cycleId(), { ...file, mapping });
        }),
      ),
    );
  }

  private ask(call: Observable<ImportPreview>): void {
    this.busy.set('reading');
    this.problems.set([]);
    call
      .pipe(
        finalize(() => this.busy.set('')),
        catchError((error: unknown) => {
          this.tell(problemOf(error), '');
          return EMPTY;
        }),
      )
      .subscribe((preview) => this.preview.set(preview));
  }

  private start(): void {
    this.problems.set([]);
    this.preview.set(null);
    this.result.set(null);
    this.file.set(null);
  }

  private refuse(message: string): void {
    this.title.set('This file cannot be imported');
    this.problems.set([{ field: '', message }]);
  }

  private tell(problem: ProblemDetails, prefix: string): void {
    const said = problem.title.startsWith(prefix) ? problem.title : `${prefix}. ${problem.title}`;
    this.title.set(said);
    const lines = (problem.fields ?? []).map((fault) => ({ field: '', message: `${fault.field}: ${fault.message}` }));
    this.problems.set(lines.length > 0 ? lines : [{ field: '', message: problem.detail ?? problem.title }]);
  }
}

/** A column that was chosen for one field is not guessed for another. */
function withoutTwice(mapping: ImportMapping, chosen: ImportMapping): ImportMapping {
  const taken = new Set(Object.values(chosen));
  const entries = Object.entries(mapping).filter(([field, column]) => field in chosen || !taken.has(column));
  return Object.fromEntries(entries) as ImportMapping;
}

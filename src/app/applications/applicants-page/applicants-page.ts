import { ChangeDetectionStrategy, Component, computed, inject, input, linkedSignal, signal } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { MatCheckbox } from '@angular/material/checkbox';
import { MatDialog } from '@angular/material/dialog';
import { MatFormFieldModule } from '@angular/material/form-field';
import { MatPaginator, type PageEvent } from '@angular/material/paginator';
import { MatSelectModule } from '@angular/material/select';
import { Router, RouterLink } from '@angular/router';
import { concatMap, filter, from, last } from 'rxjs';
import {
  type AdmissionDecision,
  type AdmissionOutcome,
  type ApplicantLine,
  type ApplicantsPage,
  ApplicantsQuery,
} from '../../../../shared/applications/applications-contract';
import { CycleStore } from '../../core/cycle-store';
import { Notices } from '../../core/notices';
import { orEmpty } from '../../core/query-inputs';
import { confirmWith } from '../../ui/confirm-dialog/confirm-dialog';
import { EmptyState } from '../../ui/empty-state/empty-state';
import { counted, PluralPipe } from '../../ui/format/plural-pipe';
import { LoadProblem } from '../../ui/load-state/load-problem';
import { Loading } from '../../ui/load-state/loading';
import { PageHeader } from '../../ui/page-header/page-header';
import { ApplicationsClient } from '../applications-client';
import { openDrawer } from './applicant-drawer';
import { ApplicantFilters } from './applicant-filters';
import { ApplicantsTable } from './applicants-table';
import { APPLICANT_COLUMNS, COLUMN_LABEL, TableLook } from './table-look';

type DecidedStatus = AdmissionDecision['status'];
const DONE: Record<DecidedStatus, string> = {
  admitted: 'admitted',
  'waiting-list': 'put on the waiting list',
  withdrawn: 'withdrawn',
  submitted: 'put back to submitted',
};

/** Coordinators: the applicants of a cycle, to be found, looked at and admitted. The address holds what is shown. */
@Component({
  selector: 'app-applicants-page',
  imports: [
    ApplicantFilters,
    ApplicantsTable,
    EmptyState,
    LoadProblem,
    Loading,
    MatButton,
    MatCheckbox,
    MatFormFieldModule,
    MatPaginator,
    MatSelectModule,
    PageHeader,
    PluralPipe,
    RouterLink,
  ],
  templateUrl: './applicants-page.html',
  styleUrl: './applicants-page.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ApplicantsPageView {
  readonly cycleId = input.required<string>();
  readonly search = input('', { transform: orEmpty });
  readonly side = input<string>();
  readonly status = input<string>();
  readonly region = input<string>();
  readonly tag = input<string>();
  readonly flagged = input<string>();
  readonly sort = input<string>();
  readonly direction = input<string>();
  readonly page = input<string>();
  readonly pageSize = input<string>();

  private readonly client = inject(ApplicationsClient);
  private readonly router = inject(Router);
  private readonly notices = inject(Notices);
  private readonly dialog = inject(MatDialog);
  private readonly store = inject(CycleStore);

  protected readonly look = new TableLook();
  protected readonly columns = APPLICANT_COLUMNS.map((key) => ({ key, label: COLUMN_LABEL[key] }));
  protected readonly query = computed((): ReturnType<typeof ApplicantsQuery.parse> => {
    const asked = {
      search: this.search(),
      side: this.side(),
      status: this.status(),
      region: this.region(),
      tag: this.tag(),
      flagged: this.flagged(),
      sort: this.sort(),
      direction: this.direction(),
      page: this.page(),
      pageSize: this.pageSize(),
    };
    // An address that somebody wrote by hand shows everything rather than nothing.
    const read = ApplicantsQuery.safeParse(asked);
    return read.success ? read.data : ApplicantsQuery.parse({});
  });
  protected readonly applicants = this.client.applicants(this.cycleId, this.query);
  /** While the next page is on its way the one before stays, so that nothing jumps. */
  protected readonly shown = linkedSignal<ApplicantsPage | null, ApplicantsPage | null>({
    source: () => (this.applicants.hasValue() ? this.applicants.value() : null),
    computation: (now, before) => now ?? before?.value ?? null,
  });
  private readonly vocabulary = this.client.tags();
  protected readonly tags = computed(() =>
    this.vocabulary.hasValue() ? this.vocabulary.value().tags.filter((tag) => tag.state !== 'retired') : [],
  );
  protected readonly filtered = computed(() => {
    const { search, side, status, region, tag, flagged } = this.query();
    return Boolean(search || side || status || region || tag || flagged);
  });
  protected readonly exportAddress = computed(() => this.client.exportAddress(this.cycleId(), this.query()));
  protected readonly chosen = signal<ReadonlyMap<string, ApplicantLine>>(new Map());
  protected readonly emptyChoice: ReadonlyMap<string, ApplicantLine> = new Map();
  protected readonly refused = signal<AdmissionOutcome['refused']>([]);
  protected readonly busy = signal(false);

  protected show(queryParams: Record<string, string | number | null>): void {
    void this.router.navigate([], { queryParams: { page: null, ...queryParams }, queryParamsHandling: 'merge' });
  }

  protected turn({ pageIndex, pageSize }: PageEvent): void {
    this.show({ page: pageIndex + 1, pageSize });
  }

  protected open(line: ApplicantLine): void {
    openDrawer(this.dialog, { cycleId: this.cycleId(), applicationId: line.id, name: line.name });
  }

  protected admit(): void {
    this.decide('admitted');
  }

  protected wait(): void {
    this.decide('waiting-list');
  }

  protected withdraw(): void {
    const lines = [...this.chosen().values()];
    confirmWith(this.dialog, {
      title: `Withdraw ${counted(lines.length, 'application', 'applications')}?`,
      text: 'These applicants take no part in the cycle. Each of them gets a message that says so. Undo brings the applications back, but neither messages nor proposals that are taken back now.',
      affectedLabel: 'Applications that are withdrawn:',
      affected: lines.map((line) => `${line.name}, ${line.side}`),
      confirm: 'Withdraw',
      tone: 'remove',
    })
      .pipe(filter((sure) => sure))
      .subscribe(() => this.decide('withdrawn'));
  }

  private decide(status: DecidedStatus): void {
    const applicationIds = [...this.chosen().keys()];
    this.busy.set(true);
    this.client.decide(this.cycleId(), { status, applicationIds }).subscribe({
      next: (outcome) => this.decided(status, outcome),
      error: (error: unknown) => {
        this.busy.set(false);
        this.notices.tell(error);
      },
    });
  }

  private decided(status: DecidedStatus, { changed, refused }: AdmissionOutcome): void {
    this.busy.set(false);
    this.refused.set(refused);
    this.chosen.set(new Map());
    this.reload();
    const said = `${counted(changed.length, 'application', 'applications')} ${DONE[status]}`;
    const rest = refused.length > 0 ? `; ${counted(refused.length, 'stays', 'stay')} as before` : '';
    if (changed.length === 0) this.notices.say('Nothing was changed; the page says why');
    else this.notices.offer(said + rest, 'Undo', () => this.undo(changed));
  }

  /** Puts every application back to where it came from. */
  private undo(changed: AdmissionOutcome['changed']): void {
    const back = (['submitted', 'admitted', 'waiting-list', 'withdrawn'] as const)
      .map((status) => ({
        status,
        applicationIds: changed.filter((each) => each.from === status).map((each) => each.id),
      }))
      .filter((decision) => decision.applicationIds.length > 0);
    from(back)
      .pipe(
        concatMap((decision) => this.client.decide(this.cycleId(), decision)),
        last(),
      )
      .subscribe({
        next: () => {
          this.notices.say('Undone: the applications are as they were');
          this.reload();
        },
        error: (error: unknown) => {
          this.notices.tell(error);
          this.reload();
        },
      });
  }

  /** The frame's counts change with the table. */
  private reload(): void {
    this.applicants.reload();
    this.store.reload();
  }
}

import { ChangeDetectionStrategy, Component, computed, input, output, signal } from '@angular/core';
import { MatPaginator, type PageEvent } from '@angular/material/paginator';
import { FitPipe } from '../../ui/format/fit-pipe';
import { FitStrip } from '../../ui/fit-strip/fit-strip';
import { FitStripHeader } from '../../ui/fit-strip/fit-strip-header';
import { ShareBar } from '../../ui/share-bar/share-bar';
import { type PairingRow, type PairingSort, sortedRows, whereabouts } from './plan-view';

const PAGE_SIZE = 50;

/** Every pairing with its fit by criterion; choosing one opens it beside the table. */
@Component({
  selector: 'app-pairings-table',
  imports: [FitPipe, FitStrip, FitStripHeader, MatPaginator, ShareBar],
  templateUrl: './pairings-table.html',
  styleUrl: './pairings-table.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class PairingsTable {
  readonly rows = input.required<readonly PairingRow[]>();
  /** Application of the mentee whose pairing is open. */
  readonly chosen = input<string | null>(null);
  readonly opened = output<string>();

  protected readonly sort = signal<PairingSort>('mentee');
  protected readonly descending = signal(false);
  private readonly page = signal(0);
  protected readonly pageSize = PAGE_SIZE;
  private readonly sorted = computed(() => sortedRows(this.rows(), this.sort(), this.descending()));
  protected readonly pageIndex = computed(() =>
    Math.min(this.page(), Math.floor(Math.max(0, this.rows().length - 1) / PAGE_SIZE)),
  );
  protected readonly shown = computed(() =>
    this.sorted().slice(this.pageIndex() * PAGE_SIZE, (this.pageIndex() + 1) * PAGE_SIZE),
  );
  protected readonly criteria = computed(() => this.rows()[0]?.criteria ?? []);
  protected readonly steady = computed(() => this.rows().some((row) => row.pairing.stays !== null));
  protected readonly whereabouts = whereabouts;

  protected order(sort: PairingSort): void {
    this.descending.set(this.sort() === sort ? !this.descending() : sort === 'fit' || sort === 'stays');
    this.sort.set(sort);
  }

  protected direction(sort: PairingSort): 'ascending' | 'descending' | 'none' {
    if (this.sort() !== sort) return 'none';
    return this.descending() ? 'descending' : 'ascending';
  }

  protected turn(event: PageEvent): void {
    this.page.set(event.pageIndex);
  }
}

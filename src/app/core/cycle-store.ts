import { httpResource } from '@angular/common/http';
import { computed, Injectable, signal, untracked } from '@angular/core';
import { Cycle } from '../../../shared/cycles/cycles-contract';

/** The cycle whose pages are open: shared by its frame and the pages inside, whichever capability they belong to. */
@Injectable({ providedIn: 'root' })
export class CycleStore {
  private readonly id = signal<string | null>(null);
  readonly resource = httpResource(
    () => {
      const id = this.id();
      return id ? `/api/cycles/${id}` : undefined;
    },
    { parse: Cycle.parse },
  );
  readonly cycle = computed(() => {
    const cycle = this.resource.hasValue() ? this.resource.value() : null;
    return cycle && cycle.id === this.id() ? cycle : null;
  });

  /** Opening the same cycle once more asks for it anew: counts may have changed while it was left. */
  open(cycleId: string): void {
    if (untracked(this.id) === cycleId) untracked(() => this.reload());
    else this.id.set(cycleId);
  }

  /** After a deed that changes counts or the phase. */
  reload(): void {
    this.resource.reload();
  }
}

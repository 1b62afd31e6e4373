import { ChangeDetectionStrategy, Component, inject } from '@angular/core';
import type { AnswerForm, OwnPairing } from '../../../../shared/pairings/pairings-contract';
import { EmptyState } from '../../ui/empty-state/empty-state';
import { LoadProblem } from '../../ui/load-state/load-problem';
import { Loading } from '../../ui/load-state/loading';
import { PageHeader } from '../../ui/page-header/page-header';
import { PairingsClient } from '../pairings-client';
import { ProposalCard } from '../proposal-card/proposal-card';

/** One's own proposals and pairs. */
@Component({
  selector: 'app-pairings-page',
  imports: [EmptyState, LoadProblem, Loading, PageHeader, ProposalCard],
  template: `
    <div class="page page--narrow">
      <app-page-header
        title="Proposals and pairs"
        subtitle="What is proposed to you, what you answered, and who your partners are."
      />
      @if (pairings.hasValue()) {
        @for (pairing of pairings.value().pairings; track pairing.id) {
          <app-proposal-card [pairing]="pairing" [send]="sender(pairing)" (answered)="pairings.reload()" />
        } @empty {
          <app-empty-state
            title="No proposal yet"
            text="When the coordinators have matched a cycle that you applied to, your proposal appears here and comes by e-mail."
          />
        }
      } @else if (pairings.error()) {
        <app-load-problem message="Your pairings could not be loaded." (retried)="pairings.reload()" />
      } @else {
        <app-loading />
      }
    </div>
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class PairingsPage {
  private readonly client = inject(PairingsClient);
  protected readonly pairings = this.client.mine();

  protected sender(pairing: OwnPairing): (form: AnswerForm) => ReturnType<PairingsClient['answer']> {
    return (form) => this.client.answer(pairing.id, form);
  }
}

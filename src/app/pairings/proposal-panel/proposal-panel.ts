import { ChangeDetectionStrategy, Component, computed, inject } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { RouterLink } from '@angular/router';
import type { OwnPairing } from '../../../../shared/pairings/pairings-contract';
import { MomentPipe } from '../../core/moments';
import { PersonLine } from '../../ui/person-line/person-line';
import { PairingsClient } from '../pairings-client';

/** On the home page: proposals that wait for an answer, and pairs under way. Nothing where there is none. */
@Component({
  selector: 'app-proposal-panel',
  imports: [MatButton, MomentPipe, PersonLine, RouterLink],
  template: `
    @for (pairing of waiting(); track pairing.id) {
      <section class="card stack" [attr.aria-label]="'Proposal: ' + pairing.partner.name">
        <h2>{{ pairing.mayAnswer ? 'A pairing for you' : 'Your answer is in' }}</h2>
        <app-person-line
          [name]="pairing.partner.name"
          [detail]="pairing.partner.headline || 'your ' + otherSide(pairing) + ' in ' + pairing.cycleName"
          [side]="otherSide(pairing)"
        />
        <p>
          @if (pairing.mayAnswer) {
            {{ pairing.cycleName }}: please answer by {{ pairing.answersDueAt | moment: 'long' }}.
          } @else {
            You have accepted. We wait for {{ pairing.partner.name }}.
          }
        </p>
        <div class="actions">
          @if (pairing.mayAnswer) {
            <a matButton="filled" routerLink="/pairings">Read and answer</a>
          } @else {
            <a matButton="outlined" routerLink="/pairings">Open</a>
          }
        </div>
      </section>
    }
    @if (pairs().length > 0) {
      <section class="card stack" aria-labelledby="pairs-heading">
        <h2 id="pairs-heading">Your pairs</h2>
        @for (pairing of pairs(); track pairing.id) {
          <app-person-line
            [name]="pairing.partner.name"
            [detail]="'your ' + otherSide(pairing) + ' in ' + pairing.cycleName"
            [side]="otherSide(pairing)"
            link="/pairings"
          />
        }
      </section>
    }
  `,
  styles: ':host { display: contents; }',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ProposalPanel {
  private readonly pairings = inject(PairingsClient).mine();
  private readonly list = computed(() => (this.pairings.hasValue() ? this.pairings.value().pairings : []));
  protected readonly waiting = computed(() => this.list().filter((pairing) => pairing.state === 'pending'));
  protected readonly pairs = computed(() => this.list().filter((pairing) => pairing.state === 'under-way'));

  protected otherSide(pairing: OwnPairing): 'mentor' | 'mentee' {
    return pairing.mySide === 'mentee' ? 'mentor' : 'mentee';
  }
}

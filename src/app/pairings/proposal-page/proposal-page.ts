import { ChangeDetectionStrategy, Component, computed, inject, input } from '@angular/core';
import { RouterLink } from '@angular/router';
import type { AnswerForm } from '../../../../shared/pairings/pairings-contract';
import { problemOf } from '../../core/problems';
import { SessionStore } from '../../core/session-store';
import { LoadProblem } from '../../ui/load-state/load-problem';
import { Loading } from '../../ui/load-state/loading';
import { PageHeader } from '../../ui/page-header/page-header';
import { PairingsClient } from '../pairings-client';
import { ProposalCard } from '../proposal-card/proposal-card';

/** Where the link of an e-mail leads: the proposal with its two buttons. Opening the page answers nothing. */
@Component({
  selector: 'app-proposal-page',
  imports: [LoadProblem, Loading, PageHeader, ProposalCard, RouterLink],
  template: `
    <div class="page page--narrow">
      @if (proposal.hasValue()) {
        <app-page-header title="A pairing for you" [subtitle]="subtitle()" />
        <app-proposal-card [pairing]="proposal.value()" [send]="send" (answered)="proposal.reload()" />
        @if (session.person()) {
          <p><a routerLink="/pairings">All your proposals and pairs</a></p>
        } @else {
          <p class="muted">
            You need not sign in to answer here. Please do not pass this link on: whoever has it can answer for you.
          </p>
        }
      } @else if (proposal.error(); as error) {
        @if (unknown(error)) {
          <app-page-header
            title="This link does not lead to a proposal"
            subtitle="It may be cut short, or the proposal no longer exists."
          />
          <p>
            Open the link in the e-mail once more, or <a routerLink="/accounts/sign-in">sign in</a>: your proposals are
            listed under Pairs.
          </p>
        } @else {
          <app-load-problem message="The proposal could not be loaded." (retried)="proposal.reload()" />
        }
      } @else {
        <app-loading />
      }
    </div>
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ProposalPage {
  readonly token = input.required<string>();

  private readonly client = inject(PairingsClient);
  protected readonly session = inject(SessionStore);
  protected readonly proposal = this.client.proposal(this.token);
  protected readonly subtitle = computed(() =>
    this.proposal.hasValue()
      ? `${this.proposal.value().cycleName}: you would be the ${this.proposal.value().mySide}.`
      : '',
  );
  protected readonly send = (form: AnswerForm) => this.client.answerByLink(this.token(), form);

  protected unknown(error: unknown): boolean {
    return problemOf(error).code === 'not-found' || problemOf(error).code === 'invalid';
  }
}

import { ChangeDetectionStrategy, Component, inject } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { RouterLink } from '@angular/router';
import { ApplicationsPanel } from '../applications/applications-panel/applications-panel';
import { SessionStore } from '../core/session-store';
import { CyclesPanel } from '../cycles/cycles-panel/cycles-panel';
import { OpenCyclesPanel } from '../cycles/open-cycles-panel/open-cycles-panel';
import { ProposalPanel } from '../pairings/proposal-panel/proposal-panel';
import { CompletenessPanel } from '../profiles/completeness-panel/completeness-panel';
import { PageHeader } from '../ui/page-header/page-header';

/** The start page: composed of the capabilities' panels, for visitors and for people who are signed in. */
@Component({
  selector: 'app-home-page',
  imports: [
    ApplicationsPanel,
    CompletenessPanel,
    CyclesPanel,
    MatButton,
    OpenCyclesPanel,
    PageHeader,
    ProposalPanel,
    RouterLink,
  ],
  templateUrl: './home-page.html',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class HomePage {
  protected readonly session = inject(SessionStore);
}

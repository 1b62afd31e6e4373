import { ChangeDetectionStrategy, Component, computed, inject, input, linkedSignal, signal } from '@angular/core';
import { takeUntilDestroyed, toObservable } from '@angular/core/rxjs-interop';
import { MatButton } from '@angular/material/button';
import { MatRadioModule } from '@angular/material/radio';
import { catchError, EMPTY, type Observable, switchMap, tap, timer } from 'rxjs';
import { CycleSettings } from '../../../../shared/cycles/cycles-contract';
import { mayEditSettings } from '../../../../shared/cycles/phase-rules';
import type { RuleEffects } from '../../../../shared/matching/effects-contract';
import {
  Aim,
  AIM_LABEL,
  type CriterionSetting,
  type MatchingSettings,
  type RuleSetting,
} from '../../../../shared/matching/matching-contract';
import { CycleStore } from '../../core/cycle-store';
import { MomentPipe } from '../../core/moments';
import { Notices } from '../../core/notices';
import { problemOf } from '../../core/problems';
import { LoadProblem } from '../../ui/load-state/load-problem';
import { Loading } from '../../ui/load-state/loading';
import { PageHeader } from '../../ui/page-header/page-header';
import { CriterionList } from './criterion-list';
import { EffectPanel } from './effect-panel';
import { FurtherSettings } from './further-settings';
import { RuleList } from './rule-list';
import { RulesClient } from './rules-client';
import { sameSettings, withCriterion, withRule } from './settings-changes';
import { faultsOfSettings } from './settings-faults';
import { SettingsHistory } from './settings-history';
import { StaleNotice } from './stale-notice';

const PAUSE_MS = 300;

/** Rules and criteria of a cycle: change one and see what it does, then save; a colleague's save is never overwritten unseen. */
@Component({
  selector: 'app-rules-page',
  imports: [
    CriterionList,
    EffectPanel,
    FurtherSettings,
    LoadProblem,
    Loading,
    MatButton,
    MatRadioModule,
    MomentPipe,
    PageHeader,
    RuleList,
    SettingsHistory,
    StaleNotice,
  ],
  templateUrl: './rules-page.html',
  styleUrl: './rules-page.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
  host: { '(window:beforeunload)': 'keep($event)' },
})
export class RulesPage {
  readonly cycleId = input.required<string>();

  private readonly client = inject(RulesClient);
  private readonly notices = inject(Notices);
  private readonly store = inject(CycleStore);
  protected readonly resource = this.client.settings(this.cycleId);
  protected readonly history = this.client.history(this.cycleId);
  protected readonly saved = linkedSignal(() => (this.resource.hasValue() ? this.resource.value() : null));
  protected readonly draft = linkedSignal(() => this.saved()?.settings ?? null);
  protected readonly theirs = signal<CycleSettings | null>(null);
  protected readonly busy = signal(false);
  protected readonly refusal = signal('');
  protected readonly effects = signal<RuleEffects | null>(null);
  protected readonly effectState = signal('');

  protected readonly aims = Aim.options.map((aim) => ({ aim, label: AIM_LABEL[aim] }));
  protected readonly locked = computed(() => {
    const cycle = this.store.cycle();
    return cycle !== null && !mayEditSettings(cycle.phase);
  });
  protected readonly faults = computed(() => {
    const draft = this.draft();
    return draft ? faultsOfSettings(draft) : new Map<string, string>();
  });
  protected readonly generalFault = computed(() => this.faults().get('criteria') ?? this.faults().get('rules') ?? '');
  protected readonly dirty = computed(() => {
    const [saved, draft] = [this.saved(), this.draft()];
    return saved !== null && draft !== null && !sameSettings(saved.settings, draft);
  });
  /** Empty where all that stands here is saved. */
  protected readonly keeping = computed(() => {
    if (this.busy()) return 'Saving …';
    if (!this.dirty() && this.faults().size === 0) return '';
    return this.faults().size > 0
      ? 'Not saved: at least one field has to be put right first'
      : 'Changes are not saved yet';
  });
  private readonly valid = computed(() => (this.faults().size === 0 ? this.draft() : null));

  constructor() {
    toObservable(this.valid)
      .pipe(
        tap((settings) => this.effectState.set(this.waiting(settings))),
        // The pause stands inside: a further change also drops the request that is under way.
        switchMap((settings) => (settings ? timer(PAUSE_MS).pipe(switchMap(() => this.effectOf(settings))) : EMPTY)),
        takeUntilDestroyed(),
      )
      .subscribe((found) => {
        this.effects.set(found);
        this.effectState.set('Of the applicants admitted now');
      });
  }

  protected keep(event: BeforeUnloadEvent): void {
    if (this.dirty()) event.preventDefault();
  }

  protected change(change: Partial<MatchingSettings>): void {
    const draft = this.draft();
    if (draft) this.draft.set({ ...draft, ...change });
  }

  protected changeRule(rule: RuleSetting): void {
    const draft = this.draft();
    if (draft) this.draft.set(withRule(draft, rule));
  }

  protected changeCriterion(criterion: CriterionSetting): void {
    const draft = this.draft();
    if (draft) this.draft.set(withCriterion(draft, criterion));
  }

  protected undo(): void {
    const saved = this.saved();
    if (saved) this.draft.set(saved.settings);
    this.refusal.set('');
  }

  protected save(version = this.saved()?.version ?? 0): void {
    const draft = this.draft();
    if (!draft || this.faults().size > 0) return;
    this.busy.set(true);
    this.refusal.set('');
    this.client.save(this.cycleId(), draft, version).subscribe({
      next: (saved) => {
        // What was typed while the answer was on its way stays, unsaved.
        const later = this.draft() === draft ? null : this.draft();
        this.begin(saved);
        if (later) this.draft.set(later);
        this.notices.say('Saved. Runs from now on use these rules and criteria.');
      },
      error: (error: unknown) => this.refuse(error),
    });
  }

  protected takeTheirs(): void {
    const theirs = this.theirs();
    if (!theirs) return;
    this.begin(theirs);
    this.notices.say('Your changes are set aside. These are the settings as they are saved.');
  }

  private begin(saved: CycleSettings): void {
    this.busy.set(false);
    this.theirs.set(null);
    this.saved.set(saved);
    this.history.reload();
    this.store.reload();
  }

  private refuse(error: unknown): void {
    const problem = problemOf(error);
    this.busy.set(false);
    const current = problem.code === 'stale' ? CycleSettings.safeParse(problem.current) : null;
    if (current?.success) this.theirs.set(current.data);
    else this.refusal.set([problem.title, problem.detail].filter(Boolean).join('. '));
    // The phase may have moved on: then the fields lock.
    if (problem.code === 'conflict') this.store.reload();
  }

  private waiting(settings: MatchingSettings | null): string {
    if (settings) return 'Computing …';
    return this.draft() ? 'Waits until every field is right' : '';
  }

  /** Where it fails the last numbers stay, and the sentence says why. */
  private effectOf(settings: MatchingSettings): Observable<RuleEffects> {
    return this.client.effects(this.cycleId(), settings).pipe(
      catchError((error: unknown) => {
        this.effectState.set(problemOf(error).title);
        return EMPTY;
      }),
    );
  }
}

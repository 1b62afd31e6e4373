import {
  ChangeDetectionStrategy,
  Component,
  computed,
  effect,
  inject,
  input,
  linkedSignal,
  signal,
} from '@angular/core';
import { takeUntilDestroyed, toObservable } from '@angular/core/rxjs-interop';
import { MatButton } from '@angular/material/button';
import { MatFormFieldModule } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import { MatRadioModule } from '@angular/material/radio';
import { catchError, debounceTime, filter, of, switchMap, tap } from 'rxjs';
import { CycleSettings } from '../../../../shared/cycles/cycles-contract';
import { mayEditSettings } from '../../../../shared/cycles/phase-rules';
import type { RuleEffects } from '../../../../shared/matching/effects-contract';
import { Aim, AIM_LABEL, type MatchingSettings } from '../../../../shared/matching/matching-contract';
import { CycleStore } from '../../core/cycle-store';
import { MomentPipe } from '../../core/moments';
import { Notices } from '../../core/notices';
import { problemOf } from '../../core/problems';
import { LoadProblem } from '../../ui/load-state/load-problem';
import { Loading } from '../../ui/load-state/loading';
import { PageHeader } from '../../ui/page-header/page-header';
import { CriterionList } from './criterion-list';
import { EffectPanel } from './effect-panel';
import { RuleList } from './rule-list';
import { RulesClient } from './rules-client';
import {
  differencesOf,
  faultsOfSettings,
  groupsToText,
  sameSettings,
  textToGroups,
  withCriterion,
  withRule,
} from './settings-changes';

const PAUSE_MS = 300;

/** Rules and criteria of a cycle: change one and see what it does, then save; a colleague's save is never overwritten unseen. */
@Component({
  selector: 'app-rules-page',
  imports: [
    CriterionList,
    EffectPanel,
    LoadProblem,
    Loading,
    MatButton,
    MatFormFieldModule,
    MatInput,
    MatRadioModule,
    MomentPipe,
    PageHeader,
    RuleList,
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
  protected readonly groups = computed(() => groupsToText(this.saved()?.settings.employerGroups ?? []));
  protected readonly theirDifferences = computed(() => {
    const [theirs, draft] = [this.theirs(), this.draft()];
    return theirs && draft ? differencesOf(theirs.settings, draft) : [];
  });
  protected readonly versions = computed(() => {
    const versions = this.history.hasValue() ? this.history.value().versions : [];
    return versions.map((version, at) => {
      const before = versions[at + 1];
      return { ...version, changes: before ? differencesOf(before.settings, version.settings) : [] };
    });
  });

  constructor() {
    // Whoever leaves a half-typed number keeps the last effect on the screen.
    effect(() => {
      if (this.faults().size > 0) this.effectState.set('Waits until every field is right');
    });
    toObservable(this.draft)
      .pipe(
        filter((draft) => draft !== null && this.faults().size === 0),
        tap(() => this.effectState.set('Computing …')),
        debounceTime(PAUSE_MS),
        switchMap((draft) =>
          this.client.effects(this.cycleId(), draft!).pipe(
            catchError((error: unknown) => {
              this.effectState.set(problemOf(error).title);
              return of(null);
            }),
          ),
        ),
        takeUntilDestroyed(),
      )
      .subscribe((found) => {
        if (!found) return;
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

  protected readonly changeRule = (rule: Parameters<typeof withRule>[1]): void => {
    const draft = this.draft();
    if (draft) this.draft.set(withRule(draft, rule));
  };

  protected readonly changeCriterion = (criterion: Parameters<typeof withCriterion>[1]): void => {
    const draft = this.draft();
    if (draft) this.draft.set(withCriterion(draft, criterion));
  };

  protected points(event: Event): number {
    const text = (event.target as HTMLInputElement).value.trim();
    return Math.round(Number(text || 'NaN') * 100);
  }

  protected typeCharge(place: number, event: Event): void {
    const draft = this.draft();
    if (!draft) return;
    const value = this.points(event);
    this.change({ loadCharges: draft.loadCharges.map((charge, at) => (at === place ? value : charge)) });
  }

  /** "1st place", "3rd place on" */
  protected chargeLabel(place: number, last: boolean): string {
    const ordinal = ['1st', '2nd', '3rd', '4th', '5th', '6th'][place];
    return last ? `${ordinal} place on` : `${ordinal} place`;
  }

  protected number(event: Event): number {
    return Number((event.target as HTMLInputElement).value.trim() || 'NaN');
  }

  protected typeGroups(event: Event): void {
    this.change({ employerGroups: textToGroups((event.target as HTMLTextAreaElement).value) });
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
      next: (saved) => this.take(saved),
      error: (error: unknown) => {
        const problem = problemOf(error);
        this.busy.set(false);
        const current = problem.code === 'stale' ? CycleSettings.safeParse(problem.current) : null;
        if (current?.success) this.theirs.set(current.data);
        else this.refusal.set([problem.title, problem.detail].filter(Boolean).join('. '));
      },
    });
  }

  protected take(settings: CycleSettings): void {
    this.busy.set(false);
    this.theirs.set(null);
    this.saved.set(settings);
    this.history.reload();
    this.store.reload();
    this.notices.say('Saved. Runs from now on use these rules and criteria.');
  }

  protected takeTheirs(): void {
    const theirs = this.theirs();
    if (!theirs) return;
    this.theirs.set(null);
    this.saved.set(theirs);
  }
}

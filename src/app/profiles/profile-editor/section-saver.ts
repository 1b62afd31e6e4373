import { DestroyRef, inject, signal } from '@angular/core';
import { takeUntilDestroyed } from '@angular/core/rxjs-interop';
import type { FormGroup } from '@angular/forms';
import { catchError, concatMap, debounceTime, EMPTY, filter, type Observable, Subject, tap } from 'rxjs';
import { z } from 'zod';
import {
  type ProfileSection,
  SECTION_SCHEMA,
  type SectionContent,
} from '../../../../shared/profiles/profiles-contract';
import { applyProblem, problemOf } from '../../core/problems';
import type { Saved } from '../../ui/saved-state/saved-state';
import { ProfilesClient } from '../profiles-client';

const Current = z.object({ section: z.string(), content: z.record(z.string(), z.unknown()), version: z.int() });

/** Saves one section as its owner types; one save at a time, and none that would overwrite another tab's unseen. */
export class SectionSaver<S extends ProfileSection> {
  readonly state = signal<Saved>({ kind: 'idle' });
  /** What another tab saved meanwhile; the owner decides which stays. */
  readonly other = signal<SectionContent[S] | null>(null);

  private readonly client = inject(ProfilesClient);
  private readonly wanted = new Subject<void>();
  private version = 0;

  constructor(
    private readonly section: S,
    private readonly form: FormGroup,
    /** The form's content in the contract's shape. */
    private readonly read: () => SectionContent[S],
    private readonly write: (content: SectionContent[S]) => void,
    private readonly saved: () => void,
  ) {
    const destroyed = inject(DestroyRef);
    form.valueChanges.pipe(takeUntilDestroyed(destroyed)).subscribe(() => this.wanted.next());
    this.wanted
      .pipe(
        tap(() => this.state.set({ kind: 'saving' })),
        debounceTime(700),
        filter(() => this.other() === null),
        concatMap(() => this.save()),
        takeUntilDestroyed(destroyed),
      )
      .subscribe();
  }

  /** Fills the form with what is stored. */
  start(content: SectionContent[S], version: number): void {
    this.version = version;
    this.write(content);
    this.state.set({ kind: 'idle' });
  }

  keepMine(): void {
    this.other.set(null);
    this.wanted.next();
  }

  takeOther(): void {
    const content = this.other();
    this.other.set(null);
    if (content) this.start(content, this.version);
  }

  private save(): Observable<unknown> {
    const checked = SECTION_SCHEMA[this.section].safeParse(this.read());
    if (!checked.success) {
      applyProblem(this.form, {
        type: '',
        title: '',
        status: 400,
        code: 'invalid',
        fields: checked.error.issues.map((issue) => ({ field: String(issue.path[0] ?? ''), message: issue.message })),
      });
      this.state.set({ kind: 'failed', message: checked.error.issues[0]?.message ?? 'please check the fields' });
      return EMPTY;
    }
    return this.client.save(this.section, checked.data, this.version).pipe(
      tap((answer) => {
        this.version = answer.version;
        this.state.set({ kind: 'saved', at: new Date() });
        this.saved();
      }),
      catchError((error: unknown) => {
        this.refused(error);
        return EMPTY;
      }),
    );
  }

  private refused(error: unknown): void {
    const problem = problemOf(error);
    const current = Current.safeParse(problem.current);
    if (problem.code === 'stale' && current.success) {
      this.version = current.data.version;
      this.other.set(current.data.content as SectionContent[S]);
    }
    applyProblem(this.form, problem);
    this.state.set({ kind: 'failed', message: problem.fields?.[0]?.message ?? problem.title });
  }
}

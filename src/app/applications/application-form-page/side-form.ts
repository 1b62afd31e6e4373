import {
  ChangeDetectionStrategy,
  Component,
  computed,
  effect,
  inject,
  input,
  output,
  signal,
  untracked,
} from '@angular/core';
import { NonNullableFormBuilder, ReactiveFormsModule } from '@angular/forms';
import { MatButton } from '@angular/material/button';
import { MatCheckbox } from '@angular/material/checkbox';
import { MatDialog } from '@angular/material/dialog';
import { MatFormFieldModule } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import { filter, switchMap } from 'rxjs';
import { nextStep } from '../../../../shared/applications/application-rules';
import {
  type ApplicationDesk,
  ApplicationForm,
  type ApplicationSide,
  type ListedMentor,
  type OwnApplication,
} from '../../../../shared/applications/applications-contract';
import type { FieldFault } from '../../../../shared/problems/problems';
import { faultOf } from '../../core/form-faults';
import { Notices } from '../../core/notices';
import { applyProblem, problemOf } from '../../core/problems';
import { confirmWith } from '../../ui/confirm-dialog/confirm-dialog';
import { ProblemSummary } from '../../ui/problem-summary/problem-summary';
import { ApplicationsClient } from '../applications-client';
import { StatusBadge } from '../status-badge';
import { MentorPicker, type NamedMentor } from './mentor-picker';

/** Applying on one side: what one sends, its state, changing it and taking it back. */
@Component({
  selector: 'app-side-form',
  imports: [
    MatButton,
    MatCheckbox,
    MatFormFieldModule,
    MatInput,
    MentorPicker,
    ProblemSummary,
    ReactiveFormsModule,
    StatusBadge,
  ],
  templateUrl: './side-form.html',
  styleUrl: './side-form.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class SideForm {
  readonly side = input.required<ApplicationSide>();
  readonly desk = input.required<ApplicationDesk>();
  readonly mentors = input.required<readonly ListedMentor[]>();
  readonly changed = output<void>();

  private readonly client = inject(ApplicationsClient);
  private readonly notices = inject(Notices);
  private readonly dialog = inject(MatDialog);
  private readonly fb = inject(NonNullableFormBuilder);

  protected readonly form = this.fb.group({
    places: 1,
    oneMoreIfAsked: false,
    goals: '',
    preferredMentors: this.fb.control<NamedMentor[]>([]),
    consentVersion: false,
  });
  protected readonly own = computed(() => this.desk().applications.find((each) => each.side === this.side()));
  protected readonly live = computed(() => {
    const own = this.own();
    return own !== undefined && own.status !== 'withdrawn';
  });
  protected readonly next = computed(() => {
    const own = this.own();
    return own ? nextStep(own.status, this.desk().phase) : '';
  });
  protected readonly mayOpen = computed(() => (this.live() ? this.desk().mayChange : this.desk().takesApplications));
  protected readonly open = signal(false);
  protected readonly busy = signal(false);
  protected readonly title = signal('');
  protected readonly faults = signal<FieldFault[]>([]);
  protected readonly faultOf = faultOf;

  constructor() {
    effect(() => {
      const own = this.own();
      // A form that is being filled keeps what was typed, also when the other side was sent meanwhile.
      untracked(() => {
        if (!this.open()) this.fill(own);
      });
    });
  }

  protected start(): void {
    this.fill(this.own());
    this.open.set(true);
  }

  protected id(field: string): string {
    return `${this.side()}-${field}`;
  }

  protected send(): void {
    const checked = ApplicationForm.safeParse(this.read());
    if (!checked.success)
      return this.show(
        'Some fields need another look',
        checked.error.issues.map((issue) => ({ field: String(issue.path[0] ?? ''), message: issue.message })),
      );
    this.busy.set(true);
    this.faults.set([]);
    this.client.apply(this.desk().cycleId, checked.data, this.own()?.version ?? 0).subscribe({
      next: (sent) => {
        this.busy.set(false);
        this.open.set(false);
        this.notices.say(sentence(sent));
        this.changed.emit();
      },
      error: (error: unknown) => this.refused(error),
    });
  }

  protected withdraw(own: OwnApplication): void {
    confirmWith(this.dialog, {
      title: `Withdraw as a ${own.side}?`,
      text: 'You take no part in this cycle on this side. A proposal that waits for answers is taken back. You can apply again while applications are taken; after the deadline that means the waiting list.',
      confirm: 'Withdraw',
      tone: 'remove',
    })
      .pipe(
        filter((sure) => sure),
        switchMap(() => this.client.withdraw(own.id)),
      )
      .subscribe({
        next: () => {
          this.open.set(false);
          this.notices.say('Your application is withdrawn. We have sent you a message that says so.');
          this.changed.emit();
        },
        error: (error: unknown) => this.notices.tell(error),
      });
  }

  private fill(own: OwnApplication | undefined): void {
    this.form.reset({
      places: own && own.places > 0 ? own.places : 1,
      oneMoreIfAsked: own?.oneMoreIfAsked ?? false,
      goals: own?.goals ?? '',
      preferredMentors: own?.preferredMentors ?? [],
      consentVersion: own !== undefined && this.live() && own.consentVersion === this.desk().consentVersion,
    });
    this.faults.set([]);
  }

  private read(): ApplicationForm {
    const { places, oneMoreIfAsked, goals, preferredMentors, consentVersion } = this.form.getRawValue();
    const mentor = this.side() === 'mentor';
    return {
      side: this.side(),
      places: mentor ? Number(places) : 0,
      oneMoreIfAsked: mentor && oneMoreIfAsked,
      goals,
      preferredMentors: mentor ? [] : preferredMentors.map((each) => each.personId),
      consentVersion: consentVersion ? this.desk().consentVersion : null,
    };
  }

  private refused(error: unknown): void {
    const problem = problemOf(error);
    this.busy.set(false);
    if (problem.code === 'stale')
      return this.show('You changed this application in another tab meanwhile. Reload the page to see it', []);
    const title = [problem.title, problem.detail].filter(Boolean).join('. ');
    this.show(title, problem.fields ?? []);
  }

  /** Sentences stand beside their fields and in the summary, whose links lead to the fields. */
  private show(title: string, fields: FieldFault[]): void {
    applyProblem(this.form, { type: '', title: '', status: 400, code: 'invalid', fields });
    this.title.set(title);
    // A checkbox's input has an id of its own.
    const idOf = (field: string): string => this.id(field === 'consentVersion' ? 'consentVersion-input' : field);
    const linked = fields.map(({ field, message }) => ({ field: idOf(field), message }));
    this.faults.set(linked.length > 0 ? linked : [{ field: '', message: title }]);
  }
}

function sentence({ status }: OwnApplication): string {
  if (status === 'admitted') return 'Sent. You are admitted and take part in matching.';
  if (status === 'waiting-list')
    return 'Sent. You are on the waiting list; you hear from us when a place becomes free.';
  return 'Sent. A coordinator looks at it; a complete profile helps.';
}

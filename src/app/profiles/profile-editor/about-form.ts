import { ChangeDetectionStrategy, Component, computed, effect, inject, input, output, untracked } from '@angular/core';
import { FormArray, NonNullableFormBuilder, ReactiveFormsModule } from '@angular/forms';
import { MatButton } from '@angular/material/button';
import { MatFormFieldModule } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import { MatSelectModule } from '@angular/material/select';
import {
  type AboutSection,
  type LanguageLevel,
  type LanguageSkill,
  MentoringProfile,
  type Region,
} from '../../../../shared/profiles/profiles-contract';
import { faultOf } from '../../core/form-faults';
import { SessionStore } from '../../core/session-store';
import { LANGUAGES, LEVELS, LIKELY_LANGUAGES, REGIONS, TIME_ZONES } from './choices';
import { SectionCard } from './section-card';
import { SectionSaver } from './section-saver';

@Component({
  selector: 'app-about-form',
  imports: [MatButton, MatFormFieldModule, MatInput, MatSelectModule, ReactiveFormsModule, SectionCard],
  templateUrl: './about-form.html',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class AboutForm {
  readonly profile = input.required<MentoringProfile>();
  readonly saved = output<void>();
  private readonly fb = inject(NonNullableFormBuilder);
  private readonly session = inject(SessionStore);
  protected readonly regions = REGIONS;
  protected readonly languages = LANGUAGES;
  protected readonly levels = LEVELS;
  protected readonly zones = TIME_ZONES;
  protected readonly towns = computed(() => this.session.association().towns);
  protected readonly faultOf = faultOf;
  protected readonly languageForms = new FormArray<ReturnType<AboutForm['languageForm']>>([]);
  protected readonly form = this.fb.group({
    name: '',
    knownAs: '',
    pronouns: '',
    headline: '',
    employer: '',
    region: this.fb.control<Region | null>(null),
    town: this.fb.control<string | null>(null),
    timeZone: '',
    languages: this.languageForms,
  });
  protected readonly saver = new SectionSaver(
    'about',
    this.form,
    () => this.form.getRawValue(),
    (content) => this.fill(content),
    () => this.saved.emit(),
  );

  constructor() {
    effect(() => {
      const { about, versions } = this.profile();
      untracked(() => this.saver.start(about, versions.about));
    });
  }

  protected languageForm(skill: LanguageSkill) {
    return this.fb.group({ code: skill.code, level: this.fb.control<LanguageLevel>(skill.level) });
  }

  private fill(content: AboutSection): void {
    this.languageForms.clear({ emitEvent: false });
    for (const skill of content.languages) this.languageForms.push(this.languageForm(skill), { emitEvent: false });
    this.form.patchValue(content, { emitEvent: false });
  }

  protected addLanguage(): void {
    const used = new Set(this.languageForms.getRawValue().map((skill) => skill.code));
    const next = [...LIKELY_LANGUAGES, ...LANGUAGES.map((language) => language.key)].find((code) => !used.has(code));
    if (next) this.languageForms.push(this.languageForm({ code: next, level: 'B2' }));
  }

  protected removeLanguage(index: number): void {
    this.languageForms.removeAt(index);
  }
}

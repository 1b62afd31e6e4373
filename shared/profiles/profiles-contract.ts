/** What a mentoring profile holds, section by section. Each section is saved on its own. */
import { z } from 'zod';

export const Region = z.enum(['coast', 'midvale', 'uplands', 'islands']);
export type Region = z.infer<typeof Region>;
export const REGION_LABEL: Record<Region, string> = {
  coast: 'Coast',
  midvale: 'Midvale',
  uplands: 'Uplands',
  islands: 'Islands',
};

/** CEFR level, or `first` for a first language. */
export const LanguageLevel = z.enum(['A1', 'A2', 'B1', 'B2', 'C1', 'C2', 'first']);
export type LanguageLevel = z.infer<typeof LanguageLevel>;

export const CareerStage = z.enum(['student', 'graduate', 'candidate', 'chartered', 'senior', 'returning']);
export type CareerStage = z.infer<typeof CareerStage>;
export const CAREER_STAGE_LABEL: Record<CareerStage, string> = {
  student: 'Student',
  graduate: 'Graduate',
  candidate: 'Candidate for chartership',
  chartered: 'Chartered',
  senior: 'Senior or principal',
  returning: 'Returning to practice',
};

export const Sector = z.enum(['private', 'public', 'academic', 'self-employed']);
export type Sector = z.infer<typeof Sector>;
export const SECTOR_LABEL: Record<Sector, string> = {
  private: 'Private practice',
  public: 'Public authority',
  academic: 'University or research',
  'self-employed': 'Self-employed',
};

export const SectorWish = z.enum(['same', 'different', 'any']);
export type SectorWish = z.infer<typeof SectorWish>;

export const MeetingMode = z.enum(['in-person', 'remote', 'both']);
export type MeetingMode = z.infer<typeof MeetingMode>;
export const MEETING_MODE_LABEL: Record<MeetingMode, string> = {
  'in-person': 'In person only',
  remote: 'Remote only',
  both: 'In person or remote',
};

export const DAYS = ['mon', 'tue', 'wed', 'thu', 'fri', 'sat', 'sun'] as const;
export const DAY_PARTS = ['morning', 'midday', 'afternoon', 'evening'] as const;
export type Day = (typeof DAYS)[number];
export type DayPart = (typeof DAY_PARTS)[number];
export type Slot = `${Day}-${DayPart}`;
export const SLOTS: readonly Slot[] = DAYS.flatMap((day) => DAY_PARTS.map((part): Slot => `${day}-${part}`));
/** A slot is a day × part of day: morning 7–12, midday 12–14, afternoon 14–18, evening 18–22, local time. */
export const Slot = z.enum(SLOTS as [Slot, ...Slot[]]);

export const TagPriority = z.union([z.literal(1), z.literal(2), z.literal(3)]);
export type TagPriority = z.infer<typeof TagPriority>;
export const TagChoice = z.object({ tagId: z.uuid(), priority: TagPriority });
export type TagChoice = z.infer<typeof TagChoice>;

export const LanguageSkill = z.object({
  /** ISO 639-1 code. */
  code: z.string().regex(/^[a-z]{2}$/, 'Choose a language from the list'),
  level: LanguageLevel,
});
export type LanguageSkill = z.infer<typeof LanguageSkill>;

const uniqueBy = <T>(key: (item: T) => string, message: string) =>
  [(items: T[]): boolean => new Set(items.map(key)).size === items.length, message] as const;

const line = (max: number) => z.string().trim().max(max, `At most ${max} characters`);

function knownTimeZone(zone: string): boolean {
  try {
    new Intl.DateTimeFormat('en', { timeZone: zone });
    return true;
  } catch {
    return false;
  }
}

export const AboutSection = z.strictObject({
  name: line(100).min(1, 'Enter your name').normalize('NFC'),
  knownAs: line(60).normalize('NFC'),
  pronouns: line(40),
  headline: line(120),
  employer: line(120).normalize('NFC'),
  region: Region.nullable(),
  /** A town of the association's gazetteer; distance is measured between towns. */
  town: line(80).nullable(),
  timeZone: z.string().max(60).refine(knownTimeZone, 'Choose a time zone from the list'),
  languages: z
    .array(LanguageSkill)
    .max(12, 'At most 12 languages')
    .refine(...uniqueBy((skill: LanguageSkill) => skill.code, 'Each language once')),
});
export type AboutSection = z.infer<typeof AboutSection>;

export const PracticeSection = z.strictObject({
  careerStage: CareerStage.nullable(),
  yearsInPractice: z.int('Whole years').min(0, 'Between 0 and 70 years').max(70, 'Between 0 and 70 years').nullable(),
  sector: Sector.nullable(),
  credentials: line(300),
});
export type PracticeSection = z.infer<typeof PracticeSection>;

const tagChoices = z
  .array(TagChoice)
  .max(15, 'At most 15 tags')
  .refine(...uniqueBy((choice: TagChoice) => choice.tagId, 'Each tag once'));
export const InterestsSection = z.strictObject({ offers: tagChoices, seeks: tagChoices });
export type InterestsSection = z.infer<typeof InterestsSection>;

export const MeetingSection = z.strictObject({
  meetingMode: MeetingMode.nullable(),
  /** How far the person would travel to meet, in kilometres; null = as the cycle's rule says. */
  maxDistanceKm: z
    .int('Whole kilometres')
    .min(0, 'Between 0 and 1000 km')
    .max(1000, 'Between 0 and 1000 km')
    .nullable(),
  availability: z.array(Slot).refine(...uniqueBy((slot: Slot) => slot, 'Each time once')),
});
export type MeetingSection = z.infer<typeof MeetingSection>;

export const WishesSection = z
  .strictObject({
    hopes: line(4000),
    style: line(2000),
    cannotHelpWith: line(1000),
    /** As a mentee: how many years of practice a mentor should have; null = the cycle's range. */
    wishedYearsMin: z.int().min(0).max(70).nullable(),
    wishedYearsMax: z.int().min(0).max(70).nullable(),
    wishedSector: SectorWish,
    /** As a mentor: the career stages wished for; empty = any. */
    wishedStages: z.array(CareerStage).refine(...uniqueBy((stage: CareerStage) => stage, 'Each stage once')),
    /** Agreed to be listed among the mentors that applicants may name. */
    listed: z.boolean(),
  })
  .refine((w) => w.wishedYearsMin === null || w.wishedYearsMax === null || w.wishedYearsMin <= w.wishedYearsMax, {
    message: 'The lower number of years comes first',
    path: ['wishedYearsMax'],
  });
export type WishesSection = z.infer<typeof WishesSection>;

export const InterestKind = z.enum(['reporting-line', 'family', 'assessor', 'other']);
export type InterestKind = z.infer<typeof InterestKind>;
export const INTEREST_KIND_LABEL: Record<InterestKind, string> = {
  'reporting-line': 'Reporting line',
  family: 'Family or household',
  assessor: 'Assessor of a qualification',
  other: 'Another interest',
};
const namedPeople = <T extends z.ZodRawShape>(extra: T) =>
  z.array(z.object({ personId: z.uuid(), name: z.string().max(100), ...extra })).max(30, 'At most 30 people');
/** Seen by coordinators only; who is named here is never told. */
export const PrivateSection = z.strictObject({
  exclusions: namedPeople({}),
  declaredInterests: namedPeople({ kind: InterestKind }),
  adjustments: line(2000),
});
export type PrivateSection = z.infer<typeof PrivateSection>;

export const PROFILE_SECTIONS = ['about', 'practice', 'interests', 'meeting', 'wishes', 'private'] as const;
export const ProfileSection = z.enum(PROFILE_SECTIONS);
export type ProfileSection = z.infer<typeof ProfileSection>;
export const SECTION_SCHEMA = {
  about: AboutSection,
  practice: PracticeSection,
  interests: InterestsSection,
  meeting: MeetingSection,
  wishes: WishesSection,
  private: PrivateSection,
} as const satisfies Record<ProfileSection, z.ZodType>;
export type SectionContent = { [S in ProfileSection]: z.infer<(typeof SECTION_SCHEMA)[S]> };

/** The whole profile as its owner sees it. `versions` holds one number a section, for If-Match. */
export const MentoringProfile = z.object({
  personId: z.uuid(),
  about: AboutSection,
  practice: PracticeSection,
  interests: InterestsSection,
  meeting: MeetingSection,
  wishes: WishesSection,
  private: PrivateSection,
  versions: z.record(ProfileSection, z.int()),
  updatedAt: z.iso.datetime(),
});
export type MentoringProfile = z.infer<typeof MentoringProfile>;

export const SectionParams = z.object({ section: ProfileSection });
/** A section as the form holds it; its shape depends on the section and is checked there. */
export const SectionBody = z.record(z.string(), z.unknown());
export const SavedSection = z.object({ section: ProfileSection, content: SectionBody, version: z.int() });
export type SavedSection = z.infer<typeof SavedSection>;

/** A profile as other members see it: nothing private, no address. */
export const PublicProfile = z.object({
  personId: z.uuid(),
  name: z.string(),
  pronouns: z.string(),
  headline: z.string(),
  employer: z.string(),
  region: Region.nullable(),
  careerStage: CareerStage.nullable(),
  yearsInPractice: z.int().nullable(),
  sector: Sector.nullable(),
  credentials: z.string(),
  languages: z.array(LanguageSkill),
  offers: z.array(z.string()),
  seeks: z.array(z.string()),
  meetingMode: MeetingMode.nullable(),
  availability: z.array(Slot),
  timeZone: z.string(),
  hopes: z.string(),
  style: z.string(),
  cannotHelpWith: z.string(),
});
export type PublicProfile = z.infer<typeof PublicProfile>;
export const ProfileParams = z.object({ personId: z.uuid() });

export const PersonSearch = z.object({ text: z.string().trim().min(2, 'At least two letters').max(100) });
export const PeopleFound = z.object({
  people: z.array(z.object({ personId: z.uuid(), name: z.string(), employer: z.string() })),
});
export type PeopleFound = z.infer<typeof PeopleFound>;

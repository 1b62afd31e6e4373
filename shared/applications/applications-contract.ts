/** Applications: a person, in a cycle, on a side. */
import { z } from 'zod';
import { CyclePhase } from '../cycles/cycles-contract';
import { CareerStage, MentoringProfile, Region } from '../profiles/profiles-contract';

export const ApplicationSide = z.enum(['mentor', 'mentee']);
export type ApplicationSide = z.infer<typeof ApplicationSide>;
export const ApplicationStatus = z.enum(['draft', 'submitted', 'admitted', 'waiting-list', 'withdrawn']);
export type ApplicationStatus = z.infer<typeof ApplicationStatus>;
export const STATUS_LABEL: Record<ApplicationStatus, string> = {
  draft: 'Draft',
  submitted: 'Submitted',
  admitted: 'Admitted',
  'waiting-list': 'Waiting list',
  withdrawn: 'Withdrawn',
};

/** What an applicant sends. `places` counts mentees a mentor can take: 1–6 for a mentor, 0 for a mentee. */
export const ApplicationForm = z
  .strictObject({
    side: ApplicationSide,
    places: z.int('A whole number').min(0).max(6, 'At most 6 places'),
    oneMoreIfAsked: z.boolean(),
    goals: z.string().trim().max(2000, 'At most 2000 characters'),
    preferredMentors: z
      .array(z.uuid())
      .max(3, 'At most three mentors')
      .refine((ids) => new Set(ids).size === ids.length, 'Each mentor once'),
    /** The version of the consent text that was on the screen when it was agreed to. */
    consentVersion: z.int().nullable(),
  })
  .superRefine((form, check) => {
    if (form.side === 'mentor' && form.places < 1)
      check.addIssue({ code: 'custom', path: ['places'], message: 'A mentor offers 1 to 6 places' });
    if (form.side === 'mentee' && form.places !== 0)
      check.addIssue({ code: 'custom', path: ['places'], message: 'Only mentors offer places' });
    if (form.side === 'mentee' && form.goals.length < 10)
      check.addIssue({ code: 'custom', path: ['goals'], message: 'Say in a sentence or two what you hope to reach' });
    if (form.side === 'mentor' && form.preferredMentors.length > 0)
      check.addIssue({ code: 'custom', path: ['preferredMentors'], message: 'Only mentees name mentors' });
    if (form.consentVersion === null)
      check.addIssue({ code: 'custom', path: ['consentVersion'], message: 'Please read and agree before you apply' });
  });
export type ApplicationForm = z.infer<typeof ApplicationForm>;

export const ApplicationParams = z.object({ applicationId: z.uuid() });

/** One's own application. */
export const OwnApplication = z.object({
  id: z.uuid(),
  cycleId: z.uuid(),
  cycleName: z.string(),
  phase: CyclePhase,
  side: ApplicationSide,
  status: ApplicationStatus,
  places: z.int(),
  oneMoreIfAsked: z.boolean(),
  goals: z.string(),
  preferredMentors: z.array(z.object({ personId: z.uuid(), name: z.string() })),
  late: z.boolean(),
  submittedAt: z.iso.datetime().nullable(),
  consentVersion: z.int().nullable(),
  version: z.int(),
});
export type OwnApplication = z.infer<typeof OwnApplication>;
export const OwnApplications = z.object({ applications: z.array(OwnApplication) });
export type OwnApplications = z.infer<typeof OwnApplications>;

export const SideParams = z.object({ cycleId: z.uuid(), side: ApplicationSide });

/** What one needs to apply to a cycle, and what one has sent already. */
export const ApplicationDesk = z.object({
  cycleId: z.uuid(),
  cycleName: z.string(),
  introduction: z.string(),
  phase: CyclePhase,
  applicationsCloseOn: z.iso.date(),
  answersDueOn: z.iso.date(),
  consentText: z.string(),
  consentVersion: z.int(),
  /** New applications are taken, be it for the waiting list. */
  takesApplications: z.boolean(),
  /** The deadline has passed: who applies now goes to the waiting list. */
  late: z.boolean(),
  /** What was sent may still be changed. */
  mayChange: z.boolean(),
  applications: z.array(OwnApplication),
});
export type ApplicationDesk = z.infer<typeof ApplicationDesk>;

/** A mentor who agreed to be listed, as applicants may see them. */
export const ListedMentor = z.object({
  personId: z.uuid(),
  name: z.string(),
  headline: z.string(),
  region: Region.nullable(),
  practiceAreas: z.array(z.string()),
});
export type ListedMentor = z.infer<typeof ListedMentor>;
export const ListedMentors = z.object({ mentors: z.array(ListedMentor) });
export type ListedMentors = z.infer<typeof ListedMentors>;

/** One line of the coordinators' applicants table. */
export const ApplicantLine = z.object({
  id: z.uuid(),
  personId: z.uuid(),
  name: z.string(),
  email: z.string(),
  side: ApplicationSide,
  status: ApplicationStatus,
  places: z.int(),
  oneMoreIfAsked: z.boolean(),
  employer: z.string(),
  region: Region.nullable(),
  careerStage: CareerStage.nullable(),
  yearsInPractice: z.int().nullable(),
  practiceAreas: z.array(z.string()),
  completeness: z.int(),
  flags: z.array(z.string()),
  late: z.boolean(),
  submittedAt: z.iso.datetime().nullable(),
  version: z.int(),
});
export type ApplicantLine = z.infer<typeof ApplicantLine>;

export const APPLICANT_SORTS = [
  'name',
  'side',
  'status',
  'employer',
  'region',
  'years',
  'submitted',
  'completeness',
] as const;
export const ApplicantsQuery = z.object({
  search: z.string().trim().max(100).default(''),
  side: ApplicationSide.optional(),
  status: ApplicationStatus.optional(),
  region: Region.optional(),
  tag: z.uuid().optional(),
  flagged: z.enum(['yes']).optional(),
  sort: z.enum(APPLICANT_SORTS).default('name'),
  direction: z.enum(['asc', 'desc']).default('asc'),
  page: z.coerce.number().int().min(1).max(100_000).default(1),
  pageSize: z.coerce.number().int().min(10).max(200).default(50),
});
export type ApplicantsQuery = z.input<typeof ApplicantsQuery>;
export const ApplicantsPage = z.object({
  applicants: z.array(ApplicantLine),
  total: z.int(),
  page: z.int(),
  pageSize: z.int(),
});
export type ApplicantsPage = z.infer<typeof ApplicantsPage>;

export const ApplicantParams = z.object({ cycleId: z.uuid(), applicationId: z.uuid() });
/** A whole application for coordinators, with the private section of its profile. */
export const ApplicantDetail = z.object({
  line: ApplicantLine,
  goals: z.string(),
  preferredMentors: z.array(z.object({ personId: z.uuid(), name: z.string() })),
  membershipNumber: z.string().nullable(),
  consentVersion: z.int().nullable(),
  consentAt: z.iso.datetime().nullable(),
  leftOutLastTime: z.boolean(),
  withdrawnAt: z.iso.datetime().nullable(),
  profile: MentoringProfile,
  offers: z.array(z.string()),
  seeks: z.array(z.string()),
});
export type ApplicantDetail = z.infer<typeof ApplicantDetail>;

/** A coordinator's decision about several applications at once. */
export const AdmissionDecision = z.strictObject({
  status: z.enum(['admitted', 'waiting-list', 'withdrawn', 'submitted']),
  applicationIds: z.array(z.uuid()).min(1, 'Choose at least one application').max(5000),
});
export type AdmissionDecision = z.infer<typeof AdmissionDecision>;
export const AdmissionOutcome = z.object({
  changed: z.array(z.object({ id: z.uuid(), from: ApplicationStatus, to: ApplicationStatus })),
  refused: z.array(z.object({ id: z.uuid(), name: z.string(), reason: z.string() })),
});
export type AdmissionOutcome = z.infer<typeof AdmissionOutcome>;

/** Columns that an import can fill, in the order the mapping page shows them. */
export const IMPORT_FIELDS = [
  'name',
  'email',
  'side',
  'places',
  'oneMoreIfAsked',
  'membershipNumber',
  'employer',
  'region',
  'town',
  'timeZone',
  'languages',
  'careerStage',
  'yearsInPractice',
  'sector',
  'offers',
  'seeks',
  'meetingMode',
  'maxDistanceKm',
  'availability',
  'headline',
  'goals',
  'wishedYearsMin',
  'wishedYearsMax',
] as const;
export const ImportField = z.enum(IMPORT_FIELDS);
export type ImportField = z.infer<typeof ImportField>;

/** Which column of the file (by its heading) fills which field. */
export const ImportMapping = z.partialRecord(ImportField, z.string().max(200));
export type ImportMapping = z.infer<typeof ImportMapping>;

export const IMPORT_MAX_BYTES = 5_000_000;
export const IMPORT_MAX_ROWS = 10_000;
/** `content` is the file's bytes in base64: the server finds out the encoding (UTF-8 or Windows-1252) and the separator. */
export const ImportRequest = z.strictObject({
  fileName: z.string().max(200),
  content: z
    .base64('The file could not be read')
    .max(Math.ceil((IMPORT_MAX_BYTES * 4) / 3) + 8, 'The file is larger than 5 MB'),
  mapping: ImportMapping.optional(),
});
export type ImportRequest = z.infer<typeof ImportRequest>;

export const ImportFault = z.object({
  /** Line of the file, counted from 1 with the heading as line 1. */
  line: z.int(),
  column: z.string(),
  value: z.string(),
  message: z.string(),
});
export type ImportFault = z.infer<typeof ImportFault>;

export const ImportPreview = z.object({
  columns: z.array(z.string()),
  mapping: ImportMapping,
  rows: z.int(),
  mentees: z.int(),
  mentors: z.int(),
  places: z.int(),
  newPeople: z.int(),
  knownPeople: z.int(),
  alreadyApplied: z.int(),
  unknownTags: z.array(z.string()),
  faults: z.array(ImportFault),
  faultCount: z.int(),
  sample: z.array(z.record(z.string(), z.string())),
});
export type ImportPreview = z.infer<typeof ImportPreview>;
export const ImportResult = z.object({
  imported: z.int(),
  newPeople: z.int(),
  updatedPeople: z.int(),
  newApplications: z.int(),
  updatedApplications: z.int(),
});
export type ImportResult = z.infer<typeof ImportResult>;

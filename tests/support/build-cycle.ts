/** A cycle with applicants, made by the product's own verbs, for API specs. */
import { DateTime } from 'luxon';
import type { CycleDraft, CyclePhase } from '../../shared/cycles/cycles-contract';
import type { SectionContent } from '../../shared/profiles/profiles-contract';
import { applications, association, tags } from '../../drizzle/schema';
import { createCycle, movePhase } from '../../src/server/cycles';
import { updateSection } from '../../src/server/profiles';
import type { Context } from '../../src/server/platform';
import type { TestApp, TestPerson } from './test-app';

export const dayFrom = (days: number): string => DateTime.utc().plus({ days }).toISODate();

export const cycleDraft = (change: Partial<CycleDraft> = {}): CycleDraft => ({
  name: 'Winter 2026–27',
  introduction: 'Half a year of conversations.',
  consentText: 'I agree that the coordinators use my profile to find me a partner.',
  askFirst: 'both',
  autoAdmit: true,
  needsApproval: false,
  applicationsOpenOn: dayFrom(-30),
  applicationsCloseOn: dayFrom(5),
  answersDueOn: dayFrom(14),
  startsOn: dayFrom(20),
  checkInOn: dayFrom(100),
  endsOn: dayFrom(200),
  ...change,
});

/** A context that acts as the system, on the pool. */
export const systemContext = (app: TestApp): Context => app.backend.context();

/** Makes a cycle in the given phase. */
export async function makeCycle(app: TestApp, phase: CyclePhase, change: Partial<CycleDraft> = {}): Promise<string> {
  const ctx = systemContext(app);
  const cycle = await createCycle(ctx, { ...cycleDraft(change), copyFrom: null });
  if (phase !== 'draft') await movePhase(ctx, cycle.id, phase);
  return cycle.id;
}

/** Towns and two practice areas; returns the areas' ids. */
export async function makeVocabulary(app: TestApp): Promise<{ gis: string; hydrographic: string }> {
  const { db } = app.backend.database;
  await db.update(association).set({
    name: 'Ellmark Institute of Surveyors',
    timeZone: 'Europe/Copenhagen',
    contactEmail: 'mentoring@ellmark.example',
    gazetteer: { 'Port Ansel': { latitude: 56.31, longitude: 3.62, region: 'coast' } },
  });
  const rows = await db
    .insert(tags)
    .values([
      {
        slug: 'gis-and-data',
        kind: 'practice-area',
        label: 'GIS and data',
        synonyms: [],
        state: 'approved',
        createdAt: new Date(),
      },
      {
        slug: 'hydrographic',
        kind: 'practice-area',
        label: 'Hydrographic',
        synonyms: [],
        state: 'approved',
        createdAt: new Date(),
      },
    ])
    .returning({ id: tags.id });
  return { gis: rows[0]!.id, hydrographic: rows[1]!.id };
}

export interface Applicant extends TestPerson {
  applicationId: string;
}

interface ApplicantFacts {
  name: string;
  side: 'mentee' | 'mentor';
  area: string;
  places?: number;
  years?: number;
  employer?: string;
  status?: 'admitted' | 'submitted' | 'waiting-list';
}

/** A person with a complete profile and an application in the cycle. */
export async function makeApplicant(app: TestApp, cycleId: string, facts: ApplicantFacts): Promise<Applicant> {
  const person = await app.person({ name: facts.name });
  const ctx = systemContext(app);
  for (const [section, content] of Object.entries(sectionsOf(facts)))
    await updateSection(ctx, person.id, section as 'about', content as SectionContent['about']);
  const [row] = await app.backend.database.db
    .insert(applications)
    .values({
      cycleId,
      personId: person.id,
      side: facts.side,
      status: facts.status ?? 'admitted',
      places: facts.side === 'mentor' ? (facts.places ?? 1) : 0,
      goals: facts.side === 'mentee' ? 'To lead a survey of my own within the year.' : '',
      submittedAt: new Date(),
      createdAt: new Date(),
    })
    .returning({ id: applications.id });
  return { ...person, applicationId: row!.id };
}

function sectionsOf(facts: ApplicantFacts): Partial<SectionContent> {
  const choice = [{ tagId: facts.area, priority: 1 as const }];
  return {
    about: {
      name: facts.name,
      knownAs: '',
      pronouns: '',
      headline: `${facts.name}, surveyor`,
      employer: facts.employer ?? `${facts.name} and partners`,
      region: 'coast',
      town: 'Port Ansel',
      timeZone: 'Europe/Copenhagen',
      languages: [{ code: 'en', level: 'C1' }],
    },
    practice: {
      careerStage: facts.side === 'mentee' ? 'graduate' : 'senior',
      yearsInPractice: facts.years ?? (facts.side === 'mentee' ? 2 : 12),
      sector: 'private',
      credentials: '',
    },
    interests: facts.side === 'mentee' ? { offers: [], seeks: choice } : { offers: choice, seeks: [] },
    meeting: { meetingMode: 'both', maxDistanceKm: null, availability: ['mon-morning', 'thu-evening'] },
  };
}

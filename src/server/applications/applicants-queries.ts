import { and, asc, count, eq, ilike, inArray, or, sql, type SQL } from 'drizzle-orm';
import type { z } from 'zod';
import { applications, auditEntries, pairings, people, profiles, profileTags, tags } from '../../../drizzle/schema';
import type {
  ApplicantsQuery,
  ApplicationSide,
  ApplicationStatus,
} from '../../../shared/applications/applications-contract';
import type { Db } from '../platform';
import { anyFlag, completeness, FLAG } from './applicant-facts-queries';

export type ApplicantsFilter = z.output<typeof ApplicantsQuery>;

// A mentee's practice areas are those sought, a mentor's those offered.
const ownDirection = sql`${profileTags.direction} = case ${applications.side} when 'mentor' then 'offers' else 'seeks' end`;

const COLUMNS = {
  id: applications.id,
  personId: applications.personId,
  name: people.name,
  email: people.email,
  membershipNumber: people.membershipNumber,
  side: applications.side,
  status: applications.status,
  places: applications.places,
  oneMoreIfAsked: applications.oneMoreIfAsked,
  employer: sql<string>`coalesce(${profiles.employer}, '')`,
  region: profiles.region,
  town: profiles.town,
  careerStage: profiles.careerStage,
  yearsInPractice: profiles.yearsInPractice,
  completeness,
  submittedAt: applications.submittedAt,
  version: applications.version,
  goals: applications.goals,
  consentVersion: applications.consentVersion,
  consentAt: applications.consentAt,
  leftOutLastTime: applications.leftOutLastTime,
  withdrawnAt: applications.withdrawnAt,
  ...FLAG,
};

const SORT: Record<ApplicantsFilter['sort'], SQL> = {
  name: sql`${people.name}`,
  side: sql`${applications.side}`,
  status: sql`${applications.status}`,
  employer: sql`nullif(${profiles.employer}, '')`,
  region: sql`${profiles.region}`,
  years: sql`${profiles.yearsInPractice}`,
  submitted: sql`${applications.submittedAt}`,
  completeness,
};

function matching(cycleId: string, filter: ApplicantsFilter): SQL | undefined {
  const pattern = `%${filter.search.replace(/[\\%_]/g, '\\$&')}%`;
  return and(
    eq(applications.cycleId, cycleId),
    filter.side ? eq(applications.side, filter.side) : undefined,
    filter.status ? eq(applications.status, filter.status) : undefined,
    filter.region ? eq(profiles.region, filter.region) : undefined,
    filter.tag
      ? sql`exists (select 1 from ${profileTags} where ${profileTags.personId} = ${applications.personId}
          and ${profileTags.tagId} = ${filter.tag} and ${ownDirection})`
      : undefined,
    filter.flagged ? anyFlag : undefined,
    filter.search
      ? or(
          ilike(people.name, pattern),
          ilike(people.email, pattern),
          ilike(profiles.employer, pattern),
          ilike(people.membershipNumber, pattern),
        )
      : undefined,
  );
}

const applicants = (db: Db) =>
  db
    .select(COLUMNS)
    .from(applications)
    .innerJoin(people, eq(people.id, applications.personId))
    .leftJoin(profiles, eq(profiles.personId, applications.personId))
    .$dynamic();

export type ApplicantRow = Awaited<ReturnType<typeof listApplicants>>[number];

/** One page of the table; without `page`, all that fit the filter. */
export async function listApplicants(
  db: Db,
  cycleId: string,
  filter: ApplicantsFilter,
  page?: { limit: number; offset: number },
) {
  const by = SORT[filter.sort];
  const direction = filter.direction === 'asc' ? sql`${by} asc nulls last` : sql`${by} desc nulls last`;
  const query = applicants(db)
    .where(matching(cycleId, filter))
    .orderBy(direction, asc(people.name), asc(applications.id));
  return page ? query.limit(page.limit).offset(page.offset) : query;
}

export async function countApplicants(db: Db, cycleId: string, filter: ApplicantsFilter): Promise<number> {
  const [row] = await db
    .select({ total: count() })
    .from(applications)
    .innerJoin(people, eq(people.id, applications.personId))
    .leftJoin(profiles, eq(profiles.personId, applications.personId))
    .where(matching(cycleId, filter));
  return row?.total ?? 0;
}

export async function findApplicant(db: Db, cycleId: string, applicationId: string): Promise<ApplicantRow | null> {
  const [row] = await applicants(db).where(and(eq(applications.cycleId, cycleId), eq(applications.id, applicationId)));
  return row ?? null;
}

/** Labels of practice areas by application, the most wanted first. */
export async function practiceAreasOf(db: Db, applicationIds: string[]): Promise<Map<string, string[]>> {
  if (applicationIds.length === 0) return new Map();
  const rows = await db
    .select({
      id: applications.id,
      labels: sql<string[]>`array_agg(${tags.label} order by ${profileTags.priority}, ${tags.label})`,
    })
    .from(applications)
    .innerJoin(profileTags, and(eq(profileTags.personId, applications.personId), ownDirection))
    .innerJoin(tags, and(eq(tags.id, profileTags.tagId), eq(tags.kind, 'practice-area')))
    .where(inArray(applications.id, applicationIds))
    .groupBy(applications.id);
  return new Map(rows.map((row) => [row.id, row.labels]));
}

export interface DecidedRow {
  id: string;
  personId: string;
  name: string;
  side: ApplicationSide;
  status: ApplicationStatus;
  version: number;
  hasProposal: boolean;
  inPair: boolean;
  /** The applicant took it back, not a coordinator. */
  ownWithdrawal: boolean;
}

const hasPairing = (state: 'pending' | 'under-way') => sql<boolean>`exists (select 1 from ${pairings}
  where ${pairings.state} = ${state} and ${applications.id} in (${pairings.menteeApplicationId}, ${pairings.mentorApplicationId}))`;

/** Applications of one cycle with what a decision must know; held for the rest of the transaction. */
export async function holdForDecision(db: Db, cycleId: string, ids: string[]): Promise<DecidedRow[]> {
  return db
    .select({
      id: applications.id,
      personId: applications.personId,
      name: people.name,
      side: applications.side,
      status: applications.status,
      version: applications.version,
      hasProposal: hasPairing('pending'),
      inPair: hasPairing('under-way'),
      ownWithdrawal: sql<boolean>`exists (select 1 from ${auditEntries} where ${auditEntries.subjectId} = ${applications.id}::text
        and ${auditEntries.action} = 'applications.withdraw' and ${auditEntries.at} >= ${applications.withdrawnAt})`,
    })
    .from(applications)
    .innerJoin(people, eq(people.id, applications.personId))
    .where(and(eq(applications.cycleId, cycleId), inArray(applications.id, ids)))
    .orderBy(asc(applications.id))
    .for('update', { of: applications });
}

export async function setStatus(db: Db, ids: string[], status: ApplicationStatus, now: Date): Promise<void> {
  if (ids.length === 0) return;
  await db
    .update(applications)
    .set({
      status,
      withdrawnAt: status === 'withdrawn' ? now : null,
      version: sql`${applications.version} + 1`,
    })
    .where(inArray(applications.id, ids));
}

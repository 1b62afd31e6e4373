/** What rules and criteria may read, and no more: run as the role `heddle_matching` where the database has it. */
import { aliasedTable, and, asc, desc, eq, inArray, ne, notInArray, or, sql } from 'drizzle-orm';
import {
  applicationPreferences,
  applications,
  association,
  cycles,
  declaredInterests,
  pairings,
  profileExclusions,
  profiles,
  profileTags,
  tags,
} from '../../../drizzle/schema';
import type { Gazetteer } from '../../../shared/accounts/accounts-contract';
import { MATCHING_ROLE, type Db } from '../platform';

/** For the rest of the transaction; the connection's own role comes back with `stepUp`. */
export async function stepDown(db: Db): Promise<void> {
  const found = await db.execute(
    sql`select from pg_roles where rolname = ${MATCHING_ROLE} and pg_has_role(current_user, oid, 'member')`,
  );
  // A role's name cannot be a parameter; this is MATCHING_ROLE.
  if (found.rowCount) await db.execute(sql`set local role heddle_matching`);
}

export async function stepUp(db: Db): Promise<void> {
  await db.execute(sql`reset role`);
}

/** All reads of the transaction see one moment; must come before its first read. */
export async function freeze(db: Db): Promise<void> {
  await db.execute(sql`set transaction isolation level repeatable read`);
}

const applicantColumns = {
  applicationId: applications.id,
  personId: applications.personId,
  side: applications.side,
  places: applications.places,
  taken: applications.taken,
  oneMoreIfAsked: applications.oneMoreIfAsked,
  leftOutLastTime: applications.leftOutLastTime,
  employer: profiles.employer,
  town: profiles.town,
  timeZone: profiles.timeZone,
  languages: profiles.languages,
  careerStage: profiles.careerStage,
  yearsInPractice: profiles.yearsInPractice,
  sector: profiles.sector,
  meetingMode: profiles.meetingMode,
  maxDistanceKm: profiles.maxDistanceKm,
  availability: profiles.availability,
  wishedYearsMin: profiles.wishedYearsMin,
  wishedYearsMax: profiles.wishedYearsMax,
  wishedSector: profiles.wishedSector,
  wishedStages: profiles.wishedStages,
};
export type ApplicantRow = Awaited<ReturnType<typeof listAdmitted>>[number];

/** Admitted applications of a cycle; mentees with a pairing that is pending or under way are left in peace. */
export async function listAdmitted(db: Db, cycleId: string) {
  const engaged = db
    .select({ id: pairings.menteeApplicationId })
    .from(pairings)
    .where(and(eq(pairings.cycleId, cycleId), inArray(pairings.state, ['pending', 'under-way'])));
  return db
    .select(applicantColumns)
    .from(applications)
    .innerJoin(profiles, eq(profiles.personId, applications.personId))
    .where(
      and(
        eq(applications.cycleId, cycleId),
        eq(applications.status, 'admitted'),
        or(eq(applications.side, 'mentor'), notInArray(applications.id, engaged)),
      ),
    );
}

/** People with an admitted application in the cycle. */
const admittedPeople = (db: Db, cycleId: string) =>
  db
    .select({ id: applications.personId })
    .from(applications)
    .where(and(eq(applications.cycleId, cycleId), eq(applications.status, 'admitted')));

export async function listTagChoices(db: Db, cycleId: string) {
  return db
    .select({
      personId: profileTags.personId,
      tagId: profileTags.tagId,
      direction: profileTags.direction,
      priority: profileTags.priority,
    })
    .from(profileTags)
    .where(inArray(profileTags.personId, admittedPeople(db, cycleId)));
}

export async function listExclusions(db: Db, cycleId: string) {
  return db
    .select()
    .from(profileExclusions)
    .where(inArray(profileExclusions.personId, admittedPeople(db, cycleId)));
}

export async function listDeclaredInterests(db: Db, cycleId: string) {
  return db
    .select({ personId: declaredInterests.personId, otherId: declaredInterests.otherId })
    .from(declaredInterests)
    .where(inArray(declaredInterests.personId, admittedPeople(db, cycleId)));
}

export async function listPreferences(db: Db, cycleId: string) {
  return db
    .select({ applicationId: applicationPreferences.applicationId, personId: applicationPreferences.mentorPersonId })
    .from(applicationPreferences)
    .innerJoin(applications, eq(applications.id, applicationPreferences.applicationId))
    .where(eq(applications.cycleId, cycleId))
    .orderBy(asc(applicationPreferences.rank));
}

export async function listTagTree(db: Db) {
  return db.select({ id: tags.id, label: tags.label, kind: tags.kind, parent: tags.parentId }).from(tags);
}

export async function findGazetteer(db: Db): Promise<Gazetteer> {
  const [row] = await db.select({ gazetteer: association.gazetteer }).from(association).limit(1);
  return row?.gazetteer ?? {};
}

/** Cycles before this one, the latest first; drafts and cancelled ones do not count. */
export async function listEarlierCycles(db: Db, cycle: { id: string; startsOn: string }): Promise<string[]> {
  const rows = await db
    .select({ id: cycles.id })
    .from(cycles)
    .where(
      and(
        ne(cycles.id, cycle.id),
        notInArray(cycles.phase, ['draft', 'cancelled']),
        sql`${cycles.startsOn} < ${cycle.startsOn}`,
      ),
    )
    .orderBy(desc(cycles.startsOn));
  return rows.map((row) => row.id);
}

const menteeApplication = aliasedTable(applications, 'mentee_application');
const mentorApplication = aliasedTable(applications, 'mentor_application');

/** Pairs of people by cycle: those that came to be, or those that were declined. */
export async function listPairsOfPeople(
  db: Db,
  cycleIds: readonly string[],
  states: ('under-way' | 'completed' | 'ended-early' | 'declined')[],
) {
  if (cycleIds.length === 0) return [];
  return db
    .select({
      cycleId: pairings.cycleId,
      mentee: menteeApplication.personId,
      mentor: mentorApplication.personId,
    })
    .from(pairings)
    .innerJoin(menteeApplication, eq(menteeApplication.id, pairings.menteeApplicationId))
    .innerJoin(mentorApplication, eq(mentorApplication.id, pairings.mentorApplicationId))
    .where(and(inArray(pairings.cycleId, [...cycleIds]), inArray(pairings.state, states)));
}

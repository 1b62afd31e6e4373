import { and, asc, eq, inArray, sql } from 'drizzle-orm';
import { applications, people, profiles } from '../../../drizzle/schema';
import type { Db } from '../platform';

/** What pages and messages say of an applicant. */
export interface ApplicantFacts {
  applicationId: string;
  personId: string;
  side: 'mentor' | 'mentee';
  status: typeof applications.$inferSelect.status;
  places: number;
  taken: number;
  oneMoreIfAsked: boolean;
  name: string;
  email: string;
  employer: string;
  headline: string;
  region: typeof profiles.$inferSelect.region;
}

const facts = {
  applicationId: applications.id,
  personId: applications.personId,
  side: applications.side,
  status: applications.status,
  places: applications.places,
  taken: applications.taken,
  oneMoreIfAsked: applications.oneMoreIfAsked,
  name: people.name,
  email: people.email,
  employer: sql<string>`coalesce(${profiles.employer}, '')`,
  headline: sql<string>`coalesce(${profiles.headline}, '')`,
  region: profiles.region,
};

const applicants = (db: Db) =>
  db
    .select(facts)
    .from(applications)
    .innerJoin(people, eq(people.id, applications.personId))
    .leftJoin(profiles, eq(profiles.personId, applications.personId));

/** Every application of a cycle that has been sent, whatever became of it. */
export async function listApplicants(db: Db, cycleId: string): Promise<ApplicantFacts[]> {
  return applicants(db)
    .where(
      and(
        eq(applications.cycleId, cycleId),
        inArray(applications.status, ['submitted', 'admitted', 'waiting-list', 'withdrawn']),
      ),
    )
    .orderBy(asc(people.name), asc(applications.id));
}

/** Two applications of one cycle. */
export async function findApplicants(db: Db, cycleId: string, ids: string[]): Promise<ApplicantFacts[]> {
  return applicants(db).where(and(eq(applications.cycleId, cycleId), inArray(applications.id, ids)));
}

import { and, eq, inArray } from 'drizzle-orm';
import { applications } from '../../../drizzle/schema';
import type { Db } from '../platform';
import type { ApplicationRow } from './applications-queries';

/** Applications of these people in the cycle, on either side. */
export async function applicationsOfPeople(db: Db, cycleId: string, personIds: string[]): Promise<ApplicationRow[]> {
  if (personIds.length === 0) return [];
  return db
    .select()
    .from(applications)
    .where(and(eq(applications.cycleId, cycleId), inArray(applications.personId, personIds)))
    .for('update');
}

export async function insertApplications(
  db: Db,
  rows: (typeof applications.$inferInsert)[],
): Promise<ApplicationRow[]> {
  const inserted: ApplicationRow[] = [];
  // A statement takes at most 65,535 values.
  for (let from = 0; from < rows.length; from += 2000)
    inserted.push(
      ...(await db
        .insert(applications)
        .values(rows.slice(from, from + 2000))
        .returning()),
    );
  return inserted;
}

import { auditEntries } from '../../../drizzle/schema';
import type { Db } from '../platform';

export type AuditRow = typeof auditEntries.$inferInsert;

export async function insertAudit(db: Db, rows: AuditRow[]): Promise<void> {
  if (rows.length > 0) await db.insert(auditEntries).values(rows);
}

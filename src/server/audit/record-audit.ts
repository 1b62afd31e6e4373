import type { Context } from '../platform';
import { insertAudit } from './audit-queries';

export interface AuditFact {
  /** `<capability>.<deed>`, e.g. `cycles.open`. */
  action: string;
  subjectId: string;
  cycleId?: string;
  /** Names of changed fields; never their values. */
  fields?: string[];
  /** A reason given for the deed, where staff must give one. */
  note?: string;
  /** For deeds done before anybody is signed in, such as confirming an address. */
  actorId?: string;
}

/** Writes down a change of state; belongs into the transaction of the change. */
export const recordAudit = (ctx: Context, fact: AuditFact): Promise<void> => recordAll(ctx, [fact]);

/** The same for many subjects of one deed. */
export async function recordAll(ctx: Context, facts: AuditFact[]): Promise<void> {
  const at = ctx.now();
  await insertAudit(
    ctx.db,
    facts.map(({ actorId, ...fact }) => ({
      ...fact,
      at,
      actorId: actorId ?? ctx.actor?.personId ?? null,
      requestId: ctx.requestId,
    })),
  );
}

/** Names of the fields in which two values of one shape differ. */
export function changedFields<T extends object>(before: T, after: T): string[] {
  return (Object.keys(after) as (keyof T & string)[]).filter(
    (field) => JSON.stringify(before[field]) !== JSON.stringify(after[field]),
  );
}

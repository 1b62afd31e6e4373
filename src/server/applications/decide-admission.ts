import { mayDecide } from '../../../shared/applications/application-rules';
import {
  type AdmissionDecision,
  type AdmissionOutcome,
  STATUS_LABEL,
} from '../../../shared/applications/applications-contract';
import { recordAll } from '../audit';
import { findCycle } from '../cycles';
import { inTransaction, notFound, Problem, type Context } from '../platform';
import { tellWithdrawn } from './application-messages';
import { holdForDecision, setStatus, type DecidedRow } from './applicants-queries';
import { withdrawProposals } from './withdraw-application';

/** Admits, puts on the waiting list or withdraws many applications at once; what cannot be done is said, the rest is done. */
export function decideAdmission(ctx: Context, cycleId: string, decision: AdmissionDecision): Promise<AdmissionOutcome> {
  return inTransaction(ctx, async (tx) => {
    const cycle = await findCycle(tx.db, cycleId);
    if (!cycle) throw notFound('cycle');
    if (!mayDecide(cycle.phase)) throw new Problem('conflict', 'This cycle is over; its applications stay as they are');
    const ids = [...new Set(decision.applicationIds)];
    const rows = await holdForDecision(tx.db, cycleId, ids);
    const judged = rows.map((row) => ({ row, reason: whyNot(row, decision.status) }));
    const changed = judged.filter((each) => each.reason === null).map((each) => each.row);
    const changedIds = changed.map((row) => row.id);
    await setStatus(tx.db, changedIds, decision.status, tx.now());
    if (decision.status === 'withdrawn') {
      await withdrawProposals(tx, changedIds, cycleId);
      const told = changed.map((row) => ({ ...row, version: row.version + 1 }));
      await tellWithdrawn(tx, told, cycle, true);
    }
    await recordAll(
      tx,
      changed.map((row) => ({
        action: 'applications.decide',
        subjectId: row.id,
        cycleId,
        fields: ['status'],
        note: `${row.status} → ${decision.status}`,
      })),
    );
    const known = new Set(rows.map((row) => row.id));
    return {
      changed: changed.map((row) => ({ id: row.id, from: row.status, to: decision.status })),
      refused: [
        ...judged.flatMap(({ row, reason }) => (reason === null ? [] : [{ id: row.id, name: row.name, reason }])),
        ...ids
          .filter((id) => !known.has(id))
          .map((id) => ({ id, name: '', reason: 'There is no such application in this cycle' })),
      ],
    };
  });
}

/** Null where the decision is possible. */
function whyNot(row: DecidedRow, to: AdmissionDecision['status']): string | null {
  if (row.status === to) return `The application is ${STATUS_LABEL[to].toLowerCase()} already`;
  if (row.status === 'draft') return 'The application has not been sent yet';
  if (row.ownWithdrawal) return 'The applicant withdrew it; only they can apply again';
  if (row.inPair) return 'The applicant is in a pair; end the pair first';
  if (row.hasProposal && to !== 'withdrawn') return 'A proposal waits for answers; decide once it is answered';
  return null;
}

import { isLate, mayChangeApplication, takesApplications } from '../../../shared/applications/application-rules';
import type {
  ApplicationForm,
  ApplicationStatus,
  OwnApplication,
} from '../../../shared/applications/applications-contract';
import { completenessOf } from '../../../shared/profiles/profile-rules';
import { findAssociation, findPerson } from '../accounts';
import { recordAudit } from '../audit';
import { type CycleRow, holdCycle } from '../cycles';
import { actorOf, inTransaction, notFound, Problem, stale, type Context } from '../platform';
import { loadProfiles } from '../profiles';
import { tellReceived } from './application-messages';
import {
  holdApplication,
  insertApplication,
  leftOutBefore,
  listListedMentors,
  replacePreferences,
  updateApplication,
  type ApplicationRow,
} from './applications-queries';
import { associationDay } from './association-day';
import { showOwn } from './show-own';

export interface Submission {
  personId: string;
  cycleId: string;
  form: ApplicationForm;
  /** For data that are brought in with their own time; otherwise now. */
  at?: Date;
}

/**
 * Applies for oneself, or changes what one applied with.
 *
 * @param version of the application that is changed; 0 where none exists yet
 */
export function applyForSelf(
  ctx: Context,
  cycleId: string,
  form: ApplicationForm,
  version: number,
): Promise<OwnApplication> {
  return inTransaction(ctx, async (tx) => {
    const { personId } = actorOf(tx);
    const cycle = await heldCycle(tx, cycleId);
    const before = await holdApplication(tx.db, cycleId, personId, form.side);
    if ((before?.version ?? 0) !== version) throw stale(before ? await showOwn(tx, before) : null);
    await refuseLapsedMember(tx, personId);
    return showOwn(tx, await submit(tx, cycle, before, personId, form));
  });
}

/** The same for anybody and any time, without a look at the membership; for data that are brought in. */
export function submitApplication(ctx: Context, { personId, cycleId, form, at }: Submission): Promise<OwnApplication> {
  const timed = at ? { ...ctx, now: () => at } : ctx;
  return inTransaction(timed, async (tx) => {
    const cycle = await heldCycle(tx, cycleId);
    const before = await holdApplication(tx.db, cycleId, personId, form.side);
    return showOwn(tx, await submit(tx, cycle, before, personId, form));
  });
}

async function heldCycle(tx: Context, cycleId: string): Promise<CycleRow> {
  const cycle = await holdCycle(tx.db, cycleId);
  if (!cycle || cycle.phase === 'draft') throw notFound('cycle');
  return cycle;
}

async function submit(
  tx: Context,
  cycle: CycleRow,
  before: ApplicationRow | null,
  personId: string,
  form: ApplicationForm,
): Promise<ApplicationRow> {
  const live = before !== null && before.status !== 'withdrawn' && before.status !== 'draft';
  refuseWrongPhase(cycle, live);
  refuseOtherConsent(cycle, form);
  if (form.places < (before?.taken ?? 0)) throw oneFault('places', `${before?.taken} of your places are taken already`);
  await checkPreferred(tx, cycle.id, personId, form.preferredMentors);
  const late = live ? before.late : isLate(cycle.phase, await associationDay(tx), cycle.applicationsCloseOn);
  const content = {
    places: form.places,
    oneMoreIfAsked: form.side === 'mentor' && form.oneMoreIfAsked,
    goals: form.goals,
    consentVersion: form.consentVersion,
    consentAt: before && live && before.consentVersion === form.consentVersion ? before.consentAt : tx.now(),
    late,
    status: await statusAfter(tx, cycle, live ? before : null, personId, late),
    submittedAt: live ? before.submittedAt : tx.now(),
    withdrawnAt: null,
  };
  const row = before
    ? await updateApplication(tx.db, before.id, content)
    : await insertApplication(tx.db, {
        ...content,
        cycleId: cycle.id,
        personId,
        side: form.side,
        leftOutLastTime: form.side === 'mentee' && (await leftOutBefore(tx.db, cycle, [personId])).has(personId),
        createdAt: tx.now(),
      });
  if (!row) throw new Problem('conflict', 'You applied in another tab at the same moment; reload the page');
  await replacePreferences(tx.db, row.id, form.preferredMentors);
  await recordAudit(tx, {
    action: live ? 'applications.change' : 'applications.submit',
    subjectId: row.id,
    cycleId: cycle.id,
    fields: live ? changedIn(before, row) : [],
  });
  if (!live) await tellReceived(tx, row, cycle);
  return row;
}

const CONTENT = ['places', 'oneMoreIfAsked', 'goals', 'status', 'consentVersion'] as const;
const changedIn = (before: ApplicationRow, after: ApplicationRow): string[] =>
  CONTENT.filter((field) => before[field] !== after[field]);

function refuseWrongPhase(cycle: CycleRow, live: boolean): void {
  if (live && !mayChangeApplication(cycle.phase))
    throw new Problem('conflict', 'Matching has begun; what you sent stays as it is. You can still withdraw');
  if (!takesApplications(cycle.phase)) throw new Problem('conflict', `${cycle.name} takes no applications any more`);
}

function refuseOtherConsent(cycle: CycleRow, form: ApplicationForm): void {
  if (form.consentVersion !== cycle.consentVersion)
    throw oneFault('consentVersion', 'The text you agree to has changed meanwhile; please read it again');
}

async function refuseLapsedMember(tx: Context, personId: string): Promise<void> {
  const person = await findPerson(tx.db, personId);
  if (person?.membershipCurrent) return;
  const contact = (await findAssociation(tx.db))?.contactEmail;
  throw new Problem(
    'conflict',
    'Only current members can apply, and our list does not show your membership as current',
    {
      detail: contact
        ? `Please write to ${contact}; once the list is put right you can apply at once`
        : 'Please ask your association’s office; once the list is put right you can apply at once',
    },
  );
}

async function checkPreferred(tx: Context, cycleId: string, personId: string, named: string[]): Promise<void> {
  if (named.length === 0) return;
  if (named.includes(personId)) throw oneFault('preferredMentors', 'You cannot name yourself');
  const listed = new Set((await listListedMentors(tx.db, cycleId)).map((mentor) => mentor.personId));
  if (named.some((id) => !listed.has(id)))
    throw oneFault('preferredMentors', 'One of these mentors is not listed in this cycle any more; choose another');
}

/** Late ones wait. On time, a complete profile is admitted where the cycle says so; a decision once made stays. */
async function statusAfter(
  tx: Context,
  cycle: CycleRow,
  before: ApplicationRow | null,
  personId: string,
  late: boolean,
): Promise<ApplicationStatus> {
  if (before && before.status !== 'submitted') return before.status;
  if (late) return 'waiting-list';
  const onTime = !isLate(cycle.phase, await associationDay(tx), cycle.applicationsCloseOn);
  if (!cycle.autoAdmit || !onTime) return 'submitted';
  const profile = (await loadProfiles(tx.db, [personId])).get(personId);
  return profile && completenessOf(profile).readyForMatching ? 'admitted' : 'submitted';
}

const oneFault = (field: string, message: string): Problem =>
  new Problem('invalid', 'Some fields need another look', { fields: [{ field, message }] });

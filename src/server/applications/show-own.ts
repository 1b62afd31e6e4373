import { mayChangeApplication, isLate, takesApplications } from '../../../shared/applications/application-rules';
import type {
  ApplicationDesk,
  ListedMentors,
  OwnApplication,
  OwnApplications,
} from '../../../shared/applications/applications-contract';
import { findCycle } from '../cycles';
import { actorOf, notFound, type Context, type Db } from '../platform';
import { listApplicationsOf, listListedMentors, preferencesOf, type ApplicationRow } from './applications-queries';
import { associationDay } from './association-day';

type OwnRow = Awaited<ReturnType<typeof listApplicationsOf>>[number];
type NamedPeople = OwnApplication['preferredMentors'];

/** One place where a row becomes what its owner sees. */
const toOwn = ({ application: row, cycleName, phase }: OwnRow, preferredMentors: NamedPeople): OwnApplication => ({
  id: row.id,
  cycleId: row.cycleId,
  cycleName,
  phase,
  side: row.side,
  status: row.status,
  places: row.places,
  oneMoreIfAsked: row.oneMoreIfAsked,
  goals: row.goals,
  preferredMentors,
  late: row.late,
  submittedAt: row.submittedAt?.toISOString() ?? null,
  consentVersion: row.consentVersion,
  version: row.version,
});

async function ownApplications(db: Db, personId: string, cycleId?: string): Promise<OwnApplication[]> {
  const rows = await listApplicationsOf(db, personId, cycleId);
  const named = await preferencesOf(
    db,
    rows.map((row) => row.application.id),
  );
  return rows.map((row) => toOwn(row, named.get(row.application.id) ?? []));
}

export async function showOwnApplications(ctx: Context): Promise<OwnApplications> {
  return { applications: await ownApplications(ctx.db, actorOf(ctx).personId) };
}

/** The application as its owner sees it now. */
export async function showOwn(tx: Context, row: ApplicationRow): Promise<OwnApplication> {
  const own = (await ownApplications(tx.db, row.personId, row.cycleId)).find((each) => each.id === row.id);
  if (!own) throw notFound('application');
  return own;
}

/** All that is needed to apply to a cycle. A draft is not there yet for applicants. */
export async function showDesk(ctx: Context, cycleId: string): Promise<ApplicationDesk> {
  const cycle = await findCycle(ctx.db, cycleId);
  if (!cycle || cycle.phase === 'draft') throw notFound('cycle');
  return {
    cycleId,
    cycleName: cycle.name,
    introduction: cycle.introduction,
    phase: cycle.phase,
    applicationsCloseOn: cycle.applicationsCloseOn,
    answersDueOn: cycle.answersDueOn,
    consentText: cycle.consentText,
    consentVersion: cycle.consentVersion,
    takesApplications: takesApplications(cycle.phase),
    late: isLate(cycle.phase, await associationDay(ctx), cycle.applicationsCloseOn),
    mayChange: mayChangeApplication(cycle.phase),
    applications: await ownApplications(ctx.db, actorOf(ctx).personId, cycleId),
  };
}

export async function showListedMentors(ctx: Context, cycleId: string): Promise<ListedMentors> {
  const cycle = await findCycle(ctx.db, cycleId);
  if (!cycle || cycle.phase === 'draft') throw notFound('cycle');
  return { mentors: await listListedMentors(ctx.db, cycleId) };
}

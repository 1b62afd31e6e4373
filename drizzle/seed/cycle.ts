/** One cycle of the demo association, led through its phases by the product's own verbs. */
import { DEFAULT_MATCHING_SETTINGS } from '../../shared/matching/matching-contract';
import { submitApplication, withdrawApplication } from '../../src/server/applications';
import { createCycle, moveCycle } from '../../src/server/cycles';
import { createMailTransport, deliverMessages } from '../../src/server/messages';
import type { Actor, Context } from '../../src/server/platform';
import { at, daysAfter, instantOf } from './clock';
import { EMPLOYER_GROUPS, type DemoApplication, type DemoCycle } from './data';
import { settleCycle } from './outcomes';

export interface Seeding {
  ctx: Context;
  coordinator: Actor;
  /** Person by address. */
  people: ReadonlyMap<string, string>;
}

const SETTINGS = {
  ...DEFAULT_MATCHING_SETTINGS,
  employerGroups: EMPLOYER_GROUPS.map((group) => [group.name, ...group.members]),
};

/** Sends what has been written until now, so that the mailbox shows it at its own time. */
export const deliver = (ctx: Context): Promise<number> =>
  deliverMessages(ctx, createMailTransport({ ...ctx.settings, smtpUrl: null }), 100_000);

export async function seedCycle(seeding: Seeding, cycle: DemoCycle): Promise<void> {
  const { ctx, coordinator } = seeding;
  const { draft } = cycle;
  const on = (day: string, hour = 9): Context => at(ctx, instantOf(day, hour), coordinator);
  const opened = on(draft.applicationsOpenOn);
  const { id } = await createCycle(
    on(daysAfter(draft.applicationsOpenOn, -10)),
    { ...draft, copyFrom: null },
    SETTINGS,
  );
  await moveCycle(opened, id, { to: 'open', reason: '' });
  await apply(seeding, id, inTime(cycle));
  if (cycle.phase === 'open') return;
  const closed = daysAfter(draft.applicationsCloseOn, 1);
  await moveCycle(on(closed), id, { to: 'applications-closed', reason: '' });
  await apply(seeding, id, late(cycle));
  await moveCycle(on(daysAfter(closed, 1)), id, { to: 'matching', reason: '' });
  if (cycle.phase === 'closed' && cycle.publishedOn) await settleCycle(seeding, cycle, id, cycle.publishedOn);
}

const inTime = ({ applications, draft }: DemoCycle): DemoApplication[] =>
  applications.filter((each) => each.submittedOn <= draft.applicationsCloseOn);
const late = ({ applications, draft }: DemoCycle): DemoApplication[] =>
  applications.filter((each) => each.submittedOn > draft.applicationsCloseOn);

async function apply({ ctx, people }: Seeding, cycleId: string, applications: DemoApplication[]): Promise<void> {
  // Mentors first: mentees name mentors who are in the cycle already.
  const ordered = [...applications].sort(
    (a, b) => b.side.localeCompare(a.side) || a.submittedOn.localeCompare(b.submittedOn),
  );
  for (const [position, application] of ordered.entries()) {
    const personId = people.get(application.personEmail)!;
    // Through the working day, each at a minute of its own.
    const moment = instantOf(application.submittedOn, 8 + (position % 12), (position * 7) % 60);
    const self: Actor = { personId, name: '', roles: [] };
    const own = at(ctx, moment, self);
    const sent = await submitApplication(own, {
      personId,
      cycleId,
      form: {
        side: application.side,
        places: application.places,
        oneMoreIfAsked: application.oneMoreIfAsked,
        goals: application.goals,
        preferredMentors: application.preferredMentors.map((email) => people.get(email)!),
        consentVersion: 1,
      },
    });
    if (application.becomes === 'withdrawn')
      await withdrawApplication(at(ctx, instantOf(daysAfter(application.submittedOn, 2)), self), sent.id);
    const next = ordered[position + 1];
    if (next?.submittedOn !== application.submittedOn) await deliver(at(ctx, instantOf(application.submittedOn, 21)));
  }
}

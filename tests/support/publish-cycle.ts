/** A cycle whose plan is published, with one mentee and one mentor each of two pairings. */
import { publishRun, startRun, workRun } from '../../src/server/matching';
import { findCycle } from '../../src/server/cycles';
import type { CycleDraft } from '../../shared/cycles/cycles-contract';
import { makeApplicant, makeCycle, systemContext, type Applicant } from './build-cycle';
import type { TestApp } from './test-app';

export interface PublishedCycle {
  cycleId: string;
  mentees: Applicant[];
  mentors: Applicant[];
}

let counter = 0;

/** Two mentees, each with the only mentor of their area. */
export async function publishedCycle(
  app: TestApp,
  areas: { gis: string; hydrographic: string },
  change: Partial<CycleDraft> = {},
): Promise<PublishedCycle> {
  counter++;
  const cycleId = await makeCycle(app, 'matching', { name: `Published ${counter}`, ...change });
  const make = (name: string, side: 'mentee' | 'mentor', area: string) =>
    makeApplicant(app, cycleId, { name: `${name} ${counter}`, side, area });
  const mentees = [await make('Ada', 'mentee', areas.gis), await make('Bo', 'mentee', areas.hydrographic)];
  const mentors = [await make('Mo', 'mentor', areas.gis), await make('No', 'mentor', areas.hydrographic)];
  const publisher = await app.person({ roles: ['coordinator'] });
  const ctx = { ...systemContext(app), actor: { personId: publisher.id, name: publisher.name, roles: [] } };
  const run = await startRun(ctx, cycleId, null);
  await workRun(ctx, run.id);
  const cycle = await findCycle(ctx.db, cycleId);
  await publishRun(ctx, run.id, { acknowledgedChanges: false, version: cycle!.version });
  return { cycleId, mentees, mentors };
}

/** The token of the latest proposal that was sent to an address. */
export async function proposalToken(app: TestApp, email: string): Promise<string> {
  await app.deliver();
  const [mail] = await app.rows<{ text: string }>(
    `select text from mailbox where recipient = $1 and text like '%/pairings/proposal/%' order by received_at desc limit 1`,
    [email],
  );
  return /\/pairings\/proposal\/([\w-]{43})/.exec(mail?.text ?? '')?.[1] ?? '';
}

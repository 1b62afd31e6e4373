import { findAssociation, findPerson } from '../accounts';
import { postMessage } from '../messages';
import type { Context } from '../platform';
import type { ApplicationRow } from './applications-queries';
import { dayInWords } from './association-day';

interface NamedCycle {
  name: string;
  applicationsCloseOn: string;
}

/** Says that an application arrived. Applying again after a withdrawal is a new cause. */
export async function tellReceived(tx: Context, row: ApplicationRow, cycle: NamedCycle): Promise<void> {
  await tell(tx, 'applications/received', row, cycle, {
    places: row.places,
    isMentor: row.side === 'mentor',
    waitingList: row.status === 'waiting-list',
  });
}

export async function tellWithdrawn(tx: Context, row: ApplicationRow, cycle: NamedCycle): Promise<void> {
  await tell(tx, 'applications/withdrawn', row, cycle, {});
}

async function tell(
  tx: Context,
  template: 'applications/received' | 'applications/withdrawn',
  row: ApplicationRow,
  cycle: NamedCycle,
  more: Record<string, unknown>,
): Promise<void> {
  const person = await findPerson(tx.db, row.personId);
  const association = await findAssociation(tx.db);
  if (!person) return;
  await postMessage(tx, {
    template,
    cause: `application:${row.id}:${row.version}`,
    recipientId: person.id,
    address: person.email,
    data: {
      name: person.name,
      associationName: association?.name ?? 'Heddle',
      cycleName: cycle.name,
      side: row.side,
      closesOn: dayInWords(cycle.applicationsCloseOn, association?.locale ?? 'en-GB'),
      ...more,
    },
    links: { application: { path: `/applications/${row.cycleId}`, purpose: 'page', rowId: row.id } },
  });
}

import { findAssociation, findPeople } from '../accounts';
import { postMessages } from '../messages';
import { grouped, type Context } from '../platform';
import type { ApplicationRow } from './applications-queries';
import { dayInWords } from './association-day';

interface NamedCycle {
  id: string;
  name: string;
  applicationsCloseOn: string;
}
type ToldApplication = Pick<ApplicationRow, 'id' | 'personId' | 'side' | 'version'>;

/** Says that an application arrived. Applying again after a withdrawal is a new cause. */
export const tellReceived = (tx: Context, row: ApplicationRow, cycle: NamedCycle): Promise<void> =>
  tell(tx, 'applications/received', [row], cycle, {
    places: row.places,
    isMentor: row.side === 'mentor',
    waitingList: row.status === 'waiting-list',
  });

export const tellWithdrawn = (
  tx: Context,
  rows: readonly ToldApplication[],
  cycle: NamedCycle,
  byCoordinator: boolean,
): Promise<void> => tell(tx, 'applications/withdrawn', rows, cycle, { byCoordinator });

async function tell(
  tx: Context,
  template: 'applications/received' | 'applications/withdrawn',
  rows: readonly ToldApplication[],
  cycle: NamedCycle,
  more: Record<string, unknown>,
): Promise<void> {
  const association = await findAssociation(tx.db);
  const byPerson = grouped(rows, (row) => row.personId);
  const people = await findPeople(tx.db, [...byPerson.keys()]);
  await postMessages(
    tx,
    people.flatMap(({ id, name, email }) =>
      (byPerson.get(id) ?? []).map((row) => ({
        template,
        cause: `application:${row.id}:${row.version}`,
        recipientId: id,
        address: email,
        data: {
          name,
          associationName: association?.name ?? 'Heddle',
          cycleName: cycle.name,
          side: row.side,
          closesOn: dayInWords(cycle.applicationsCloseOn, association?.locale ?? 'en-GB'),
          ...more,
        },
        links: { application: { path: `/applications/${cycle.id}`, purpose: 'page', rowId: row.id } },
      })),
    ),
  );
}

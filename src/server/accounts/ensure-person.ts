import type { Context } from '../platform';
import { findPeopleByAddressOrNumber, insertPerson, updatePerson } from './accounts-queries';

export interface PersonFacts {
  /** Lower case. */
  email: string;
  name: string;
  membershipNumber?: string | null;
  membershipCurrent?: boolean;
}

/** Finds a person by address or membership number, or makes an account in state invited. For lists that staff bring. */
export async function ensurePerson(tx: Context, facts: PersonFacts): Promise<{ id: string; created: boolean }> {
  const number = facts.membershipNumber || null;
  const [known] = await findPeopleByAddressOrNumber(tx.db, [facts.email], number ? [number] : []);
  if (known) {
    await updatePerson(tx.db, known.id, {
      membershipNumber: number ?? known.membershipNumber,
      membershipCurrent: facts.membershipCurrent ?? known.membershipCurrent,
    });
    return { id: known.id, created: false };
  }
  const made = await insertPerson(tx.db, {
    email: facts.email,
    name: facts.name,
    membershipNumber: number,
    membershipCurrent: facts.membershipCurrent ?? false,
    createdAt: tx.now(),
  });
  if (!made) throw new Error('a person with this address appeared in the same moment');
  return { id: made.id, created: true };
}

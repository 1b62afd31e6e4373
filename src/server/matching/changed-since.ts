import type { MatchingInput } from '../../../shared/matching/matching-input';
import type { MatchingSettings } from '../../../shared/matching/matching-contract';
import type { Plan } from '../../../shared/matching/runs-contract';
import { inTransaction, type Context } from '../platform';
import type { CycleRow } from '../cycles';
import type { ApplicantFacts } from './cycle-facts-queries';
import { gatherInput } from './gather-input';

type Change = Plan['changedSince'][number];

interface Compared {
  cycle: CycleRow;
  /** What the run read. */
  input: MatchingInput;
  settings: MatchingSettings;
  facts: ReadonlyMap<string, Pick<ApplicantFacts, 'name' | 'status'>>;
}

/** What differs between what a run read and what it would read now, in sentences; a missing applicant blocks publishing. */
export async function changedSince(ctx: Context, compared: Compared): Promise<Change[]> {
  const now = await inTransaction(ctx, (tx) => gatherInput(tx.db, compared.cycle, compared.cycle.settings));
  return differences(compared, now);
}

export function differences({ input, settings, cycle, facts }: Compared, now: MatchingInput): Change[] {
  const nameOf = (key: string): string => facts.get(key)?.name ?? 'An erased person';
  const changes: Change[] = [];
  for (const side of ['mentees', 'mentors'] as const) {
    const before = new Map(input[side].map((person) => [person.key, JSON.stringify(person)]));
    const after = new Map(now[side].map((person) => [person.key, JSON.stringify(person)]));
    for (const [key, text] of before) {
      if (!after.has(key)) changes.push(missing(nameOf(key), facts.get(key)?.status));
      else if (after.get(key) !== text)
        changes.push({ text: `${nameOf(key)} changed profile, places or application`, blocks: false });
    }
    for (const key of after.keys())
      if (!before.has(key)) changes.push({ text: `${nameOf(key)} was admitted since`, blocks: false });
  }
  if (JSON.stringify(settings) !== JSON.stringify(cycle.settings))
    changes.push({ text: 'The run used other rules, criteria or weights than the cycle has now', blocks: false });
  if (JSON.stringify(input.decisions) !== JSON.stringify(now.decisions))
    changes.push({ text: 'Locks or bars changed', blocks: false });
  return changes;
}

function missing(name: string, status: string | undefined): Change {
  if (status === 'withdrawn') return { text: `${name} has withdrawn`, blocks: true };
  if (status === 'admitted') return { text: `${name} has a pairing by now`, blocks: true };
  return { text: `${name} is no longer admitted`, blocks: true };
}

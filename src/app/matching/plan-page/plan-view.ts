/** A plan turned into what its parts show: pure, so that pages stay thin. */
import type { Plan, PlanPairing, PlanPerson } from '../../../../shared/matching/runs-contract';
import type { FitCriterion } from '../../ui/fit-strip/strip-layout';
import type { PlanGroup } from '../../ui/plan-at-a-glance/plan-at-a-glance';

export interface PairingRow {
  mentee: PlanPerson;
  mentor: PlanPerson;
  pairing: PlanPairing;
  criteria: FitCriterion[];
  decision: 'lock' | 'bar' | null;
}

export const NO_AREA = 'No area given';
/** Areas with fewer people than this share one group in the picture. */
const MOST_GROUPS = 11;

const byId = (people: readonly PlanPerson[]): Map<string, PlanPerson> =>
  new Map(people.map((person) => [person.applicationId, person]));

export const areaOf = (person: PlanPerson): string => person.area || NO_AREA;

/** "Hydrographic · Islands" */
export const whereabouts = (person: PlanPerson): string =>
  [person.area, person.region ? person.region[0]!.toUpperCase() + person.region.slice(1) : '']
    .filter(Boolean)
    .join(' · ');

export function pairingRows(plan: Plan): PairingRow[] {
  const mentees = byId(plan.mentees);
  const mentors = byId(plan.mentors);
  const decided = new Map(plan.decisions.map((each) => [`${each.mentee} ${each.mentor}`, each.kind]));
  return plan.pairings.map((pairing) => ({
    pairing,
    mentee: mentees.get(pairing.mentee)!,
    mentor: mentors.get(pairing.mentor)!,
    criteria: criteriaOf(plan, pairing),
    decision: decided.get(`${pairing.mentee} ${pairing.mentor}`) ?? null,
  }));
}

export const criteriaOf = (plan: Plan, pairing: PlanPairing): FitCriterion[] =>
  plan.criteria.map((criterion, at) => {
    const score = pairing.scores[at] ?? -1;
    return {
      label: criterion.label,
      short: criterion.short.slice(0, 5),
      weight: criterion.weight,
      score: score < 0 ? 0.5 : score / 10_000,
      missing: score < 0,
    };
  });

/** Mentees and places by practice area, the largest first; what is rare shares one group. */
export function planGroups(plan: Plan): PlanGroup[] {
  const size = new Map<string, number>();
  for (const person of plan.mentees) size.set(areaOf(person), (size.get(areaOf(person)) ?? 0) + 1);
  for (const person of plan.mentors) size.set(areaOf(person), (size.get(areaOf(person)) ?? 0) + person.places);
  const largest = [...size].sort((a, b) => b[1] - a[1] || a[0].localeCompare(b[0])).map(([area]) => area);
  const shown = largest.length > MOST_GROUPS + 1 ? largest.slice(0, MOST_GROUPS) : largest;
  const groupOf = groupFinder(shown);
  const pairingOf = new Map(plan.pairings.map((pairing) => [pairing.mentee, pairing]));
  const menteesOf = new Map<string, string[]>();
  for (const pairing of plan.pairings)
    menteesOf.set(pairing.mentor, [...(menteesOf.get(pairing.mentor) ?? []), pairing.mentee]);
  const labels = shown.length < largest.length ? [...shown, OTHER] : shown;
  return labels.map((label) => {
    const mentees = plan.mentees.filter((person) => groupOf(person) === label);
    return {
      key: label,
      label,
      mentees: mentees.map((person) => ({
        key: person.applicationId,
        name: person.name,
        mentorKey: pairingOf.get(person.applicationId)?.mentor ?? null,
        fit: pairingOf.get(person.applicationId)?.fit ?? null,
      })),
      places: plan.mentors
        .filter((person) => groupOf(person) === label)
        .flatMap((person) =>
          Array.from({ length: person.places }, (_, place) => ({
            key: person.applicationId,
            name: person.name,
            menteeKey: menteesOf.get(person.applicationId)?.[place] ?? null,
          })),
        ),
      short: mentees.filter((person) => !pairingOf.has(person.applicationId)).length,
    };
  });
}

const OTHER = 'Other areas';

const groupFinder =
  (shown: readonly string[]) =>
  (person: PlanPerson): string =>
    shown.includes(areaOf(person)) ? areaOf(person) : OTHER;

/** The group of the picture that a person stands in. */
export function inGroup(groups: readonly PlanGroup[], group: string | null): ReadonlySet<string> | null {
  const chosen = groups.find((each) => each.key === group);
  return chosen ? new Set(chosen.mentees.map((mentee) => mentee.key)) : null;
}

const folded = (text: string): string => text.normalize('NFKD').replace(/\p{M}/gu, '').toLowerCase();

/** Does a person's name, area or employer contain the text, whatever its case and accents? */
export function found(person: PlanPerson, text: string): boolean {
  return folded(`${person.name} ${person.area} ${person.employer} ${person.region}`).includes(folded(text.trim()));
}

export type PairingSort = 'mentee' | 'fit' | 'mentor' | 'stays';

/** Rows in the wished order; ties by the mentee's name, so that the order is always the same. */
export function sortedRows(rows: readonly PairingRow[], sort: PairingSort, descending: boolean): PairingRow[] {
  const sign = descending ? -1 : 1;
  const compare: Record<PairingSort, (a: PairingRow, b: PairingRow) => number> = {
    mentee: (a, b) => a.mentee.name.localeCompare(b.mentee.name),
    mentor: (a, b) => a.mentor.name.localeCompare(b.mentor.name),
    fit: (a, b) => a.pairing.fit - b.pairing.fit,
    stays: (a, b) => (a.pairing.stays ?? 0) - (b.pairing.stays ?? 0),
  };
  return [...rows].sort((a, b) => sign * compare[sort](a, b) || a.mentee.name.localeCompare(b.mentee.name));
}

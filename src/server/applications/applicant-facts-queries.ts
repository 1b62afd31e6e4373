/** Completeness and flags as the database computes them, so that a table of thousands sorts and filters there. */
import { sql, type SQL } from 'drizzle-orm';
import { alias } from 'drizzle-orm/pg-core';
import { applications, people, profiles, profileTags } from '../../../drizzle/schema';
import type { ApplicantFlag } from '../../../shared/applications/application-rules';

const hasTags = sql`exists (select 1 from ${profileTags} where ${profileTags.personId} = ${applications.personId})`;

// The checks of shared/profiles/profile-rules in SQL; the API spec holds both against each other.
const CHECKS: readonly { needed: boolean; done: SQL }[] = [
  { needed: true, done: sql`jsonb_array_length(${profiles.languages}) > 0` },
  { needed: false, done: sql`${profiles.region} is not null and ${profiles.town} is not null` },
  { needed: false, done: sql`${profiles.employer} <> ''` },
  { needed: false, done: sql`${profiles.headline} <> ''` },
  { needed: true, done: sql`${profiles.yearsInPractice} is not null` },
  { needed: false, done: sql`${profiles.careerStage} is not null` },
  { needed: false, done: sql`${profiles.sector} is not null` },
  { needed: true, done: hasTags },
  { needed: true, done: sql`${profiles.meetingMode} is not null` },
  { needed: true, done: sql`cardinality(${profiles.availability}) > 0` },
  { needed: false, done: sql`(${profiles.hopes} <> '' or ${profiles.style} <> '')` },
];

const count = sql.join(
  CHECKS.map((check) => sql`(case when ${check.done} then 1 else 0 end)`),
  sql` + `,
);
/** 0..100, whole. */
export const completeness = sql<number>`round(100.0 * (${count}) / ${CHECKS.length}::int)::int`;

const ready = sql.join(
  CHECKS.filter((check) => check.needed).map((check) => sql`coalesce(${check.done}, false)`),
  sql` and `,
);

const other = alias(applications, 'other');

export const FLAG: Record<ApplicantFlag, SQL<boolean>> = {
  notReady: sql<boolean>`not (${ready})`,
  employerUnknown: sql<boolean>`coalesce(${profiles.employer}, '') = ''`,
  membershipNotCurrent: sql<boolean>`not ${people.membershipCurrent}`,
  bothSides: sql<boolean>`exists (select 1 from ${applications} as "other"
    where ${other.cycleId} = ${applications.cycleId} and ${other.personId} = ${applications.personId}
      and ${other.side} <> ${applications.side} and ${other.status} not in ('withdrawn', 'draft'))`,
  late: sql<boolean>`${applications.late}`,
  noConsent: sql<boolean>`${applications.consentVersion} is null`,
};
export const anyFlag: SQL = sql`(${sql.join(Object.values(FLAG), sql` or `)})`;

/** What is wrong with settings that are being typed, in sentences that stand beside their fields. */
import { MatchingSettings } from '../../../../shared/matching/matching-contract';

type Path = readonly PropertyKey[];

/**
 * Sentences by the path of the field ("rules.5.min"); all of the groups of companies stand in one field and share
 * one path ("employerGroups").
 */
export function faultsOfSettings(settings: MatchingSettings): ReadonlyMap<string, string> {
  const faults = new Map<string, string>();
  const result = MatchingSettings.safeParse(settings);
  for (const issue of result.error?.issues ?? []) {
    const field = issue.path[0] === 'employerGroups' ? 'employerGroups' : issue.path.join('.');
    if (!faults.has(field)) faults.set(field, ownSentence(settings, issue.path, issue.code) ?? issue.message);
  }
  return faults;
}

/** The contract speaks of stored units, and of some numbers not in plain words; the page shows points and says so. */
function ownSentence(settings: MatchingSettings, path: Path, code: string): string | null {
  const [part, , parameter] = path;
  if (part === 'seed') return 'A whole number from 0 to 2147483647';
  if (part === 'employerGroups') return groupSentence(settings, path, code);
  if (code === 'custom') return null;
  if (parameter === 'weight') return 'A number between 0 and 100';
  return part === 'leftOutBonus' || part === 'loadCharges' || parameter === 'fit' ? 'Between 0 and 100 points' : null;
}

function groupSentence(settings: MatchingSettings, [, group, name]: Path, code: string): string {
  if (name !== undefined) return 'A name has at most 120 characters';
  if (typeof group !== 'number') return 'At most 200 groups';
  const first = settings.employerGroups[group]?.[0] ?? '';
  return code === 'too_small'
    ? `“${first}” stands alone on its line; a group has at least two names`
    : `The group of “${first}” has more than 50 names`;
}

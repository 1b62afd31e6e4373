/** Applicants for specs of rules and criteria: two people whom every default rule lets through. */
import { DEFAULT_MATCHING_SETTINGS, type MatchingSettings } from '../../shared/matching/matching-contract';
import type { MatchingInput, MenteeInput, MentorInput } from '../../shared/matching/matching-input';

const common = {
  employer: '',
  town: 'Port Ansel',
  timeZone: 'Europe/Copenhagen',
  languages: [{ code: 'en', level: 'C1' as const }],
  sector: 'private' as const,
  meetingMode: 'both' as const,
  maxDistanceKm: null,
  availability: ['mon-morning' as const, 'wed-evening' as const],
  exclusions: [],
  declaredInterests: [],
};

export const menteeInput = (key: string, change: Partial<MenteeInput> = {}): MenteeInput => ({
  ...common,
  key,
  person: `person-${key}`,
  employer: 'Aldermoor Survey',
  yearsInPractice: 2,
  seeks: [{ tagId: 'gis', priority: 1 }],
  careerStage: 'graduate',
  wishedYearsMin: null,
  wishedYearsMax: null,
  wishedSector: 'any',
  preferred: [],
  leftOutLastTime: false,
  ...change,
});

/** `offers` by tag id alone: priorities of offers change nothing. */
type MentorChange = Partial<Omit<MentorInput, 'offers'>> & { offers?: string[] };

export const mentorInput = (key: string, { offers = ['gis'], ...change }: MentorChange = {}): MentorInput => ({
  ...common,
  key,
  person: `person-${key}`,
  employer: 'Thornfield Mapping',
  yearsInPractice: 10,
  offers: offers.map((tagId) => ({ tagId, priority: 1 })),
  wishedStages: [],
  places: 1,
  taken: 0,
  oneMoreIfAsked: false,
  ...change,
});

export const matchingInput = (
  mentees: MenteeInput[],
  mentors: MentorInput[],
  change: Partial<MatchingInput> = {},
): MatchingInput => ({
  settings: DEFAULT_MATCHING_SETTINGS,
  day: '2027-01-11',
  mentees,
  mentors,
  tags: [
    { id: 'gis', label: 'GIS and data', kind: 'practice-area', parent: null },
    { id: 'remote-sensing', label: 'Remote sensing', kind: 'practice-area', parent: 'gis' },
    { id: 'hydrographic', label: 'Hydrographic', kind: 'practice-area', parent: null },
    { id: 'chartership', label: 'Chartership', kind: 'topic', parent: null },
  ],
  towns: {
    'Port Ansel': { latitude: 56.31, longitude: 3.62, region: 'coast' },
    Greyford: { latitude: 56.12, longitude: 4.28, region: 'midvale' },
    Tarnwick: { latitude: 55.71, longitude: 5.06, region: 'uplands' },
  },
  earlier: [],
  declined: [],
  decisions: [],
  ...change,
});

/** The default settings with some rules changed; rules named are on. */
export function settingsWith(
  rules: Partial<Record<string, object>>,
  weights: Partial<Record<string, number>> = {},
): MatchingSettings {
  return {
    ...DEFAULT_MATCHING_SETTINGS,
    rules: DEFAULT_MATCHING_SETTINGS.rules.map((rule) => ({
      ...rule,
      ...rules[rule.rule],
    })) as MatchingSettings['rules'],
    criteria: DEFAULT_MATCHING_SETTINGS.criteria.map((each) => ({
      ...each,
      weight: weights[each.criterion] ?? each.weight,
    })),
  };
}

/** Who is in the demo association before they have names: area, side, place and standing of each person. */
import type { CareerStage, Region } from '../../../shared/profiles/profiles-contract';
import { PRACTICE_AREA_SLUGS, type PracticeAreaSlug } from './tags';
import type { Chance } from './random';

/** What a person does in one cycle; `places` > 0 = applies as a mentor. */
export interface Part {
  mentee: boolean;
  places: number;
  oneMoreIfAsked: boolean;
  becomes: 'admitted' | 'waiting-list' | 'withdrawn' | 'submitted';
}
export type PartKey = 'summer2026' | 'winter2026' | 'summer2027';
export type Parts = Partial<Record<PartKey, Part>>;

export interface Blueprint {
  /** Seeks a mentor, is one, or both. */
  side: 'mentee' | 'mentor' | 'both';
  /** Own area first; what a mentee seeks and a mentor offers. */
  seeks: PracticeAreaSlug[];
  offers: PracticeAreaSlug[];
  region: Region;
  stage: CareerStage;
  years: number;
  parts: Parts;
}

export const asMentee = (becomes: Part['becomes'] = 'admitted'): Part => ({
  mentee: true,
  places: 0,
  oneMoreIfAsked: false,
  becomes,
});
export const asMentor = (places: number, oneMoreIfAsked: boolean, becomes: Part['becomes'] = 'admitted'): Part => ({
  mentee: false,
  places,
  oneMoreIfAsked,
  becomes,
});

/** Hydrographic and mine surveying stand apart: few people, and hardly anyone else can stand in for them. */
export type Market = 'hydrographic' | 'mine-and-tunnel' | 'general';

const GENERAL_AREAS = PRACTICE_AREA_SLUGS.filter((slug) => slug !== 'hydrographic' && slug !== 'mine-and-tunnel');
const AREA_WEIGHT: Partial<Record<PracticeAreaSlug, number>> = {
  'boundary-and-cadastral': 20,
  'engineering-setting-out': 18,
  'gis-and-data': 14,
  'laser-scanning': 12,
  'geodesy-and-control': 10,
  'monitoring-and-deformation': 10,
  photogrammetry: 9,
  'planning-and-consents': 9,
  'land-valuation': 8,
};

/** Areas that people of an area often know as well. */
const NEIGHBOURS: Record<PracticeAreaSlug, readonly PracticeAreaSlug[]> = {
  'boundary-and-cadastral': ['land-valuation', 'planning-and-consents', 'gis-and-data', 'geodesy-and-control'],
  'geodesy-and-control': ['monitoring-and-deformation', 'engineering-setting-out', 'gis-and-data', 'photogrammetry'],
  'engineering-setting-out': [
    'monitoring-and-deformation',
    'laser-scanning',
    'geodesy-and-control',
    'boundary-and-cadastral',
  ],
  hydrographic: ['geodesy-and-control', 'gis-and-data'],
  photogrammetry: ['laser-scanning', 'gis-and-data', 'geodesy-and-control', 'monitoring-and-deformation'],
  'laser-scanning': ['photogrammetry', 'engineering-setting-out', 'gis-and-data', 'monitoring-and-deformation'],
  'gis-and-data': ['photogrammetry', 'planning-and-consents', 'boundary-and-cadastral', 'laser-scanning'],
  'mine-and-tunnel': ['monitoring-and-deformation', 'engineering-setting-out'],
  'monitoring-and-deformation': ['engineering-setting-out', 'geodesy-and-control', 'laser-scanning', 'photogrammetry'],
  'land-valuation': ['planning-and-consents', 'boundary-and-cadastral'],
  'planning-and-consents': ['land-valuation', 'boundary-and-cadastral', 'gis-and-data'],
};

const REGIONS: Record<Market, readonly (readonly [Region, number])[]> = {
  hydrographic: [
    ['islands', 62],
    ['coast', 38],
  ],
  'mine-and-tunnel': [
    ['uplands', 85],
    ['midvale', 15],
  ],
  general: [
    ['midvale', 40],
    ['coast', 31],
    ['uplands', 19],
    ['islands', 10],
  ],
};

const MENTEE_STAGES: readonly (readonly [CareerStage, number])[] = [
  ['student', 7],
  ['graduate', 34],
  ['candidate', 31],
  ['chartered', 16],
  ['returning', 10],
  ['senior', 2],
];
const STAGE_YEARS: Record<CareerStage, readonly [low: number, high: number]> = {
  student: [0, 0],
  graduate: [1, 3],
  candidate: [3, 6],
  chartered: [6, 11],
  returning: [5, 11],
  senior: [14, 18],
};

function ownArea(luck: Chance, market: Market): PracticeAreaSlug {
  return market === 'general'
    ? luck.pickWeighted(GENERAL_AREAS.map((slug) => [slug, AREA_WEIGHT[slug] ?? 1] as const))
    : market;
}

/** Somebody who seeks a mentor. In the two narrow markets they seek that one area and no other. */
export function menteeBlueprint(luck: Chance, market: Market, parts: Parts): Blueprint {
  const area = ownArea(luck, market);
  const more =
    market === 'general'
      ? luck.pickWeighted([
          [0, 22],
          [1, 48],
          [2, 30],
        ] as const)
      : 0;
  const stage = luck.pickWeighted(MENTEE_STAGES);
  return {
    side: 'mentee',
    seeks: [area, ...luck.sample(NEIGHBOURS[area], more)],
    offers: [],
    region: luck.pickWeighted(REGIONS[market]),
    stage,
    years: luck.between(...STAGE_YEARS[stage]),
    parts,
  };
}

/** Somebody who offers places. */
export function mentorBlueprint(luck: Chance, market: Market, parts: Parts): Blueprint {
  const area = ownArea(luck, market);
  const more =
    market === 'general'
      ? luck.pickWeighted([
          [1, 30],
          [2, 45],
          [3, 25],
        ] as const)
      : luck.between(0, 1);
  const years = luck.pickWeighted([
    [luck.between(8, 13), 30],
    [luck.between(14, 22), 42],
    [luck.between(23, 30), 20],
    [luck.between(31, 38), 8],
  ] as const);
  return {
    side: 'mentor',
    seeks: [],
    offers: [area, ...luck.sample(NEIGHBOURS[area], more)],
    region: luck.pickWeighted(REGIONS[market]),
    stage:
      years < 14
        ? 'chartered'
        : luck.pickWeighted([
            ['senior', 75],
            ['chartered', 25],
          ] as const),
    years,
    parts,
  };
}

/** Somebody in mid-career who helps a younger colleague and seeks an older one. */
export function bothBlueprint(luck: Chance, parts: Parts): Blueprint {
  const mentor = mentorBlueprint(luck, 'general', parts);
  const [area = 'gis-and-data', ...others] = mentor.offers;
  return {
    ...mentor,
    side: 'both',
    seeks: [...luck.sample(NEIGHBOURS[area], 2).filter((slug) => !others.includes(slug)), area].slice(0, 2),
    stage: 'chartered',
    years: luck.between(8, 11),
  };
}

/** Shares `total` places among `count` mentors, one to four each. */
export function sharePlaces(luck: Chance, count: number, total: number): number[] {
  const places = Array.from({ length: count }, () => 1);
  for (let left = total - count; left > 0;) {
    const mentor = luck.between(0, count - 1);
    const now = places[mentor] ?? 4;
    if (now >= 4 || (now >= 2 && luck.happens(0.6))) continue;
    places[mentor] = now + 1;
    left--;
  }
  return places;
}

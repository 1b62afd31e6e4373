/** Invented employers of Ellmark's surveyors. Several belong to a group of companies, which counts as one employer. */
import type { Region, Sector } from '../../../shared/profiles/profiles-contract';
import type { PracticeAreaSlug } from './tags';

export interface DemoEmployer {
  name: string;
  /** Mail domain. */
  domain: string;
  sector: Sector;
  /** Name of the group of companies; null where it stands alone. */
  group: string | null;
  regions: readonly Region[];
  areas: readonly PracticeAreaSlug[];
  /** How the name is also written by its own people. */
  alsoWritten: readonly string[];
}

const firm = (
  name: string,
  domain: string,
  regions: readonly Region[],
  areas: readonly PracticeAreaSlug[],
  more: Partial<Pick<DemoEmployer, 'sector' | 'group' | 'alsoWritten'>> = {},
): DemoEmployer => ({
  name,
  domain: `${domain}.example`,
  sector: 'private',
  group: null,
  alsoWritten: [],
  regions,
  areas,
  ...more,
});

const ALDERMOOR = 'Aldermoor Group';
const THORNFIELD = 'Thornfield Holdings';
const NORTHLIGHT = 'Northlight Group';

export const EMPLOYERS: readonly DemoEmployer[] = [
  firm(
    'Aldermoor Geomatics',
    'aldermoor',
    ['midvale', 'coast'],
    ['engineering-setting-out', 'laser-scanning', 'gis-and-data'],
    {
      group: ALDERMOOR,
      alsoWritten: ['Aldermoor Geomatics Ltd'],
    },
  ),
  firm('Aldermoor Marine', 'aldermoor-marine', ['coast', 'islands'], ['hydrographic', 'geodesy-and-control'], {
    group: ALDERMOOR,
  }),
  firm(
    'Aldermoor Underground',
    'aldermoor-underground',
    ['uplands'],
    ['mine-and-tunnel', 'monitoring-and-deformation'],
    {
      group: ALDERMOOR,
    },
  ),
  firm('Thornfield Land Services', 'thornfield', ['midvale', 'uplands'], ['boundary-and-cadastral', 'land-valuation'], {
    group: THORNFIELD,
  }),
  firm('Thornfield Aerial', 'thornfield-aerial', ['midvale', 'coast'], ['photogrammetry', 'gis-and-data'], {
    group: THORNFIELD,
  }),
  firm(
    'Northlight Survey',
    'northlight',
    ['coast', 'midvale'],
    ['engineering-setting-out', 'monitoring-and-deformation'],
    {
      group: NORTHLIGHT,
      alsoWritten: ['Northlight Survey Ltd'],
    },
  ),
  firm('Northlight Data', 'northlight-data', ['midvale'], ['gis-and-data', 'laser-scanning'], { group: NORTHLIGHT }),
  firm(
    'Bracken & Hale',
    'brackenhale',
    ['midvale', 'coast', 'uplands'],
    ['boundary-and-cadastral', 'planning-and-consents', 'land-valuation'],
  ),
  firm('Corrigan Wells Surveyors', 'corriganwells', ['coast'], ['boundary-and-cadastral', 'engineering-setting-out']),
  firm('Stonecrop Tunnels', 'stonecrop', ['uplands', 'midvale'], ['mine-and-tunnel', 'engineering-setting-out']),
  firm(
    'Ironlow Mining Company',
    'ironlow-mining',
    ['uplands'],
    ['mine-and-tunnel', 'monitoring-and-deformation', 'geodesy-and-control'],
  ),
  firm('Tidewell Hydrographic', 'tidewell', ['islands', 'coast'], ['hydrographic']),
  firm('Saltway Offshore', 'saltway', ['coast', 'islands'], ['hydrographic', 'geodesy-and-control']),
  firm(
    'Skerry Harbour Trust',
    'skerryharbour',
    ['islands'],
    ['hydrographic', 'engineering-setting-out', 'planning-and-consents'],
    { sector: 'public' },
  ),
  firm(
    'Harbours Board of Ellmark',
    'harboursboard',
    ['coast', 'islands'],
    ['hydrographic', 'planning-and-consents', 'monitoring-and-deformation'],
    { sector: 'public' },
  ),
  firm(
    'Ellmark Land Registry',
    'landregistry',
    ['midvale', 'coast', 'uplands', 'islands'],
    ['boundary-and-cadastral', 'gis-and-data'],
    { sector: 'public' },
  ),
  firm(
    'Ellmark Mapping Agency',
    'mappingagency',
    ['midvale', 'coast'],
    ['geodesy-and-control', 'photogrammetry', 'gis-and-data'],
    { sector: 'public', alsoWritten: ['Mapping Agency'] },
  ),
  firm(
    'Roads and Bridges Authority',
    'roadsandbridges',
    ['midvale', 'uplands', 'coast'],
    ['engineering-setting-out', 'monitoring-and-deformation', 'planning-and-consents'],
    { sector: 'public' },
  ),
  firm(
    'Ellmark Rail',
    'ellmarkrail',
    ['midvale', 'coast', 'uplands'],
    ['engineering-setting-out', 'monitoring-and-deformation', 'laser-scanning'],
    { sector: 'public' },
  ),
  firm('City of Greyford', 'greyford-city', ['midvale'], ['planning-and-consents', 'gis-and-data', 'land-valuation'], {
    sector: 'public',
  }),
  firm(
    'Port Ansel Council',
    'portansel-council',
    ['coast'],
    ['planning-and-consents', 'boundary-and-cadastral', 'gis-and-data'],
    { sector: 'public' },
  ),
  firm(
    'Uplands District Council',
    'uplands-district',
    ['uplands'],
    ['planning-and-consents', 'land-valuation', 'boundary-and-cadastral'],
    { sector: 'public' },
  ),
  firm(
    'Islands Council',
    'islandscouncil',
    ['islands'],
    ['planning-and-consents', 'boundary-and-cadastral', 'gis-and-data'],
    { sector: 'public' },
  ),
  firm('Valuation Office of Ellmark', 'valuationoffice', ['midvale', 'coast', 'uplands'], ['land-valuation'], {
    sector: 'public',
  }),
  firm(
    'University of Greyford',
    'greyford-university',
    ['midvale'],
    ['geodesy-and-control', 'photogrammetry', 'gis-and-data', 'laser-scanning'],
    { sector: 'academic' },
  ),
  firm(
    'Tarnwick Technical College',
    'tarnwick-college',
    ['uplands'],
    ['mine-and-tunnel', 'engineering-setting-out', 'boundary-and-cadastral'],
    { sector: 'academic' },
  ),
  firm('Whitmoor Marine Institute', 'whitmoor-marine', ['islands'], ['hydrographic', 'geodesy-and-control'], {
    sector: 'academic',
  }),
  firm(
    'Greywater Dams',
    'greywater',
    ['uplands', 'midvale'],
    ['monitoring-and-deformation', 'geodesy-and-control', 'hydrographic'],
    { sector: 'public' },
  ),
  firm(
    'Plumbline Monitoring',
    'plumbline',
    ['midvale', 'coast', 'uplands'],
    ['monitoring-and-deformation', 'geodesy-and-control'],
  ),
  firm('Fernhill Scanning', 'fernhill', ['midvale', 'uplands'], ['laser-scanning', 'photogrammetry']),
  firm('Kestrel Air Survey', 'kestrelair', ['midvale', 'coast', 'islands'], ['photogrammetry', 'laser-scanning']),
  firm('Marram Consulting', 'marram', ['coast', 'islands'], ['planning-and-consents', 'gis-and-data']),
  firm('Hollin Valuers', 'hollin', ['midvale', 'uplands', 'coast'], ['land-valuation', 'planning-and-consents']),
  firm('Lodestar Geodetic', 'lodestar', ['midvale', 'coast'], ['geodesy-and-control', 'engineering-setting-out']),
  firm('Quarrymen Cooperative', 'quarrymen', ['uplands'], ['mine-and-tunnel', 'engineering-setting-out']),
  firm(
    'Wayleave Partners',
    'wayleave',
    ['midvale', 'coast', 'uplands'],
    ['land-valuation', 'boundary-and-cadastral', 'planning-and-consents'],
  ),
  firm(
    'Meridian Street Architects',
    'meridianstreet',
    ['midvale', 'coast'],
    ['laser-scanning', 'planning-and-consents'],
  ),
  firm(
    'Causeway Civil Works',
    'causeway',
    ['coast', 'islands', 'midvale'],
    ['engineering-setting-out', 'monitoring-and-deformation'],
  ),
];

/** Groups of companies with the names of their members, as the rule *different employer* takes them. */
export const EMPLOYER_GROUPS: readonly { name: string; members: string[] }[] = [ALDERMOOR, THORNFIELD, NORTHLIGHT].map(
  (group) => ({
    name: group,
    members: EMPLOYERS.filter((employer) => employer.group === group).map((employer) => employer.name),
  }),
);

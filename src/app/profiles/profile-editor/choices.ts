/** What the profile's lists offer. */
import {
  CAREER_STAGE_LABEL,
  CareerStage,
  INTEREST_KIND_LABEL,
  InterestKind,
  LanguageLevel,
  MEETING_MODE_LABEL,
  MeetingMode,
  Region,
  REGION_LABEL,
  Sector,
  SECTOR_LABEL,
  SectorWish,
} from '../../../../shared/profiles/profiles-contract';

// ISO 639-1 codes of languages that people of a European association are likely to meet in; their names come from Intl.
const LANGUAGE_CODES =
  'ar bg bs ca cs cy da de el en es et eu fa fi fr ga gl hi hr hu hy is it ja ka ko lb lt lv mk mt nb nl nn pl pt ro ru sk sl sq sr sv tr uk ur vi zh'.split(
    ' ',
  );

const names = new Intl.DisplayNames('en', { type: 'language' });

export const languageName = (code: string): string => names.of(code) ?? code;

export const levelLabel = (level: LanguageLevel): string => (level === 'first' ? 'first language' : level);

const labelled = <K extends string>(keys: readonly K[], labels: Record<K, string>) =>
  keys.map((key) => ({ key, label: labels[key] }));

export const LANGUAGES = LANGUAGE_CODES.map((code) => ({ key: code, label: languageName(code) })).sort((a, b) =>
  a.label.localeCompare(b.label),
);
export const LEVELS = LanguageLevel.options.map((key) => ({ key, label: levelLabel(key) }));
export const STAGES = labelled(CareerStage.options, CAREER_STAGE_LABEL);
export const SECTORS = labelled(Sector.options, SECTOR_LABEL);
export const REGIONS = labelled(Region.options, REGION_LABEL);
export const MODES = labelled(MeetingMode.options, MEETING_MODE_LABEL);
export const INTEREST_KINDS = labelled(InterestKind.options, INTEREST_KIND_LABEL);
export const SECTOR_WISHES: readonly { key: SectorWish; label: string }[] = [
  { key: 'any', label: 'Any sector' },
  { key: 'same', label: 'The same as mine' },
  { key: 'different', label: 'A different one' },
];
export const TIME_ZONES: readonly string[] = Intl.supportedValuesOf('timeZone');

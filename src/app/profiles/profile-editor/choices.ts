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

// ISO 639-1 codes, all of living languages that Intl can name (typed from memory of the standard); their names come from Intl.
const LANGUAGE_CODES = (
  'aa ab af ak am an ar as av ay az ba be bg bm bn bo br bs ca ce ch co cs cv cy da de dv dz ee el en eo es et eu fa ff fi fj ' +
  'fo fr fy ga gd gl gn gu gv ha he hi hr ht hu hy hz id ig ik is it iu ja jv ka kg ki kj kk kl km kn ko kr ks ku kv kw ky lb ' +
  'lg li ln lo lt lu lv mg mh mi mk ml mn mr ms mt my na nb nd ne ng nl nn no nr nv ny oc oj om or os pa pl ps pt qu rm rn ro ' +
  'ru rw sc sd se sg si sk sl sm sn so sq sr ss st su sv sw ta te tg th ti tk tl tn to tr ts tt ty ug uk ur uz ve vi wa wo xh ' +
  'yi yo za zh zu'
).split(' ');

/** Offered first when somebody adds a language. */
export const LIKELY_LANGUAGES: readonly string[] = ['en', 'da', 'de', 'fr', 'es'];

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

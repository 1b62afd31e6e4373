/** Turns the lines of an applicants' file into applications, and says by line and column what is wrong. */
import { EmailAddress, type Gazetteer } from '../accounts/accounts-contract';
import type {
  AboutSection,
  MeetingSection,
  PracticeSection,
  TagChoice,
  WishesSection,
} from '../profiles/profiles-contract';
import { folded } from '../tags/tag-search';
import type { Tag } from '../tags/tags-contract';
import type { ApplicationSide, ImportFault, ImportField, ImportMapping } from './applications-contract';
import { tagFinder, type TagFinder } from './closest-tag';
import { IMPORT_FIELD_LABEL, REQUIRED_FIELDS } from './import-columns';
import {
  bad,
  type Cell,
  type CellReader,
  good,
  listItems,
  listOf,
  numberBetween,
  readLanguage,
  readMode,
  readRegion,
  readSector,
  readSides,
  readSlot,
  readStage,
  readTimeZone,
  readYes,
  textUpTo,
} from './import-values';

/** One line of the file: its number (the heading is line 1) and its cells by heading. */
export interface FileLine {
  line: number;
  cells: Readonly<Record<string, string>>;
}

/** What the file says of a person's profile; what it does not say is absent and stays as it is. */
export interface ImportedProfile {
  about: Partial<Pick<AboutSection, 'employer' | 'region' | 'town' | 'timeZone' | 'languages' | 'headline'>>;
  practice: Partial<Pick<PracticeSection, 'careerStage' | 'yearsInPractice' | 'sector'>>;
  interests: { offers?: TagChoice[]; seeks?: TagChoice[] };
  meeting: Partial<MeetingSection>;
  wishes: Partial<Pick<WishesSection, 'wishedYearsMin' | 'wishedYearsMax'>>;
}

export interface ImportRow {
  line: number;
  name: string;
  /** Lower case. */
  email: string;
  sides: ApplicationSide[];
  /** For a mentor's application; undefined where the file does not say. */
  places: number | undefined;
  oneMoreIfAsked: boolean | undefined;
  goals: string | undefined;
  membershipNumber: string | undefined;
  profile: ImportedProfile;
}

export interface ImportVocabulary {
  tags: readonly Tag[];
  towns: Gazetteer;
}

export interface ReadRows {
  rows: ImportRow[];
  faults: ImportFault[];
  /** Names of tags that the vocabulary lacks, each once. */
  unknownTags: string[];
}

/**
 * Reads all lines.
 *
 * @param mapping headings by field; fields without a heading are left as they are
 * @returns the lines without faults as rows, and every fault of the others
 */
export function readImportRows(
  lines: readonly FileLine[],
  mapping: ImportMapping,
  vocabulary: ImportVocabulary,
): ReadRows {
  const missing = REQUIRED_FIELDS.filter((field) => mapping[field] === undefined);
  if (missing.length > 0) return { rows: [], faults: missing.map(noColumn), unknownTags: [] };
  const reader = new RowReader(mapping, vocabulary);
  const rows = lines.flatMap((line) => reader.read(line) ?? []);
  return { rows, faults: reader.faults, unknownTags: [...reader.unknownTags] };
}

const noColumn = (field: ImportField): ImportFault => ({
  line: 1,
  column: IMPORT_FIELD_LABEL[field],
  value: '',
  message: `Choose the column that holds: ${IMPORT_FIELD_LABEL[field].toLowerCase()}`,
});

const readEmail: CellReader<string> = (text) => {
  const result = EmailAddress.safeParse(text);
  return result.success ? good(result.data) : bad(text, `“${text}” is no e-mail address`);
};

class RowReader {
  readonly faults: ImportFault[] = [];
  readonly unknownTags = new Set<string>();
  private readonly finder: TagFinder;
  private readonly towns: ReadonlyMap<string, string>;
  private readonly seen = new Map<string, number>();

  constructor(
    private readonly mapping: ImportMapping,
    private readonly vocabulary: ImportVocabulary,
  ) {
    this.finder = tagFinder(vocabulary.tags);
    this.towns = new Map(Object.keys(vocabulary.towns).map((name) => [folded(name), name]));
  }

  /** Null where something is wrong with the line. */
  read(line: FileLine): ImportRow | null {
    const before = this.faults.length;
    const cell = <T>(field: ImportField, reader: CellReader<T>): T | undefined => this.cell(line, field, reader);
    const name = this.needed(line, 'name', textUpTo(100));
    const email = this.needed(line, 'email', readEmail);
    const sides = this.needed(line, 'side', readSides);
    const mentors = sides?.includes('mentor') ?? false;
    const row: ImportRow = {
      line: line.line,
      name: name ?? '',
      email: email ?? '',
      sides: sides ?? [],
      // A mentee's line may leave the cell empty or hold a nought; the number means nothing there.
      places: mentors ? cell('places', numberBetween(1, 6, 'Places of a mentor')) : undefined,
      oneMoreIfAsked: cell('oneMoreIfAsked', readYes),
      goals: cell('goals', textUpTo(2000)),
      membershipNumber: cell('membershipNumber', textUpTo(40)),
      profile: this.profile(cell),
    };
    this.noteRepeated(row);
    const { wishedYearsMin: least, wishedYearsMax: most } = row.profile.wishes;
    if (typeof least === 'number' && typeof most === 'number' && least > most)
      this.fault(line.line, 'wishedYearsMax', String(most), 'The lower number of years comes first');
    return this.faults.length === before ? row : null;
  }

  private profile(cell: <T>(field: ImportField, reader: CellReader<T>) => T | undefined): ImportedProfile {
    const years = (what: string) => numberBetween(0, 70, what);
    return {
      about: given({
        employer: cell('employer', textUpTo(120)),
        region: cell('region', readRegion),
        town: cell('town', (text) => this.town(text)),
        timeZone: cell('timeZone', readTimeZone),
        languages: cell(
          'languages',
          atMost(
            12,
            'languages',
            listOf(readLanguage, (skill) => skill.code),
          ),
        ),
        headline: cell('headline', textUpTo(120)),
      }),
      practice: given({
        careerStage: cell('careerStage', readStage),
        yearsInPractice: cell('yearsInPractice', years('Years in practice')),
        sector: cell('sector', readSector),
      }),
      interests: given({
        offers: cell('offers', (text) => this.tags(text)),
        seeks: cell('seeks', (text) => this.tags(text)),
      }),
      meeting: given({
        meetingMode: cell('meetingMode', readMode),
        maxDistanceKm: cell('maxDistanceKm', numberBetween(0, 1000, 'The distance in km')),
        availability: cell(
          'availability',
          listOf(readSlot, (slot) => slot),
        ),
      }),
      wishes: given({
        wishedYearsMin: cell('wishedYearsMin', years('The years of a mentor')),
        wishedYearsMax: cell('wishedYearsMax', years('The years of a mentor')),
      }),
    };
  }

  private text(line: FileLine, field: ImportField): string {
    const column = this.mapping[field];
    return column === undefined ? '' : (line.cells[column] ?? '').trim();
  }

  private cell<T>(line: FileLine, field: ImportField, reader: CellReader<T>): T | undefined {
    const text = this.text(line, field);
    if (text === '') return undefined;
    const result = reader(text);
    if ('value' in result) return result.value;
    for (const fault of result.faults) this.fault(line.line, field, fault.value, fault.message);
    return undefined;
  }

  private needed<T>(line: FileLine, field: ImportField, reader: CellReader<T>): T | undefined {
    if (this.text(line, field) !== '') return this.cell(line, field, reader);
    this.fault(line.line, field, '', `${IMPORT_FIELD_LABEL[field]} is missing`);
    return undefined;
  }

  private fault(line: number, field: ImportField, value: string, message: string): void {
    this.faults.push({ line, column: this.mapping[field] ?? IMPORT_FIELD_LABEL[field], value, message });
  }

  private noteRepeated({ line, email, sides }: ImportRow): void {
    if (email === '') return;
    for (const side of sides) {
      const earlier = this.seen.get(`${side} ${email}`);
      if (earlier === undefined) this.seen.set(`${side} ${email}`, line);
      else this.fault(line, 'email', email, `This person is a ${side} in line ${earlier} already`);
    }
  }

  private town(text: string): Cell<string> {
    const name = this.towns.get(folded(text));
    return name === undefined ? bad(text, `“${text}” is not among the association's towns`) : good(name);
  }

  /** “GIS and data (1); Hydrographic”: without a number the first counts most, the second less, all others least. */
  private tags(text: string): Cell<TagChoice[]> {
    const read = listItems(text).map((item, index) => this.tag(item, index));
    const faults = read.flatMap((cell) => ('faults' in cell ? cell.faults : []));
    if (faults.length > 0) return { faults };
    const choices = new Map<string, TagChoice>();
    for (const cell of read)
      if ('value' in cell && !choices.has(cell.value.tagId)) choices.set(cell.value.tagId, cell.value);
    return choices.size <= 15 ? good([...choices.values()]) : bad(text.slice(0, 60), 'At most 15 tags');
  }

  private tag(item: string, index: number): Cell<TagChoice> {
    const [, label = item, number] = /^(.*?)\s*\(([1-3])\)$/.exec(item) ?? [];
    const tag = this.finder.find(label);
    if (tag) return good({ tagId: tag.id, priority: (number ? Number(number) : Math.min(index + 1, 3)) as 1 | 2 | 3 });
    this.unknownTags.add(label);
    const near = this.finder.closest(label);
    return bad(label, `“${label}” is no tag of the vocabulary${near ? `; perhaps “${near.label}” is meant` : ''}`);
  }
}

function atMost<T>(max: number, what: string, read: CellReader<T[]>): CellReader<T[]> {
  return (text) => {
    const cell = read(text);
    return 'value' in cell && cell.value.length > max ? bad(text.slice(0, 60), `At most ${max} ${what}`) : cell;
  };
}

type Given<T> = { [K in keyof T]?: Exclude<T[K], undefined> };

/** Leaves out what was not said. */
function given<T extends object>(values: T): Given<T> {
  return Object.fromEntries(Object.entries(values).filter(([, value]) => value !== undefined)) as Given<T>;
}

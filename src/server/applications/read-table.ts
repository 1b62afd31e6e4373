/** From a file's bytes to lines and cells, whatever its encoding and separator. */
import { CsvError, parse, type InfoRecord } from 'csv-parse/sync';
import { IMPORT_MAX_BYTES, IMPORT_MAX_ROWS } from '../../../shared/applications/applications-contract';
import type { FileLine } from '../../../shared/applications/import-rows';
import { Problem } from '../platform';

export interface FileTable {
  columns: string[];
  lines: FileLine[];
}

interface ParsedLine {
  info: InfoRecord;
  record: string[];
  raw: string;
}

const SEPARATORS = [',', ';', '\t'] as const;

/** Reads a CSV file. Throws `too-large` or `unprocessable` with a sentence about what to do. */
export function readTable(base64: string): FileTable {
  const bytes = Buffer.from(base64, 'base64');
  if (bytes.length > IMPORT_MAX_BYTES)
    throw new Problem('too-large', 'The file is larger than 5 MB; split it and import the parts');
  const text = decoded(bytes);
  const [heading, ...parsed] = parsedLines(text, separatorOf(text));
  if (!heading || parsed.length === 0) throw unreadable('The file holds no lines below its heading');
  if (parsed.length > IMPORT_MAX_ROWS)
    throw unreadable(`The file has more than ${IMPORT_MAX_ROWS} lines; split it and import the parts`);
  const columns = distinct(heading.record);
  return {
    columns,
    lines: parsed.map((each) => ({
      line: lineOf(each),
      cells: Object.fromEntries(columns.map((column, index) => [column, each.record[index] ?? ''])),
    })),
  };
}

const unreadable = (title: string): Problem => new Problem('unprocessable', title);

/** UTF-8 with or without a mark, UTF-16 with one, otherwise Windows-1252. */
function decoded(bytes: Buffer): string {
  if (bytes[0] === 0xff && bytes[1] === 0xfe) return new TextDecoder('utf-16le').decode(bytes);
  if (bytes[0] === 0xfe && bytes[1] === 0xff) return new TextDecoder('utf-16be').decode(bytes);
  if (bytes.subarray(0, 4).toString('latin1') === 'PK\u0003\u0004' || bytes.includes(0))
    throw unreadable('This is no CSV file. In your spreadsheet, save the list as CSV and choose that file');
  try {
    return new TextDecoder('utf-8', { fatal: true }).decode(bytes);
  } catch {
    return new TextDecoder('windows-1252').decode(bytes);
  }
}

/** The separator that divides the heading into most cells. */
function separatorOf(text: string): string {
  const heading = /^[^\r\n]*/.exec(text.trimStart())?.[0].replace(/"[^"]*"/g, '') ?? '';
  const counts = SEPARATORS.map((separator) => heading.split(separator).length);
  return SEPARATORS[counts.indexOf(Math.max(...counts))] ?? ',';
}

function parsedLines(text: string, delimiter: string): ParsedLine[] {
  try {
    return parse(text, {
      delimiter,
      bom: true,
      info: true,
      raw: true,
      relax_column_count: true,
      skip_empty_lines: true,
      skip_records_with_empty_values: true,
      trim: true,
    }) as unknown as ParsedLine[];
  } catch (error) {
    if (!(error instanceof CsvError)) throw error;
    const line = typeof error['lines'] === 'number' ? ` near line ${error['lines']}` : '';
    throw unreadable(`The file cannot be read${line}: a quotation mark is not closed or stands inside a cell`);
  }
}

// The parser counts to a record's last line; a cell may span several.
const lineOf = ({ info, raw }: ParsedLine): number => info.lines - (raw.trim().match(/\n/g)?.length ?? 0);

function distinct(heading: string[]): string[] {
  const seen = new Map<string, number>();
  return heading.map((cell, index) => {
    const name = cell || `Column ${index + 1}`;
    const times = (seen.get(name) ?? 0) + 1;
    seen.set(name, times);
    return times === 1 ? name : `${name} (${times})`;
  });
}

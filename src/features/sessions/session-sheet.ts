import { CsvError, parse } from 'csv-parse/sync';
import { ValidationError } from '../../platform/errors.ts';
import type { FieldError } from '../../platform/errors.ts';

export const sheetColumns = [
  'athlete',
  'startedAt',
  'durationMin',
  'modality',
  'setting',
  'kind',
  'rating',
  'ratingBy',
  'ratingDelayMin',
  'intendedRating',
  'moderateMin',
  'heavyMin',
  'severeMin',
  'extremeMin',
  'meanHeartRateBpm',
  'distanceM',
  'title',
  'externalId',
] as const;
export type SheetColumn = (typeof sheetColumns)[number];
const requiredColumns: readonly SheetColumn[] = ['athlete', 'startedAt', 'durationMin', 'modality'];

/** More rows than this are several files. */
export const MAX_ROWS = 5000;

export interface SheetRow {
  /** The line of the file; the header is line 1. */
  row: number;
  /** Trimmed; empty cells are left out. */
  cells: Partial<Record<SheetColumn, string>>;
}

export interface Sheet {
  rows: SheetRow[];
  /** Where fields are not parted by commas, a comma is a decimal sign. */
  decimalComma: boolean;
}

/** One wrong cell of a sheet. */
export interface RowError extends FieldError {
  row: number;
}

/**
 * Reads a sheet: comma, semicolon or tab between fields, with or without a byte order mark, any line end, quoted fields.
 * Cells are text as they are: one that begins like a formula stays text.
 * @throws {ValidationError} if it is no sheet, or one with other columns
 */
export function readSheet(text: string): Sheet {
  const delimiter = delimiterOf(text);
  const [header, ...records] = parsed(text, delimiter);
  if (header === undefined) throw refused(1, '(whole sheet)', undefined, 'a header row and at least one row');
  const columns = checkedColumns(header);
  if (records.length === 0) throw refused(2, '(whole sheet)', undefined, 'at least one row below the header');
  if (records.length > MAX_ROWS) {
    throw refused(MAX_ROWS + 2, '(whole sheet)', records.length, `at most ${MAX_ROWS} rows`);
  }
  const uneven = records.filter(({ record }) => record.length !== columns.length);
  if (uneven.length > 0) {
    throw new ValidationError(
      uneven.map(({ row, record }): RowError => {
        return {
          row,
          field: '(whole row)',
          value: record.length,
          allowed: `${columns.length} fields, as in the header`,
        };
      }),
    );
  }
  const rows = records.map(({ row, record }) => ({ row, cells: cellsOf(columns, record) }));
  return { rows, decimalComma: delimiter !== ',' };
}

interface SheetRecord {
  row: number;
  record: string[];
}

function parsed(text: string, delimiter: string): SheetRecord[] {
  try {
    const options = { bom: true, delimiter, info: true, relax_column_count: true, skip_empty_lines: true, trim: true };
    const read = parse(text, options) as unknown as { record: string[]; info: { lines: number } }[];
    return read.map(({ record, info }) => ({ row: info.lines, record }));
  } catch (error) {
    if (!(error instanceof CsvError)) throw error;
    const line = Number((error as { lines?: unknown }).lines);
    const row = Number.isInteger(line) && line > 0 ? line : 1;
    throw refused(row, '(whole row)', undefined, 'fields parted by one sign, quotes closed and doubled inside');
  }
}

/** The sign between the names of the header; names hold none of them. */
function delimiterOf(text: string): string {
  const header = /^\uFEFF?[^\r\n]*/.exec(text)?.[0] ?? '';
  const counts = [',', ';', '\t'].map((sign) => ({ sign, count: header.split(sign).length }));
  return counts.toSorted((a, b) => b.count - a.count)[0]!.sign;
}

function checkedColumns({ row, record }: SheetRecord): SheetColumn[] {
  const errors: RowError[] = [];
  record.forEach((name, index) => {
    if (!isColumn(name)) errors.push({ row, field: shown(name), allowed: `one of ${sheetColumns.join(', ')}` });
    else if (record.indexOf(name) < index) errors.push({ row, field: name, allowed: 'each column once' });
  });
  for (const name of requiredColumns) {
    if (!record.includes(name)) errors.push({ row, field: name, allowed: 'required: this column' });
  }
  if (errors.length > 0) throw new ValidationError(errors, 'The header of the sheet does not fit.');
  return record.filter(isColumn);
}

function cellsOf(columns: readonly SheetColumn[], record: readonly string[]): SheetRow['cells'] {
  const cells: SheetRow['cells'] = {};
  columns.forEach((column, index) => {
    const cell = record[index] ?? '';
    if (cell !== '') cells[column] = cell;
  });
  return cells;
}

function isColumn(name: string): name is SheetColumn {
  return sheetColumns.some((column) => column === name);
}

function refused(row: number, field: string, value: unknown, allowed: string): ValidationError {
  const error: RowError = { row, field, ...(value === undefined ? {} : { value }), allowed };
  return new ValidationError([error], 'The sheet cannot be read.');
}

function shown(name: string): string {
  return name === '' ? '(a column without a name)' : name.slice(0, 100);
}

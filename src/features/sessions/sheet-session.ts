import { fieldErrors } from '../../platform/field-errors.ts';
import { localDateTime } from '../../platform/zoned-time.ts';
import type { RowError, SheetColumn, SheetRow } from './session-sheet.ts';
import { sessionEntry } from './session-entry.ts';
import { sessionInputSchema } from './sessions.schema.ts';
import type { SessionEntry } from './sessions.types.ts';

const domainColumns = {
  moderate: 'moderateMin',
  heavy: 'heavyMin',
  severe: 'severeMin',
  extreme: 'extremeMin',
} as const;
const plainColumns = ['modality', 'setting', 'kind', 'ratingBy', 'title', 'externalId'] as const;
const numberColumns = [
  'durationMin',
  'rating',
  'ratingDelayMin',
  'intendedRating',
  'meanHeartRateBpm',
  'distanceM',
] as const;
const startWords = 'an instant like 2026-03-02T07:30+01:00, or a time of the squad like 2026-03-02 07:30';

/** What a row says of a session, checked like any other input; or everything that is wrong with its cells. */
export function sheetSession(
  { row, cells }: SheetRow,
  decimalComma: boolean,
  zoneOn: (day: string) => string,
): { entry: SessionEntry } | { errors: RowError[] } {
  const number = (column: SheetColumn) => numberOf(cells[column], decimalComma);
  const startedAt = instantOf(cells.startedAt, zoneOn);
  const input = {
    startedAt: startedAt ?? cells.startedAt,
    source: 'csv',
    ...Object.fromEntries(plainColumns.map((column) => [column, cells[column]])),
    ...Object.fromEntries(numberColumns.map((column) => [column, number(column)])),
    ...contentOf(cells, number),
  };
  const result = sessionInputSchema.safeParse(input, { reportInput: true });
  if (result.success) return { entry: sessionEntry(result.data) };
  const errors = fieldErrors(result.error).map((error): RowError => {
    const field = columnOf(error.field);
    return { ...error, row, field, ...(field === 'startedAt' ? { allowed: startWords } : {}) };
  });
  return { errors };
}

/** The column a field of a session stands in. */
export function columnOf(field: string): string {
  const domain = /^content\.(moderate|heavy|severe|extreme)$/.exec(field)?.[1] as
    keyof typeof domainColumns | undefined;
  if (domain !== undefined) return domainColumns[domain];
  return field === 'content' ? Object.values(domainColumns).join(', ') : field === 'athleteId' ? 'athlete' : field;
}

function contentOf(cells: SheetRow['cells'], number: (column: SheetColumn) => unknown) {
  const domains = Object.entries(domainColumns);
  if (domains.every(([, column]) => cells[column] === undefined)) return {};
  const minutes = domains.map(([domain, column]) => [domain, number(column) ?? 0]);
  return { content: { kind: 'domain-minutes', ...(Object.fromEntries(minutes) as object) } };
}

/** A number in plain decimals; anything else stays text, which the schema refuses by its range. */
function numberOf(cell: string | undefined, decimalComma: boolean): number | string | undefined {
  if (cell === undefined) return undefined;
  const plain = decimalComma ? cell.replace(',', '.') : cell;
  return /^-?\d{1,12}(\.\d{1,12})?$/.test(plain) ? Number(plain) : cell;
}

/** An instant as it is; a wall time in the zone the athlete lives in that day. */
function instantOf(cell: string | undefined, zoneOn: (day: string) => string): string | undefined {
  const wall = /^(\d{4}-\d{2}-\d{2})[ T](\d{2}:\d{2}(?::\d{2})?)$/.exec(cell ?? '');
  if (wall === null) return cell?.replace(/^(\d{4}-\d{2}-\d{2})[ T](\d{2}:\d{2})(Z|[+-]\d{2}:\d{2})$/, '$1T$2:00$3');
  try {
    return localDateTime(wall[1]!, wall[2]!, zoneOn(wall[1]!)).toISOString();
  } catch (error) {
    // A date or time that does not exist, such as 2026-02-30 or 25:00.
    if (error instanceof RangeError) return cell;
    throw error;
  }
}

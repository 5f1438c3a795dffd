export type CsvValue = string | number | null | undefined;
export type CsvRow<Column extends string> = Partial<Record<Column, CsvValue>>;

/** A table as RFC 4180 has it: header row, CRLF, quotes where a value needs them; numbers in full. */
export function csv<Column extends string>(columns: readonly Column[], rows: readonly CsvRow<Column>[]): string {
  const lines = rows.map((row) => columns.map((column) => cell(row[column])).join(','));
  return [columns.join(','), ...lines, ''].join('\r\n');
}

function cell(value: CsvValue): string {
  if (value === undefined || value === null) return '';
  const text = String(value);
  return /[",\r\n]/.test(text) ? `"${text.replaceAll('"', '""')}"` : text;
}

import type { PublishedWork } from './published.ts';
import type { Outcome, Row } from './rows.ts';

/** The readable report: a line per row, the facts nothing computes, a summary, and the counts on the last line. */
export function report(rows: readonly Row[], works: readonly PublishedWork[]): string {
  const off = rows.filter((row) => !row.ok).length;
  return [
    'Checks: what the functions give beside what was published or follows from the formula',
    '',
    ...lines(rows),
    '',
    'Plausibility: published facts that nothing computes; not counted',
    '',
    ...works.flatMap((work) =>
      (work.facts ?? []).map((fact) => `${fact.id}  ${fact.fact}: ${fact.value}  [${work.source}; ${fact.provenance}]`),
    ),
    '',
    'Counted checks by provenance',
    '',
    ...summary(rows),
    '',
    `${rows.length} checks, ${rows.length - off} pass, ${off} off`,
    '',
  ].join('\n');
}

function lines(rows: readonly Row[]): string[] {
  const cells = rows.map((row) => [
    row.ok ? 'PASS' : 'OFF',
    row.id,
    row.method,
    text(row.expected),
    text(row.computed),
    row.tolerance === 0 ? 'exact' : `±${row.tolerance}`,
    `${row.source} [${row.provenance}]`,
  ]);
  const head = ['', 'id', 'method', 'expected', 'computed', 'tolerance', 'source'];
  const widths = head.map((title, column) => Math.max(title.length, ...cells.map((row) => row[column]!.length)));
  const line = (row: readonly string[]): string =>
    row
      .map((cell, column) => (column === row.length - 1 ? cell : cell.padEnd(widths[column]!)))
      .join('  ')
      .trimEnd();
  return [line(head), ...cells.map(line)];
}

function summary(rows: readonly Row[]): string[] {
  const counts = new Map<string, number>();
  for (const row of rows) counts.set(row.provenance, (counts.get(row.provenance) ?? 0) + 1);
  return [...counts]
    .sort((a, b) => b[1] - a[1])
    .map(([provenance, count]) => `${String(count).padStart(4)}  ${provenance}`);
}

function text(outcome: Outcome): string {
  if (typeof outcome !== 'number') return String(outcome);
  return Number.isInteger(outcome) ? String(outcome) : String(Number(outcome.toPrecision(12)));
}

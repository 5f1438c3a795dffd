import type { Row, Workbook } from 'exceljs';
import { figure, fitHeight, hairline, heads, LEVEL_COLOURS, NUMBERS, page, solid, text } from './house.style.ts';
import { LEVEL_WORDS, longDate, NO_PLAN, shortDate, squadLine, weekWords } from '../squad-week/squad-week.view.ts';
import type { AthleteLine, Changes, Edition, SquadWeekView } from '../squad-week/squad-week.view.ts';

const COLUMNS = [
  { title: 'Athlete', width: 19 },
  { title: 'Availability', width: 13 },
  { title: 'Level', width: 10 },
  { title: 'Why', width: 54 },
  { title: 'Since', width: 9 },
  { title: 'Ask or next step', width: 32 },
  { title: "Week's load,\n% of own usual", width: 16 },
  { title: 'Done of\nplanned', width: 13 },
  { title: 'Days\ncomplete', width: 10 },
];
const RIGHT = new Set([6]);
const SHEET_WIDTH = COLUMNS.reduce((sum, { width }) => sum + width, 0);

/** First sheet: who needs a talk, why, what changed, what comes next. At most nine columns. */
export function squadSheet(workbook: Workbook, view: SquadWeekView, edition: Edition): void {
  const sheet = workbook.addWorksheet('Monday');
  sheet.columns = COLUMNS.map(({ width }) => ({ width }));
  const title = `${view.squad.name}: ${weekWords(view.isoWeek)}, ${shortDate(view.from)} to ${longDate(view.to)}`;
  const lines: { words: string; size: number; bold: boolean }[] = [
    { words: title, size: 12, bold: false },
    { words: view.headline, size: 15, bold: true },
    { words: squadLine(view), size: 10, bold: false },
    ...changeLines(view.changes).map((words) => ({ words, size: 10, bold: false })),
    ...(edition.version > 1
      ? [{ words: `Version ${edition.version}. ${edition.change ?? ''}`, size: 10, bold: true }]
      : []),
  ];
  lines.forEach(({ words, size, bold }, i) => {
    sheet.mergeCells(i + 1, 1, i + 1, COLUMNS.length);
    text(sheet.getCell(i + 1, 1), words, { size, bold });
    const width = (SHEET_WIDTH * 10) / size;
    sheet.getRow(i + 1).height = fitHeight([{ text: words, width, bold }], size * 1.3);
  });
  const head = lines.length + 1;
  heads(
    sheet,
    head,
    COLUMNS.map(({ title: name }) => name),
    RIGHT,
  );
  sheet.getRow(head).height = 30;
  view.athletes.forEach((line, i) => {
    athleteRow(sheet.getRow(head + 1 + i), line);
  });
  const foot = head + view.athletes.length + 2;
  sheet.mergeCells(foot, 1, foot, COLUMNS.length);
  const caution = view.cautions.slice(0, 2).join(' ');
  text(sheet.getCell(foot, 1), `${caution} More on the sheet Method.`, { colour: '4B5563', size: 9 });
  sheet.getRow(foot).height = fitHeight([{ text: caution, width: SHEET_WIDTH * 1.1 }]);
  page(sheet, head, 1, `${view.squad.name} · ${weekWords(view.isoWeek)} · ${asOfWords(view)}`);
}

function athleteRow(row: Row, line: AthleteLine): void {
  const cell = (column: number) => row.getCell(column);
  text(cell(1), line.name, { bold: line.talk });
  text(cell(2), line.availability);
  text(cell(3), LEVEL_WORDS[line.level], { bold: line.level !== 'none', colour: LEVEL_COLOURS[line.level] });
  text(cell(4), line.sentence, line.level === 'none' ? { colour: '6B7280' } : {});
  text(cell(5), line.since === null ? '' : shortDate(line.since));
  text(cell(6), line.ask);
  const { value, instead, atLeast } = line.weekShare;
  figure(cell(7), value, instead, atLeast === true ? '"at least "0" %"' : NUMBERS.percent);
  text(cell(8), `${line.sessionsDone} · ${NO_PLAN}`);
  text(cell(9), `${line.daysComplete} of ${line.daysOf}`);
  for (let column = 1; column <= COLUMNS.length; column += 1) {
    cell(column).border = hairline;
    if (line.talk) cell(column).fill = solid('EAF3FA');
  }
  row.height = fitHeight([
    { text: line.name, width: COLUMNS[0]!.width, bold: line.talk },
    { text: line.sentence, width: COLUMNS[3]!.width },
    { text: line.ask, width: COLUMNS[5]!.width },
    { text: instead ?? '', width: COLUMNS[6]!.width },
    { text: `${line.sessionsDone} · ${NO_PLAN}`, width: COLUMNS[7]!.width },
  ]);
}

/** What is new, better and unchanged since last Monday. */
export function changeLines(changes: Changes): string[] {
  if (changes.since === null) return ['No report of the week before to compare with.'];
  const list = (names: readonly string[]): string => (names.length === 0 ? 'nobody' : names.join('; '));
  return [
    `Since last Monday. New: ${list(changes.fresh)}. Better: ${list(changes.better)}. Unchanged: ${list(changes.unchanged)}.`,
  ];
}

export function asOfWords(view: SquadWeekView): string {
  return view.asOf === null ? 'no day closed yet' : `figures up to ${longDate(view.asOf)}`;
}

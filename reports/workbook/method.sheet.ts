import type { Workbook } from 'exceljs';
import { fitHeight, hairline, heads, page, text } from './house.style.ts';
import { weekWords } from '../squad-week/squad-week.view.ts';
import type { SquadWeekView } from '../squad-week/squad-week.view.ts';

const COLUMNS = [
  { title: 'Topic', width: 26 },
  { title: 'How it is done here', width: 100 },
  { title: 'Source', width: 54 },
];

/** Last sheet: the policy in force, methods with their sources, own conventions, cautions. */
export function methodSheet(workbook: Workbook, view: SquadWeekView): void {
  const sheet = workbook.addWorksheet('Method');
  sheet.columns = COLUMNS.map(({ width }) => ({ width }));
  sheet.mergeCells(1, 1, 1, 3);
  text(sheet.getCell(1, 1), 'Cautions', { bold: true, size: 12 });
  sheet.getRow(1).height = 18;
  view.cautions.forEach((caution, i) => {
    sheet.mergeCells(2 + i, 1, 2 + i, 3);
    text(sheet.getCell(2 + i, 1), caution);
    sheet.getRow(2 + i).height = fitHeight([{ text: caution, width: 180 }]);
  });
  const head = view.cautions.length + 3;
  heads(
    sheet,
    head,
    COLUMNS.map(({ title }) => title),
    new Set(),
  );
  view.method.forEach((line, i) => {
    const row = sheet.getRow(head + 1 + i);
    text(row.getCell(1), line.topic, { bold: true });
    text(row.getCell(2), line.text);
    text(row.getCell(3), line.source);
    for (let column = 1; column <= 3; column += 1) row.getCell(column).border = hairline;
    row.height = fitHeight([
      { text: line.topic, width: COLUMNS[0]!.width, bold: true },
      { text: line.text, width: COLUMNS[1]!.width },
      { text: line.source, width: COLUMNS[2]!.width },
    ]);
  });
  page(sheet, 1, 0, `${view.squad.name} · ${weekWords(view.isoWeek)} · method`);
}

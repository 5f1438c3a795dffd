import type { Workbook } from 'exceljs';
import { fitHeight, hairline, heads, LEVEL_COLOURS, page, text } from './house.style.ts';
import { LEVEL_WORDS, MEASURE_WORDS, shortDate, weekWords } from '../squad-week/squad-week.view.ts';
import type { AthleteChart, AthleteMeasures, SquadWeekView } from '../squad-week/squad-week.view.ts';

const COLUMNS = [
  { title: 'Level', width: 11 },
  { title: 'Since', width: 9 },
  { title: 'Why', width: 52 },
  { title: 'Ask or next step', width: 33 },
  { title: 'What clears it', width: 38 },
];

/** Pictures have twice the pixels they are drawn for: shown a little larger they stay sharp. */
const PICTURE_SCALE = 1.2;

export interface SheetPicture {
  png: Buffer;
  width: number;
  height: number;
}

/** A flagged athlete: every flag with what clears it, and the pictures. @returns the name the sheet got */
export function athleteSheet(
  workbook: Workbook,
  view: SquadWeekView,
  chart: AthleteChart,
  measures: AthleteMeasures,
  picture: SheetPicture,
): void {
  const sheet = workbook.addWorksheet(sheetName(workbook, chart.name));
  sheet.columns = COLUMNS.map(({ width }) => ({ width }));
  sheet.mergeCells(1, 1, 1, COLUMNS.length);
  text(sheet.getCell(1, 1), chart.name, { bold: true, size: 15 });
  sheet.getRow(1).height = 22;
  sheet.mergeCells(2, 1, 2, COLUMNS.length);
  const line = `${view.squad.name}, ${weekWords(view.isoWeek)}. Compared with own earlier days; measure: ${MEASURE_WORDS[chart.measure]}.`;
  text(sheet.getCell(2, 1), line);
  heads(
    sheet,
    3,
    COLUMNS.map(({ title }) => title),
    new Set(),
  );
  measures.flags.forEach((flag, i) => {
    const row = sheet.getRow(4 + i);
    text(row.getCell(1), LEVEL_WORDS[flag.level], { bold: true, colour: LEVEL_COLOURS[flag.level] });
    text(row.getCell(2), shortDate(flag.since));
    text(row.getCell(3), `${flag.claim}.`);
    text(row.getCell(4), `${flag.ask.charAt(0).toUpperCase()}${flag.ask.slice(1)}.`);
    text(row.getCell(5), flag.clears);
    for (let column = 1; column <= COLUMNS.length; column += 1) row.getCell(column).border = hairline;
    row.height = fitHeight([
      { text: flag.claim, width: COLUMNS[2]!.width },
      { text: flag.ask, width: COLUMNS[3]!.width },
      { text: flag.clears, width: COLUMNS[4]!.width },
    ]);
  });
  // exceljs wants a buffer type of its own.
  const image = workbook.addImage({ buffer: picture.png as unknown as ArrayBuffer, extension: 'png' });
  sheet.addImage(image, {
    tl: { col: 0, row: 4 + measures.flags.length },
    ext: { width: PICTURE_SCALE * picture.width, height: PICTURE_SCALE * picture.height },
    editAs: 'oneCell',
  });
  page(sheet, 3, 0, `${chart.name} · ${weekWords(view.isoWeek)} · load describes training; it foretells nothing`);
  sheet.pageSetup.fitToHeight = 1;
}

/** Sheets that come later, and a name Excel keeps for itself. */
const RESERVED = ['method', 'history'];

/** A name Excel takes: at most 31 characters, without : \ / ? * [ ] and apostrophes at the ends, and not used yet. */
export function sheetName(workbook: Workbook, name: string): string {
  const clean = name.replaceAll(/[:\\/?*[\]\p{Cc}]/gu, ' ');
  const base = bare(bare(clean).slice(0, 31)) || 'Athlete';
  const taken = new Set([...RESERVED, ...workbook.worksheets.map((sheet) => sheet.name.toLowerCase())]);
  if (!taken.has(base.toLowerCase())) return base;
  for (let n = 2; ; n += 1) {
    const next = `${bare(base.slice(0, 27))} ${n}`;
    if (!taken.has(next.toLowerCase())) return next;
  }
}

function bare(name: string): string {
  return name.replaceAll(/^['\s]+|['\s]+$/g, '');
}

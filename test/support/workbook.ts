import ExcelJS from 'exceljs';
import type { Worksheet } from 'exceljs';

/** A sheet whose cells are found by the athlete of the row and the head of the column. */
export interface AthleteTable {
  sheet: Worksheet;
  /** The cell's value; the head is given by its beginning. */
  value(athlete: string, head: string): unknown;
  format(athlete: string, head: string): string;
}

/** Reads a workbook as somebody else's program would. */
export async function readWorkbook(
  content: Buffer,
): Promise<{ names: string[]; table: (sheet: string) => AthleteTable }> {
  const workbook = new ExcelJS.Workbook();
  // exceljs wants a buffer type of its own.
  await workbook.xlsx.load(content as unknown as ArrayBuffer);
  const table = (name: string): AthleteTable => {
    const sheet = workbook.getWorksheet(name);
    if (sheet === undefined) throw new Error(`no sheet ${name}`);
    const cell = (athlete: string, head: string) => {
      const headRow = rowOf(sheet, 'Athlete', 1);
      for (let column = 1; column <= sheet.columnCount; column += 1) {
        if (!sheet.getCell(headRow, column).text.startsWith(head)) continue;
        return sheet.getCell(rowOf(sheet, athlete, headRow), column);
      }
      throw new Error(`no column ${head}`);
    };
    return {
      sheet,
      value: (athlete, head) => cell(athlete, head).value,
      format: (athlete, head) => cell(athlete, head).numFmt,
    };
  };
  return { names: workbook.worksheets.map(({ name }) => name), table };
}

function rowOf(sheet: Worksheet, name: string, from: number): number {
  for (let row = from; row <= sheet.rowCount; row += 1) if (sheet.getCell(row, 1).value === name) return row;
  throw new Error(`no row ${name}`);
}

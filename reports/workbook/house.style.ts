import type { Borders, Cell, Fill, Font, Worksheet } from 'exceljs';

/** Okabe–Ito colours: told apart by people who see few colours; a word and a shape always stand beside them. */
export const OKABE_ITO = {
  black: '000000',
  orange: 'E69F00',
  skyBlue: '56B4E9',
  bluishGreen: '009E73',
  yellow: 'F0E442',
  blue: '0072B2',
  vermillion: 'D55E00',
  reddishPurple: 'CC79A7',
} as const;

export const LEVEL_COLOURS = {
  none: '7F7F7F',
  note: OKABE_ITO.blue,
  watch: 'A8487D',
  act: OKABE_ITO.vermillion,
} as const;

export const FONT = 'Arial';
const INK = 'FF1F2933';
const RULE = 'FFD5DAE0';

export const argb = (hex: string): string => `FF${hex}`;

export function font(options: Partial<Font> = {}): Partial<Font> {
  return { name: FONT, size: 10, color: { argb: INK }, ...options };
}

export const solid = (hex: string): Fill => ({ type: 'pattern', pattern: 'solid', fgColor: { argb: argb(hex) } });

export const hairline: Partial<Borders> = { bottom: { style: 'thin', color: { argb: RULE } } };
export const headLine: Partial<Borders> = { bottom: { style: 'thin', color: { argb: INK } } };

export const NUMBERS = { load: '#,##0', minutes: '#,##0', percent: '0" %"', two: '0.00', count: '0' } as const;

/** Text as text: a string cell is never a formula, whatever it begins with. */
export function text(
  cell: Cell,
  value: string,
  options: { bold?: boolean; colour?: string; size?: number } = {},
): Cell {
  cell.value = value;
  cell.font = font({
    ...(options.bold === undefined ? {} : { bold: options.bold }),
    ...(options.size === undefined ? {} : { size: options.size }),
    ...(options.colour === undefined ? {} : { color: { argb: argb(options.colour) } }),
  });
  cell.alignment = { vertical: 'top', horizontal: 'left', wrapText: true, indent: Number(cell.col) > 1 ? 1 : 0 };
  return cell;
}

/** A number with its format, or the words that stand in its place. */
export function figure(cell: Cell, value: number | null, instead: string | null, format: string): Cell {
  if (value === null) {
    text(cell, instead ?? '–', { colour: '6B7280' }).alignment = {
      vertical: 'top',
      horizontal: 'right',
      wrapText: true,
      indent: 1,
    };
    return cell;
  }
  cell.value = value;
  cell.numFmt = format;
  cell.font = font();
  cell.alignment = { vertical: 'top', horizontal: 'right', indent: 1 };
  return cell;
}

/** A row of column heads. */
export function heads(sheet: Worksheet, row: number, titles: readonly string[], rightFrom: ReadonlySet<number>): void {
  titles.forEach((title, i) => {
    const cell = sheet.getCell(row, i + 1);
    text(cell, title, { bold: true });
    cell.fill = solid('EEF2F6');
    cell.border = headLine;
    cell.alignment = {
      vertical: 'bottom',
      wrapText: true,
      horizontal: rightFrom.has(i) ? 'right' : 'left',
      indent: i > 0 ? 1 : 0,
    };
  });
}

/** Short enough also when every character is an ampersand, which is written twice. */
const FOOTER_CHARACTERS = 110;

/** Landscape A4, one page wide, head rows on every page. */
export function page(sheet: Worksheet, headRows: number, columns: number, footer: string): void {
  sheet.pageSetup = {
    ...sheet.pageSetup,
    paperSize: 9,
    orientation: 'landscape',
    fitToPage: true,
    fitToWidth: 1,
    fitToHeight: 0,
    margins: { left: 0.4, right: 0.4, top: 0.45, bottom: 0.55, header: 0.2, footer: 0.25 },
    printTitlesRow: `1:${headRows}`,
  };
  // The space ends the size, which would swallow a digit; Excel takes 255 characters at most.
  const words = footer.slice(0, FOOTER_CHARACTERS).replaceAll('&', '&&');
  sheet.headerFooter.oddFooter = `&L&8 ${words}&R&8 Page &P of &N`;
  sheet.views = [{ state: 'frozen', ySplit: headRows, xSplit: columns, showGridLines: false }];
}

/** Height in points for wrapped text: lines by words that fit the column widths, largest cell wins. */
export function fitHeight(cells: readonly { text: string; width: number; bold?: boolean }[], linePoints = 13): number {
  const lines = cells.map(({ text: words, width, bold }) => {
    const room = Math.max(3, (width - 2) * (bold === true ? 1.2 : 1.36));
    return words.split('\n').reduce((sum, line) => sum + wrapped(line, room), 0);
  });
  return Math.max(1, ...lines) * linePoints + 4;
}

function wrapped(line: string, room: number): number {
  let count = 1;
  let used = 0;
  for (const word of line.split(' ')) {
    const length = word.length + (used > 0 ? 1 : 0);
    if (used > 0 && used + length > room) {
      count += Math.max(1, Math.ceil(word.length / room));
      used = word.length % room;
    } else {
      used += length;
    }
  }
  return count;
}

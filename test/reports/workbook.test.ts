import { beforeAll, describe, expect, test } from '@jest/globals';
import ExcelJS from 'exceljs';
import { squadWeekWorkbook } from '../../reports/workbook/workbook.ts';
import { readZip } from '../../reports/workbook/zip.ts';
import type { SquadWeekView } from '../../reports/squad-week/squad-week.view.ts';
import { inventedView } from './invented-squad.ts';

const first = { version: 1, change: null };
const hostile = [
  { name: '=HYPERLINK("http://x.example","y")', story: 'jump' },
  { name: '+1+1', story: 'gap' },
  { name: '-2', story: 'usual' },
  { name: '@SUM(A1)', story: 'return' },
  { name: 'A/B: [C]?', story: 'old-test' },
  { name: 'a/b: [c]?', story: 'suspect' },
  { name: 'Newcomer', story: 'new' },
] as const;

let view: SquadWeekView;
let file: Buffer;
let workbook: ExcelJS.Workbook;

beforeAll(async () => {
  view = inventedView(hostile);
  file = await squadWeekWorkbook(view, first);
  workbook = new ExcelJS.Workbook();
  await workbook.xlsx.load(file as unknown as ArrayBuffer);
});

const sheet = (name: string): ExcelJS.Worksheet => workbook.getWorksheet(name)!;
const headRow = (of: ExcelJS.Worksheet): number => {
  for (let row = 1; row < 20; row += 1) if (of.getCell(row, 1).value === 'Athlete') return row;
  throw new Error('no head row');
};
const column = (of: ExcelJS.Worksheet, title: RegExp): number => {
  const row = of.getRow(headRow(of));
  for (let at = 1; at <= of.columnCount; at += 1) if (title.test(row.getCell(at).text)) return at;
  throw new Error(`no column ${title.source}`);
};

describe('first sheet', () => {
  test('nine columns, ordered by level and then by name', () => {
    const monday = sheet('Monday');
    expect(monday.columnCount).toBeLessThanOrEqual(9);
    const names = view.athletes.map(({ level, name }) => `${level === 'none' ? 1 : 0}${name}`);
    expect(names).toEqual(
      [...names].sort((a, b) => a[0]!.localeCompare(b[0]!) || a.slice(1).localeCompare(b.slice(1), 'en')),
    );
    view.athletes.forEach(({ name }, i) => {
      expect(monday.getCell(headRow(monday) + 1 + i, 1).value).toBe(name);
    });
  });

  test('says first who needs a talk, then what was planned and done, then what changed', () => {
    const monday = sheet('Monday');
    expect(monday.getCell(2, 1).value).toBe(
      '1 of 7 needs a talk: =HYPERLINK("http://x.example","y"). Too thin a log to judge: 2 of 7.',
    );
    expect(monday.getCell(3, 1).value).toMatch(/^Planned: no plan · done: \d+ sessions · .*log complete on \d+ of 49/);
    expect(monday.getCell(4, 1).value).toBe('No report of the week before to compare with.');
  });

  test('level is a word with a shape, in a colour that is neither red, amber nor green', () => {
    const monday = sheet('Monday');
    const cell = monday.getCell(headRow(monday) + 1, column(monday, /^Level/));
    expect(cell.value).toBe('● note');
    expect(cell.font.color!.argb).toBe('FF0072B2');
  });

  test('figures of a thin log are named with what is in', () => {
    const row = headRow(sheet('Monday')) + 1 + view.athletes.findIndex(({ name }) => name === 'Newcomer');
    expect(sheet('Monday').getCell(row, column(sheet('Monday'), /usual/)).value).toBe('1 of 4 full weeks in');
  });
});

describe('every sheet', () => {
  test('landscape, one page wide, head rows frozen and printed on every page', () => {
    for (const each of workbook.worksheets) {
      expect(each.pageSetup).toMatchObject({ orientation: 'landscape', fitToPage: true, fitToWidth: 1 });
      expect(each.pageSetup.printTitlesRow).toMatch(/^1:\d+$/);
      expect(each.views[0]).toMatchObject({ state: 'frozen' });
    }
  });

  test('no text becomes a formula, whatever it begins with', () => {
    for (const { name, content } of readZip(file)) {
      if (name.startsWith('xl/worksheets/')) expect(content.toString('utf8')).not.toMatch(/<f[ >]/);
    }
  });

  test('names that no sheet may carry are changed, equal ones numbered', () => {
    const names = workbook.worksheets.map(({ name }) => name);
    expect(names).toEqual(expect.arrayContaining(['Monday', 'Measures', 'Method', 'a b   c', 'A B   C 2']));
  });

  test('charts of flagged athletes only, each with words for those who cannot see it', () => {
    expect(view.charts.map(({ name }) => name)).not.toContain('-2');
    const drawings = readZip(file).filter(({ name }) => /^xl\/drawings\/drawing\d+\.xml$/.test(name));
    expect(drawings).toHaveLength(view.charts.length);
    for (const { content } of drawings) expect(content.toString('utf8')).toMatch(/<xdr:cNvPr descr="[^"]{80,}"/);
    const first_ = drawings.find(({ name }) => name.endsWith('drawing1.xml'))!.content.toString('utf8');
    expect(first_).toContain(`descr="${view.charts[0]!.name.replaceAll('"', '&quot;')}`);
  });
});

describe('figures', () => {
  test('cells hold unrounded numbers and show loads without decimals', () => {
    const measures = sheet('Measures');
    const row = headRow(measures) + 1;
    const cell = measures.getCell(row, column(measures, /^Domain load, week/));
    expect(cell.value).toBe(view.measures[0]!.domainLoad.week.value);
    expect(cell.numFmt).toBe('#,##0');
    expect(measures.getCell(row, column(measures, /^Monotony/)).value).toBe(view.measures[0]!.monotony.value);
  });

  test('a sum over a window with unknown days is marked as a lower bound', () => {
    const measures = sheet('Measures');
    const at = view.measures.findIndex(({ domainLoad }) => domainLoad.week.atLeast === true);
    const cell = measures.getCell(headRow(measures) + 1 + at, column(measures, /^Domain load, week/));
    expect(cell.numFmt).toBe('"≥ "#,##0');
    expect(typeof cell.value).toBe('number');
  });

  test('a withheld figure is words, never a number', () => {
    const measures = sheet('Measures');
    const at = view.measures.findIndex(({ name }) => name === 'Newcomer');
    const row = headRow(measures) + 1 + at;
    expect(measures.getCell(row, column(measures, /^Ratio/)).value).toBe('14 of 28 days known');
    expect(measures.getCell(row, column(measures, /^Long load/)).value).toBe('14 of 56 days in');
  });

  test('bounds stand beside a component where they differ by more than 5 %', () => {
    const measures = sheet('Measures');
    const gap = view.measures.findIndex(({ name }) => name === '+1+1');
    const cell = measures.getCell(headRow(measures) + 1 + gap, column(measures, /^Short load/));
    expect(cell.numFmt).toMatch(/^0" % \(\d+ to \d+\)"$/);
  });
});

test('the same view and edition give the same bytes; another version says what changed', async () => {
  expect((await squadWeekWorkbook(inventedView(hostile), first)).equals(file)).toBe(true);
  const second = new ExcelJS.Workbook();
  const bytes = await squadWeekWorkbook(view, { version: 2, change: 'Newcomer: ratio 1.62 → 1.41' });
  await second.xlsx.load(bytes as unknown as ArrayBuffer);
  expect(second.getWorksheet('Monday')!.getCell(5, 1).value).toBe('Version 2. Newcomer: ratio 1.62 → 1.41');
});

test('the sheet Method prints policy, sources and own conventions, and how missing days are treated', () => {
  const words: string[] = [];
  sheet('Method').eachRow((row) => row.eachCell((cell) => words.push(cell.text)));
  const all = words.join('\n');
  for (const part of [
    'population standard deviation',
    'rolling, coupled 7:28',
    'own convention',
    'common practice, no source',
    'not a medical device',
    'A day without an entry is not a day of rest',
    'Foster C 1998',
  ]) {
    expect(all).toContain(part);
  }
  expect(all).not.toMatch(/\brisk/i);
});

test('an athlete may be called like one of the sheets, or end in an apostrophe where the name is cut', async () => {
  const names = ['method', 'Monday', 'measures', 'History', `Bartholomew of the Long River ’'x`, "'s Gravenzande'"];
  const members = names.map((name) => ({ name, story: 'jump' as const }));
  const read = new ExcelJS.Workbook();
  await read.xlsx.load((await squadWeekWorkbook(inventedView(members), first)) as unknown as ArrayBuffer);
  const sheets = read.worksheets.map(({ name }) => name);
  expect(sheets).toHaveLength(names.length + 3);
  expect(new Set(sheets.map((name) => name.toLowerCase())).size).toBe(sheets.length);
  for (const name of sheets) expect(name).toMatch(/^[^'\s](.{0,29}[^'\s])?$/);
});

test('a squad whose name begins with a digit does not change the size of the footer', async () => {
  const view8 = { ...inventedView([{ name: 'Anna', story: 'jump' }]), squad: { ...view.squad, name: '8+ & 4x' } };
  const read = new ExcelJS.Workbook();
  await read.xlsx.load((await squadWeekWorkbook(view8, first)) as unknown as ArrayBuffer);
  for (const { headerFooter } of read.worksheets) {
    expect(headerFooter.oddFooter).toMatch(/^&L&8 /);
    expect(headerFooter.oddFooter!.length).toBeLessThan(256);
  }
});

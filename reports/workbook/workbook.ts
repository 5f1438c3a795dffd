import ExcelJS from 'exceljs';
import { athleteChart, CHART_HEIGHT, CHART_WIDTH } from '../charts/athlete-chart.ts';
import { renderPng } from '../charts/render-png.ts';
import { weekWords } from '../squad-week/squad-week.view.ts';
import type { Edition, SquadWeekView } from '../squad-week/squad-week.view.ts';
import { athleteSheet } from './athlete.sheet.ts';
import { measuresSheet } from './measures.sheet.ts';
import { methodSheet } from './method.sheet.ts';
import { squadSheet } from './squad.sheet.ts';
import { readZip, writeZip } from './zip.ts';

/** The workbook of a week: the same view and edition give the same bytes. */
export async function squadWeekWorkbook(view: SquadWeekView, edition: Edition): Promise<Buffer> {
  const workbook = new ExcelJS.Workbook();
  const made = new Date(`${view.asOf ?? view.to}T12:00:00Z`);
  workbook.creator = 'Loadweir';
  workbook.lastModifiedBy = 'Loadweir';
  workbook.created = made;
  workbook.modified = made;
  workbook.title = `${view.squad.name}, ${weekWords(view.isoWeek)}, version ${edition.version}`;
  squadSheet(workbook, view, edition);
  measuresSheet(workbook, view);
  const altTexts: string[] = [];
  for (const chart of view.charts) {
    const measures = view.measures.find(({ athleteId }) => athleteId === chart.athleteId);
    if (measures === undefined) throw new Error('a chart without its athlete');
    const picture = await renderPng(athleteChart(chart), CHART_WIDTH, CHART_HEIGHT);
    athleteSheet(workbook, view, chart, measures, picture);
    altTexts.push(chart.altText);
  }
  methodSheet(workbook, view);
  const file = Buffer.from(await workbook.xlsx.writeBuffer());
  return finish(file, altTexts);
}

/** exceljs writes neither alternative text nor a fixed date: both are put into the finished file. */
function finish(file: Buffer, altTexts: readonly string[]): Buffer {
  const entries = readZip(file).map(({ name, content }) => {
    const drawing = /^xl\/drawings\/drawing(\d+)\.xml$/.exec(name);
    if (drawing === null) return { name, content };
    const words = altTexts[Number(drawing[1]) - 1];
    if (words === undefined) throw new Error(`no alternative text for ${name}`);
    const xml = content.toString('utf8').replace('<xdr:cNvPr ', `<xdr:cNvPr descr="${attribute(words)}" `);
    return { name, content: Buffer.from(xml, 'utf8') };
  });
  return writeZip(entries);
}

function attribute(words: string): string {
  return words.replaceAll('&', '&amp;').replaceAll('<', '&lt;').replaceAll('"', '&quot;');
}

import type { Row, Workbook, Worksheet } from 'exceljs';
import { figure, fitHeight, hairline, heads, NUMBERS, page, text } from './house.style.ts';
import { FORM_WORDS, MEASURE_WORDS, shortDate, weekWords } from '../squad-week/squad-week.view.ts';
import type { AthleteMeasures, Cell, ComponentCell, SquadWeekView } from '../squad-week/squad-week.view.ts';

interface Column {
  title: string;
  width: number;
  right?: boolean;
  write: (row: Row, column: number, athlete: AthleteMeasures) => string;
}

const BASIS_WORDS: Record<string, string> = {
  power: 'power',
  speed: 'speed',
  interval: 'intervals by hand',
  minutes: 'minutes by hand',
  'heart-rate': 'heart rate',
  rating: 'rating',
};

const words = (title: string, width: number, pick: (athlete: AthleteMeasures) => string): Column => ({
  title,
  width,
  write: (row, column, athlete) => {
    const value = pick(athlete);
    text(row.getCell(column), value);
    return value;
  },
});

const number = (title: string, width: number, format: string, pick: (athlete: AthleteMeasures) => Cell): Column => ({
  title,
  width,
  right: true,
  write: (row, column, athlete) => {
    const { value, instead, atLeast } = pick(athlete);
    figure(row.getCell(column), value, instead, atLeast === true ? `"≥ "${format}` : format);
    return value === null ? (instead ?? '') : '';
  },
});

const plain = (value: number | null): Cell => ({ value, instead: null });

function columns(view: SquadWeekView): Column[] {
  const form = view.measures[0]?.ratio.form ?? 'rolling-coupled';
  const component = (title: string, pick: (athlete: AthleteMeasures) => ComponentCell): Column => ({
    title,
    width: 15,
    right: true,
    write: (row, column, athlete) => {
      const cell = pick(athlete);
      figure(row.getCell(column), cell.value, cell.instead, componentFormat(cell));
      return cell.value === null ? (cell.instead ?? '') : '';
    },
  });
  return [
    words('Athlete', 20, ({ name }) => name),
    ...(['moderate', 'heavy', 'severe', 'extreme'] as const).map((domain) =>
      number(`${domain.charAt(0).toUpperCase()}${domain.slice(1)}, min`, 10, NUMBERS.minutes, ({ domainMinutes }) =>
        plain(domainMinutes[domain]),
      ),
    ),
    number('Domain load, week', 10, NUMBERS.load, ({ domainLoad }) => domainLoad.week),
    number('Domain load, 28 days', 10, NUMBERS.load, ({ domainLoad }) => domainLoad.last28),
    number('Days known of 28', 9, NUMBERS.count, ({ domainLoad }) => plain(domainLoad.last28KnownDays)),
    number('Rating load, week', 10, NUMBERS.load, ({ ratingLoad }) => ratingLoad.week),
    words('Primary measure', 12, ({ primaryMeasure }) => MEASURE_WORDS[primaryMeasure]),
    number('Acute load a day', 9, NUMBERS.load, ({ ratio }) => plain(ratio.acute)),
    number('Chronic load a day', 9, NUMBERS.load, ({ ratio }) => plain(ratio.chronic)),
    number(`Ratio (${FORM_WORDS[form]})`, 16, NUMBERS.two, ({ ratio }) => ratio),
    words(
      'Days known, acute and chronic',
      15,
      ({ ratio: { knownDays: known } }) => `${known.acute} of ${known.acuteOf}, ${known.chronic} of ${known.chronicOf}`,
    ),
    number('Monotony', 11, NUMBERS.two, ({ monotony }) => monotony),
    number('Strain', 11, NUMBERS.load, ({ strain }) => strain),
    component('Long load, % of own median', ({ longLoad }) => longLoad),
    component('Short load, % of own median', ({ shortLoad }) => shortLoad),
    words('Minutes counted from', 24, ({ basisMix }) => basisWords(basisMix)),
  ];
}

/** Second sheet: the figures behind the first, with what they rest on. */
export function measuresSheet(workbook: Workbook, view: SquadWeekView): void {
  const sheet = workbook.addWorksheet('Measures');
  const all = columns(view);
  sheet.columns = all.map(({ width }) => ({ width }));
  const asOf =
    view.asOf === null ? 'No day is closed yet.' : `All figures end on ${shortDate(view.asOf)}, the last closed day.`;
  const intro =
    `Measures of ${weekWords(view.isoWeek)}. ${asOf} Ratio, monotony, strain, long and short load are of each athlete's primary measure. ` +
    '≥ marks a sum over a window that is not wholly known. Words in place of a number say why it is withheld.';
  sheet.mergeCells(1, 1, 1, all.length);
  text(sheet.getCell(1, 1), intro);
  sheet.getRow(1).height = 30;
  heads(
    sheet,
    2,
    all.map(({ title }) => title),
    new Set(all.flatMap(({ right }, i) => (right === true ? [i] : []))),
  );
  sheet.getRow(2).height = 44;
  view.measures.forEach((athlete, i) => {
    const row = sheet.getRow(3 + i);
    const texts = all.map((column, at) => ({ text: column.write(row, at + 1, athlete), width: column.width }));
    for (let column = 1; column <= all.length; column += 1) row.getCell(column).border = hairline;
    row.height = fitHeight(texts);
  });
  reasons(sheet, view, all.length);
  page(sheet, 2, 1, `${view.squad.name} · ${weekWords(view.isoWeek)} · measures`);
}

/** Below the table: every withheld figure with its reason, and why a measure is not the one of the policy. */
function reasons(sheet: Worksheet, view: SquadWeekView, width: number): void {
  let at = view.measures.length + 4;
  const line = (said: string, bold = false): void => {
    sheet.mergeCells(at, 1, at, width);
    text(sheet.getCell(at, 1), said, { bold });
    sheet.getRow(at).height = fitHeight([{ text: said, width: 225 }]);
    at += 1;
  };
  const measures = new Map<string, string[]>();
  for (const { name, primaryMeasure, primaryReason } of view.measures) {
    const key = `Primary measure ${MEASURE_WORDS[primaryMeasure]}, because ${primaryReason}`;
    measures.set(key, [...(measures.get(key) ?? []), name]);
  }
  line('Withheld figures and choice of measure', true);
  const missing = view.measures.filter(({ withheld }) => withheld.length > 0);
  if (missing.length === 0) line('No figure is withheld.');
  for (const { name, withheld } of missing) line(`${name}: ${withheld.join('; ')}.`);
  for (const [why, names] of measures) {
    line(`${why}: ${names.length === view.measures.length && names.length > 1 ? 'everybody' : names.join(', ')}.`);
  }
  for (const { name, thresholdsChanged } of view.measures) {
    if (thresholdsChanged.length === 0) continue;
    line(`${name}: thresholds changed (${thresholdsChanged.join(', ')}); a step in domain load is not a step in work.`);
  }
}

function componentFormat({ value, low, high }: ComponentCell): string {
  if (value === null || low === null || high === null || high - low <= 0.05 * value) return NUMBERS.percent;
  return `0" % (${Math.round(low)} to ${Math.round(high)})"`;
}

export function basisWords(mix: Record<string, number>): string {
  const parts = Object.entries(mix).sort(([, a], [, b]) => b - a);
  if (parts.length === 0) return 'no minutes in domain';
  return parts.map(([basis, share]) => `${BASIS_WORDS[basis] ?? basis} ${Math.round(share)} %`).join(', ');
}

import type { AthleteSeries, ComponentReading, SeriesRow } from '../../src/features/series/series.types.ts';
import { longDate, MEASURE_WORDS, shortDate } from './squad-week.view.ts';
import type { AthleteChart, Band, ChartDay } from './squad-week.view.ts';

const DAYS_SHOWN = 84;
const WINDOW = 28;

/** The last twelve weeks of one athlete as the pictures show them. */
export function athleteChartOf(name: string, series: AthleteSeries, ratioLimit: number): AthleteChart {
  const from = Math.max(0, series.rows.length - DAYS_SHOWN);
  const scale = series.after.longLoad.share === null ? 'units' : 'share';
  const known = series.rows.map((row) => state(row, series) === 'known');
  const days = series.rows.slice(from).map((row, i): ChartDay => {
    const index = from + i;
    return {
      day: row.day,
      state: state(row, series),
      load: (series.measure === 'domain-load' ? row.domain : row.rating).value,
      acute: row.acute,
      chronic: row.chronic,
      knownOf28: known.slice(Math.max(0, index - WINDOW + 1), index + 1).filter(Boolean).length,
      long: band(row.longLoad, scale),
      short: band(row.shortLoad, scale),
    };
  });
  const { after } = series;
  const morning: ChartDay = {
    day: after.day,
    state: 'after',
    load: null,
    acute: null,
    chronic: null,
    knownOf28: null,
    long: band(after.longLoad, scale),
    short: band(after.shortLoad, scale),
  };
  return {
    athleteId: series.athleteId,
    name,
    measure: series.measure,
    ratioLimit,
    ratioForm: series.form,
    componentScale: scale,
    days: [...days, morning],
    unavailable: spells(series.rows.slice(from)),
    altText: altText(name, series, days),
  };
}

function state(row: SeriesRow, series: AthleteSeries): ChartDay['state'] {
  return (series.measure === 'domain-load' ? row.domain : row.rating).state;
}

function band(reading: ComponentReading, scale: 'share' | 'units'): Band | null {
  const [value, low, high] =
    scale === 'share'
      ? [reading.share, reading.shareLow, reading.shareHigh]
      : [reading.units, reading.low, reading.high];
  return value === null || low === null || high === null ? null : { value, low, high };
}

function spells(rows: readonly SeriesRow[]): { from: string; to: string }[] {
  const found: { from: string; to: string }[] = [];
  let open = false;
  for (const { day, availability, away } of rows) {
    const out = availability === 'none' && !away;
    if (out && open) found[found.length - 1]!.to = day;
    else if (out) found.push({ from: day, to: day });
    open = out;
  }
  return found;
}

function altText(name: string, series: AthleteSeries, days: readonly ChartDay[]): string {
  const last = series.rows.at(-1)!;
  const unknown = days.filter(({ state: known }) => known !== 'known').length;
  const { longLoad, shortLoad } = series.after;
  const round = (value: number | null, unit = ''): string =>
    value === null ? 'withheld' : `${Math.round(value)}${unit}`;
  return [
    `${name}, ${shortDate(days[0]!.day)} to ${longDate(last.day)}: daily ${MEASURE_WORDS[series.measure]} as bars, ${unknown} of ${days.length} days not fully known.`,
    `Acute load ${round(last.acute)} and chronic load ${round(last.chronic)} a day, ratio ${last.ratio.value === null ? 'withheld' : last.ratio.value.toFixed(2)}.`,
    `Long load ${round(longLoad.share, ' %')} and short load ${round(shortLoad.share, ' %')} of the own 26-week median.`,
  ].join(' ');
}

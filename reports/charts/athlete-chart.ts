import type { EChartsOption } from 'echarts';
import { FORM_WORDS, MEASURE_WORDS, shortDate } from '../squad-week/squad-week.view.ts';
import type { AthleteChart, ChartDay } from '../squad-week/squad-week.view.ts';

export const CHART_WIDTH = 1000;
export const CHART_HEIGHT = 700;

const BLUE = '#0072B2';
const SKY = '#56B4E9';
const ORANGE = '#E69F00';
const VERMILLION = '#D55E00';
const PURPLE = '#CC79A7';
const INK = '#1F2933';
const GREY = '#6B7280';
const LEFT = 64;
const RIGHT = 18;

// Top and height of the panels [px]: daily load, acute and chronic, known days, long and short load.
const PANELS = [
  { top: 38, height: 138 },
  { top: 238, height: 158 },
  { top: 456, height: 30 },
  { top: 532, height: 138 },
] as const;

const HATCH = { symbol: 'rect', dashArrayX: [1, 0], dashArrayY: [2, 4], rotation: -Math.PI / 4, color: '#8A94A0' };
const HATCH_LIGHT = { ...HATCH, color: 'rgba(31,41,51,0.55)' };

type Series = Exclude<EChartsOption['series'], undefined | readonly unknown[]>;

/**
 * Four panels on one time axis: daily load with unknown days hatched; acute and chronic load with the band up to the
 * limit; days known; long and short load with their bounds. Never two of them on one axis.
 */
export function athleteChart(chart: AthleteChart): EChartsOption {
  const { days } = chart;
  const componentUnit = chart.componentScale === 'share' ? '% of own 26-week median' : 'load units';
  const now = days.findLast(({ knownOf28 }) => knownOf28 !== null)?.knownOf28 ?? 0;
  const titles = [
    `Daily ${MEASURE_WORDS[chart.measure]}`,
    `Acute and chronic load, mean per day (${FORM_WORDS[chart.ratioForm]})`,
    `Days known of the last 28: now ${now} (24 are needed, fewer in purple)`,
    `Long and short load, ${componentUnit}, read each morning`,
  ];
  return {
    title: titles.map((text, i) => ({
      text,
      left: 8,
      top: PANELS[i]!.top - 30,
      textStyle: { fontSize: 14, fontWeight: 'bold', color: INK, fontFamily: 'Arimo' },
    })),
    legend: legends(chart),
    grid: PANELS.map(({ top, height }) => ({ left: LEFT, right: RIGHT, top, height })),
    xAxis: PANELS.map((_, i) => timeAxis(days, i, i === 0 || i === 1 || i === PANELS.length - 1)),
    yAxis: PANELS.map((_, i) => valueAxis(i)),
    series: [
      ...loadBars(chart),
      ...acuteChronic(chart),
      ...knownStrip(days),
      ...components(days, chart.componentScale === 'share'),
    ],
  };
}

function legends(chart: AthleteChart) {
  const has = (test: (day: ChartDay) => boolean): boolean => chart.days.some(test);
  const entries: { name: string; icon?: string }[][] = [
    [
      { name: 'load', icon: 'rect' },
      ...(has(({ state }) => state === 'partial') ? [{ name: 'part of a day (lower bound)', icon: 'rect' }] : []),
      ...(has(({ state }) => state === 'unknown') ? [{ name: 'day not known', icon: 'rect' }] : []),
      ...(chart.unavailable.length > 0 ? [{ name: 'not available', icon: 'rect' }] : []),
    ],
    [{ name: 'acute load' }, { name: 'chronic load' }, { name: bandName(chart), icon: 'rect' }],
    [],
    [
      { name: 'long load (45 days)' },
      { name: 'short load (15 days)' },
      { name: 'bounds where days are not known', icon: 'rect' },
    ],
  ];
  return entries.flatMap((data, i) =>
    data.length === 0
      ? []
      : [
          {
            data,
            right: RIGHT,
            top: PANELS[i]!.top - 29,
            itemWidth: 22,
            itemHeight: 8,
            itemGap: 16,
            textStyle: { fontSize: 12, color: INK, fontFamily: 'Arimo' },
          },
        ],
  );
}

function timeAxis(days: readonly ChartDay[], gridIndex: number, labels: boolean) {
  const mondays = new Set(days.filter(({ day }) => weekdayOf(day) === 1).map(({ day }) => day));
  return {
    type: 'category' as const,
    gridIndex,
    data: days.map(({ day }) => day),
    boundaryGap: true,
    axisLine: { lineStyle: { color: GREY } },
    axisTick: { show: labels, alignWithLabel: true, interval: (_: number, day: string) => mondays.has(day) },
    axisLabel: {
      show: labels,
      fontSize: 11,
      color: INK,
      interval: (_: number, day: string) => mondays.has(day),
      formatter: (day: string) => shortDate(day),
    },
    splitLine: { show: true, interval: (_: number, day: string) => mondays.has(day), lineStyle: { color: '#EEF1F4' } },
  };
}

function valueAxis(gridIndex: number) {
  const strip = gridIndex === 2;
  return {
    type: 'value' as const,
    gridIndex,
    ...(gridIndex === 3 ? { scale: true } : { min: 0 }),
    ...(strip ? { max: 28, interval: 14 } : {}),
    splitNumber: 4,
    axisLabel: { fontSize: 11, color: INK },
    splitLine: { lineStyle: { color: '#E3E8ED' } },
  };
}

function loadBars({ days, unavailable }: AthleteChart): Series[] {
  const top = Math.max(1, ...days.map(({ load }) => load ?? 0));
  const out = (day: string): boolean => unavailable.some(({ from, to }) => from <= day && day <= to);
  const bars = (name: string, color: string, value: (day: ChartDay) => number | null, decal?: object): Series => ({
    name,
    type: 'bar',
    xAxisIndex: 0,
    yAxisIndex: 0,
    stack: 'day',
    barWidth: '78%',
    data: days.map(value),
    itemStyle: { color, ...(decal === undefined ? {} : { decal }) },
  });
  return [
    bars('load', BLUE, (day) => (day.state === 'known' ? day.load : null)),
    bars('part of a day (lower bound)', SKY, (day) => (day.state === 'partial' ? day.load : null), HATCH_LIGHT),
    bars('day not known', '#F3F5F7', (day) => (day.state === 'unknown' ? top : null), HATCH),
    bars('not available', '#E4D3DF', (day) => (day.state === 'known' && out(day.day) && day.load === 0 ? top : null)),
  ];
}

const bandName = ({ ratioLimit }: AthleteChart): string => `up to ${ratioLimit} times chronic`;

function acuteChronic(chart: AthleteChart): Series[] {
  const { days, ratioLimit } = chart;
  const line = (name: string, color: string, data: (number | null)[], width: number): Series => ({
    name,
    type: 'line',
    xAxisIndex: 1,
    yAxisIndex: 1,
    symbol: 'none',
    data,
    lineStyle: { width, color },
    itemStyle: { color },
    z: 4,
  });
  return [
    ...area(
      bandName(chart),
      1,
      SKY,
      days.map(({ chronic }) => bandOf(chronic, ratioLimit)),
    ),
    line(
      'acute load',
      VERMILLION,
      days.map(({ acute }) => acute),
      2.5,
    ),
    line(
      'chronic load',
      BLUE,
      days.map(({ chronic }) => chronic),
      2.5,
    ),
  ];
}

function bandOf(chronic: number | null, limit: number): { low: number; high: number } | null {
  return chronic === null ? null : { low: chronic, high: limit * chronic };
}

function knownStrip(days: readonly ChartDay[]): Series[] {
  return [
    {
      name: 'days known',
      type: 'bar',
      xAxisIndex: 2,
      yAxisIndex: 2,
      barWidth: '78%',
      data: days.map(({ knownOf28 }) => ({
        value: knownOf28,
        itemStyle: { color: (knownOf28 ?? 0) >= 24 ? '#7C8894' : PURPLE },
      })),
    },
  ];
}

function components(days: readonly ChartDay[], share: boolean): Series[] {
  const hundred = share ? { markLine: referenceLine(100) } : {};
  const line = (name: string, color: string, pick: 'long' | 'short'): Series => ({
    name,
    type: 'line',
    xAxisIndex: 3,
    yAxisIndex: 3,
    symbol: 'none',
    data: days.map((day) => day[pick]?.value ?? null),
    lineStyle: { width: 2.5, color, type: pick === 'long' ? 'solid' : [7, 3] },
    itemStyle: { color },
    z: 4,
  });
  const bounds = 'bounds where days are not known';
  return [
    ...area(
      bounds,
      3,
      '#B9C2CC',
      days.map((day) => day.long),
      'long',
    ),
    ...area(
      bounds,
      3,
      '#B9C2CC',
      days.map((day) => day.short),
      'short',
    ),
    { ...line('long load (45 days)', BLUE, 'long'), ...hundred },
    line('short load (15 days)', ORANGE, 'short'),
  ];
}

/** A thin line at the own median. */
function referenceLine(value: number) {
  return {
    silent: true,
    symbol: 'none',
    label: { show: false },
    lineStyle: { color: GREY, width: 1, type: 'solid' as const },
    data: [{ yAxis: value }],
  };
}

/** An area between two lines: an invisible floor with the difference stacked on it. */
function area(
  name: string,
  panel: number,
  color: string,
  bands: readonly ({ low: number; high: number } | null)[],
  key = 'band',
): Series[] {
  const part = (title: string, data: (number | null)[], opacity: number): Series => ({
    name: title,
    type: 'line',
    xAxisIndex: panel,
    yAxisIndex: panel,
    stack: `${key} ${panel}`,
    symbol: 'none',
    silent: true,
    data,
    lineStyle: { opacity: 0 },
    itemStyle: { color, opacity: Math.max(opacity, 0.01) },
    areaStyle: { color, opacity },
    z: 2,
  });
  return [
    part(
      `floor of ${key} ${panel}`,
      bands.map((band) => band?.low ?? null),
      0,
    ),
    part(
      name,
      bands.map((band) => (band === null ? null : band.high - band.low)),
      0.3,
    ),
  ];
}

function weekdayOf(day: string): number {
  return ((new Date(`${day}T00:00:00Z`).getUTCDay() + 6) % 7) + 1;
}

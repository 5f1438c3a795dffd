import type { ComponentReading, SquadWeek, WindowSum } from '../../src/features/series/series.types.ts';
import type { LoadPolicySettings } from '../../src/features/policies/policies.types.ts';
import type { AthleteMeasures, Cell, ComponentCell, FlagLine } from './squad-week.view.ts';

type Athlete = SquadWeek['athletes'][number];

const NO_LOG = 'no log yet';
const WORDS: Record<string, string> = {
  acute: 'acute load',
  chronic: 'chronic load',
  ratio: 'ratio',
  monotony: 'monotony',
  strain: 'strain',
  longLoad: 'long load',
  shortLoad: 'short load',
};

/** One athlete's row of the sheet Measures, unrounded. */
export function measuresOf(
  { athleteId, name, series, week }: Athlete,
  flags: FlagLine[],
  thresholdsChanged: string[],
  settings: Pick<LoadPolicySettings, 'ratio'>,
): AthleteMeasures {
  const row = series?.rows.at(-1) ?? null;
  const withheld = { ...row?.withheld, ...components(series?.after) };
  const cell = (value: number | null | undefined, reason: string | undefined): Cell =>
    value === null || value === undefined ? { value: null, instead: reason ?? NO_LOG } : { value, instead: null };
  return {
    athleteId,
    name,
    primaryMeasure: series?.measure ?? 'rating-load',
    primaryReason: series?.measureReason ?? NO_LOG,
    domainMinutes: week?.domainMinutes ?? { moderate: 0, heavy: 0, severe: 0, extreme: 0 },
    domainLoad: {
      week: sum(week?.domainLoad),
      weekKnownDays: week?.domainLoad.knownDays ?? 0,
      last28: sum(week?.domainLoad28),
      last28KnownDays: week?.domainLoad28.knownDays ?? 0,
    },
    ratingLoad: { week: sum(week?.ratingLoad), weekKnownDays: week?.ratingLoad.knownDays ?? 0 },
    ratio: {
      ...cell(row?.ratio.value, row?.ratio.withheld),
      form: row?.ratio.form ?? settings.ratio.form,
      acute: row?.acute ?? null,
      chronic: row?.chronic ?? null,
      knownDays: row?.ratio.knownDays ?? { acute: 0, acuteOf: 7, chronic: 0, chronicOf: 28 },
    },
    monotony: cell(row?.monotony, withheld.monotony),
    strain: cell(row?.strain, withheld.strain),
    longLoad: component(series?.after.longLoad),
    shortLoad: component(series?.after.shortLoad),
    basisMix: { ...week?.basisMix },
    thresholdsChanged,
    withheld:
      row === null
        ? ['everything: no day in the log']
        : Object.entries(withheld).map(([figure, reason]) => `${WORDS[figure] ?? figure} (${reason})`),
    flags,
  };
}

/** Long and short load of the report are those of the morning after the last day, not those of the last row. */
function components(
  after: { longLoad: ComponentReading; shortLoad: ComponentReading } | undefined,
): Partial<Record<'longLoad' | 'shortLoad', string>> {
  const entries = (['longLoad', 'shortLoad'] as const).map((key) => [key, after?.[key].withheld] as const);
  return Object.fromEntries(entries.filter(([, reason]) => reason !== undefined));
}

/** A sum over known days; a lower bound where the window is not wholly known, and nothing without a known day. */
function sum(window: WindowSum | undefined): Cell {
  if (window === undefined) return { value: null, instead: NO_LOG };
  if (window.knownDays === 0 && window.sum === 0) return { value: null, instead: `0 of ${window.of} days known` };
  return window.knownDays < window.of
    ? { value: window.sum, instead: null, atLeast: true }
    : { value: window.sum, instead: null };
}

function component(reading: ComponentReading | undefined): ComponentCell {
  return {
    value: reading?.share ?? null,
    instead: reading === undefined ? NO_LOG : (reading.withheld ?? null),
    low: reading?.shareLow ?? null,
    high: reading?.shareHigh ?? null,
    units: reading?.units ?? null,
    unitsLow: reading?.low ?? null,
    unitsHigh: reading?.high ?? null,
  };
}

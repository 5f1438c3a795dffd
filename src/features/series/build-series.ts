import { acuteChronicCoupled } from '../../core/ratio/acute-chronic-coupled.ts';
import { acuteChronicExponential } from '../../core/ratio/acute-chronic-exponential.ts';
import { acuteChronicUncoupled } from '../../core/ratio/acute-chronic-uncoupled.ts';
import { monotonyPopulation, monotonySample, strain } from '../../core/load/monotony.ts';
import { longShortLoad } from '../../core/response/long-short-load.ts';
import { returnPhase } from '../../core/flags/return-phase.ts';
import { dayNumber, isoDay } from '../../core/series/day.ts';
import { fillUnknown } from '../../core/series/fill-unknown.ts';
import { knownDays } from '../../core/series/known-days.ts';
import type { AcuteChronic, DayValue, LongShortLoad, Measure } from '../../core/types.ts';
import type { DayRecord, MeasureDay } from '../days/days.types.ts';
import { basisMixes } from './basis-mix.ts';
import { chooseMeasure } from './choose-measure.ts';
import { componentReading, finite, FLOORS, monotonyWithheld, ratioWithheld, windowWithheld } from './readings.ts';
import type { AthleteSeries, MeasureReading, RatioForm, SeriesRow, SeriesSettings } from './series.types.ts';

const ACUTE_DAYS = 7;
const CHRONIC_DAYS = 28;

/**
 * One athlete's series from the days of the log, in order and without gaps, up to the last closed day. Pure: every
 * number comes from a method of the core; here they are put side by side with the reasons for those withheld.
 */
export function buildSeries(
  athleteId: string,
  records: readonly DayRecord[],
  settings: SeriesSettings,
  wanted?: Measure,
): AthleteSeries {
  const first = records[0];
  if (first === undefined) throw new Error('a series needs at least one day');
  const choice = chooseMeasure(records, settings.primaryMeasure);
  const measure = wanted ?? choice.measure;
  const days = records.map((record): DayValue => dayValue(record, measure));
  const values = days.map((day) => (day.state === 'known' ? day.value : NaN));
  const { form } = settings.ratio;
  const ratio = ratioByForm(form, values, days);
  const counts = { acute: knownDays(values, ACUTE_DAYS), chronic: chronicCounts(form, values) };
  const components = longShortLoad(days);
  const returning = returnPhase(
    records.map((record, index) => ({
      day: days[index]!.day,
      unavailable: record.availability === 'none' && !record.away,
      chronic: ratio.chronic[index]!,
    })),
  );
  const mixes = measure === 'domain-load' ? basisMixes(records, ACUTE_DAYS, chronicWindow(form)) : null;
  const monotonyOf = settings.monotony.sd === 'sample' ? monotonySample : monotonyPopulation;

  const rows = records.map((record, index): SeriesRow => {
    const known = {
      acute: counts.acute[index]!,
      acuteOf: ACUTE_DAYS,
      chronic: counts.chronic[index]!,
      chronicOf: form === 'rolling-uncoupled' ? CHRONIC_DAYS - ACUTE_DAYS : CHRONIC_DAYS,
    };
    const back = returning[index] ?? null;
    const mix = mixes?.[index] ?? null;
    const noRatio = ratioWithheld(form, known, index + 1, ratio.chronic[index]!, back?.dayN ?? null, mix?.shift ?? 0);
    const week = values.slice(Math.max(0, index - ACUTE_DAYS + 1), index + 1);
    const monotony = week.length === ACUTE_DAYS ? monotonyOf(week) : NaN;
    const weekStrain = strain(
      week.reduce((sum, value) => sum + value, 0),
      monotony,
    );
    const noMonotony = monotonyWithheld(week, monotony);
    const noAcute = windowWithheld(known.acute, ACUTE_DAYS, FLOORS.acute, index + 1);
    const noChronic = windowWithheld(known.chronic, known.chronicOf, chronicFloor(form), index + 1, CHRONIC_DAYS);
    const morning = readComponents(components[index - 1], index);
    const value = noRatio === null ? finite(ratio.ratio[index]!) : null;
    return {
      day: record.day,
      training: record.training,
      availability: record.availability,
      away: record.away,
      completeness: record.completeness,
      sessions: record.sessions,
      minutes: record.minutes,
      domain: reading(record.domain),
      rating: reading(record.rating),
      domainMinutes: record.domainMinutes,
      acute: noAcute === null ? finite(ratio.acute[index]!) : null,
      chronic: noChronic === null ? finite(ratio.chronic[index]!) : null,
      ratio: {
        form,
        value,
        low: value === null ? null : (ratio.low?.[index] ?? null),
        high: value === null ? null : (ratio.high?.[index] ?? null),
        knownDays: known,
        basisMix: mix === null ? null : { acute: mix.acute, chronic: mix.chronic },
        ...(noRatio === null ? {} : { withheld: noRatio }),
      },
      monotony: finite(monotony),
      strain: finite(weekStrain),
      ...morning,
      returning: back === null ? null : { dayN: back.dayN, share: finite(back.share) },
      withheld: reasons({
        acute: noAcute,
        chronic: noChronic,
        ratio: noRatio,
        monotony: noMonotony,
        strain: noMonotony,
        longLoad: morning.longLoad.withheld ?? null,
        shortLoad: morning.shortLoad.withheld ?? null,
      }),
    };
  });
  const last = records.at(-1)!;
  return {
    athleteId,
    measure,
    measureReason: wanted === undefined ? choice.reason : 'asked for',
    form,
    sd: settings.monotony.sd,
    firstDay: first.day,
    lastDay: last.day,
    rows,
    after: { day: isoDay(dayNumber(last.day) + 1), ...readComponents(components.at(-1), records.length) },
  };
}

/** A day of one measure as the core reads it. */
export function dayValue(record: DayRecord, measure: Measure): DayValue {
  const { state, value } = measure === 'domain-load' ? record.domain : record.rating;
  return { day: dayNumber(record.day), state, value: state === 'unknown' ? NaN : value };
}

function reading({ state, value }: MeasureDay): MeasureReading {
  return { state, value: state === 'unknown' ? null : finite(value) };
}

function readComponents(load: LongShortLoad | undefined, logDays: number): Pick<SeriesRow, 'longLoad' | 'shortLoad'> {
  return {
    longLoad: componentReading(load?.longUnits, load?.longShare, logDays),
    shortLoad: componentReading(load?.shortUnits, load?.shortShare, logDays),
  };
}

function chronicWindow(form: RatioForm): { days: number; skip: number } {
  return form === 'rolling-uncoupled'
    ? { days: CHRONIC_DAYS - ACUTE_DAYS, skip: ACUTE_DAYS }
    : { days: CHRONIC_DAYS, skip: 0 };
}

function chronicFloor(form: RatioForm): number {
  return form === 'rolling-uncoupled' ? FLOORS.chronicUncoupled : FLOORS.chronic;
}

function chronicCounts(form: RatioForm, values: readonly number[]): number[] {
  const { days, skip } = chronicWindow(form);
  const counts = knownDays(values, days);
  return values.map((_, index) => (index >= skip ? counts[index - skip]! : 0));
}

function ratioByForm(
  form: RatioForm,
  values: readonly number[],
  days: readonly DayValue[],
): AcuteChronic & { low?: number[]; high?: number[] } {
  if (form === 'rolling-coupled') return acuteChronicCoupled([...values]);
  if (form === 'rolling-uncoupled') return acuteChronicUncoupled([...values]);
  // Nothing before the first known load: the recursion starts with it.
  const first = days.findIndex(({ state }) => state === 'known');
  const fromFirst = (run: readonly number[]) => run.map((value, index) => (first < 0 || index < first ? NaN : value));
  const filled = fillUnknown(days);
  const middle = acuteChronicExponential(fromFirst(filled.value));
  const runs = [filled.value, filled.low, filled.high].map((run) => acuteChronicExponential(fromFirst(run)).ratio);
  return {
    ...middle,
    low: middle.ratio.map((_, i) => Math.min(...runs.map((run) => run[i]!))),
    high: middle.ratio.map((_, i) => Math.max(...runs.map((run) => run[i]!))),
  };
}

function reasons(given: Record<keyof SeriesRow['withheld'], string | null>): SeriesRow['withheld'] {
  return Object.fromEntries(Object.entries(given).filter(([, reason]) => reason !== null));
}

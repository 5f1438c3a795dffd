import { BASIS_MIX_LIMIT, basisMixShift } from '../../../src/core/flags/basis-mix-shift.ts';
import { loadConcern } from '../../../src/core/flags/load-concern.ts';
import { logGap } from '../../../src/core/flags/log-gap.ts';
import { plannedOverloadPhase } from '../../../src/core/flags/planned-overload-phase.ts';
import { primaryMeasure } from '../../../src/core/flags/primary-measure.ts';
import { returnPhase } from '../../../src/core/flags/return-phase.ts';
import { sessionSpikePercent } from '../../../src/core/flags/session-spike.ts';
import { thresholdsOutOfDate } from '../../../src/core/flags/thresholds-out-of-date.ts';
import { monotonyPopulation, strain } from '../../../src/core/load/monotony.ts';
import { acuteChronicCoupled } from '../../../src/core/ratio/acute-chronic-coupled.ts';
import { dayNumber } from '../../../src/core/series/day.ts';
import type { Basis, Measure, Muting } from '../../../src/core/types.ts';
import type { Scenario } from '../../../src/demo/scenario.types.ts';
import { scenarioDays } from './scenario-days.ts';
import type { ScenarioDay } from './scenario-days.ts';

export interface OpenFlag {
  kind: string;
  /** Days before the Sunday looked from. */
  sinceDaysAgo: number;
}

export interface SundayView {
  measure: Measure;
  ratio: number;
  /** True where only the change of basis withholds the ratio. */
  mixed: boolean;
  monotony: number;
  flags: OpenFlag[];
}

/** What the rules say of one athlete on a Sunday, from the log up to it. */
export function viewOn(scenario: Scenario, athlete: string, all: readonly ScenarioDay[], days: number): SundayView {
  const log = all.slice(0, days);
  const sunday = log.at(-1)!.day;
  const { measure } = primaryMeasure(
    log
      .slice(-28)
      .map((day) => ({ domain: day.domain.state, minutes: day.applicableMin, domainMinutes: day.coveredMin })),
  );
  const values = log.map((day) => {
    const of = measure === 'domain-load' ? day.domain : day.rating;
    return of.state === 'known' ? of.value : NaN;
  });
  const windows = acuteChronicCoupled(values);
  const mixed = log.map((_, index) => measure === 'domain-load' && mixShifted(log, index));
  const back = returnPhase(
    log.map(({ day, unavailable }, index) => ({ day, unavailable, chronic: windows.chronic[index]! })),
  );
  const planned = overloads(scenario, athlete);
  const figures = log.map((day, index) => {
    const week = index < 6 ? [NaN] : values.slice(index - 6, index + 1);
    const monotony = monotonyPopulation(week);
    return {
      day: day.day,
      ratio: mixed[index] || back[index] !== null ? NaN : windows.ratio[index]!,
      chronic: windows.chronic[index]!,
      monotony,
      strain: strain(
        week.reduce((a, b) => a + b, 0),
        monotony,
      ),
      muted: mutingOn(scenario, planned, day, back[index] !== null),
      spike: spikeOn(log, index),
    };
  });
  const open = (kind: string, stretches: readonly { since: number; until: number | null }[]) =>
    stretches.filter(({ until }) => until === null).map(({ since }) => ({ kind, sinceDaysAgo: sunday - since }));
  const phase = plannedOverloadPhase(sunday, planned);
  return {
    measure,
    ratio: figures.at(-1)!.ratio,
    mixed: mixed.at(-1)!,
    monotony: figures.at(-1)!.monotony,
    flags: [
      ...open('load-concern', loadConcern({ days: figures, firstDay: log[0]!.day })),
      ...open('log-gap', logGap(log.map((day) => (measure === 'domain-load' ? day.domain : day.rating)))),
      ...open('thresholds-out-of-date', thresholdsOutOfDate(ages(scenario, athlete, log))),
      ...(phase === null ? [] : [{ kind: phase.phase, sinceDaysAgo: phase.dayN - 1 }]),
      ...(back.at(-1) ? [{ kind: 'return', sinceDaysAgo: back.at(-1)!.dayN - 1 }] : []),
    ],
  };
}

/** Every Sunday of the twelve weeks. */
export function allSundays(scenario: Scenario, athlete: string): SundayView[] {
  const days = scenarioDays(scenario, athlete);
  return Array.from({ length: 12 }, (_, week) => viewOn(scenario, athlete, days, 7 * (week + 1)));
}

function mixShifted(log: readonly ScenarioDay[], index: number): boolean {
  const sum = (window: readonly ScenarioDay[]) => {
    const minutes: Partial<Record<Basis, number>> = {};
    for (const day of window) {
      for (const [basis, of] of Object.entries(day.basisMinutes)) {
        minutes[basis as Basis] = (minutes[basis as Basis] ?? 0) + of;
      }
    }
    return minutes;
  };
  const acute = sum(log.slice(Math.max(0, index - 6), index + 1));
  return basisMixShift(acute, sum(log.slice(Math.max(0, index - 27), index + 1))) > BASIS_MIX_LIMIT;
}

function overloads(scenario: Scenario, athlete: string) {
  return scenario.loadPeriods
    .filter((period) => period.purpose === 'overload' && period.athlete === athlete)
    .map(({ from, to }) => ({ from: dayNumber(from), to: dayNumber(to) }));
}

function mutingOn(
  scenario: Scenario,
  planned: ReturnType<typeof overloads>,
  { day, unavailable }: ScenarioDay,
  back: boolean,
): Muting | null {
  if (unavailable) return 'unavailable';
  if (back) return 'return';
  if (plannedOverloadPhase(day, planned)?.phase === 'within') return 'planned-overload';
  const unload = scenario.loadPeriods.some(
    ({ purpose, from, to }) => purpose === 'unload' && dayNumber(from) <= day && day <= dayNumber(to),
  );
  return unload ? 'unload' : null;
}

function spikeOn(log: readonly ScenarioDay[], index: number) {
  const before = Math.max(0, ...log.slice(Math.max(0, index - 30), index).map(({ longestRunM }) => longestRunM));
  const distance = log[index]!.longestRunM;
  if (before === 0 || distance === 0) return null;
  const percent = sessionSpikePercent(distance / 1000, before / 1000);
  return percent > 10 ? { percent, sessionId: String(log[index]!.day) } : null;
}

/** Age of the newest threshold of the trained modality whose newest threshold is oldest. */
function ages(scenario: Scenario, athlete: string, log: readonly ScenarioDay[]) {
  const entries = scenario.thresholds.filter((batch) => batch.athlete === athlete).flatMap(({ values }) => values);
  const tested = Map.groupBy(
    entries.map(({ modality, validFrom }) => ({ modality, from: dayNumber(validFrom) })),
    ({ modality }) => modality ?? 'other',
  );
  return log.map(({ day }, index) => {
    const trained = new Set(log.slice(Math.max(0, index - 27), index + 1).flatMap((one) => [...one.modalities]));
    const newest = [...trained].map((modality) =>
      Math.max(...(tested.get(modality) ?? []).map(({ from }) => from).filter((from) => from <= day)),
    );
    return { day, ageDays: newest.length === 0 ? NaN : day - Math.min(...newest) };
  });
}

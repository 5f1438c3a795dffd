import type { LoadConcernDay } from '../types.ts';
import { rollingQuantile } from '../series/rolling-quantile.ts';
import type { Constituent } from './constituent.ts';
import { stretches } from './constituent.ts';
import type { LoadConcernSettings } from './load-concern-settings.ts';

/**
 * Stretches in which the chronic load lay far below the athlete's own usual.
 *
 * Months of work leak away without anyone having planned it.
 *
 * @param days figures by day; chronic [load units], NaN unknown
 * @param firstDay first day of the log [days since 1970-01-01]
 * @param settings limits, see there
 * @returns stretches with their evidence; value and limit [load units]
 * @remarks Equation: raised when chronic < L, L = 0.5·median of the chronic loads on t−181 … t, from 56 days of log on.
 * Cleared when chronic ≥ L ÷ 0.95 on 3 judged days in a row. Silent through unload, taper, planned overload, unavailability and return.
 * Limits: after half a year of low load the usual is low as well.
 * @see own convention
 * @example
 * chronicLowConcern([0, 1, 2].map((day) => ({ day, ratio: 1, chronic: day === 2 ? 20 : 50, monotony: 1, strain: 400, muted: null, spike: null })), -60, loadConcernSettings({})).map((c) => c.evidence.limit); // => [25]
 */
export function chronicLowConcern(
  days: readonly LoadConcernDay[],
  firstDay: number,
  settings: LoadConcernSettings,
): Constituent[] {
  const { chronicLowShare, historyDays, historyMinDays, clearFactor, clearDays } = settings;
  const usual = rollingQuantile(
    days.map((day) => day.chronic),
    historyDays,
    0.5,
  );
  return stretches(
    days,
    (index) => {
      const { day, chronic, muted } = days[index]!;
      if (muted === 'unavailable') return { kind: 'absent' };
      if (muted !== null) return { kind: 'muted' };
      if (Number.isNaN(chronic) || day - firstDay + 1 < historyMinDays) return { kind: 'silent' };
      const limit = chronicLowShare * usual[index]!;
      return {
        kind: 'judged',
        raised: chronic < limit,
        inside: chronic >= limit / clearFactor,
        strength: chronic > 0 ? limit / chronic : Infinity,
        evidence: { measure: 'chronic-low', value: chronic, limit, day },
      };
    },
    clearDays,
  );
}

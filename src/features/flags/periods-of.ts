import type { DayRecord } from '../days/days.types.ts';
import type { PlannedPeriod } from './flags.types.ts';

/**
 * The planned periods that hold for one athlete: own ones, and those of a squad for as long as the athlete was in it. A
 * period that goes on after the log keeps its end while the athlete is still in the squad.
 */
export function periodsOf(
  athleteId: string,
  records: readonly DayRecord[],
  periods: readonly PlannedPeriod[],
): PlannedPeriod[] {
  const last = records.at(-1)?.day ?? '';
  return periods.flatMap((period) => {
    if (period.athleteId !== null) return period.athleteId === athleteId ? [period] : [];
    const within = records.filter(
      ({ day, squadId }) => squadId === period.squadId && period.from <= day && day <= period.to,
    );
    const [first, end] = [within[0]?.day, within.at(-1)?.day];
    if (first === undefined || end === undefined) return [];
    return [{ ...period, from: first, to: end === last ? period.to : end }];
  });
}

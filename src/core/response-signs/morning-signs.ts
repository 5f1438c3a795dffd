import type { FamilyDay, MeasuredDay, OwnBaseline } from './types.ts';
import { above, within } from '../guard.ts';
import { checkDays } from './check-days.ts';
import { ownBaseline } from './own-baseline.ts';
import { hasSigns, nextRun, NO_RUN } from './sign-run.ts';

/** A morning beside the athlete's own usual. */
export interface MorningDay extends FamilyDay {
  readonly value: number;
  /** What it is judged by; null where there is too little. */
  readonly baseline: OwnBaseline | null;
  /** Since when the baseline is held; null while it moves. */
  readonly frozenSince: number | null;
  /** Mean + 1.5 spreads; NaN without a baseline. */
  readonly limit: number;
  /** Null: not measured or not judged. */
  readonly sign: boolean | null;
}

/**
 * Mornings far above the athlete's own usual, and whether they have become frequent.
 *
 * One bad morning is nothing; several in a row that are worse than usual for this athlete are a reason to ask.
 *
 * @param days values that are worse when higher [points, or any unit] in order without gaps, NaN not measured
 * @param options spreads 1.5 [SD], leastSpread 1 [unit of the values]: a smaller SD counts as this
 * @returns per day value, baseline, limit [unit of the values], sign and how the family stands; same length
 * @throws NumericInputError on days with gaps, an infinite value or an option out of range
 * @remarks Equation: sign if x > mean + 1.5·max(SD, least spread); baseline held from the first day of a sign until none is left among
 * the last 7 measured days within 14 days; raised by 3 of these 7, cleared at 1.
 * Limits: normal mornings raise it on 2 to 3 of 100 Mondays. For resting heart rate (least spread 1) it informs only: alone it is no sign.
 * @see own convention; Hooper SL et al. 1995, Med Sci Sports Exerc 27(1):106–112 for the answers
 * @example
 * morningSigns(Array.from({ length: 31 }, (_, day) => ({ day, value: day < 28 ? 10 + (day % 2) : 14, inBaseline: true, judged: true }))).map((one) => one.raised).at(-1); // => true
 */
export function morningSigns(
  days: readonly MeasuredDay[],
  options: { spreads?: number; leastSpread?: number } = {},
): MorningDay[] {
  const { spreads = 1.5, leastSpread = 1 } = options;
  above('morningSigns', 'spreads', spreads, 0);
  above('morningSigns', 'leastSpread', leastSpread, 0);
  checkDays('morningSigns', days);
  let run = NO_RUN;
  let held: { baseline: OwnBaseline; since: number } | null = null;
  return days.map(({ day, value, judged }, index) => {
    if (!Number.isNaN(value)) within('morningSigns', `days[${index}].value`, value, -Infinity, Infinity);
    const baseline: OwnBaseline | null = held?.baseline ?? ownBaseline(days, index);
    const spread = baseline === null ? NaN : Math.max(baseline.sd, leastSpread);
    const limit = baseline === null ? NaN : baseline.mean + spreads * spread;
    const sign = judged && !Number.isNaN(value) && baseline !== null ? value > limit : null;
    const point = { day, value, expected: baseline?.mean ?? NaN, spread, limit, sources: [`morning:${day}`] };
    run = nextRun(run, day, sign === null ? undefined : sign ? point : null);
    held = hasSigns(run) && baseline !== null ? { baseline, since: held?.since ?? day } : null;
    return { day, value, baseline, frozenSince: held?.since ?? null, limit, sign, ...run.state };
  });
}

import type { DayState, Stretch } from '../types.ts';

const WINDOW_DAYS = 7;
const MIN_KNOWN = 6;
const CLEAR_DAYS = 3;

/**
 * Stretches in which the log has a gap.
 *
 * Without days there is nothing to judge; the flag asks for the log, not for the athlete.
 *
 * @param days day [days since 1970-01-01] and state, in order without gaps; only 'known' counts as known
 * @returns stretches: since, until (first day that is clear, null while open) and evidence of the last open day: known [days] of 7
 * @remarks Equation: raised when fewer than 6 of the last 7 days are known, from the seventh day on; cleared on the third day in a row with 6 or 7.
 * Limits: days still being entered look like a gap until they are closed.
 * @see own convention
 * @example
 * logGap([0, 1, 2, 3, 4, 5, 6].map((day) => ({ day, state: day > 4 ? 'unknown' : 'known' }))); // => [{ since: 6, until: null, evidence: { known: 5, of: 7, day: 6 } }]
 */
export function logGap(
  days: readonly { readonly day: number; readonly state: DayState }[],
): Stretch<{ known: number; of: number; day: number }>[] {
  const done: Stretch<{ known: number; of: number; day: number }>[] = [];
  let open: Stretch<{ known: number; of: number; day: number }> | null = null;
  let enough = 0;
  days.forEach(({ day }, index) => {
    if (index < WINDOW_DAYS - 1) return;
    const window = days.slice(index - WINDOW_DAYS + 1, index + 1);
    const known = window.filter((one) => one.state === 'known').length;
    enough = known >= MIN_KNOWN ? enough + 1 : 0;
    const evidence = { known, of: WINDOW_DAYS, day };
    if (open === null) {
      if (enough === 0) open = { since: day, until: null, evidence };
    } else if (enough >= CLEAR_DAYS) {
      done.push({ ...open, until: day });
      open = null;
    } else {
      open = { since: open.since, until: null, evidence };
    }
  });
  return open === null ? done : [...done, open];
}

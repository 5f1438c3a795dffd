import { checkDays } from '../response-signs/check-days.ts';
import { NumericInputError } from '../numeric-input-error.ts';
import type { OverreachingSettings } from './overreaching-settings.ts';
import { overreachingSettings } from './overreaching-settings.ts';
import type { Under } from './overreaching-step.ts';
import { carried, raised } from './overreaching-step.ts';
import type { OverreachingEpisode, OverreachingInput } from './overreaching-types.ts';
import type { FamilyStates } from './standing-families.ts';
import { FAMILIES, standing } from './standing-families.ts';

/**
 * Episodes in which an athlete is strained, or overreaching is suspected.
 *
 * Two kinds of sign that agree are a reason to test or talk; with a confirmed fall of performance they are a reason to act.
 *
 * @param input days [days since 1970-01-01] in order without gaps, explained or not; families: their states on the same days;
 *   results and bouts of the log [unit of each; typical errors]
 * @param settings clearDays 3 and minStayDays 7 [days]
 * @returns episodes in order: since, until (first day on which it no longer stood; null while it stands), level on its last day and the
 *   highest, steps by day, and the evidence of the last day it held
 * @throws NumericInputError on days with gaps, a family with other days, or settings out of range
 * @remarks Equation: strained from a day, not explained, on which at least two families are raised that share no measured value, and while
 * at least two are open; suspected from a day, not explained, on which in addition performance evidence stands that uses no value of two of
 * them, and while it does. Expected results are taken before the first sign of the open families. A level is left after 3 days in a row without its
 * evidence, and after 7 days at the earliest. A day sees only what is dated up to it. Planned overload is no input, for it mutes nothing
 * here; nor is load, which is a likely reason and no condition.
 * Limits: a screen, not a diagnosis; other causes are for a physician to exclude, and no episode does not mean that all is well.
 * @see Meeusen R et al. 2013, Med Sci Sports Exerc 45(1):186–205 for performance as the defining part; numbers: own convention
 * @example
 * overreachingScreen({ days: [{ day: 1, explained: false }], families: {}, results: [], bouts: [] }); // => []
 */
export function overreachingScreen(
  input: OverreachingInput,
  settings: Partial<OverreachingSettings> = {},
): OverreachingEpisode[] {
  const limits = overreachingSettings(settings);
  const { days, families } = input;
  check(input);
  const done: OverreachingEpisode[] = [];
  let under = null as Under | null;
  days.forEach(({ day, explained }, index) => {
    const states: FamilyStates = Object.fromEntries(
      FAMILIES.flatMap((family) => {
        const state = families[family]?.[index];
        return state === undefined ? [] : [[family, state]];
      }),
    );
    const strong = standing(states, 'raised');
    if (under === null && (explained || strong.length < 2)) return;
    under = carried(under ?? raised(day, strong), day, explained, standing(states, 'open'), input, limits);
    if (under.episode.until === null) return;
    done.push(under.episode);
    under = null;
  });
  return under === null ? done : [...done, under.episode];
}

function check({ days, families }: OverreachingInput): void {
  checkDays('overreachingScreen', days);
  for (const family of FAMILIES) {
    const states = families[family];
    if (states === undefined) continue;
    if (states.length !== days.length) {
      throw new NumericInputError('overreachingScreen', `families.${family}`, states.length, `${days.length} days`);
    }
    states.forEach(({ day }, index) => {
      const wanted = days[index]!.day;
      if (day === wanted) return;
      throw new NumericInputError('overreachingScreen', `families.${family}[${index}].day`, day, String(wanted));
    });
  }
}

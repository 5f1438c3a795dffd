import type { RatedSession } from '../../../src/core/response-signs/session-work.ts';
import type { CriterionResult, FamilyDay, MeasuredDay, StandardBout } from '../../../src/core/response-signs/types.ts';
import { seededNormal, seededUniform } from '../../verify/seeded.ts';

/** A Monday. */
export const FIRST = 20_780;

/** Values from FIRST on, all usable; NaN not measured. */
export function measured(values: readonly number[], change: (index: number) => Partial<MeasuredDay> = () => ({})) {
  return values.map((value, index): MeasuredDay => {
    return { day: FIRST + index, value, inBaseline: true, judged: true, ...change(index) };
  });
}

/** The same number again and again. */
export function times(count: number, value: number): number[] {
  return Array<number>(count).fill(value);
}

/** Two numbers in turn. */
export function inTurn(count: number, first: number, second: number): number[] {
  return Array.from({ length: count }, (_, index) => (index % 2 === 0 ? first : second));
}

/** Normal values from a seed, some of them not measured. */
export function normalValues(seed: number, count: number, mean: number, sd: number, missing = 0): number[] {
  const [normal, uniform] = [seededNormal(seed), seededUniform(seed + 1)];
  return Array.from({ length: count }, () => {
    const value = mean + sd * normal();
    return uniform() < missing ? NaN : value;
  });
}

/** Share of the Sundays from `start` on that are raised: what a report of the Monday after would say. */
export function raisedShare(runs: readonly (readonly FamilyDay[])[], start: number): number {
  const sundays = runs.flatMap((days) => days.filter((_, index) => index % 7 === 6 && index >= start));
  return sundays.filter(({ raised }) => raised).length / sundays.length;
}

/** A session from its day, minutes and rating. */
export function session(
  day: number,
  rating: number,
  given: Partial<RatedSession> & { heavy?: number; severe?: number } = {},
) {
  const { heavy = 0, severe = 0, totalMin = 60, ...rest } = given;
  const minutes = { moderate: totalMin - heavy - severe, heavy, severe, extreme: 0 };
  const made: RatedSession = {
    ...{ day: FIRST + day, id: `session-${day}`, modality: 'rowing', totalMin, minutes, rating },
    ...{ inBaseline: true, judged: true, ...rest },
  };
  return made;
}

/** What a made-up athlete does and says; each shift is added from its day on. */
export interface Feeling {
  readonly morning?: (day: number) => number;
  readonly rating?: (day: number) => number;
  readonly bout?: (day: number) => number;
  readonly test?: (day: number) => number;
  readonly variability?: (day: number) => number;
}

export interface Log {
  readonly mornings: MeasuredDay[];
  readonly variability: MeasuredDay[];
  readonly sessions: RatedSession[];
  readonly bouts: StandardBout[];
  readonly results: CriterionResult[];
}

/** Six sessions a week of mixed work, a strength session among them, a bout every Tuesday and a test every second Wednesday. */
export function madeUpLog(seed: number, dayCount: number, feeling: Feeling = {}): Log {
  const [normal, uniform] = [seededNormal(seed), seededUniform(seed + 1)];
  const at = (of: ((day: number) => number) | undefined, day: number) => of?.(day) ?? 0;
  const log: Log = { mornings: [], variability: [], sessions: [], bouts: [], results: [] };
  const free = { inBaseline: true, judged: true };
  for (let index = 0; index < dayCount; index += 1) {
    const day = FIRST + index;
    log.mornings.push({ day, value: Math.round(11 + 1.8 * normal() + at(feeling.morning, index)), ...free });
    log.variability.push({ day, value: 4.2 + 0.12 * normal() + at(feeling.variability, index), ...free });
    if (index % 7 !== 6) log.sessions.push(madeUpSession(index, normal, uniform, at(feeling.rating, index)));
    if (index % 7 === 1) {
      log.bouts.push({
        ...{ day, id: `bout-${index}`, key: '3 x 6 min at 180 W', heartRateBpm: 141 + 3 * normal() },
        rating: 3.2 + 0.6 * normal() + at(feeling.bout, index),
        ...{ heartRateTypicalError: 3, ratingTypicalError: 0.7, ...free },
      });
    }
    if (index % 14 === 2) {
      log.results.push({
        ...{
          day,
          id: `test-${index}`,
          key: '2000 m',
          kind: 'test',
          value: 420 + 1.5 * normal() + at(feeling.test, index),
        },
        ...{ typicalError: 2, higherIsBetter: false, ...free },
      });
    }
  }
  return log;
}

function madeUpSession(index: number, normal: () => number, uniform: () => number, shift: number): RatedSession {
  const strength = index % 7 === 3;
  const totalMin = 50 + Math.round(50 * uniform());
  const kind = uniform();
  const heavy = !strength && kind < 0.4 ? Math.round(20 * uniform()) : 0;
  const severe = !strength && kind > 0.75 ? Math.round(15 * uniform()) : 0;
  const felt = (strength ? 3 : 1.5) + (1.2 * totalMin + 3 * heavy + 10 * severe) / 60 + 0.8 * normal() + shift;
  const rating = Math.min(10, Math.max(0, Math.round(2 * felt) / 2));
  return session(index, rating, { totalMin, heavy, severe, modality: strength ? 'strength' : 'rowing' });
}

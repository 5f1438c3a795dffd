import { expect, test } from '@jest/globals';
import type { Feeling, Log } from './response-signs/support.ts';
import { FIRST, madeUpLog } from './response-signs/support.ts';
import { screenUpTo } from './screen-up-to.ts';

const DAYS = 84;
const LAST = FIRST + DAYS - 1;
const SEEDS = Array.from({ length: 20 }, (_, index) => index + 1);
/** Rises by `size` over two weeks from the given day on. */
const from = (start: number, size: number) => (day: number) => size * Math.min(1, Math.max(0, (day - start) / 14));
const drifting: Feeling = { morning: from(42, 6), rating: from(40, 2.2), bout: from(42, 2.4), test: from(44, 12) };
const week = (day: number) => Math.floor((day - FIRST) / 7) + 1;

test('signs and tests that worsen from week 7 on: suspected by week 10 in 18 of 20, in week 12 in 2, and still at the end', () => {
  const ends = SEEDS.map((seed) => screenUpTo(madeUpLog(seed, DAYS, drifting), LAST).at(-1)!);
  for (const { until, level, steps, evidence } of ends) {
    expect({ until, level }).toEqual({ until: null, level: 'overreaching-suspected' });
    expect(steps.at(-1)!.change).toBe('escalated');
    expect(week(steps.at(-1)!.day)).toBeGreaterThanOrEqual(7);
    expect(evidence.day).toBe(LAST);
    expect(evidence.families.length).toBeGreaterThanOrEqual(2);
    expect(evidence.criterion!.test.typicalErrors).toBeLessThan(-2);
  }
  const weeks = ends.map(({ steps }) => week(steps.at(-1)!.day)).sort((a, b) => a - b);
  expect([weeks[0], weeks[17], weeks[18], weeks[19]]).toEqual([10, 10, 12, 12]);
  // One of the twenty was strained by chance in week 6 already.
  expect(ends.filter(({ since }) => week(since) >= 7 && week(since) <= 9)).toHaveLength(19);
});

test('the same sessions with ordinary ratings, mornings, bouts and tests: never suspected, and none strained at the end', () => {
  for (const seed of SEEDS) {
    const [hard, easy] = [madeUpLog(seed, DAYS, drifting), madeUpLog(seed, DAYS)];
    const work = (log: Log) => log.sessions.map(({ rating, ...done }) => ({ ...done, rated: rating >= 0 }));
    expect(work(easy)).toEqual(work(hard));
    const episodes = screenUpTo(easy, LAST);
    expect(episodes.filter(({ until, highest }) => until === null || highest !== 'strained')).toEqual([]);
  }
});

test('twelve weeks given at once are twelve weeks given day by day', () => {
  for (const seed of [2, 4]) {
    const log = madeUpLog(seed, DAYS, drifting);
    const whole = screenUpTo(log, LAST);
    expect(whole.length).toBeGreaterThan(0);
    for (let day = FIRST; day <= LAST; day += 1) {
      const part = screenUpTo(log, day);
      const begun = whole.filter(({ since }) => since <= day);
      expect(part.map(({ since }) => since)).toEqual(begun.map(({ since }) => since));
      begun.forEach((episode, index) => {
        expect(part[index]!.steps).toEqual(episode.steps.filter((step) => step.day <= day));
        if (episode.until !== null && episode.until <= day) expect(part[index]).toEqual(episode);
        else expect(part[index]!.until).toBeNull();
      });
    }
  }
});

test('what is dated later, or entered at all for a later day, changes no earlier day', () => {
  const log = madeUpLog(7, DAYS, drifting);
  const day = FIRST + 62;
  const wild: Log = {
    mornings: log.mornings.map((one) => (one.day > day ? { ...one, value: 28 } : one)),
    variability: log.variability.map((one) => (one.day > day ? { ...one, value: 9 } : one)),
    sessions: log.sessions.map((one) => (one.day > day ? { ...one, rating: 10 } : one)),
    bouts: log.bouts.map((one) => (one.day > day ? { ...one, rating: 10 } : one)),
    results: log.results.map((one) => (one.day > day ? { ...one, value: 900 } : one)),
  };
  const before = (given: Log) =>
    screenUpTo(given, LAST).flatMap(({ since, steps }) =>
      since <= day ? steps.filter((step) => step.day <= day) : [],
    );
  expect(before(log).length).toBeGreaterThan(0);
  expect(before(wild)).toEqual(before(log));
});

test('of 150 ordinary athletes over 26 weeks a tenth is ever strained, 0.6 of 100 Mondays; none is suspected', () => {
  let [mondays, strained, ever] = [0, 0, 0];
  for (let seed = 1; seed <= 150; seed += 1) {
    const episodes = screenUpTo(madeUpLog(seed, 182), FIRST + 181);
    for (let sunday = FIRST + 48; sunday < FIRST + 182; sunday += 7) {
      mondays += 1;
      if (episodes.some(({ since, until }) => since <= sunday && (until ?? Infinity) > sunday)) strained += 1;
    }
    if (episodes.length > 0) ever += 1;
    expect(episodes.every(({ highest }) => highest === 'strained')).toBe(true);
  }
  expect(strained / mondays).toBeCloseTo(0.0063, 4);
  expect(ever / 150).toBeCloseTo(0.1, 2);
});

import { describe, expect, test } from '@jest/globals';
import { overreachingScreen } from '../../src/core/flags/overreaching-screen.ts';
import type { OverreachingInput } from '../../src/core/flags/overreaching-types.ts';
import { NumericInputError } from '../../src/core/numeric-input-error.ts';
import type { CriterionResult, FamilyDay, SignFamily, StandardBout } from '../../src/core/response-signs/types.ts';
import { FIRST } from './response-signs/support.ts';

/** A family's states from letters: r raised, o open only, anything else nothing; its signs are dated the day it was raised. */
function states(letters: string, source: string): FamilyDay[] {
  let since: number | null = null;
  return [...letters].map((letter, index) => {
    const day = FIRST + index;
    const open = letter === 'r' || letter === 'o';
    since = open ? (since ?? day) : null;
    const sign = { day: since ?? day, value: 15, expected: 11, spread: 1, limit: 12.5, sources: [source] };
    return { day, raised: letter === 'r', open, since, firstSign: since, measured: 7, signs: open ? [sign] : [] };
  });
}

type Given = Partial<Record<SignFamily, string>> & {
  explained?: string;
  results?: CriterionResult[];
  bouts?: StandardBout[];
};

function input({ explained = '', results = [], bouts = [], ...families }: Given): OverreachingInput {
  const length = Math.max(...Object.values(families).map((letters) => letters.length));
  const days = Array.from({ length }, (_, index) => ({ day: FIRST + index, explained: explained[index] === 'x' }));
  const entries = Object.entries(families).map(([family, letters]) => [
    family,
    states(letters.padEnd(length, '.'), family),
  ]);
  return { days, families: Object.fromEntries(entries), results, bouts };
}

const screen = (given: Given) => overreachingScreen(input(given));
const spans = (given: Given) =>
  screen(given).map(({ since, until }) => [since - FIRST, until === null ? null : until - FIRST]);
const steps = (given: Given) =>
  screen(given).flatMap((one) => one.steps.map(({ day, change }) => [day - FIRST, change]));
const r = (count: number) => 'r'.repeat(count);
const gap = (count: number) => '.'.repeat(count);

describe('strained', () => {
  test('needs two families at once', () => {
    expect(spans({ 'morning-answers': r(20) })).toEqual([]);
    expect(spans({ 'morning-answers': `${r(5)}`, 'effort-mismatch': `${gap(5)}${r(9)}` })).toEqual([]);
    expect(spans({ 'morning-answers': r(20), 'effort-mismatch': `${gap(4)}${r(16)}` })).toEqual([[4, null]]);
    expect(spans({ variability: r(9), 'standard-bout': r(9) })).toEqual([[0, null]]);
    expect(spans({ 'morning-answers': r(9), 'effort-mismatch': `${gap(3)}oooo` })).toEqual([]);
  });

  test('names the families, their signs and the day it last held', () => {
    const [episode] = screen({ 'morning-answers': r(6), 'effort-mismatch': `..${r(3)}`, variability: `...${r(2)}` });
    expect(episode).toMatchObject({
      level: 'strained',
      highest: 'strained',
      evidence: { day: FIRST + 4, criterion: null },
    });
    expect(episode!.evidence.families.map(({ family, since }) => [family, since! - FIRST])).toEqual([
      ['morning-answers', 0],
      ['effort-mismatch', 2],
      ['variability', 3],
    ]);
    expect(episode!.evidence.families[0]!.signs[0]).toMatchObject({ value: 15, expected: 11, limit: 12.5 });
  });

  test('one measured value counts in one family only', () => {
    const given = input({ 'effort-mismatch': r(9), 'standard-bout': r(9) });
    expect(overreachingScreen(given)).toHaveLength(1);
    const shared = { ...given.families, 'standard-bout': states(r(9), 'effort-mismatch') };
    expect(overreachingScreen({ ...given, families: shared })).toEqual([]);
    const third = { ...shared, 'morning-answers': states(r(9), 'morning-answers') };
    const [episode] = overreachingScreen({ ...given, families: third });
    expect(episode!.evidence.families.map(({ family }) => family)).toEqual(['morning-answers', 'effort-mismatch']);
  });

  test('nothing is raised on a day that is explained; what stands stays until its signs are gone', () => {
    const both = { 'morning-answers': r(12), 'effort-mismatch': r(12) };
    expect(spans({ ...both, explained: 'xxxx' })).toEqual([[4, null]]);
    expect(spans({ ...both, explained: 'xxxxxxxxxxxx' })).toEqual([]);
    expect(spans({ ...both, explained: '...xxxxxxxxx' })).toEqual([[0, null]]);
    expect(spans({ 'morning-answers': `${r(7)}....`, 'effort-mismatch': r(11), explained: '...xxxxxxxx' })).toEqual([
      [0, 9],
    ]);
  });

  test('is raised by raised families and kept by open ones', () => {
    expect(spans({ 'morning-answers': `rr${'o'.repeat(30)}`, 'effort-mismatch': r(32) })).toEqual([[0, null]]);
  });

  test('clears on the third day in a row without two families, after seven days at the earliest', () => {
    const clear = (letters: string) => spans({ 'morning-answers': letters, 'effort-mismatch': r(letters.length) });
    expect(clear(`${r(10)}...`)).toEqual([[0, 12]]);
    expect(clear(`${r(10)}..`)).toEqual([[0, null]]);
    expect(clear(`${r(10)}..o..`)).toEqual([[0, null]]);
    expect(clear(`${r(2)}.........`)).toEqual([[0, 7]]);
    expect(clear(`${r(2)}.....`)).toEqual([[0, null]]);
    expect(clear(`${r(8)}...${r(3)}`)).toEqual([[0, 10], [11, null]]); // prettier-ignore
    expect(overreachingScreen(input({ 'morning-answers': 'r.....', 'effort-mismatch': r(6) }), { clearDays: 1, minStayDays: 0 })).toMatchObject([{ since: FIRST, until: FIRST + 1 }]); // prettier-ignore
  });

  test('a family that fades for another is still strained', () => {
    const given = { 'morning-answers': `${r(10)}`, 'effort-mismatch': r(30), variability: `${gap(11)}${r(19)}` };
    expect(spans(given)).toEqual([[0, null]]);
  });
});

function result(day: number, value: number): CriterionResult {
  const at = { day: FIRST + day, id: `test-${day}`, key: 'power', value };
  return { ...at, kind: 'test', typicalError: 4, higherIsBetter: true, inBaseline: true, judged: true };
}

function bout(day: number, rating: number): StandardBout {
  const at = { day: FIRST + day, id: `bout-${day}`, key: 'easy', heartRateBpm: 140, rating };
  return { ...at, heartRateTypicalError: 3, ratingTypicalError: 0.7, inBaseline: true, judged: true };
}

/** Tests of 300 and bouts of 3 in the first weeks; two families from day 40 on. */
const before = [0, 8, 16].map((day) => result(day, 300));
const easy = [0, 7, 14, 21, 28].map((day) => bout(day, 3));
const pair = { 'morning-answers': `${gap(40)}${r(40)}`, 'effort-mismatch': `${gap(40)}${r(40)}` };

describe('overreaching suspected', () => {
  test('is strained with a confirmed fall of performance, from the day both are there', () => {
    const given = { ...pair, results: [...before, result(44, 290), result(50, 290)] };
    expect(steps(given).slice(0, 2)).toEqual([[40, 'raised'], [50, 'escalated']]); // prettier-ignore
    const [episode] = screen({
      ...given,
      'morning-answers': `${gap(40)}${r(20)}`,
      'effort-mismatch': `${gap(40)}${r(20)}`,
    });
    expect(episode).toMatchObject({
      ...{ level: 'overreaching-suspected', highest: 'overreaching-suspected', since: FIRST + 40, until: null },
      evidence: {
        day: FIRST + 59,
        criterion: { test: { id: 'test-44', expected: 300 }, confirmedBy: { kind: 'repeat', id: 'test-50' } },
      },
    });
    expect(episode!.evidence.families).toHaveLength(2);
  });

  test('a fall that was confirmed before the signs counts from the first strained day', () => {
    expect(steps({ ...pair, results: [...before, result(32, 290), result(38, 290)] }).slice(0, 2)).toEqual([[40, 'raised'], [40, 'escalated']]); // prettier-ignore
  });

  test('a fall alone, or an unconfirmed one, is nothing more', () => {
    expect(screen({ 'morning-answers': r(80), results: [...before, result(44, 290), result(50, 290)] })).toEqual([]);
    expect(steps({ ...pair, results: [...before, result(44, 290)] })).toEqual([[40, 'raised']]);
    expect(steps({ ...pair, results: [...before, result(44, 290), result(60, 290)] })).toEqual([[40, 'raised']]);
  });

  test('expected results are taken before the first sign', () => {
    const results = [result(0, 300), result(8, 300), result(41, 290), result(50, 290)];
    expect(steps({ ...pair, results: [...results, result(25, 300)] })).toContainEqual([50, 'escalated']);
    const early = { 'morning-answers': `${gap(20)}${r(60)}`, 'effort-mismatch': `${gap(20)}${r(60)}` };
    expect(steps({ ...early, results: [...results, result(25, 300)] })).toEqual([[20, 'raised']]);
  });

  test('a bout confirms, unless two families would not be left without it', () => {
    const log = { results: [...before, result(50, 290)], bouts: [...easy, bout(52, 5)] };
    expect(steps({ ...pair, ...log })).toContainEqual([52, 'escalated']);
    const withBout = (families: Given) => {
      const given = input({ ...families, ...log });
      const used = { ...given.families, 'standard-bout': states(`${gap(40)}${r(40)}`, 'bout-52') };
      return overreachingScreen({ ...given, families: used });
    };
    const [two] = withBout({ 'morning-answers': pair['morning-answers'] });
    expect(two!.steps.map(({ change }) => change)).toEqual(['raised']);
    const [three] = withBout(pair);
    expect(three!.highest).toBe('overreaching-suspected');
    const on = withBout(pair).map(({ steps: all }) => all[1]!.day - FIRST);
    expect(on).toEqual([52]);
    // What confirms the test is not listed among the signs as well.
    const given = input({
      'morning-answers': pair['morning-answers'].slice(0, 60),
      'effort-mismatch': pair['effort-mismatch'].slice(0, 60),
      ...log,
    });
    const used = { ...given.families, 'standard-bout': states(`${gap(40)}${r(20)}`, 'bout-52') };
    const [now] = overreachingScreen({ ...given, families: used });
    expect(now!.evidence.families.map(({ family }) => family)).toEqual(['morning-answers', 'effort-mismatch']);
  });

  test('nothing escalates on a day that is explained', () => {
    const explained = `${gap(45)}${'x'.repeat(15)}`;
    const given = { ...pair, explained, results: [...before, result(44, 290), result(50, 290)] };
    expect(steps(given).slice(0, 2)).toEqual([[40, 'raised'], [60, 'escalated']]); // prettier-ignore
  });

  test('eases when the performance is back, three days later and after seven days at the earliest; then it may escalate again', () => {
    const fallen = [...before, result(44, 290), result(50, 290)];
    expect(steps({ ...pair, results: [...fallen, result(60, 298)] })).toEqual([[40, 'raised'], [50, 'escalated'], [62, 'eased']]); // prettier-ignore
    expect(steps({ ...pair, results: [...fallen, result(51, 298)] })).toEqual([[40, 'raised'], [50, 'escalated'], [57, 'eased']]); // prettier-ignore
    const [episode] = screen({ ...pair, results: [...fallen, result(60, 298)] });
    expect(episode).toMatchObject({
      level: 'strained',
      highest: 'overreaching-suspected',
      evidence: { criterion: null },
    });
    const again = [...fallen, result(60, 298), result(70, 288), result(74, 288)];
    expect(steps({ ...pair, results: again }).at(-1)).toEqual([74, 'escalated']);
  });

  test('a fall not tested again counts for 28 days', () => {
    const long = { 'morning-answers': `${gap(40)}${r(60)}`, 'effort-mismatch': `${gap(40)}${r(60)}` };
    expect(steps({ ...long, results: [...before, result(44, 290), result(50, 290)] })).toEqual([[40, 'raised'], [50, 'escalated'], [81, 'eased']]); // prettier-ignore
  });

  test('clears with the signs, whatever the tests say', () => {
    const short = {
      'morning-answers': `${gap(40)}${r(20)}${gap(10)}`,
      'effort-mismatch': `${gap(40)}${r(20)}${gap(10)}`,
    };
    const [episode] = screen({ ...short, results: [...before, result(44, 290), result(50, 290)] });
    expect(episode!.steps.map(({ day, change, level }) => [day - FIRST, change, level])).toEqual([
      [40, 'raised', 'strained'],
      [50, 'escalated', 'overreaching-suspected'],
      [62, 'cleared', null],
    ]);
    expect(episode).toMatchObject({
      until: FIRST + 62,
      level: 'overreaching-suspected',
      evidence: { day: FIRST + 59 },
    });
  });
});

test('refuses days with gaps, families of other days and settings that mean nothing', () => {
  const given = input({ 'morning-answers': r(3) });
  const [first, second] = given.days;
  expect(() => overreachingScreen({ ...given, days: [first!, first!, second!] })).toThrow(NumericInputError);
  expect(() => overreachingScreen({ ...given, days: given.days.slice(1) })).toThrow(/families\.morning-answers = 3/);
  const later = given.days.map(({ day }) => ({ day: day + 1, explained: false }));
  expect(() => overreachingScreen({ ...given, days: later })).toThrow(/families\.morning-answers\[0\]\.day/);
  expect(() => overreachingScreen(given, { clearDays: 0 })).toThrow(/clearDays/);
  expect(() => overreachingScreen(given, { minStayDays: -1 })).toThrow(/minStayDays/);
});

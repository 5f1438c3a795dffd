import { expect, test } from '@jest/globals';
import type { DayRecord } from '../../../src/features/days/days.types.ts';
import { periodsOf } from '../../../src/features/flags/periods-of.ts';
import { dayOf } from '../../reports/invented-squad.ts';

const days = (squadId: string, ...numbers: number[]): DayRecord[] =>
  numbers.map((number) => ({ ...dayOf(`2026-11-${String(number).padStart(2, '0')}`, 60), squadId }));
const records = [...days('old', 1, 2, 3, 4), ...days('new', 5, 6, 7, 8)];
const period = (squadId: string, from: string, to: string, athleteId: string | null = null) => ({
  ...{ squadId, athleteId, purpose: 'overload' as const },
  ...{ from: `2026-11-${from}`, to: `2026-11-${to}` },
});
const spans = (...periods: ReturnType<typeof period>[]) =>
  periodsOf('a', records, periods).map(({ from, to }) => [from.slice(8), to.slice(8)]);

test('a squad’s period holds only while the athlete is in that squad, and goes on after the log', () => {
  expect(spans(period('new', '02', '06'))).toEqual([['05', '06']]);
  expect(spans(period('new', '02', '20'))).toEqual([['05', '20']]);
  expect(spans(period('old', '02', '20'))).toEqual([['02', '04']]);
  expect(spans(period('new', '01', '04'), period('other', '01', '30'))).toEqual([]);
});

test('own periods hold as they were planned, others’ do not', () => {
  expect(spans(period('new', '02', '20', 'a'), period('new', '02', '20', 'b'))).toEqual([['02', '20']]);
});

import { expect, test } from '@jest/globals';
import type { Morning } from '../../../src/features/responses/mornings.types.ts';
import { presentMorning, readingsOf } from '../../../src/features/responses/present-morning.ts';

const now = new Date('2026-03-02T12:00:00Z');
const morning: Morning = {
  ...{ id: 'm', athleteId: 'a', day: '2026-03-02', version: 1 },
  ...{ sleepHours: 8, sleep: 2, fatigue: 3, stress: 1, soreness: 4, mood: 7, restingHeartRateBpm: 48, rmssdMs: Math.E },
  ...{ rrIntervalsMs: [], rrRemoved: null, quality: 'ok', qualityNotes: [] },
  ...{ enteredBy: null, enteredAt: now, updatedAt: now, withdrawnAt: null, withdrawReason: null },
};

test('hold the sum of the four ratings without mood, resting heart rate and ln RMSSD', () => {
  expect(readingsOf(morning)).toEqual({
    ...{ athleteId: 'a', day: '2026-03-02', sum: 10, restingHeartRateBpm: 48 },
    lnRmssd: 1,
  });
  expect(readingsOf({ ...morning, stress: null, restingHeartRateBpm: null, rmssdMs: null })).toMatchObject({
    ...{ sum: NaN, restingHeartRateBpm: NaN, lnRmssd: NaN },
  });
});

test('count the same when they were entered late; a suspect recording costs its RMSSD and nothing else', () => {
  expect(readingsOf({ ...morning, quality: 'question' })).toEqual(readingsOf(morning));
  expect(readingsOf({ ...morning, quality: 'suspect' })).toEqual({ ...readingsOf(morning), lnRmssd: NaN });
});

test('the intervals themselves are not shown', () => {
  expect(Object.keys(presentMorning({ ...morning, rrIntervalsMs: [900, 940] }))).not.toContain('rrIntervalsMs');
  expect(presentMorning({ ...morning, fatigue: null })).toMatchObject({ sum: null, rrIntervals: 0 });
});

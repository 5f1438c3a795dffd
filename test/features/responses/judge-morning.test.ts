import { expect, test } from '@jest/globals';
import { judgeMorning } from '../../../src/features/responses/judge-morning.ts';

const facts = { day: '2026-03-02', today: '2026-03-02', intervals: 0, removed: null };

test('a morning is late from the third day on', () => {
  expect(judgeMorning({ ...facts, today: '2026-03-04' })).toEqual({ quality: 'ok', notes: [] });
  expect(judgeMorning({ ...facts, today: '2026-03-05' })).toEqual({
    quality: 'question',
    notes: ['entered 3 days later'],
  });
});

test('more than one interval in twenty removed makes it suspect, also when it is late', () => {
  expect(judgeMorning({ ...facts, intervals: 100, removed: 5 }).quality).toBe('ok');
  expect(judgeMorning({ ...facts, today: '2026-03-09', intervals: 100, removed: 6 })).toEqual({
    quality: 'suspect',
    notes: ['entered 7 days later', '6 of 100 RR intervals were artefacts'],
  });
});

import { expect, test } from '@jest/globals';
import { FixedClock, SystemClock } from '../../src/platform/clock.ts';

test('the system clock is ahead by its offset and goes on', async () => {
  const clock = new SystemClock(3_600_000);
  const before = Date.now();
  const first = clock.now().getTime();
  expect(first - before - 3_600_000).toBeGreaterThanOrEqual(0);
  expect(first - before - 3_600_000).toBeLessThan(1000);
  await new Promise((resolve) => setTimeout(resolve, 15));
  expect(clock.now().getTime()).toBeGreaterThan(first);
});

test('a fixed clock stands until it is moved, also back, and hands out dates nobody can change', () => {
  const clock = new FixedClock('2026-03-29T00:59:00Z');
  clock.now().setFullYear(1999);
  expect(clock.now().toISOString()).toBe('2026-03-29T00:59:00.000Z');
  clock.advance(-60_000);
  expect(clock.now().toISOString()).toBe('2026-03-29T00:58:00.000Z');
  clock.set(new Date('2026-10-25T00:00:00Z'));
  expect(clock.now().toISOString()).toBe('2026-10-25T00:00:00.000Z');
  expect(() => new FixedClock('yesterday')).toThrow(RangeError);
});

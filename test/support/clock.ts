import { FixedClock } from '../../src/platform/clock.ts';

/** A clock that stands at a Monday noon until the test moves it. */
export function fixedClock(instant: Date | string = '2026-03-02T12:00:00Z'): FixedClock {
  return new FixedClock(instant);
}

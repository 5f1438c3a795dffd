import { describe, expect, it } from '@jest/globals';
import fc from 'fast-check';
import { schedule } from '../../jobs/schedule.ts';
import { due } from '../../jobs/runner/due.ts';
import type { DueRun } from '../../jobs/runner/due.ts';
import { keyOf } from '../../src/features/jobs/jobs.types.ts';
import type { ScheduledSquad } from '../../src/features/jobs/jobs.types.ts';
import { localDay } from '../../src/platform/zoned-time.ts';

const HOUR = 3_600_000;
const zones = [
  'UTC',
  'Europe/Berlin',
  'America/New_York',
  'Australia/Lord_Howe',
  'America/Santiago',
  'Asia/Kathmandu',
  'Pacific/Apia',
  'Africa/Cairo',
];
const instant = fc.integer({ min: Date.UTC(2010, 0), max: Date.UTC(2031, 0) }).map((time) => new Date(time));
const squads = fc
  .array(fc.tuple(fc.constantFrom(...zones), instant), { minLength: 1, maxLength: 4 })
  .map((list) =>
    list.map(([zone, createdAt], i): ScheduledSquad => ({ clubId: 'c', squadId: `s${i}`, name: '', zone, createdAt })),
  );

/** A scheduler that ticks at these instants, in this order, and claims what is due. */
function run(list: ScheduledSquad[], ticks: Date[]): DueRun[] {
  const claimed: DueRun[] = [];
  for (const now of ticks) claimed.push(...due(schedule, claimed, list, now));
  return claimed;
}

describe('what is due, whatever the clock does', () => {
  it('claims no period twice, even with a clock that jumps', () => {
    fc.assert(
      fc.property(squads, fc.array(instant, { maxLength: 12 }), (list, ticks) => {
        const keys = run(list, ticks).map(keyOf);
        expect(new Set(keys).size).toBe(keys.length);
      }),
    );
  });

  it('is due in its window and never before the squad, with at most one run of a job and squad at a time', () => {
    fc.assert(
      fc.property(squads, instant, (list, now) => {
        const runs = due(schedule, [], list, now);
        expect(new Set(runs.map(({ job, squadId }) => `${job} ${squadId}`)).size).toBe(runs.length);
        for (const { job, squadId, dueAt } of runs) {
          const { catchUpHours } = schedule.find(({ id }) => id === job)!;
          expect(dueAt.getTime()).toBeLessThanOrEqual(now.getTime());
          expect(now.getTime() - dueAt.getTime()).toBeLessThan(catchUpHours * HOUR);
          expect(dueAt >= list.find((one) => one.squadId === squadId)!.createdAt).toBe(true);
        }
      }),
    );
  });

  it('runs every night once and every week once when it ticks on time, through the clock changes of a year', () => {
    fc.assert(
      fc.property(fc.constantFrom(...zones), fc.integer({ min: 2019, max: 2029 }), (zone, year) => {
        // From the middle of February to the end of November: every clock change of these zones.
        const squad = { clubId: 'c', squadId: 's', name: '', zone, createdAt: new Date(Date.UTC(year - 1, 0)) };
        const start = Date.UTC(year, 1, 15);
        const ticks = Array.from({ length: 2 * 287 }, (_, i) => new Date(start + i * 12 * HOUR));
        const claimed = run([squad], ticks);
        const nights = claimed.filter(({ job }) => job === 'nightly-flags').map(({ period }) => period);
        const days = new Set(ticks.map((tick) => localDay(tick, zone)));
        expect(nights).toEqual([...nights].sort());
        expect(Math.abs(nights.length - days.size)).toBeLessThanOrEqual(1);
        const weeks = claimed.filter(({ job }) => job === 'weekly-report');
        expect(new Set(weeks.map(({ period }) => period)).size).toBeGreaterThanOrEqual(41);
        weeks.slice(1).forEach(({ dueAt }, i) => {
          expect(Math.abs(dueAt.getTime() - weeks[i]!.dueAt.getTime() - 7 * 24 * HOUR)).toBeLessThanOrEqual(HOUR);
        });
      }),
      { numRuns: 3 },
    );
  });
});

import { describe, expect, it } from '@jest/globals';
import { schedule } from '../../jobs/schedule.ts';
import { due } from '../../jobs/runner/due.ts';
import type { JobKey, ScheduledSquad } from '../../src/features/jobs/jobs.types.ts';

// Dates of clock changes: IANA time zone database. Times of the schedule: own convention.
const squad = (zone: string, createdAt = '2020-01-01T00:00:00Z'): ScheduledSquad => ({
  clubId: 'c',
  squadId: 's',
  name: 'Eight',
  zone,
  createdAt: new Date(createdAt),
});
const only = (id: string) => schedule.filter((job) => job.id === id);
const at = (job: string, zone: string, now: string, claimed: JobKey[] = [], createdAt?: string) =>
  due(only(job), claimed, [squad(zone, createdAt)], new Date(now)).map(({ period, dueAt }) => [
    period,
    dueAt.toISOString(),
  ]);
const key = (job: JobKey['job'], period: string): JobKey => ({ job, squadId: 's', period });

describe('what is due', () => {
  it('starts at the wall time of the squad, not a second before', () => {
    expect(at('weekly-report', 'Europe/Berlin', '2026-11-30T04:59:59Z')).toEqual([]);
    expect(at('weekly-report', 'Europe/Berlin', '2026-11-30T05:00:00Z')).toEqual([
      ['2026-W48', '2026-11-30T05:00:00.000Z'],
    ]);
    expect(at('weekly-report', 'Pacific/Auckland', '2026-11-29T17:00:00Z')).toEqual([
      ['2026-W48', '2026-11-29T17:00:00.000Z'],
    ]);
  });

  it('covers the week that ended with the report, the week under way with the reminder, yesterday at night', () => {
    expect(at('log-reminder', 'Europe/Berlin', '2026-11-29T17:00:00Z')).toEqual([
      ['2026-W48', '2026-11-29T17:00:00.000Z'],
    ]);
    expect(at('nightly-flags', 'Europe/Berlin', '2026-11-30T01:30:00Z')).toEqual([
      ['2026-11-29', '2026-11-30T01:30:00.000Z'],
    ]);
  });

  it('knows week 53 and the turn of the year', () => {
    // ISO 8601: 2026 has 53 weeks (it begins on a Thursday).
    expect(at('weekly-report', 'Europe/Berlin', '2027-01-04T05:00:00Z')[0]).toEqual([
      '2026-W53',
      '2027-01-04T05:00:00.000Z',
    ]);
    expect(at('weekly-report', 'Europe/Berlin', '2027-01-11T05:00:00Z')[0]![0]).toBe('2027-W01');
  });

  it('moves a time the clocks skip on by the gap: 02:30 on 29 March 2026 in Berlin is 03:30 summer time', () => {
    expect(at('nightly-flags', 'Europe/Berlin', '2026-03-29T01:29:59Z', [key('nightly-flags', '2026-03-27')])).toEqual(
      [],
    );
    expect(at('nightly-flags', 'Europe/Berlin', '2026-03-29T01:30:00Z')).toEqual([
      ['2026-03-28', '2026-03-29T01:30:00.000Z'],
    ]);
  });

  it('takes the earlier of a doubled time and does not run again at the later: 25 October 2026 in Berlin', () => {
    expect(at('nightly-flags', 'Europe/Berlin', '2026-10-25T00:30:00Z')).toEqual([
      ['2026-10-24', '2026-10-25T00:30:00.000Z'],
    ]);
    expect(at('nightly-flags', 'Europe/Berlin', '2026-10-25T01:30:00Z', [key('nightly-flags', '2026-10-24')])).toEqual(
      [],
    );
  });

  it('keeps Monday 06:00 local on both sides of a clock change', () => {
    expect(at('weekly-report', 'America/New_York', '2026-03-02T12:00:00Z')[0]![1]).toBe('2026-03-02T11:00:00.000Z');
    expect(at('weekly-report', 'America/New_York', '2026-03-09T12:00:00Z')[0]![1]).toBe('2026-03-09T10:00:00.000Z');
  });

  it('gets over a day that a zone left out: Samoa went from 29 to 31 December 2011', () => {
    const now = '2011-12-30T12:30:00Z';
    const early = '2010-01-01T00:00:00Z';
    expect(at('nightly-flags', 'Pacific/Apia', now, [], early)).toEqual([['2011-12-30', '2011-12-30T12:30:00.000Z']]);
  });

  it('catches up within its window and lets the rest go', () => {
    expect(at('weekly-report', 'UTC', '2026-12-03T05:59:59Z')).toHaveLength(1);
    expect(at('weekly-report', 'UTC', '2026-12-03T06:00:00Z')).toEqual([]);
    expect(at('log-reminder', 'UTC', '2026-11-30T00:00:00Z')).toEqual([]);
  });

  it('keeps a claimed period claimed when the clock goes back', () => {
    const claimed = [key('weekly-report', '2026-W47'), key('weekly-report', '2026-W48')];
    expect(at('weekly-report', 'UTC', '2026-11-30T06:00:05Z', claimed)).toEqual([]);
    expect(at('weekly-report', 'UTC', '2026-11-23T06:00:05Z', claimed)).toEqual([]);
  });

  it('owes a new squad nothing from before it was there', () => {
    const monday = '2026-11-30T06:00:00Z';
    expect(at('weekly-report', 'UTC', '2026-11-30T09:00:00Z', [], '2026-11-30T08:00:00Z')).toEqual([]);
    expect(at('weekly-report', 'UTC', monday, [], '2026-11-30T01:00:00Z')).toEqual([]);
    expect(at('weekly-report', 'UTC', monday, [], '2026-11-29T20:00:00Z')).toHaveLength(1);
  });

  it('starts at most one run of each job when the service is deployed over old squads', () => {
    const squads = ['a', 'b', 'c'].map((squadId) => ({ ...squad('UTC'), squadId }));
    const runs = due(schedule, [], squads, new Date('2026-11-30T06:30:00Z'));
    expect(runs.map(({ job, squadId }) => `${job} ${squadId}`).sort()).toEqual([
      'nightly-flags a',
      'nightly-flags b',
      'nightly-flags c',
      'weekly-report a',
      'weekly-report b',
      'weekly-report c',
    ]);
  });
});

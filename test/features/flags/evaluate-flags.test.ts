import { describe, expect, test } from '@jest/globals';
import { dayNumber, isoDay } from '../../../src/core/series/day.ts';
import type { DayRecord } from '../../../src/features/days/days.types.ts';
import { evaluateFlags } from '../../../src/features/flags/evaluate-flags.ts';
import type { FlagInput } from '../../../src/features/flags/evaluate-flags.ts';
import type { FlagEpisode, FlagKind } from '../../../src/features/flags/flags.types.ts';
import { defaultSettings } from '../../../src/features/policies/default-settings.ts';
import { buildSeries } from '../../../src/features/series/build-series.ts';
import { dayOf } from '../../reports/invented-squad.ts';

// 2026-08-31 is a Monday; day 69 of the log is Sunday 2026-11-08.
const FIRST = dayNumber('2026-08-31');
const iso = (index: number): string => isoDay(FIRST + index);

/** 70 days: five a week at 60 min with an easier and a free day, changed where told. */
function log(days: number, change: (index: number) => DayRecord | null = () => null): DayRecord[] {
  const plan = [60, 80, 40, 90, 60, 100, 0];
  return Array.from({ length: days }, (_, index) => change(index) ?? dayOf(iso(index), plan[index % 7]!));
}

function flags(records: DayRecord[], given: Partial<FlagInput> = {}): FlagEpisode[] {
  const series = buildSeries('a', records, defaultSettings);
  return evaluateFlags({
    records,
    series,
    settings: defaultSettings,
    periods: [],
    runs: [],
    thresholdUse: [],
    ...given,
  });
}

const of = (kind: FlagKind, episodes: FlagEpisode[]) => episodes.filter((episode) => episode.kind === kind);
const jump = (from: number) => (index: number) => (index >= from ? dayOf(iso(index), 220) : null);

describe('load concern', () => {
  test('an ordinary log raises nothing', () => {
    expect(flags(log(70))).toEqual([]);
  });

  test('a week at three times the usual raises one flag with ratio as its evidence, at note', () => {
    const [flag, ...others] = flags(log(70, jump(63)));
    expect(others).toEqual([]);
    expect(flag).toMatchObject({ kind: 'load-concern', level: 'note', until: null });
    expect(flag!.evidence).toMatchObject({ strongest: 'ratio', loadMeasure: 'domain-load', form: 'rolling-coupled' });
    // Minutes: 21 days hold 1290, the last week 1540; ratio (1540 ÷ 7) ÷ (2830 ÷ 28).
    const part = flag!.evidence.kind === 'load-concern' ? flag!.evidence.parts[0]! : null;
    expect(part).toMatchObject({ measure: 'ratio', day: iso(69) });
    expect(part!.value).toBeCloseTo(1540 / 7 / (2830 / 28), 9);
  });

  test('what was flagged does not depend on when it is looked at', () => {
    const records = log(70, jump(60));
    const then = of('load-concern', flags(records.slice(0, 66)))[0]!;
    const now = of('load-concern', flags(records))[0]!;
    expect(now.since).toBe(then.since);
  });

  test('within a planned overload the load is silent; the phase is told, and recovering after it', () => {
    const periods = [{ squadId: 's', athleteId: null, purpose: 'overload' as const, from: iso(60), to: iso(66) }];
    const found = flags(log(70, jump(60)), { periods });
    const until = (kind: FlagKind) => of(kind, found).map(({ since, until: end }) => [since, end]);
    expect(until('planned-overload')).toEqual([[iso(60), iso(66)]]);
    expect(until('recovering')).toEqual([[iso(67), null]]);
    expect(of('recovering', found)[0]!.evidence).toMatchObject({ dayN: 3, of: 14 });
    expect(of('load-concern', found).every(({ since }) => since > iso(66))).toBe(true);
  });

  test('a run 40 % longer than the longest of 30 days stays for seven days; the first run is none', () => {
    const run = (index: number, distanceM: number) => ({
      athleteId: 'a',
      day: iso(index),
      sessionId: `s${index}`,
      distanceM,
    });
    const spike = flags(log(70), { runs: [run(10, 10_000), run(40, 10_000), run(62, 14_000)] });
    expect(of('load-concern', spike)).toEqual([
      expect.objectContaining({ since: iso(62), until: iso(68), level: 'note' }),
    ]);
    const [flag] = of('load-concern', spike);
    expect(flag!.evidence).toMatchObject({
      strongest: 'spike',
      parts: [{ value: expect.closeTo(40, 9), sessionId: 's62', spikeClass: 'moderate' }],
    });
    expect(flags(log(70), { runs: [run(20, 30_000)] })).toEqual([]);
    expect(flags(log(70), { runs: [run(20, 10_000), run(62, 14_000)] })).toEqual([]);
  });
});

describe('return', () => {
  test('no load concern while coming back, instead the day of return and the share of before', () => {
    const records = log(70, (index) => {
      if (index >= 50 && index < 62) return dayOf(iso(index), 0, { availability: 'none' });
      return index >= 62 ? dayOf(iso(index), 100) : null;
    });
    const found = flags(records);
    expect(found.map(({ kind }) => kind)).toEqual(['return']);
    expect(found[0]).toMatchObject({ since: iso(62), until: null, evidence: { dayN: 8 } });
  });
});

describe('the log itself', () => {
  test('two unknown days of seven make a gap, cleared on the third day with six of seven', () => {
    const records = log(70, (index) => (index === 50 || index === 51 ? dayOf(iso(index), null) : null));
    // Days 51 to 56 have fewer than six known of seven; 57, 58, 59 are the three that clear.
    expect(of('log-gap', flags(records))).toEqual([
      expect.objectContaining({ since: iso(51), until: iso(58), evidence: expect.objectContaining({ of: 7 }) }),
    ]);
  });

  test('a doubtful reading stands for fourteen days and counts its sessions', () => {
    const records = log(70, (index) => (index === 60 || index === 64 ? dayOf(iso(index), 60, { suspect: 1 }) : null));
    expect(of('data-suspect', flags(records))).toEqual([
      expect.objectContaining({ since: iso(60), until: null, evidence: expect.objectContaining({ sessions: 2 }) }),
    ]);
    const old = log(70, (index) => (index === 40 ? dayOf(iso(index), 60, { suspect: 1 }) : null));
    expect(of('data-suspect', flags(old))[0]).toMatchObject({ since: iso(40), until: iso(53) });
  });

  test('an old test speaks from the 57th day on, only for a kind of exercise still trained', () => {
    const use = (index: number, modality: string, newest: number) => ({
      athleteId: 'a',
      day: iso(index),
      modality,
      newest: iso(newest),
    });
    const rowing = [55, 60, 65].map((index) => use(index, 'rowing', 3));
    const [flag] = of('thresholds-out-of-date', flags(log(70), { thresholdUse: rowing }));
    expect(flag).toMatchObject({ since: iso(60), evidence: { modality: 'rowing', newest: iso(3), ageDays: 66 } });
    const stopped = [use(20, 'rowing', 3), use(65, 'cycling', 50)];
    expect(of('thresholds-out-of-date', flags(log(70), { thresholdUse: stopped }))).toEqual([]);
  });
});

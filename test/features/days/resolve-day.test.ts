import { describe, expect, it } from '@jest/globals';
import type { AthleteDayFacts, DailyTotal } from '../../../src/features/days/days.types.ts';
import { resolveDay, resolveDays } from '../../../src/features/days/resolve-day.ts';
import type { DayFacts } from '../../../src/features/days/resolve-day.ts';

const total = (more: Partial<DailyTotal> = {}): DailyTotal => ({
  athleteId: 'a',
  day: '2026-03-02',
  sessions: 1,
  minutes: 60,
  ratingLoad: 240,
  ratingMissing: 0,
  domainLoad: 80,
  domainMissing: 0,
  moderateMin: 40,
  heavyMin: 20,
  severeMin: 0,
  extremeMin: 0,
  applicableMin: 60,
  coveredMin: 60,
  basisMinutes: { interval: 60 },
  suspect: 0,
  ...more,
});

function day(more: Partial<DayFacts> = {}) {
  const facts: DayFacts = {
    day: '2026-03-02',
    squadId: 's',
    closed: false,
    namedUnknown: false,
    availability: 'full',
    away: false,
    total: undefined,
  };
  const { training, completeness, rating, domain } = resolveDay({ ...facts, ...more });
  return { training, completeness, rating: [rating.state, rating.value], domain: [domain.state, domain.value] };
}

const rest = { training: 'rest', completeness: 'complete', rating: ['known', 0], domain: ['known', 0] };
const unknown = { training: 'unknown', completeness: 'unknown', rating: ['unknown', NaN], domain: ['unknown', NaN] };
const whole = { training: 'trained', completeness: 'complete', rating: ['known', 240], domain: ['known', 80] };
const lower = { training: 'trained', completeness: 'partial', rating: ['partial', 240], domain: ['partial', 80] };

describe('resolveDay', () => {
  it.each<[string, Partial<DayFacts>, object]>([
    ['nothing logged, open: unknown, never 0', {}, unknown],
    ['nothing logged, closed: rest', { closed: true }, rest],
    ['nothing logged, closed, named unknown', { closed: true, namedUnknown: true }, unknown],
    ['sessions, open: a lower bound', { total: total() }, lower],
    ['sessions, closed', { closed: true, total: total() }, whole],
    ['sessions, closed, named unknown: a lower bound', { closed: true, namedUnknown: true, total: total() }, lower],
    ['unavailable, open: a known 0', { availability: 'none' }, rest],
    ['unavailable, closed', { availability: 'none', closed: true }, rest],
    ['unavailable, but named unknown', { availability: 'none', closed: true, namedUnknown: true }, unknown],
    ['unavailable, but trained, open', { availability: 'none', total: total() }, lower],
    ['away: may have trained elsewhere', { availability: 'none', away: true }, unknown],
    ['away, closed: still unknown', { availability: 'none', away: true, closed: true }, unknown],
    ['away, closed, with what was logged', { availability: 'none', away: true, closed: true, total: total() }, whole],
    ['modified, open', { availability: 'modified' }, unknown],
    ['in no squad', { squadId: null }, unknown],
  ])('%s', (_, facts, expected) => {
    expect(day(facts)).toEqual(expected);
  });

  it('a session without a rating makes the day partial for rating load alone', () => {
    expect(day({ closed: true, total: total({ ratingMissing: 1 }) })).toEqual({
      ...whole,
      rating: ['partial', 240],
    });
  });

  it('a session without domain minutes makes the day partial for domain load alone', () => {
    expect(day({ closed: true, total: total({ domainMissing: 1 }) })).toEqual({ ...whole, domain: ['partial', 80] });
  });

  it('a closed day of strength alone is a known 0 in domain load', () => {
    const strength = total({
      domainLoad: 0,
      moderateMin: 0,
      heavyMin: 0,
      applicableMin: 0,
      coveredMin: 0,
      basisMinutes: {},
    });
    expect(day({ closed: true, total: strength })).toEqual({ ...whole, domain: ['known', 0] });
  });
});

describe('resolveDays', () => {
  const facts: AthleteDayFacts = {
    athleteId: 'a',
    memberships: [
      { squadId: 'first', from: '2026-02-01', to: '2026-02-27' },
      { squadId: 'second', from: '2026-03-01', to: null },
    ],
    totals: [total({ day: '2026-03-02' })],
    unknownDays: ['2026-03-01'],
    availability: [
      { state: 'none', away: false, from: '2026-02-26', to: '2026-02-26' },
      { state: 'modified', away: false, from: '2026-03-02', to: null },
    ],
  };

  it('is gapless, and each day goes by the closing of the squad the athlete was in then', () => {
    const closed = new Set(['first 2026-02-27', 'second 2026-02-28', 'second 2026-03-01', 'second 2026-03-02']);
    const days = resolveDays(facts, (squad, iso) => closed.has(`${squad} ${iso}`), '2026-02-25', '2026-03-03');
    expect(days.map(({ day: iso, squadId, training, availability }) => [iso, squadId, training, availability])).toEqual(
      [
        ['2026-02-25', 'first', 'unknown', 'full'],
        ['2026-02-26', 'first', 'rest', 'none'],
        ['2026-02-27', 'first', 'rest', 'full'],
        ['2026-02-28', null, 'unknown', 'full'],
        ['2026-03-01', 'second', 'unknown', 'full'],
        ['2026-03-02', 'second', 'trained', 'modified'],
        ['2026-03-03', 'second', 'unknown', 'modified'],
      ],
    );
    expect(days[5]).toMatchObject({ minutes: 60, coveredMin: 60, basisMinutes: { interval: 60 }, closed: true });
  });
});

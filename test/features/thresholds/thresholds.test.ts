import { describe, expect, it } from '@jest/globals';
import fc from 'fast-check';
import { orderConflict } from '../../../src/features/thresholds/check-order.ts';
import { changedDays, dateValues, sameDayPair } from '../../../src/features/thresholds/date-values.ts';
import { resolveThresholds } from '../../../src/features/thresholds/resolve-thresholds.ts';
import type { ThresholdValue } from '../../../src/features/thresholds/thresholds.types.ts';

let made = 0;
function value(
  more: Partial<ThresholdValue> & Pick<ThresholdValue, 'quantity' | 'value' | 'validFrom'>,
): ThresholdValue {
  made += 1;
  return {
    id: `value ${made}`,
    athleteId: 'athlete',
    modality: 'rowing',
    setting: 'any',
    standardError: null,
    method: 'step test',
    validTo: null,
    enteredBy: null,
    enteredAt: new Date('2026-03-01T00:00:00Z'),
    supersedes: null,
    withdrawnAt: null,
    withdrawnBy: null,
    withdrawReason: null,
    ...more,
  };
}
const power = (validFrom: string, watts: number, more: Partial<ThresholdValue> = {}) =>
  value({ quantity: 'critical-power', value: watts, validFrom, ...more });
const gone = { withdrawnAt: new Date('2026-03-02T00:00:00Z'), withdrawReason: 'wrong athlete' };

describe('dateValues', () => {
  it('ends each value the day before the next of its series', () => {
    const dated = dateValues([
      power('2026-01-10', 280),
      power('2026-03-01', 290),
      power('2026-01-10', 300, { setting: 'water' }),
    ]);
    expect(dated.map(({ validTo }) => validTo)).toEqual(['2026-02-28', null, null]);
  });

  it('a late value takes days from the earlier one, a withdrawn one gives them back', () => {
    const [first, last] = [power('2026-01-10', 280), power('2026-03-01', 290)];
    const late = power('2026-02-01', 285);
    expect(dateValues([first, last, late]).map(({ validTo }) => validTo)).toEqual(['2026-01-31', null, '2026-02-28']);
    const withdrawn = dateValues([first, last, { ...late, ...gone, validTo: '2026-02-28' }]);
    expect(withdrawn.map(({ validTo }) => validTo)).toEqual(['2026-02-28', null, '2026-02-28']);
  });

  it('finds two of one series on one day, but not across series or withdrawn ones', () => {
    const first = power('2026-01-10', 280);
    expect(sameDayPair([first, power('2026-01-10', 290, { setting: 'water' })])).toBeUndefined();
    expect(sameDayPair([first, power('2026-01-10', 290, gone)])).toBeUndefined();
    expect(sameDayPair([first, power('2026-01-10', 290)])).toHaveLength(2);
  });
});

describe('changedDays', () => {
  it('a late value changes just its own days', () => {
    const before = dateValues([power('2026-01-10', 280), power('2026-03-01', 290)]);
    const after = dateValues([...before, power('2026-02-01', 285)]);
    const series = { quantity: 'critical-power', modality: 'rowing', setting: 'any' };
    expect(changedDays(before, after)).toEqual([{ ...series, from: '2026-02-01', to: '2026-02-28' }]);
    expect(changedDays(before, before)).toEqual([]);
  });

  it('the newest value changes all days from its own on', () => {
    const before = dateValues([power('2026-01-10', 280)]);
    expect(changedDays(before, dateValues([...before, power('2026-02-01', 285)]))).toMatchObject([
      { from: '2026-02-01', to: null },
    ]);
    expect(changedDays([], before)).toMatchObject([{ from: '2026-01-10', to: null }]);
  });

  it('says of every day whether another value is in force, whatever was entered in whatever order', () => {
    const days = fc.integer({ min: 1, max: 28 }).map((day) => `2026-02-${String(day).padStart(2, '0')}`);
    fc.assert(
      fc.property(fc.uniqueArray(days, { maxLength: 6 }), fc.nat(5), (starts, last) => {
        const before = dateValues(starts.slice(1).map((day) => power(day, 280)));
        const added = starts.slice(0, 1).map((day) => power(day, 290));
        const withdrawn = before.map((each, at) => (at === last ? { ...each, ...gone } : each));
        const after = dateValues([...withdrawn, ...added]);
        const changes = changedDays(before, after);
        for (let day = 1; day <= 31; day += 1) {
          const iso = day <= 28 ? `2026-02-${String(day).padStart(2, '0')}` : `2026-03-0${day - 28}`;
          const inForce = (values: ThresholdValue[]) =>
            resolveThresholds(values, iso, 'rowing', 'any').get('critical-power')?.id;
          const named = changes.some(({ from, to }) => from <= iso && (to === null || iso <= to));
          expect(named).toBe(inForce(before) !== inForce(after));
        }
      }),
      { seed: 20_260_301, numRuns: 300 },
    );
  });
});

describe('resolveThresholds', () => {
  const values = dateValues([
    power('2026-01-10', 280),
    power('2026-02-01', 300, { setting: 'water' }),
    value({ quantity: 'lt1-power', value: 200, validFrom: '2026-01-20' }),
    value({ quantity: 'resting-heart-rate', value: 48, validFrom: '2026-01-01', modality: 'other' }),
    power('2026-01-10', 350, { modality: 'cycling' }),
  ]);
  const at = (day: string, setting: 'any' | 'water' | 'ergometer', modality: 'rowing' | 'running' = 'rowing') =>
    Object.fromEntries(
      [...resolveThresholds(values, day, modality, setting)].map(([name, each]) => [name, each.value]),
    );

  it('goes quantity by quantity: the setting’s own value, else the one for any', () => {
    expect(at('2026-02-10', 'water')).toEqual({ 'critical-power': 300, 'lt1-power': 200, 'resting-heart-rate': 48 });
    expect(at('2026-02-10', 'ergometer')).toMatchObject({ 'critical-power': 280 });
    expect(at('2026-02-10', 'any')).toMatchObject({ 'critical-power': 280 });
  });

  it('holds from the test day’s start and is carried back to no day before', () => {
    expect(at('2026-01-19', 'any')).toEqual({ 'critical-power': 280, 'resting-heart-rate': 48 });
    expect(at('2026-01-20', 'any')).toHaveProperty('lt1-power', 200);
    expect(at('2026-01-31', 'water')).toHaveProperty('critical-power', 280);
    expect(at('2025-12-31', 'any')).toEqual({});
  });

  it('values of the athlete hold for every modality, all others for their own', () => {
    expect(at('2026-02-10', 'any', 'running')).toEqual({ 'resting-heart-rate': 48 });
  });
});

describe('orderConflict', () => {
  const lt1 = (watts: number, validFrom: string, more: Partial<ThresholdValue> = {}) =>
    value({ quantity: 'lt1-power', value: watts, validFrom, ...more });
  const conflict = (...values: ThresholdValue[]) => orderConflict(dateValues(values));

  it('finds none where each lower one is lower', () => {
    expect(conflict(lt1(200, '2026-01-10'), power('2026-01-10', 280))).toBeUndefined();
    expect(conflict(lt1(200, '2026-01-10'), power('2026-01-10', 200, { modality: 'cycling' }))).toBeUndefined();
  });

  it('names both values and the first day they meet', () => {
    const found = conflict(lt1(200, '2026-01-10'), power('2026-02-01', 190), power('2026-03-01', 180));
    expect(found).toMatchObject({
      day: '2026-02-01',
      lower: { value: 200 },
      higher: { value: 190 },
      relation: 'below',
    });
  });

  it('looks at the resolved set: a value for one setting meets the other quantity’s value for any', () => {
    const found = conflict(
      lt1(200, '2026-01-10'),
      power('2026-01-10', 280),
      power('2026-02-01', 195, { setting: 'water' }),
    );
    expect(found).toMatchObject({ day: '2026-02-01', setting: 'water' });
  });

  it('does not compare values that are never in force together', () => {
    expect(
      conflict(lt1(150, '2026-01-10'), power('2026-01-10', 180), lt1(200, '2026-02-01'), power('2026-02-01', 280)),
    ).toBeUndefined();
    expect(conflict(lt1(200, '2026-01-10', gone), power('2026-02-01', 190))).toBeUndefined();
  });

  it.each([
    ['lt1-power', 250, 'lt2-power', 250, true],
    ['lt1-speed', 4, 'critical-speed', 3.9, true],
    ['lt1-heart-rate', 150, 'lt2-heart-rate', 150, true],
    ['lt2-heart-rate', 190, 'max-heart-rate', 190, false],
    ['lt2-heart-rate', 191, 'max-heart-rate', 190, true],
    ['resting-heart-rate', 110, 'max-heart-rate', 110, true],
    ['resting-heart-rate', 50, 'max-heart-rate', 190, false],
  ] as const)('%s %s against %s %s', (lower, low, higher, high, broken) => {
    const modality = lower === 'resting-heart-rate' ? 'other' : 'rowing';
    const found = conflict(
      value({ quantity: lower, value: low, validFrom: '2026-01-10', modality }),
      value({ quantity: higher, value: high, validFrom: '2026-01-10' }),
    );
    expect(found !== undefined).toBe(broken);
  });
});

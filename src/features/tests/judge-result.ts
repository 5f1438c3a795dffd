import { mean } from '../../core/series/mean.ts';
import type { FieldError } from '../../platform/errors.ts';
import type { ResultReadings } from './tests.schema.ts';
import type { ResultQuality, TestDefinition, TestResult } from './tests.types.ts';

/** Further than this from the mean of the own last three results, a result has to be confirmed: own convention. */
const LARGEST_STEP = 0.2;
const LOOKED_AT = 3;

const ofBout = ['workW', 'workMps', 'heartRateBpm', 'heartRateRecoveryBpm', 'rating', 'lactateMmolL'] as const;

/** What does not fit the kind of the test. */
export function misfits(definition: TestDefinition, given: ResultReadings): FieldError[] {
  if (definition.kind === 'criterion') {
    const value: FieldError = { field: 'value', allowed: `the result in ${definition.scale!.unit}` };
    const foreign = ofBout
      .filter((field) => field !== 'rating' && field !== 'heartRateBpm' && given[field] !== undefined)
      .map((field) => ({ field, value: given[field], allowed: 'nothing: it belongs to a standard bout' }));
    return given.value === undefined ? [value, ...foreign] : foreign;
  }
  const faults: FieldError[] = [];
  if (given.value !== undefined) {
    faults.push({ field: 'value', value: given.value, allowed: 'nothing: a standard bout has no result of its own' });
  }
  if (given.heartRateBpm === undefined && given.rating === undefined) {
    faults.push({ field: 'rating', allowed: 'a rating, or heartRateBpm' });
  }
  return faults;
}

/** A result far from the own last three is kept as suspect, unless who enters it confirms it. */
export function judgeResult(
  { value, confirmed }: Pick<ResultReadings, 'value' | 'confirmed'>,
  earlier: readonly TestResult[],
): { quality: ResultQuality; notes: string[] } {
  const trusted = earlier.filter(({ quality, value: one }) => quality === 'ok' && one !== null).slice(-LOOKED_AT);
  if (value === undefined || trusted.length < LOOKED_AT) return { quality: 'ok', notes: [] };
  const usual = mean(trusted.map((one) => one.value!));
  const step = Math.abs(value - usual) / usual;
  if (step <= LARGEST_STEP) return { quality: 'ok', notes: [] };
  const note = `${Math.round(100 * step)} % from the mean of the own last three`;
  if (confirmed === true) return { quality: 'ok', notes: [`${note}, confirmed`] };
  return { quality: 'suspect', notes: [`${note}; if it is right, correct it with confirmed: true`] };
}

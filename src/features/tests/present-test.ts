import { deviationInTypicalErrors, expectedResult } from '../../core/monitoring/expected-result.ts';
import { dayNumber } from '../../core/series/day.ts';
import type { DefinitionView, ResultView } from './tests.schema.ts';
import type { TestDefinition, TestResult } from './tests.types.ts';

export function presentDefinition({ scale, createdAt, withdrawnAt, ...definition }: TestDefinition): DefinitionView {
  return {
    ...definition,
    unit: scale?.unit ?? null,
    direction: scale?.direction ?? null,
    typicalError: scale?.typicalError ?? null,
    createdAt: createdAt.toISOString(),
    withdrawnAt: withdrawnAt?.toISOString() ?? null,
  };
}

/** A result beside what the own earlier ones of the same test let expect. */
export function presentResult(
  { enteredAt, withdrawnAt, withdrawnBy: _, ...result }: TestResult,
  { scale }: TestDefinition,
  others: readonly TestResult[],
): ResultView {
  const earlier = others
    .filter(({ definitionId, quality }) => definitionId === result.definitionId && quality === 'ok')
    .map(({ day, value }) => ({ day: dayNumber(day), value: value ?? NaN }));
  const expected = scale === null ? NaN : expectedResult(earlier, dayNumber(result.day));
  const direction = scale?.direction === 'lower' ? -1 : 1;
  const deviation =
    scale === null ? NaN : deviationInTypicalErrors(result.value ?? NaN, expected, scale.typicalError, direction);
  return {
    ...result,
    expected: Number.isNaN(expected) ? null : expected,
    deviation: Number.isNaN(deviation) ? null : deviation,
    enteredAt: enteredAt.toISOString(),
    withdrawnAt: withdrawnAt?.toISOString() ?? null,
  };
}

import { deviationInTypicalErrors, expectedResult } from '../monitoring/expected-result.ts';
import { define, fields, input } from './define.ts';
import type { Method } from './method.ts';
import { PROVENANCE } from './method.ts';

export const resultMethods: readonly Method[] = [
  define({
    file: 'monitoring/expected-result.ts',
    fn: expectedResult,
    name: 'Expected result of a test',
    inputs: [
      fields('results', 'day numbers and results in the unit of the test', 'rows', { day: 'number', value: 'number' }),
      input('day', 'day number'),
      { ...input('before', 'day number'), optional: true },
    ],
    unit: 'unit of the test',
    source: PROVENANCE.own,
    provenance: PROVENANCE.own,
    checkedAgainst: [],
  }),
  define({
    file: 'monitoring/expected-result.ts',
    fn: deviationInTypicalErrors,
    name: 'Deviation from the expected result',
    inputs: [
      input('value', 'unit of the test'),
      input('expected', 'unit of the test'),
      input('typicalErrorOfOne', 'unit of the test'),
      input('higherIsBetter', '1, or -1 where lower is better'),
    ],
    unit: 'typical errors, negative is worse',
    source: 'Hopkins WG 2000, Sports Med 30(1):1–15',
    provenance: PROVENANCE.published,
    checkedAgainst: [],
  }),
];

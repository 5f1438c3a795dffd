import { overreachingScreen } from '../flags/overreaching-screen.ts';
import { criterionEvidence } from '../response-signs/criterion-evidence.ts';
import { define, fields, input } from './define.ts';
import type { Method } from './method.ts';
import { PROVENANCE } from './method.ts';
import { bouts } from './response-sign-methods.ts';

const form = { provenance: PROVENANCE.form, checkedAgainst: [] };
const results = fields('results', 'day number, unit of the test', 'rows', {
  ...{ day: 'number', id: 'any', key: 'any', kind: 'any', value: 'number', typicalError: 'number' },
  ...{ higherIsBetter: 'flag', inBaseline: 'flag', judged: 'flag' },
});

export const overreachingMethods: readonly Method[] = [
  define({
    ...{ file: 'response-signs/criterion-evidence.ts', fn: criterionEvidence, name: 'Confirmed fall of performance' },
    ...{ ...form, source: 'Hopkins WG 2000, Sports Med 30(1):1–15' },
    inputs: [
      fields('log', 'results and bouts as for the overreaching screen', 'record', { results: 'any', bouts: 'any' }),
      ...[input('day', 'day number'), input('firstSign', 'day number')],
      input('used', 'names of measured values', 'flexible'),
    ],
    unit: 'typical errors',
  }),
  define({
    ...{ file: 'flags/overreaching-screen.ts', fn: overreachingScreen, name: 'Strained, and overreaching suspected' },
    ...{ ...form, source: 'Meeusen R et al. 2013, Med Sci Sports Exerc 45(1):186–205', asObject: true },
    inputs: [
      fields('days', 'day number, true or false', 'rows', { day: 'number', explained: 'flag' }),
      input('families', 'states by day, by family', 'flexible'),
      ...[results, bouts],
    ],
    unit: 'episodes of days',
  }),
];

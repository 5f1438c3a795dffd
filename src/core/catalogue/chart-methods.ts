import { ewmaChart, ewmaLimit } from '../monitoring/ewma-chart.ts';
import { averageRunLengthCusum, averageRunLengthEwma } from '../monitoring/run-length.ts';
import { tabularCusum } from '../monitoring/tabular-cusum.ts';
import { define, input } from './define.ts';
import type { Method } from './method.ts';
import { PROVENANCE } from './method.ts';

const handbook = 'NIST/SEMATECH e-Handbook of Statistical Methods';
const weight = input('weight', 'fraction, above 0 to 1');
const shift = input('shift', 'SD');

export const chartMethods: readonly Method[] = [
  define({
    file: 'monitoring/tabular-cusum.ts',
    fn: tabularCusum,
    name: 'Tabular cumulative sum',
    inputs: [
      input('values', 'any unit', 'numbers'),
      ...['target', 'slack', 'limit'].map((name) => input(name, 'unit of the values')),
    ],
    unit: 'unit of the values; indices of signals',
    source: `${handbook}, 6.3.2.3`,
    provenance: PROVENANCE.published,
    checkedAgainst: ['SPC-01', 'SPC-02', 'SPC-06'],
  }),
  define({
    file: 'monitoring/ewma-chart.ts',
    fn: ewmaChart,
    name: 'Exponentially weighted moving average chart',
    inputs: [input('values', 'any unit, null not measured', 'numbers'), input('target', 'unit of the values'), weight],
    unit: 'unit of the values',
    source: `${handbook}, 6.3.2.4`,
    provenance: PROVENANCE.published,
    checkedAgainst: ['SPC-03'],
  }),
  define({
    file: 'monitoring/ewma-chart.ts',
    fn: ewmaLimit,
    name: 'Limit of such a chart',
    inputs: [input('sd', 'any unit'), weight, input('width', 'multiple'), input('count', 'values so far')],
    unit: 'unit of the SD',
    source: `${handbook}, 6.3.2.4`,
    provenance: PROVENANCE.published,
    checkedAgainst: ['SPC-04', 'SPC-05'],
  }),
  define({
    file: 'monitoring/run-length.ts',
    fn: averageRunLengthCusum,
    name: 'Average run length of a two-sided cumulative sum',
    inputs: [input('slack', 'SD'), input('limit', 'SD'), shift],
    unit: 'values',
    source: 'Goel AL, Wu SM 1971, Technometrics 13(2):221–230',
    provenance: PROVENANCE.memory,
    checkedAgainst: ['SPC-09'],
  }),
  define({
    file: 'monitoring/run-length.ts',
    fn: averageRunLengthEwma,
    name: 'Average run length of an exponentially weighted chart',
    inputs: [weight, input('width', 'multiple'), shift],
    unit: 'values',
    source: 'Crowder SV 1987, Technometrics 29(4):401–407',
    provenance: PROVENANCE.memory,
    checkedAgainst: ['SPC-10'],
  }),
];

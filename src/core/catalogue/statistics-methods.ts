import { coefficientOfVariation } from '../series/coefficient-of-variation.ts';
import { mean } from '../series/mean.ts';
import { median } from '../series/median.ts';
import { quantile, quantileSorted } from '../series/quantile.ts';
import { rollingQuantile } from '../series/rolling-quantile.ts';
import { standardDeviationPopulation, standardDeviationSample } from '../series/standard-deviation.ts';
import { define, input } from './define.ts';
import type { Method } from './method.ts';
import { PROVENANCE } from './method.ts';

const hyndman = 'Hyndman RJ, Fan Y 1996, Am Stat 50(4):361–365, definition 7';
const values = input('values', 'any unit, null unknown', 'numbers');
const windowDays = input('windowDays', 'days');
const q = input('q', 'fraction, 0 to 1');

const moments: readonly Method[] = [
  { fn: mean, file: 'series/mean.ts', name: 'Mean', checkedAgainst: ['HRV-02'] },
  {
    fn: standardDeviationPopulation,
    file: 'series/standard-deviation.ts',
    name: 'Population standard deviation',
    checkedAgainst: [],
  },
  {
    fn: standardDeviationSample,
    file: 'series/standard-deviation.ts',
    name: 'Sample standard deviation',
    checkedAgainst: ['SR-07', 'HRV-02'],
  },
].map((one) =>
  define({
    ...one,
    inputs: [values],
    unit: 'unit of the values',
    source: 'textbook definition',
    provenance: PROVENANCE.textbook,
  }),
);

export const statisticsMethods: readonly Method[] = [
  ...moments,
  define({
    file: 'series/coefficient-of-variation.ts',
    fn: coefficientOfVariation,
    name: 'Coefficient of variation',
    inputs: [values],
    unit: '%',
    source: 'textbook definition',
    provenance: PROVENANCE.textbook,
    checkedAgainst: ['HRV-02'],
  }),
  define({
    file: 'series/quantile.ts',
    fn: quantile,
    name: 'Quantile, type 7',
    inputs: [values, q],
    unit: 'unit of the values',
    source: hyndman,
    provenance: PROVENANCE.published,
    checkedAgainst: [],
  }),
  define({
    file: 'series/quantile.ts',
    fn: quantileSorted,
    name: 'Quantile, type 7, of sorted values',
    inputs: [input('sorted', 'any unit, rising', 'numbers'), q],
    unit: 'unit of the values',
    source: hyndman,
    provenance: PROVENANCE.published,
    checkedAgainst: [],
  }),
  define({
    file: 'series/median.ts',
    fn: median,
    name: 'Median of the known values',
    inputs: [values],
    unit: 'unit of the values',
    source: hyndman,
    provenance: PROVENANCE.published,
    checkedAgainst: [],
  }),
  define({
    file: 'series/rolling-quantile.ts',
    fn: rollingQuantile,
    name: 'Rolling quantile of the known values',
    inputs: [values, windowDays, q],
    unit: 'unit of the values',
    source: hyndman,
    provenance: PROVENANCE.published,
    checkedAgainst: [],
  }),
];

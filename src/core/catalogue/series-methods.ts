import { exponentialMean, smoothingFactor } from '../series/exponential-mean.ts';
import { fillUnknown } from '../series/fill-unknown.ts';
import { knownDays } from '../series/known-days.ts';
import { rollingMean } from '../series/rolling-mean.ts';
import { define, fields, input } from './define.ts';
import type { Method } from './method.ts';
import { PROVENANCE } from './method.ts';

const williams = 'Williams S et al. 2017, Br J Sports Med 51(3):209–210, doi 10.1136/bjsports-2016-096589';
const values = input('values', 'any unit, null unknown', 'numbers');
const daily = input('values', 'load units a day, null unknown', 'numbers');
const windowDays = input('windowDays', 'days');

export const seriesMethods: readonly Method[] = [
  define({
    file: 'series/rolling-mean.ts',
    fn: rollingMean,
    name: 'Rolling mean per known day',
    inputs: [daily, windowDays, input('minKnown', 'days')],
    unit: 'load units a day',
    source: 'own convention',
    provenance: PROVENANCE.own,
    checkedAgainst: ['HRV-03'],
  }),
  define({
    file: 'series/known-days.ts',
    fn: knownDays,
    name: 'Known days in the window',
    inputs: [values, windowDays],
    unit: 'days',
    source: 'own convention',
    provenance: PROVENANCE.own,
    checkedAgainst: [],
  }),
  define({
    file: 'series/exponential-mean.ts',
    fn: smoothingFactor,
    name: 'Weight of the newest day',
    inputs: [windowDays],
    unit: 'fraction',
    source: williams,
    provenance: PROVENANCE.memory,
    checkedAgainst: ['AC-04'],
  }),
  define({
    file: 'series/exponential-mean.ts',
    fn: exponentialMean,
    name: 'Exponentially weighted mean',
    inputs: [
      daily,
      windowDays,
      { name: 'start', unit: "load units a day, or 'first'", kind: 'flexible', optional: true },
    ],
    unit: 'load units a day',
    source: williams,
    provenance: PROVENANCE.memory,
    checkedAgainst: [],
  }),
  define({
    file: 'series/fill-unknown.ts',
    fn: fillUnknown,
    name: 'Values and bounds for unknown days',
    inputs: [
      fields('days', 'day number, state, load units', 'rows', { day: 'number', state: 'state', value: 'number' }),
    ],
    unit: 'load units a day',
    source: 'own convention',
    provenance: PROVENANCE.own,
    checkedAgainst: [],
  }),
];

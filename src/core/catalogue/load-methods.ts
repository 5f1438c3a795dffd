import { clockMinutes } from '../load/clock-minutes.ts';
import { dailySum } from '../load/daily-sum.ts';
import { domainLoad } from '../load/domain-load.ts';
import { monotonyPopulation, monotonySample, strain } from '../load/monotony.ts';
import { sessionRatingLoad } from '../load/session-rating-load.ts';
import { volumeLoad } from '../load/volume-load.ts';
import { define, fields, input } from './define.ts';
import type { Method } from './method.ts';
import { PROVENANCE } from './method.ts';

const foster2001 = 'Foster C et al. 2001, J Strength Cond Res 15(1):109–115';
const foster1998 = 'Foster C 1998, Med Sci Sports Exerc 30(7):1164–1168';
const week = input('days', 'load units a day, 7 days', 'numbers');
const byDomain = { moderate: 'number', heavy: 'number', severe: 'number', extreme: 'number' } as const;

export const loadMethods: readonly Method[] = [
  define({
    file: 'load/session-rating-load.ts',
    fn: sessionRatingLoad,
    name: 'Rating load of a session',
    inputs: [input('rating', 'CR-10 units, 0 to 10'), input('durationMin', 'min')],
    unit: 'rating × min',
    source: foster2001,
    provenance: PROVENANCE.published,
    checkedAgainst: ['SR-01', 'SR-02', 'RJ-01'],
  }),
  define({
    file: 'load/daily-sum.ts',
    fn: dailySum,
    name: 'Load of a day',
    inputs: [input('loads', 'load units', 'numbers')],
    unit: 'load units',
    source: foster2001,
    provenance: PROVENANCE.published,
    checkedAgainst: ['SR-03', 'SR-05'],
  }),
  define({
    file: 'load/monotony.ts',
    fn: monotonyPopulation,
    name: 'Monotony, population SD',
    inputs: [week],
    unit: 'no unit',
    source: foster1998,
    provenance: 'published; the choice of n is an own convention',
    checkedAgainst: ['SR-06', 'SR-10', 'SR-11', 'SR-12', 'SR-13', 'SR-14', 'SR-15', 'LOAD-03'],
  }),
  define({
    file: 'load/monotony.ts',
    fn: monotonySample,
    name: 'Monotony, sample SD',
    inputs: [week],
    unit: 'no unit',
    source: foster1998,
    provenance: 'published; the choice of n − 1 is an own convention',
    checkedAgainst: ['SR-07', 'SR-10', 'SR-11', 'SR-12', 'SR-13', 'SR-14', 'SR-15'],
  }),
  define({
    file: 'load/monotony.ts',
    fn: strain,
    name: 'Strain of a week',
    inputs: [input('weekLoad', 'load units'), input('monotony', 'no unit')],
    unit: 'load units',
    source: foster1998,
    provenance: PROVENANCE.published,
    checkedAgainst: ['SR-04', 'SR-06', 'SR-07', 'SR-12', 'LOAD-03'],
  }),
  define({
    file: 'load/domain-load.ts',
    fn: domainLoad,
    name: 'Domain load',
    inputs: [
      fields('minutes', 'min by domain', 'record', byDomain),
      { ...fields('weights', 'no unit, default 1, 2, 3, 3', 'record', byDomain), optional: true },
    ],
    unit: 'weighted min',
    source: 'Lucía A et al. 2003, Med Sci Sports Exerc 35(5):872–878, doi 10.1249/01.MSS.0000064999.82036.B4',
    provenance: 'published for three phases; no weights were found for four domains',
    checkedAgainst: [],
  }),
  define({
    file: 'load/volume-load.ts',
    fn: volumeLoad,
    name: 'Volume load',
    inputs: [fields('sets', 'count, count, kg', 'rows', { sets: 'number', repetitions: 'number', loadKg: 'number' })],
    unit: 'kg × repetitions',
    source: 'Kraft JA et al. 2014, J Strength Cond Res 28(7):2042–2046',
    provenance: PROVENANCE.published,
    checkedAgainst: ['ST-03'],
  }),
  define({
    file: 'load/clock-minutes.ts',
    fn: clockMinutes,
    name: 'Minutes of a time in hours and minutes',
    inputs: [input('clock', 'hours:minutes', 'text')],
    unit: 'min',
    source: 'Lucía A et al. 2003, Br J Sports Med 37(5):457–459, doi 10.1136/bjsm.37.5.457',
    provenance: PROVENANCE.published,
    checkedAgainst: ['LU-05'],
  }),
];

import { domainOf } from '../domains/domain-of.ts';
import { extremeBoundCycling, extremeBoundRunning } from '../domains/extreme-bound.ts';
import { timeInDomainFromBouts } from '../domains/time-in-domain-from-bouts.ts';
import { timeInDomainFromHeartRate } from '../domains/time-in-domain-from-heart-rate.ts';
import { define, fields, input, options } from './define.ts';
import type { Method } from './method.ts';
import { PROVENANCE } from './method.ts';

const burnley = 'Burnley M, Jones AM 2018, Eur J Sport Sci 18(1):1–12, doi 10.1080/17461391.2016.1249524';
const bounds = fields('bounds', 'W, m/s or beats per minute; extreme may be null', 'record', {
  lt1: 'number',
  heavySevere: 'number',
  extreme: 'any',
});

export const domainMethods: readonly Method[] = [
  define({
    file: 'domains/domain-of.ts',
    fn: domainOf,
    name: 'Intensity domain',
    inputs: [input('intensity', 'unit of the bounds'), bounds],
    unit: 'name of a domain',
    source: burnley,
    provenance: PROVENANCE.published,
    checkedAgainst: [],
  }),
  define({
    file: 'domains/extreme-bound.ts',
    fn: extremeBoundCycling,
    name: 'Upper bound of the severe domain, cycling',
    inputs: [input('criticalPowerW', 'W'), input('wPrimeJ', 'J')],
    unit: 'W',
    source: 'Hill DW, Poole DC, Smith JC 2002, Med Sci Sports Exerc 34(4):709–714',
    provenance: 'derived from published group means',
    checkedAgainst: [],
  }),
  define({
    file: 'domains/extreme-bound.ts',
    fn: extremeBoundRunning,
    name: 'Upper bound of the severe domain, running',
    inputs: [input('criticalSpeedMps', 'm/s'), input('dPrimeM', 'm')],
    unit: 'm/s',
    source: 'Hill DW, Glass, Vingren, Rev Bras Med Esporte',
    provenance: 'derived from published group means',
    checkedAgainst: [],
  }),
  define({
    file: 'domains/time-in-domain-from-bouts.ts',
    fn: timeInDomainFromBouts,
    name: 'Time in domain from hand-entered intervals',
    inputs: [
      fields('bouts', 'min, unit of the bounds', 'rows', { durationMin: 'number', intensity: 'number' }),
      bounds,
    ],
    unit: 'min by domain',
    source: burnley,
    provenance: PROVENANCE.published,
    checkedAgainst: [],
  }),
  define({
    file: 'domains/time-in-domain-from-heart-rate.ts',
    fn: timeInDomainFromHeartRate,
    name: 'Time in three domains from heart rate',
    inputs: [
      fields('bouts', 'min, beats per minute', 'rows', { durationMin: 'number', heartRateBpm: 'number' }),
      bounds,
      options('min', 'minimumBoutMin'),
    ],
    unit: 'min by domain',
    source: 'Lucía A et al. 2003, Med Sci Sports Exerc 35(5):872–878, doi 10.1249/01.MSS.0000064999.82036.B4',
    provenance: 'published phases; shortest bout: common practice, no source',
    checkedAgainst: [],
  }),
];

import { checkHeartRate, heartRateFraction } from '../load/heart-rate-fraction.ts';
import { heartRateLoadBanister } from '../load/heart-rate-load-banister.ts';
import { edwardsZoneEdges, edwardsZoneMinutes, heartRateLoadEdwards } from '../load/heart-rate-load-edwards.ts';
import { heartRateLoadThreePhase, phaseShares } from '../load/heart-rate-load-three-phase.ts';
import { define, fields, input } from './define.ts';
import type { Method } from './method.ts';
import { PROVENANCE } from './method.ts';

const edwards = 'Edwards S 1993, The Heart Rate Monitor Book, Fleet Feet Press, 113–129';
const bpm = 'beats per minute';

export const heartRateMethods: readonly Method[] = [
  define({
    file: 'load/heart-rate-fraction.ts',
    fn: checkHeartRate,
    name: 'Heart rate within a believable range',
    inputs: [input('heartRateBpm', `${bpm}, 25 to 240`)],
    unit: bpm,
    source: 'own convention',
    provenance: PROVENANCE.own,
    checkedAgainst: ['RJ-02'],
  }),
  define({
    file: 'load/heart-rate-fraction.ts',
    fn: heartRateFraction,
    name: 'Fraction of the heart-rate reserve',
    asObject: true,
    inputs: [input('heartRateBpm', bpm), input('restingBpm', bpm), input('maxBpm', bpm)],
    unit: 'fraction',
    source: 'Banister EW, Calvert TW 1980, Can J Appl Sport Sci 5(3):170–176',
    provenance: PROVENANCE.published,
    checkedAgainst: [],
  }),
  define({
    file: 'load/heart-rate-load-banister.ts',
    fn: heartRateLoadBanister,
    name: 'Heart-rate load, Banister, of the mean',
    asObject: true,
    inputs: [
      input('durationMin', 'min'),
      input('heartRateBpm', bpm),
      input('restingBpm', bpm),
      input('maxBpm', bpm),
      input('sex', 'female or male', 'text'),
    ],
    unit: 'weighted min',
    source: 'Banister EW 1991, in Physiological Testing of the High-Performance Athlete, Human Kinetics, 403–424',
    provenance: PROVENANCE.memory,
    checkedAgainst: ['BA-01', 'BA-02', 'BA-03', 'BA-04', 'BA-05', 'BA-06', 'BA-07', 'RJ-03'],
  }),
  define({
    file: 'load/heart-rate-load-edwards.ts',
    fn: heartRateLoadEdwards,
    name: 'Heart-rate load, Edwards',
    inputs: [input('zoneMinutes', 'min in 5 zones', 'numbers')],
    unit: 'weighted min',
    source: edwards,
    provenance: PROVENANCE.published,
    checkedAgainst: ['ED-01', 'ED-02', 'ED-04'],
  }),
  define({
    file: 'load/heart-rate-load-edwards.ts',
    fn: edwardsZoneEdges,
    name: 'Edges of the zones, Edwards',
    inputs: [input('maxBpm', bpm)],
    unit: bpm,
    source: edwards,
    provenance: PROVENANCE.published,
    checkedAgainst: ['ED-03'],
  }),
  define({
    file: 'load/heart-rate-load-edwards.ts',
    fn: edwardsZoneMinutes,
    name: 'Minutes in the zones, Edwards',
    inputs: [
      fields('bouts', `min, ${bpm}`, 'rows', { durationMin: 'number', heartRateBpm: 'number' }),
      input('maxBpm', bpm),
    ],
    unit: 'min',
    source: edwards,
    provenance: PROVENANCE.published,
    checkedAgainst: ['ED-04'],
  }),
  define({
    file: 'load/heart-rate-load-three-phase.ts',
    fn: heartRateLoadThreePhase,
    name: 'Three-phase load, Lucía',
    inputs: [input('minutes', 'min in 3 phases', 'numbers')],
    unit: 'weighted min',
    source: 'Lucía A et al. 2003, Med Sci Sports Exerc 35(5):872–878, doi 10.1249/01.MSS.0000064999.82036.B4',
    provenance: PROVENANCE.published,
    checkedAgainst: ['LU-01', 'LU-02'],
  }),
  define({
    file: 'load/heart-rate-load-three-phase.ts',
    fn: phaseShares,
    name: 'Share of the time in each phase',
    inputs: [input('minutes', 'min by phase', 'numbers')],
    unit: 'fraction',
    source: 'Lucía A et al. 1999, Int J Sports Med 20(3):167–172, doi 10.1055/s-1999-970284',
    provenance: PROVENANCE.published,
    checkedAgainst: ['LU-02', 'LU-06'],
  }),
];

import { expect, test } from '@jest/globals';
import { domainOf } from '../../src/core/domains/domain-of.ts';
import { extremeBoundCycling, extremeBoundRunning } from '../../src/core/domains/extreme-bound.ts';
import { timeInDomainFromBouts } from '../../src/core/domains/time-in-domain-from-bouts.ts';
import { timeInDomainFromHeartRate } from '../../src/core/domains/time-in-domain-from-heart-rate.ts';
import { dailySum } from '../../src/core/load/daily-sum.ts';
import { domainLoad } from '../../src/core/load/domain-load.ts';
import { checkHeartRate, heartRateFraction } from '../../src/core/load/heart-rate-fraction.ts';
import { heartRateLoadBanister } from '../../src/core/load/heart-rate-load-banister.ts';
import {
  edwardsZoneEdges,
  edwardsZoneMinutes,
  heartRateLoadEdwards,
} from '../../src/core/load/heart-rate-load-edwards.ts';
import { heartRateLoadThreePhase } from '../../src/core/load/heart-rate-load-three-phase.ts';
import { sessionRatingLoad } from '../../src/core/load/session-rating-load.ts';
import { volumeLoad } from '../../src/core/load/volume-load.ts';
import { NumericInputError } from '../../src/core/numeric-input-error.ts';
import { acuteChronicCoupled } from '../../src/core/ratio/acute-chronic-coupled.ts';
import { uncoupledFromCoupled } from '../../src/core/ratio/coupled-from-uncoupled.ts';
import { impulseComponentExclusive } from '../../src/core/response/impulse-component.ts';
import { timeToRecover } from '../../src/core/response/time-to-recover.ts';
import { quantile } from '../../src/core/series/quantile.ts';
import { rollingMean } from '../../src/core/series/rolling-mean.ts';

const bounds = { lt1: 180, heavySevere: 240, extreme: 380 };
const none = { moderate: 0, heavy: 0, severe: 0, extreme: 0 };
const banister = (heartRateBpm: number, restingBpm: number, maxBpm: number): number =>
  heartRateLoadBanister({ durationMin: 30, heartRateBpm, restingBpm, maxBpm, sex: 'female' });
const set = (sets: number, repetitions: number, loadKg: number): number => volumeLoad([{ sets, repetitions, loadKg }]);

/** What is still taken, and what is just outside. */
const sides: [string, () => unknown, () => unknown][] = [
  ['rating from 0', () => sessionRatingLoad(0, 60), () => sessionRatingLoad(-0.01, 60)],
  ['rating to 10', () => sessionRatingLoad(10, 60), () => sessionRatingLoad(10.01, 60)],
  ['rating is a number', () => sessionRatingLoad(5, 60), () => sessionRatingLoad(NaN, 60)],
  ['minutes above 0', () => sessionRatingLoad(5, 0.1), () => sessionRatingLoad(5, 0)],
  ['minutes to 1440', () => sessionRatingLoad(5, 1440), () => sessionRatingLoad(5, 1441)],
  ['load from 0', () => dailySum([0, NaN]), () => dailySum([-1])],
  ['load is finite', () => dailySum([1e9]), () => dailySum([Infinity])],
  ['heart rate from 25', () => checkHeartRate(25), () => checkHeartRate(24)],
  ['heart rate to 240', () => checkHeartRate(240), () => checkHeartRate(241)],
  ['maximum above rest', () => banister(60, 60, 61), () => banister(60, 60, 60)],
  ['mean up to the maximum', () => banister(190, 60, 190), () => banister(191, 60, 190)],
  ['mean from rest on', () => banister(60, 60, 190), () => banister(59, 60, 190)],
  ['fraction needs its anchors', () => fraction(60), () => fraction(NaN)],
  ['five zones', () => heartRateLoadEdwards([0, 0, 0, 0, 1]), () => heartRateLoadEdwards([0, 0, 0, 0])],
  ['zone minutes from 0', () => heartRateLoadEdwards([0, 0, 0, 0, 0]), () => heartRateLoadEdwards([-1, 0, 0, 0, 0])],
  [
    'zone minutes of a day',
    () => heartRateLoadEdwards([720, 720, 0, 0, 0]),
    () => heartRateLoadEdwards([720, 721, 0, 0, 0]),
  ],
  ['zones need a maximum', () => edwardsZoneEdges(100), () => edwardsZoneEdges(99)],
  ['bout up to the maximum', () => zones(200), () => zones(201)],
  ['three phases', () => phases([1, 2, 3]), () => phases([1, 2])],
  ['phase minutes from 0', () => phases([0, 0, 0]), () => phases([0, -1, 0])],
  ['sets from 1', () => set(1, 1, 0.5), () => set(0, 1, 0.5)],
  ['repetitions are whole', () => set(1, 2, 0.5), () => set(1, 1.5, 0.5)],
  ['kilograms above 0', () => set(1, 1, 0.1), () => set(1, 1, 0)],
  ['domain minutes from 0', () => domainLoad(none), () => domainLoad({ ...none, heavy: -1 })],
  ['weights from 0', () => domainLoad(none, none), () => domainLoad(none, { ...none, severe: -1 })],
  ['intensity from 0', () => domainOf(0, bounds), () => domainOf(-1, bounds)],
  ['bounds rise', () => domainOf(1, { ...bounds, lt1: 239 }), () => domainOf(1, { ...bounds, lt1: 240 })],
  [
    'extreme bound on top',
    () => domainOf(1, { ...bounds, extreme: 241 }),
    () => domainOf(1, { ...bounds, extreme: 240 }),
  ],
  ['critical power above 0', () => extremeBoundCycling(1, 1), () => extremeBoundCycling(0, 1)],
  ['D′ above 0', () => extremeBoundRunning(1, 1), () => extremeBoundRunning(1, 0)],
  ['window from 1', () => rollingMean([1], 1, 1), () => rollingMean([1], 0, 1)],
  ['floor within the window', () => rollingMean([1], 7, 7), () => rollingMean([1], 7, 8)],
  ['share to 1', () => quantile([1], 1), () => quantile([1], 1.01)],
  ['chronic above acute', () => coupled(8), () => coupled(7)],
  ['coupled to 4', () => uncoupledFromCoupled(4), () => uncoupledFromCoupled(4.01)],
  ['time constant above 0', () => impulseComponentExclusive([1], 0.1), () => impulseComponentExclusive([1], 0)],
  ['long above short', () => recover(15.1), () => recover(15)],
];

test.each(sides)('%s', (_, taken, refused) => {
  expect(taken).not.toThrow();
  expect(refused).toThrow(NumericInputError);
});

test('a refusal names function, field, value and what is allowed', () => {
  const refused = (): number => sessionRatingLoad(11, 60);
  expect(refused).toThrow('sessionRatingLoad: rating = 11, allowed: a number from 0 to 10');
  expect.assertions(2);
  try {
    refused();
  } catch (error) {
    expect(error).toMatchObject({ functionName: 'sessionRatingLoad', parameter: 'rating', value: 11 });
  }
});

test('an intensity on a bound belongs to the domain below it', () => {
  expect([180, 180.1, 240, 240.1, 380, 380.1].map((power) => domainOf(power, bounds))).toEqual([
    'moderate',
    'heavy',
    'heavy',
    'severe',
    'severe',
    'extreme',
  ]);
  expect(domainOf(900, { ...bounds, extreme: null })).toBe('severe');
});

test('a zone of Edwards holds its lower edge, the fifth also the maximum', () => {
  const minutes = [99, 100, 119, 120, 139, 140, 160, 180, 200].map((heartRateBpm) => ({
    durationMin: 1,
    heartRateBpm,
  }));
  expect(edwardsZoneMinutes(minutes, 200)).toEqual([2, 2, 1, 1, 2]);
});

test('bouts of just under three minutes have no domain by heart rate', () => {
  const bouts = [2.9, 3, 10].map((durationMin) => ({ durationMin, heartRateBpm: 160 }));
  const heart = { lt1: 150, heavySevere: 170, extreme: null };
  expect(timeInDomainFromHeartRate(bouts, heart)).toEqual({ minutes: { ...none, heavy: 13 }, unassignedMin: 2.9 });
  expect(timeInDomainFromHeartRate(bouts, heart, { minimumBoutMin: 0 }).unassignedMin).toBe(0);
});

test('intervals are kept as they were given', () => {
  const bouts = [150, 200, 300, 400].map((intensity, index) => ({ durationMin: index + 1, intensity }));
  expect(timeInDomainFromBouts(bouts, bounds)).toEqual({ moderate: 1, heavy: 2, severe: 3, extreme: 4 });
});

// Hill DW, Poole DC, Smith JC 2002, Med Sci Sports Exerc 34(4):709–714: group means 198 W and 342 W at 136 s.
test('the extreme bound of cycling is the power that lasts 136 s', () => {
  expect(extremeBoundCycling(198, 19_584)).toBeCloseTo(342, 9);
  expect(19_584 / (extremeBoundCycling(198, 19_584) - 198)).toBeCloseTo(136, 9);
  // The running study: 3.00 m/s and 4.98 m/s at 103 s.
  expect(extremeBoundRunning(3, (4.98 - 3) * 103)).toBeCloseTo(4.98, 9);
});

function fraction(restingBpm: number): number {
  return heartRateFraction({ heartRateBpm: 150, restingBpm, maxBpm: 190 });
}

function zones(heartRateBpm: number): number[] {
  return edwardsZoneMinutes([{ durationMin: 1, heartRateBpm }], 200);
}

function phases(minutes: number[]): number {
  return heartRateLoadThreePhase(minutes as [number, number, number]);
}

function coupled(chronicDays: number): unknown {
  return acuteChronicCoupled([1], { acuteDays: 7, chronicDays });
}

function recover(tau1: number): number {
  return timeToRecover({ k1: 1, k2: 2, tau1, tau2: 15 });
}

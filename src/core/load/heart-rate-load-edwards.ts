import { NumericInputError } from '../numeric-input-error.ts';
import { within } from '../guard.ts';
import { checkHeartRate } from './heart-rate-fraction.ts';

/**
 * Heart-rate load of Edwards: minutes in five zones, weighted 1 to 5.
 *
 * A simple sum that only needs the maximal heart rate.
 *
 * @param zoneMinutes minutes in the five zones [min], each 0 or more, together at most 1440
 * @returns load [weighted min]
 * @throws NumericInputError on another number of zones or minutes out of range
 * @remarks Equation: load = 1·z1 + 2·z2 + 3·z3 + 4·z4 + 5·z5.
 * Limits: weights are arbitrary and linear; one beat at an edge changes a whole unit; percent of maximum matches no threshold.
 * @see Edwards S 1993, The Heart Rate Monitor Book, Fleet Feet Press, 113–129; zones and weights as in Foster C et al. 2001, J Strength Cond Res 15(1):109–115
 * @example
 * heartRateLoadEdwards([5, 10, 20, 15, 10]); // => 195
 */
export function heartRateLoadEdwards(zoneMinutes: readonly number[]): number {
  if (zoneMinutes.length !== 5) {
    throw new NumericInputError('heartRateLoadEdwards', 'zoneMinutes', zoneMinutes, 'minutes of exactly 5 zones');
  }
  zoneMinutes.forEach((min, i) => within('heartRateLoadEdwards', `zoneMinutes[${i}]`, min, 0, 1440, 'min'));
  const total = zoneMinutes.reduce((sum, min) => sum + min, 0);
  within('heartRateLoadEdwards', 'sum of zoneMinutes', total, 0, 1440, 'min');
  return zoneMinutes.reduce((sum, min, zone) => sum + min * (zone + 1), 0);
}

/**
 * Edges of the five zones of Edwards.
 *
 * @param maxBpm maximal heart rate [beats per minute], 100 to 240
 * @returns lower edges of the five zones and the maximum [beats per minute]: 50, 60, 70, 80, 90 and 100 %
 * @throws NumericInputError outside 100 to 240
 * @remarks Equation: edge = maximum × percent ÷ 100. Limits: the published edges overlap; here a zone holds its lower edge and not its upper one, the last holds both.
 * @see Edwards S 1993, The Heart Rate Monitor Book, Fleet Feet Press, 113–129
 * @example
 * edwardsZoneEdges(185); // => [92.5, 111, 129.5, 148, 166.5, 185]
 */
export function edwardsZoneEdges(maxBpm: number): number[] {
  within('edwardsZoneEdges', 'maxBpm', maxBpm, 100, 240, 'beats per minute');
  return [50, 60, 70, 80, 90, 100].map((percent) => (maxBpm * percent) / 100);
}

/**
 * Minutes of a session in the five zones of Edwards.
 *
 * @param bouts stretches of a session: durationMin [min], 0 or more, and heartRateBpm [beats per minute], 25 to the maximum
 * @param maxBpm maximal heart rate [beats per minute], 100 to 240
 * @returns minutes in the five zones [min]; minutes below 50 % of the maximum are in none
 * @throws NumericInputError on a heart rate above the maximum or values out of range
 * @remarks Equation: zone i holds edge(i) ≤ HR < edge(i+1), the fifth also HR = maximum. Limits: easy work below half of the maximum vanishes.
 * @see Edwards S 1993, The Heart Rate Monitor Book, Fleet Feet Press, 113–129
 * @example
 * edwardsZoneMinutes([{ durationMin: 60, heartRateBpm: 200 }], 200); // => [0, 0, 0, 0, 60]
 */
export function edwardsZoneMinutes(
  bouts: readonly { durationMin: number; heartRateBpm: number }[],
  maxBpm: number,
): number[] {
  const edges = edwardsZoneEdges(maxBpm);
  const minutes = [0, 0, 0, 0, 0];
  for (const { durationMin, heartRateBpm } of bouts) {
    within('edwardsZoneMinutes', 'durationMin', durationMin, 0, 1440, 'min');
    checkHeartRate(heartRateBpm);
    within('edwardsZoneMinutes', 'heartRateBpm', heartRateBpm, 25, maxBpm, 'beats per minute (the stored maximum)');
    const zone = Math.min(edges.filter((edge) => heartRateBpm >= edge).length - 1, 4);
    if (zone >= 0) minutes[zone]! += durationMin;
  }
  return minutes;
}

import type { SpikeClass } from '../types.ts';
import { above, within } from '../guard.ts';

/**
 * How far a running session exceeds the longest of the 30 days before.
 *
 * One run much longer than any of the last month.
 *
 * @param distanceKm distance of the session [km], 0 or more
 * @param longestBeforeKm longest single run of the 30 days before [km], above 0
 * @returns percent above the longest [%], negative if shorter
 * @throws NumericInputError outside these ranges
 * @remarks Equation: 100·(distance − longest) ÷ longest. Limits: running distance only; at very low distances a percentage means little.
 * @see Frandsen JSB et al. 2025, Br J Sports Med 59(17):1203–1210, doi 10.1136/bjsports-2024-109380
 * @example
 * sessionSpikePercent(13, 10); // => 30
 */
export function sessionSpikePercent(distanceKm: number, longestBeforeKm: number): number {
  within('sessionSpikePercent', 'distanceKm', distanceKm, 0, Infinity, 'km');
  above('sessionSpikePercent', 'longestBeforeKm', longestBeforeKm, 0, Infinity, 'km');
  return (100 * (distanceKm - longestBeforeKm)) / longestBeforeKm;
}

/**
 * Class of a single-session spike.
 *
 * @param percent above the longest of the 30 days before [%]
 * @returns 'reference' to 10, 'small' above 10 to 30, 'moderate' above 30 to 100, 'large' above 100
 * @throws NumericInputError if it is not a finite number
 * @remarks Equation: half-open bands, each holds its upper end. Limits: found in 5,205 runners; the moderate class was not above the small one.
 * @see Frandsen JSB et al. 2025, Br J Sports Med 59(17):1203–1210, doi 10.1136/bjsports-2024-109380
 * @example
 * spikeClass(30.1); // => 'moderate'
 */
export function spikeClass(percent: number): SpikeClass {
  within('spikeClass', 'percent', percent, -Infinity, Infinity, '%');
  if (percent <= 10) return 'reference';
  if (percent <= 30) return 'small';
  return percent <= 100 ? 'moderate' : 'large';
}

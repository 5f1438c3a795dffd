import { above } from '../guard.ts';

// Time to exhaustion at the upper bound of the severe domain, group means.
const CYCLING_S = 136;
const RUNNING_S = 103;

/**
 * Upper bound of the severe domain in cycling.
 *
 * The power above which exhaustion comes before the oxygen uptake can reach its maximum.
 *
 * @param criticalPowerW critical power [W], above 0
 * @param wPrimeJ W′ [J], above 0
 * @returns bound [W]
 * @throws NumericInputError if one is not above 0
 * @remarks Equation: bound = CP + W′ ÷ 136 s, the power of the CP model that lasts 136 s.
 * Limits: 136 ± 17 s is the mean of 11 students; an individual's time is not known from it.
 * @see Hill DW, Poole DC, Smith JC 2002, The relationship between power and the time to achieve VO2max, Med Sci Sports Exerc 34(4):709–714
 * @example
 * extremeBoundCycling(198, 19584); // => 342
 */
export function extremeBoundCycling(criticalPowerW: number, wPrimeJ: number): number {
  above('extremeBoundCycling', 'criticalPowerW', criticalPowerW, 0, Infinity, 'W');
  above('extremeBoundCycling', 'wPrimeJ', wPrimeJ, 0, Infinity, 'J');
  return criticalPowerW + wPrimeJ / CYCLING_S;
}

/**
 * Upper bound of the severe domain in running.
 *
 * @param criticalSpeedMps critical speed [m/s], above 0
 * @param dPrimeM D′ [m], above 0
 * @returns bound [m/s]
 * @throws NumericInputError if one is not above 0
 * @remarks Equation: bound = CS + D′ ÷ 103 s. Limits: 103 ± 7 s is a group mean.
 * @see Hill DW, Glass, Vingren, Rev Bras Med Esporte (running: critical speed 3.00 m/s, upper bound 4.98 m/s at 103 ± 7 s)
 * @example
 * extremeBoundRunning(3, 203.94); // => 4.98
 */
export function extremeBoundRunning(criticalSpeedMps: number, dPrimeM: number): number {
  above('extremeBoundRunning', 'criticalSpeedMps', criticalSpeedMps, 0, Infinity, 'm/s');
  above('extremeBoundRunning', 'dPrimeM', dPrimeM, 0, Infinity, 'm');
  return criticalSpeedMps + dPrimeM / RUNNING_S;
}

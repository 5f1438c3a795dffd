import { within } from '../guard.ts';

const FEWEST_DIFFERENCES = 2;

/**
 * Root mean square of successive differences of RR intervals.
 *
 * The beat-to-beat part of heart rate variability, from the intervals of a quiet morning.
 *
 * @param intervalsMs RR intervals in the order they were measured [ms]; NaN = removed, no difference is taken across it
 * @returns RMSSD [ms]; NaN with fewer than two differences
 * @throws NumericInputError on an interval that is not above 0 and finite
 * @remarks Equation: √(Σ(RR(i+1) − RR(i))² ÷ n), n differences between neighbours.
 * Limits: one artefact can double it: remove artefacts first; compare mornings of the same posture and length only.
 * @see Task Force of the European Society of Cardiology 1996, Circulation 93(5):1043–1065
 * @example
 * rmssd([800, 810, 790, 805, 795]); // => 14.3614066
 */
export function rmssd(intervalsMs: readonly number[]): number {
  let sum = 0;
  let differences = 0;
  intervalsMs.forEach((interval, index) => {
    if (Number.isNaN(interval)) return;
    within('rmssd', `intervalsMs[${index}]`, interval, Number.MIN_VALUE, Infinity, 'ms');
    const before = intervalsMs[index - 1] ?? NaN;
    if (Number.isNaN(before)) return;
    sum += (interval - before) ** 2;
    differences += 1;
  });
  return differences < FEWEST_DIFFERENCES ? NaN : Math.sqrt(sum / differences);
}

/**
 * Natural logarithm of RMSSD, the form that is averaged and compared.
 *
 * @param rmssdMs RMSSD [ms], above 0; NaN = not measured
 * @returns ln RMSSD [ln ms]; NaN if not measured
 * @throws NumericInputError on 0, a negative or an infinite value
 * @remarks Equation: ln(RMSSD ÷ 1 ms). Limits: 0 has no logarithm: it is a fault of the recording, not a low value.
 * @see Plews DJ et al. 2012, Eur J Appl Physiol 112(11):3729–3741
 * @example
 * lnRmssd(14.361406616); // => 2.6645445
 */
export function lnRmssd(rmssdMs: number): number {
  if (Number.isNaN(rmssdMs)) return NaN;
  return Math.log(within('lnRmssd', 'rmssdMs', rmssdMs, Number.MIN_VALUE, Infinity, 'ms'));
}

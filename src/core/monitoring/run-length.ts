import { above, within } from '../guard.ts';
import { gaussLegendre } from '../numeric/gauss-legendre.ts';
import { normalDensity, normalDistribution } from '../numeric/normal.ts';
import { solveLinear } from '../numeric/solve-linear.ts';

const POINTS = 48;

/**
 * Average run length of a two-sided tabular cumulative sum.
 *
 * How many values pass on average before the chart signals: long when nothing changed, short after a shift.
 *
 * @param slack departure that is not counted [SD], 0 or more
 * @param limit sum above which it signals [SD], above 0
 * @param shift shift of the mean [SD]; 0 = nothing changed
 * @returns average run length [values]
 * @throws NumericInputError on an input out of range
 * @remarks Equation: one side L(0) from L(z) = 1 + L(0)·Φ(k − z − δ) + ∫₀ʰ L(x)·φ(x + k − z − δ) dx, by Gauss–Legendre points;
 * both sides 1 ÷ L = 1 ÷ L⁺ + 1 ÷ L⁻. Limits: independent normal values with known mean and SD; an athlete's own baseline signals sooner.
 * @see Goel AL, Wu SM 1971, Technometrics 13(2):221–230; combination: Kemp KW 1961, J R Stat Soc B 23(1):149–153; both from memory
 * @example
 * Math.round(averageRunLengthCusum(0.5, 4, 1) * 100) / 100; // => 8.38
 */
export function averageRunLengthCusum(slack: number, limit: number, shift: number): number {
  within('averageRunLengthCusum', 'slack', slack, 0, Infinity);
  above('averageRunLengthCusum', 'limit', limit, 0);
  within('averageRunLengthCusum', 'shift', shift, -Infinity, Infinity);
  return 1 / (1 / oneSided(slack, limit, shift) + 1 / oneSided(slack, limit, -shift));
}

function oneSided(slack: number, limit: number, shift: number): number {
  // The first unknown is the run length from 0, the others those from the points.
  const points = [{ x: 0, weight: 0 }, ...gaussLegendre(POINTS, 0, limit)];
  const matrix = points.map((from, row) =>
    points.map((to, column) => {
      const back = column === 0 ? normalDistribution(slack - from.x - shift) : 0;
      const there = to.weight * normalDensity(to.x + slack - from.x - shift);
      return (row === column ? 1 : 0) - back - there;
    }),
  );
  return runLengthFrom(matrix);
}

/**
 * Average run length of an EWMA chart with its limits at their final distance.
 *
 * @param weight weight of the newest value [fraction], above 0, at most 1
 * @param width multiple of the average's own standard deviation [no unit], above 0
 * @param shift shift of the mean [SD]; 0 = nothing changed
 * @returns average run length [values], started at the target
 * @throws NumericInputError on an input out of range
 * @remarks Equation: L(u) = 1 + (1 ÷ λ)·∫ L(x)·φ((x − (1 − λ)·u) ÷ λ − δ) dx between the limits, by Gauss–Legendre points.
 * Limits: independent normal values with known mean and SD; an athlete's own baseline signals sooner.
 * @see Crowder SV 1987, Technometrics 29(4):401–407; from memory
 * @example
 * Math.round(averageRunLengthEwma(0.2, 2.962, 1) * 100) / 100; // => 10.54
 */
export function averageRunLengthEwma(weight: number, width: number, shift: number): number {
  above('averageRunLengthEwma', 'weight', weight, 0, 1);
  above('averageRunLengthEwma', 'width', width, 0);
  within('averageRunLengthEwma', 'shift', shift, -Infinity, Infinity);
  const edge = width * Math.sqrt(weight / (2 - weight));
  const points = [{ x: 0, weight: 0 }, ...gaussLegendre(POINTS, -edge, edge)];
  const matrix = points.map((from, row) =>
    points.map((to, column) => {
      const step = (to.x - (1 - weight) * from.x) / weight - shift;
      return (row === column ? 1 : 0) - (to.weight / weight) * normalDensity(step);
    }),
  );
  return runLengthFrom(matrix);
}

function runLengthFrom(matrix: readonly (readonly number[])[]): number {
  return solveLinear(matrix, new Array<number>(matrix.length).fill(1))?.[0] ?? NaN;
}

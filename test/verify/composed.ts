import type { Core } from './core.ts';
import { load90 } from './arguments.ts';
import { call } from './call.ts';
import { seededNormal } from './seeded.ts';

type Input = Readonly<Record<string, unknown>>;
type AcuteChronicResult = { acute: number[]; chronic: number[]; ratio: number[] };

const parameters = { p0: 250, k1: 0.1, k2: 0.15, tau1: 40, tau2: 10 };

/** Computations that take more than one call. Comparison values are worked out here, without the functions under check. */
export const composed: Readonly<Record<string, (core: Core, input: Input) => unknown>> = {
  /** Monotony by the population form over the same by the sample form, the other form worked out here. */
  'monotony-population-over-sample': (core, input) => {
    const days = input['days'] as number[];
    return (call(core, 'monotonyPopulation', [days]) as number) / (average(days) / spread(days, days.length - 1));
  },
  'monotony-sample-times-factor': (core, input) => {
    const days = input['days'] as number[];
    return average(days) / spread(days, days.length) / (call(core, 'monotonySample', [days]) as number);
  },
  /** Whether the women's load exceeds the men's at every given fraction of the reserve. */
  'women-above-men': (core, input) => {
    const steps = input['fractions'] as number[];
    return steps.every((x) => {
      const session = { durationMin: 60, heartRateBpm: 60 + 130 * x, restingBpm: 60, maxBpm: 190 };
      const women = call(core, 'heartRateLoadBanister', [{ ...session, sex: 'female' }]) as number;
      const men = call(core, 'heartRateLoadBanister', [{ ...session, sex: 'male' }]) as number;
      return women > men;
    });
  },
  /** Correlation of acute and chronic load over blocks of four independent weeks. */
  'acute-chronic-correlation': (core, input) => {
    const draw = seededNormal(input['seed'] as number);
    const blocks = input['blocks'] as number;
    const weeks = Array.from({ length: 4 * blocks }, () => 1000 + 100 * draw());
    const options = { acuteDays: 1, chronicDays: 4, minAcuteKnown: 1, minChronicKnown: 4 };
    const form = call(core, input['form'] as string, [weeks, options]) as AcuteChronicResult;
    const last = (series: number[]): number[] => series.filter((_, index) => index % 4 === 3);
    return call(core, 'correlation', [last(form.acute), last(form.chronic)]);
  },
  /** Largest coupled ratio over many random logs with a share of empty days. */
  'largest-coupled-ratio': (core, input) => {
    const draw = seededNormal(input['seed'] as number);
    let largest = 0;
    for (let log = 0; log < (input['logs'] as number); log += 1) {
      const days = Array.from({ length: 60 }, () => Math.max(0, 100 * draw()));
      const { ratio } = call(core, 'acuteChronicCoupled', [days]) as AcuteChronicResult;
      for (const value of ratio) if (value > largest) largest = value;
    }
    return largest > 0 && largest <= 4;
  },
  /** Largest difference between a function's response and the direct sum over earlier days, worked out here. */
  'largest-difference-from-direct-sum': (core, input) => {
    const loads = load90();
    const { p0, k1, k2, tau1, tau2 } = parameters;
    const direct = Array.from({ length: loads.length + 1 }, (_, n) =>
      loads
        .slice(0, n)
        .reduce((p, w, s) => p + w * k1 * Math.exp(-(n - s) / tau1) - w * k2 * Math.exp(-(n - s) / tau2), p0),
    );
    const response = call(core, input['form'] as string, [loads, parameters]) as number[];
    return Math.max(...direct.map((value, n) => Math.abs(value - response[n]!)));
  },
};

function average(values: readonly number[]): number {
  return values.reduce((sum, value) => sum + value, 0) / values.length;
}

function spread(values: readonly number[], divisor: number): number {
  return Math.sqrt(values.reduce((sum, value) => sum + (value - average(values)) ** 2, 0) / divisor);
}

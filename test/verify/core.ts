import { clockMinutes } from '../../src/core/load/clock-minutes.ts';
import { dailySum } from '../../src/core/load/daily-sum.ts';
import { checkHeartRate } from '../../src/core/load/heart-rate-fraction.ts';
import { heartRateLoadBanister } from '../../src/core/load/heart-rate-load-banister.ts';
import {
  edwardsZoneEdges,
  edwardsZoneMinutes,
  heartRateLoadEdwards,
} from '../../src/core/load/heart-rate-load-edwards.ts';
import { heartRateLoadThreePhase, phaseShares } from '../../src/core/load/heart-rate-load-three-phase.ts';
import { ewmaChart, ewmaLimit } from '../../src/core/monitoring/ewma-chart.ts';
import { hooperSum } from '../../src/core/monitoring/hooper-sum.ts';
import { lnRmssd, rmssd } from '../../src/core/monitoring/rmssd.ts';
import { averageRunLengthCusum, averageRunLengthEwma } from '../../src/core/monitoring/run-length.ts';
import { tabularCusum } from '../../src/core/monitoring/tabular-cusum.ts';
import { totalMoodDisturbance } from '../../src/core/monitoring/total-mood-disturbance.ts';
import {
  limitsOfAgreement,
  smallestWorthwhileChange,
  typicalError,
  typicalErrorPercent,
} from '../../src/core/monitoring/typical-error.ts';
import { monotonyPopulation, monotonySample, strain } from '../../src/core/load/monotony.ts';
import { sessionRatingLoad } from '../../src/core/load/session-rating-load.ts';
import { volumeLoad } from '../../src/core/load/volume-load.ts';
import { acuteChronicCoupled } from '../../src/core/ratio/acute-chronic-coupled.ts';
import { acuteChronicExponential } from '../../src/core/ratio/acute-chronic-exponential.ts';
import { acuteChronicUncoupled } from '../../src/core/ratio/acute-chronic-uncoupled.ts';
import { correlation } from '../../src/core/ratio/correlation.ts';
import { coupledFromUncoupled, uncoupledFromCoupled } from '../../src/core/ratio/coupled-from-uncoupled.ts';
import { impulseInfluence } from '../../src/core/response/impulse-influence.ts';
import { impulseResponseConvolution } from '../../src/core/response/impulse-response-convolution.ts';
import { impulseResponse, impulseResponseInclusive } from '../../src/core/response/impulse-response.ts';
import {
  partialSumInclusive,
  steadyStateSumExclusive,
  steadyStateSumInclusive,
} from '../../src/core/response/steady-state-sum.ts';
import { gainRatioFromRecovery, timeToPeak, timeToRecover } from '../../src/core/response/time-to-recover.ts';
import { coefficientOfVariation } from '../../src/core/series/coefficient-of-variation.ts';
import { smoothingFactor } from '../../src/core/series/exponential-mean.ts';
import { mean } from '../../src/core/series/mean.ts';
import { rollingMean } from '../../src/core/series/rolling-mean.ts';
import { standardDeviationSample } from '../../src/core/series/standard-deviation.ts';

/** The functions under check by home and name. Rows call them only through this table, so that a test can put wrong ones in. */
const homes = {
  'load/clock-minutes.ts': { clockMinutes },
  'load/daily-sum.ts': { dailySum },
  'load/heart-rate-fraction.ts': { checkHeartRate },
  'load/heart-rate-load-banister.ts': { heartRateLoadBanister },
  'load/heart-rate-load-edwards.ts': { edwardsZoneEdges, edwardsZoneMinutes, heartRateLoadEdwards },
  'load/heart-rate-load-three-phase.ts': { heartRateLoadThreePhase, phaseShares },
  'load/monotony.ts': { monotonyPopulation, monotonySample, strain },
  'load/session-rating-load.ts': { sessionRatingLoad },
  'load/volume-load.ts': { volumeLoad },
  'monitoring/ewma-chart.ts': { ewmaChart, ewmaLimit },
  'monitoring/hooper-sum.ts': { hooperSum },
  'monitoring/rmssd.ts': { lnRmssd, rmssd },
  'monitoring/run-length.ts': { averageRunLengthCusum, averageRunLengthEwma },
  'monitoring/tabular-cusum.ts': { tabularCusum },
  'monitoring/total-mood-disturbance.ts': { totalMoodDisturbance },
  'monitoring/typical-error.ts': { limitsOfAgreement, smallestWorthwhileChange, typicalError, typicalErrorPercent },
  'ratio/acute-chronic-coupled.ts': { acuteChronicCoupled },
  'ratio/acute-chronic-exponential.ts': { acuteChronicExponential },
  'ratio/acute-chronic-uncoupled.ts': { acuteChronicUncoupled },
  'ratio/correlation.ts': { correlation },
  'ratio/coupled-from-uncoupled.ts': { coupledFromUncoupled, uncoupledFromCoupled },
  'response/impulse-influence.ts': { impulseInfluence },
  'response/impulse-response-convolution.ts': { impulseResponseConvolution },
  'response/impulse-response.ts': { impulseResponse, impulseResponseInclusive },
  'response/steady-state-sum.ts': { partialSumInclusive, steadyStateSumExclusive, steadyStateSumInclusive },
  'response/time-to-recover.ts': { gainRatioFromRecovery, timeToPeak, timeToRecover },
  'series/coefficient-of-variation.ts': { coefficientOfVariation },
  'series/exponential-mean.ts': { smoothingFactor },
  'series/mean.ts': { mean },
  'series/rolling-mean.ts': { rollingMean },
  'series/standard-deviation.ts': { standardDeviationSample },
};

export type CoreFunction = (...args: unknown[]) => unknown;
export type Core = Readonly<Record<string, CoreFunction>>;

export const core: Core = Object.assign({}, ...Object.values(homes)) as Core;

const homeOf: Readonly<Record<string, string>> = Object.fromEntries(
  Object.entries(homes).flatMap(([file, functions]) =>
    Object.keys(functions).map((name) => [name, `src/core/${file}#${name}`]),
  ),
);

/** File and name of a function under check. */
export function home(name: string): string {
  const found = homeOf[name];
  if (found === undefined) throw new Error(`no function ${name} among the functions under check`);
  return found;
}

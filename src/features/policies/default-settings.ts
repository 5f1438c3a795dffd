import type { DomainWeights, LoadPolicySettings, WeightsSource } from './policies.types.ts';

/**
 * Lucia A, Hoyos J, Santalla A, Earnest C, Chicharro JL. Tour de France versus Vuelta a España: which is harder?
 * Med Sci Sports Exerc 2003; 35: 872–878: minutes in three phases weigh 1, 2, 3. With four domains severe and extreme
 * both weigh 3.
 */
export const publishedWeights: DomainWeights = { moderate: 1, heavy: 2, severe: 3, extreme: 3 };

/** What a squad starts with. The ratio's limit is an own convention; monotony's is common practice, no source. */
export const defaultSettings: LoadPolicySettings = {
  primaryMeasure: 'domain-load',
  weights: publishedWeights,
  weightsSource: 'published three-phase weights',
  bound: { quantity: 'critical', fallbackLt2Method: null },
  ratio: { form: 'rolling-coupled', upper: 1.5 },
  monotony: { sd: 'population', upper: 2 },
  chronicLowShare: 0.5,
  thresholdMaxAgeWeeks: 8,
  filterTimeConstantS: 30,
};

export const firstPolicyDay = '2000-01-01';

/** Other weights than the published ones are the squad's own, and are printed as such. */
export function weightsSource(weights: DomainWeights): WeightsSource {
  const names = ['moderate', 'heavy', 'severe', 'extreme'] as const;
  return names.every((name) => weights[name] === publishedWeights[name])
    ? 'published three-phase weights'
    : 'own convention of the squad';
}

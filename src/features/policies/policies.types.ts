/** One heavy/severe bound: critical power or speed where there is one, else an LT2 value. */
export interface PolicyBound {
  quantity: 'critical' | 'lt2';
  /** The LT2 method that counts; null: the LT2 value in force, whatever its method. */
  fallbackLt2Method: string | null;
}

export interface DomainWeights {
  moderate: number;
  heavy: number;
  severe: number;
  extreme: number;
}

export type RatioForm = 'rolling-coupled' | 'rolling-uncoupled' | 'exponential';
export type WeightsSource = 'published three-phase weights' | 'own convention of the squad';

/** How a squad's load is weighed and judged. */
export interface LoadPolicySettings {
  primaryMeasure: 'domain-load' | 'rating-load';
  weights: DomainWeights;
  /** Follows from the weights; never given. */
  weightsSource: WeightsSource;
  bound: PolicyBound & { byModality?: Record<string, PolicyBound> };
  ratio: { form: RatioForm; upper: number };
  monotony: { sd: 'population' | 'sample'; upper: number };
  /** Chronic load below this share of the athlete's own 26-week median is a concern. */
  chronicLowShare: number;
  thresholdMaxAgeWeeks: number;
  filterTimeConstantS: number;
}

export interface LoadPolicy {
  id: string;
  squadId: string;
  /** Both ends included; null = open. */
  validFrom: string;
  validTo: string | null;
  settings: LoadPolicySettings;
}

/** The kind of exercise a threshold and a session belong to. */
export const modalities = ['rowing', 'cycling', 'running', 'swimming', 'skiing', 'strength', 'games', 'other'] as const;
export type Modality = (typeof modalities)[number];

/** Where or on what it is done; 'any' for a threshold that holds wherever no value of its own is there. */
export const settings = [
  'any',
  'ergometer',
  'water',
  'road',
  'track',
  'treadmill',
  'trail',
  'pool',
  'open-water',
  'snow',
  'gym',
] as const;
export type Setting = (typeof settings)[number];

export const quantities = [
  'lt1-power',
  'lt2-power',
  'critical-power',
  'lt1-speed',
  'lt2-speed',
  'critical-speed',
  'w-prime',
  'd-prime',
  'vo2max',
  'lt1-heart-rate',
  'lt2-heart-rate',
  'max-heart-rate',
  'resting-heart-rate',
  'body-mass',
] as const;
export type Quantity = (typeof quantities)[number];

/** Quantities of the athlete, whatever they train: kept with modality 'other' and setting 'any'. */
export const athleteQuantities: readonly Quantity[] = ['resting-heart-rate', 'body-mass'];

/** Quantities that are kept and shown, but weigh no session. */
export const unweighedQuantities: readonly Quantity[] = ['vo2max', 'body-mass'];

/** Unit and allowed range of each quantity; the database refuses the same. Ranges: own convention, wide on purpose. */
export const quantityRanges: Readonly<Record<Quantity, { unit: string; min: number; max: number }>> = {
  'lt1-power': { unit: 'W', min: 20, max: 1000 },
  'lt2-power': { unit: 'W', min: 20, max: 1000 },
  'critical-power': { unit: 'W', min: 20, max: 1000 },
  'lt1-speed': { unit: 'm/s', min: 0.2, max: 12 },
  'lt2-speed': { unit: 'm/s', min: 0.2, max: 12 },
  'critical-speed': { unit: 'm/s', min: 0.2, max: 12 },
  'w-prime': { unit: 'J', min: 1000, max: 60000 },
  'd-prime': { unit: 'm', min: 10, max: 1000 },
  vo2max: { unit: 'L/min', min: 0.5, max: 8 },
  'lt1-heart-rate': { unit: 'bpm', min: 60, max: 220 },
  'lt2-heart-rate': { unit: 'bpm', min: 60, max: 220 },
  'max-heart-rate': { unit: 'bpm', min: 100, max: 240 },
  'resting-heart-rate': { unit: 'bpm', min: 25, max: 120 },
  'body-mass': { unit: 'kg', min: 25, max: 250 },
};

/** What a threshold is a value of: values of one series follow each other in time. */
export interface ThresholdSeries {
  quantity: Quantity;
  modality: Modality;
  setting: Setting;
}

export interface ThresholdValue extends ThresholdSeries {
  id: string;
  athleteId: string;
  value: number;
  standardError: number | null;
  method: string;
  /** Both days included; null = until the next value. */
  validFrom: string;
  validTo: string | null;
  enteredBy: string | null;
  enteredAt: Date;
  /** The value this one corrects. */
  supersedes: string | null;
  withdrawnAt: Date | null;
  withdrawnBy: string | null;
  withdrawReason: string | null;
}

/** The part of a value that weighing needs and keeps. */
export type ResolvedThreshold = Pick<ThresholdValue, 'id' | 'quantity' | 'value' | 'validFrom' | 'method'>;

/** The set in force: one value a quantity. */
export type ThresholdSet = ReadonlyMap<Quantity, ResolvedThreshold>;

/** The set in force for an athlete on a day, for one modality and setting. */
export type ThresholdResolver = (athleteId: string, day: string, modality: Modality, setting: Setting) => ThresholdSet;

/** Days on which the value in force of one series has changed; null = from then on. */
export interface ThresholdChange extends ThresholdSeries {
  from: string;
  to: string | null;
}

import { above, whole, within } from '../guard.ts';

/** Limits of the load concern. */
export interface LoadConcernSettings {
  /** Acute:chronic ratio, rolling coupled 7:28 [no unit]. */
  readonly ratioLimit: number;
  /** Monotony, population SD [no unit]: common practice, no source. */
  readonly monotonyLimit: number;
  /** Chronic load as a fraction of its own median: own convention. */
  readonly chronicLowShare: number;
  /** Own history looked at [days]: own convention. */
  readonly historyDays: number;
  /** Log needed before the own history counts [days]: own convention. */
  readonly historyMinDays: number;
  /** A value is inside at this fraction of its limit: own convention. */
  readonly clearFactor: number;
  /** Days inside in a row that clear [days]: own convention. */
  readonly clearDays: number;
}

const DEFAULTS: LoadConcernSettings = {
  ratioLimit: 1.5,
  monotonyLimit: 2,
  chronicLowShare: 0.5,
  historyDays: 182,
  historyMinDays: 56,
  clearFactor: 0.95,
  clearDays: 3,
};

/** The settings with their defaults, checked. */
export function loadConcernSettings(given: Partial<LoadConcernSettings>): LoadConcernSettings {
  const settings = { ...DEFAULTS, ...given };
  const fn = 'loadConcern';
  above(fn, 'ratioLimit', settings.ratioLimit, 0);
  above(fn, 'monotonyLimit', settings.monotonyLimit, 0);
  above(fn, 'chronicLowShare', settings.chronicLowShare, 0, 1);
  whole(fn, 'historyDays', settings.historyDays, 1);
  whole(fn, 'historyMinDays', settings.historyMinDays, 1);
  within(fn, 'clearFactor', settings.clearFactor, 0.5, 1);
  whole(fn, 'clearDays', settings.clearDays, 1);
  return settings;
}

import { whole } from '../guard.ts';

/** How long the levels of the overreaching screen last at least; all own convention. */
export interface OverreachingSettings {
  /** Days in a row without its evidence before a level is left. */
  readonly clearDays: number;
  /** Fewest days at a level. */
  readonly minStayDays: number;
}

const DEFAULTS: OverreachingSettings = { clearDays: 3, minStayDays: 7 };

/** The settings with their defaults, checked. */
export function overreachingSettings(given: Partial<OverreachingSettings>): OverreachingSettings {
  const settings = { ...DEFAULTS, ...given };
  whole('overreachingScreen', 'clearDays', settings.clearDays, 1);
  whole('overreachingScreen', 'minStayDays', settings.minStayDays, 0);
  return settings;
}

import type { ThresholdChange } from './thresholds.types.ts';

/** Sessions that were weighed anew, or the task that does it. */
export interface Reweighed {
  sessionIds: string[];
  task: { id: string; total: number } | null;
}

/**
 * Told which values are in force differently now (port and DI token): the sessions these days touch get their weight
 * again. Runs inside the unit of work of the change, which holds the athlete's lock.
 */
export abstract class ThresholdChangeListener {
  abstract thresholdsChanged(athleteId: string, changes: readonly ThresholdChange[]): Promise<Reweighed>;
}

import type { LoadConcernDay } from '../types.ts';
import type { Constituent } from './constituent.ts';
import { spikeClass } from './session-spike.ts';

const LIMIT_PERCENT = 10;
const STAY_DAYS = 7;

/**
 * Stretches after a running session much longer than the longest of the 30 days before.
 *
 * @param days figures by day; spike: percent above the longest [%] and the session
 * @returns stretches with their evidence; value and limit [%]; the newest spike of a stretch is the one shown
 * @remarks Equation: raised when percent > 10; stays for 7 days from the newest spike (own convention). Muted by planned overload only.
 * Strength: (100 + percent) ÷ 110, the distance over the allowed distance. Limits: running distance only.
 * @see Frandsen JSB et al. 2025, Br J Sports Med 59(17):1203–1210, doi 10.1136/bjsports-2024-109380
 * @example
 * spikeConcern([{ day: 3, ratio: 1, chronic: 50, monotony: 1, strain: 400, muted: null, spike: { percent: 40, sessionId: 'a' } }]).map((c) => c.evidence.spikeClass); // => ['moderate']
 */
export function spikeConcern(days: readonly LoadConcernDay[]): Constituent[] {
  const done: Constituent[] = [];
  let open = null as Constituent | null;
  for (const { day, muted, spike } of days) {
    if (open !== null && (muted === 'planned-overload' || day >= open.evidence.day + STAY_DAYS)) {
      done.push({ ...open, until: day });
      open = null;
    }
    if (muted === 'planned-overload' || spike === null || spikeClass(spike.percent) === 'reference') continue;
    const { percent, sessionId } = spike;
    open = {
      since: open?.since ?? day,
      until: null,
      strength: (100 + percent) / (100 + LIMIT_PERCENT),
      evidence: {
        measure: 'spike',
        value: percent,
        limit: LIMIT_PERCENT,
        day,
        spikeClass: spikeClass(percent),
        sessionId,
      },
    };
  }
  return open === null ? done : [...done, open];
}

import { extremeBoundCycling, extremeBoundRunning } from '../../../core/domains/extreme-bound.ts';
import type { Bounds } from '../../../core/types.ts';
import type { Modality, Quantity, ResolvedThreshold, ThresholdSet } from '../../thresholds/thresholds.types.ts';
import type { BoundRule, WeighPolicy } from '../sessions.types.ts';
import type { Intensity } from './interval-bouts.ts';

export type ResolvedBounds =
  | { bounds: Bounds; used: ResolvedThreshold[] }
  /** What would have been needed. */
  | { missing: string };

/** The bounds of the domains for one kind of intensity, and the values they come from. */
export function resolveBounds(
  thresholds: ThresholdSet,
  modality: Modality,
  intensity: Intensity,
  policy: WeighPolicy,
): ResolvedBounds {
  const lt1 = thresholds.get(`lt1-${intensity}`);
  if (lt1 === undefined) return { missing: `lt1-${intensity}` };
  const bound =
    intensity === 'heart-rate' ? heartRateBound(thresholds) : workBound(thresholds, modality, intensity, policy);
  if (typeof bound === 'string') return { missing: bound };
  const top = extremeBound(thresholds, modality, intensity);
  // A bound at or above the domain it would end does not exist.
  const extreme = top !== null && top.value > bound.value ? top : null;
  return {
    bounds: { lt1: lt1.value, heavySevere: bound.value, extreme: extreme?.value ?? null },
    used: [...new Set([lt1, bound, ...(extreme?.used ?? [])])],
  };
}

function heartRateBound(thresholds: ThresholdSet): ResolvedThreshold | string {
  return thresholds.get('lt2-heart-rate') ?? 'lt2-heart-rate';
}

/** The one bound the policy names for this modality; it never changes by which test is newer. */
function workBound(
  thresholds: ThresholdSet,
  modality: Modality,
  intensity: 'power' | 'speed',
  { bound }: WeighPolicy,
): ResolvedThreshold | string {
  const rule: BoundRule = bound.byModality?.[modality] ?? bound;
  const critical = thresholds.get(`critical-${intensity}`);
  if (rule.quantity === 'critical' && critical !== undefined) return critical;
  const lt2 = thresholds.get(`lt2-${intensity}`);
  if (lt2 !== undefined && (rule.fallbackLt2Method === null || rule.fallbackLt2Method === lt2.method)) return lt2;
  const named = rule.fallbackLt2Method === null ? `lt2-${intensity}` : `lt2-${intensity} (${rule.fallbackLt2Method})`;
  return rule.quantity === 'critical' ? `critical-${intensity} or ${named}` : named;
}

/** Cycling power and running speed only: for the others no published time to exhaustion is used. */
function extremeBound(thresholds: ThresholdSet, modality: Modality, intensity: Intensity) {
  const pair = (critical: Quantity, capacity: Quantity, bound: (critical: number, capacity: number) => number) => {
    const low = thresholds.get(critical);
    const high = thresholds.get(capacity);
    if (low === undefined || high === undefined) return null;
    return { value: bound(low.value, high.value), used: [low, high] };
  };
  if (modality === 'cycling' && intensity === 'power') return pair('critical-power', 'w-prime', extremeBoundCycling);
  if (modality === 'running' && intensity === 'speed') return pair('critical-speed', 'd-prime', extremeBoundRunning);
  return null;
}

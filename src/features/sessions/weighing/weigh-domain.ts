import { timeInDomainFromBouts } from '../../../core/domains/time-in-domain-from-bouts.ts';
import { timeInDomainFromHeartRate } from '../../../core/domains/time-in-domain-from-heart-rate.ts';
import { domainLoad } from '../../../core/load/domain-load.ts';
import type { Basis, DomainMinutes } from '../../../core/types.ts';
import type { Modality, ResolvedThreshold, Setting } from '../../thresholds/thresholds.types.ts';
import type { DomainResult, IntervalLine, SessionEntry, WeighContext } from '../sessions.types.ts';
import { intensitiesOf, intervalBouts, intervalMinutes } from './interval-bouts.ts';
import type { Intensity } from './interval-bouts.ts';
import { resolveBounds } from './resolve-bounds.ts';

/** Share of a session's minutes that may stay without a domain (own convention). */
export const MAX_UNASSIGNED_SHARE = 0.1;

/** Where the same speed is the same intensity on another day (own convention, after the published cautions). */
const speedPlaces: readonly (readonly [Modality, Setting])[] = [
  ['running', 'track'],
  ['running', 'treadmill'],
  ['swimming', 'pool'],
  ['skiing', 'treadmill'],
];

export interface DomainWeighing {
  domain: DomainResult;
  basis: Basis;
  used: ResolvedThreshold[];
}

export type Weighable = Pick<
  SessionEntry,
  'durationMin' | 'modality' | 'setting' | 'rating' | 'meanHeartRateBpm' | 'content'
>;

/** Domain minutes and load of a session by the first basis it offers. */
export function weighDomain(session: Weighable, context: WeighContext): DomainWeighing {
  const { modality, content } = session;
  if (modality === 'strength' || modality === 'games') {
    const reason = `${modality} sessions have no intensity domains`;
    return { domain: { state: 'not-applicable', reason }, basis: 'rating', used: [] };
  }
  if (content.kind === 'intervals') return fromIntervals(session, content.lines, context);
  if (content.kind === 'domain-minutes') {
    const { moderate, heavy, severe, extreme } = content;
    const domain = judged(session, context, { moderate, heavy, severe, extreme }, 0);
    return { domain, basis: 'minutes', used: [] };
  }
  if (session.meanHeartRateBpm !== null) {
    return absent('heart-rate', 'a mean heart rate alone does not say how long each domain lasted');
  }
  return absent(
    'rating',
    session.rating === null ? 'nothing says how hard it was' : 'a rating alone gives no domain minutes',
  );
}

function fromIntervals(session: Weighable, lines: readonly IntervalLine[], context: WeighContext): DomainWeighing {
  const offered = intensitiesOf(lines);
  const allowed = offered.filter((kind) => kind !== 'speed' || speedCounts(session));
  const kind = allowed[0];
  if (kind === undefined) {
    return absent('interval', `speed is no measure of intensity for ${session.modality} (${session.setting})`);
  }
  const basis = kind === 'heart-rate' ? 'heart-rate' : 'interval';
  const resolved = resolveBounds(context.thresholds, session.modality, kind, context.policy);
  if ('missing' in resolved) return absent(basis, `no value in force for ${resolved.missing}`);
  const { minutes, unassignedMin } = countMinutes(lines, kind, resolved.bounds);
  const domain = judged(session, context, minutes, unassignedMin);
  return { domain, basis, used: resolved.used };
}

function countMinutes(
  lines: readonly IntervalLine[],
  kind: Intensity,
  bounds: { lt1: number; heavySevere: number; extreme: number | null },
): { minutes: DomainMinutes; unassignedMin: number } {
  const { bouts, restMin, otherMin } = intervalBouts(lines, kind);
  const counted =
    kind === 'heart-rate'
      ? timeInDomainFromHeartRate(
          bouts.map(({ durationMin, intensity }) => ({ durationMin, heartRateBpm: intensity })),
          bounds,
        )
      : { minutes: timeInDomainFromBouts(bouts, bounds), unassignedMin: 0 };
  return {
    // Rest between repetitions counts as moderate (own convention).
    minutes: { ...counted.minutes, moderate: counted.minutes.moderate + restMin },
    unassignedMin: counted.unassignedMin + otherMin,
  };
}

/** Load, if enough of the session's minutes have a domain. Minutes nobody described are unassigned. */
function judged(
  { durationMin, content }: Weighable,
  { policy }: WeighContext,
  minutes: DomainMinutes,
  withoutDomainMin: number,
): DomainResult {
  const described =
    content.kind === 'intervals'
      ? intervalMinutes(content.lines)
      : minutes.moderate + minutes.heavy + minutes.severe + minutes.extreme;
  const unassignedMin = withoutDomainMin + Math.max(0, durationMin - described);
  if (unassignedMin > MAX_UNASSIGNED_SHARE * durationMin + 1e-9) {
    const share = Math.ceil((100 * unassignedMin) / durationMin);
    return { state: 'absent', reason: `${share} % of the minutes have no domain (at most 10 %)`, unassignedMin };
  }
  return { state: 'present', load: domainLoad(minutes, policy.weights), minutes, unassignedMin };
}

function speedCounts({ modality, setting }: Weighable): boolean {
  return speedPlaces.some(
    ([allowedModality, allowedSetting]) => allowedModality === modality && allowedSetting === setting,
  );
}

function absent(basis: Basis, reason: string): DomainWeighing {
  return { domain: { state: 'absent', reason, unassignedMin: null }, basis, used: [] };
}

import { sessionRatingLoad } from '../../../core/load/session-rating-load.ts';
import type { ResolvedThreshold } from '../../thresholds/thresholds.types.ts';
import type { SessionWeight, WeighContext } from '../sessions.types.ts';
import { otherMeasures } from './other-measures.ts';
import { weighDomain } from './weigh-domain.ts';
import type { Weighable } from './weigh-domain.ts';

/** Raised whenever the same session, thresholds and policy would weigh differently than before. */
export const METHOD_VERSION = '1';

/**
 * What a session weighs: rating load, minutes and load by intensity domain, and the other measures it offers something
 * for. Pure: the same session, thresholds and policy always weigh the same, and only what was used is named.
 */
export function weighSession(session: Weighable, context: WeighContext): SessionWeight {
  const { domain, basis, used } = weighDomain(session, context);
  const others = otherMeasures(session, domain, context);
  return {
    ratingLoad: session.rating === null ? null : sessionRatingLoad(session.rating, session.durationMin),
    domain,
    basis,
    measures: others.measures,
    thresholdsUsed: named([...used, ...others.used]),
    policyId: context.policy.id,
    methodVersion: METHOD_VERSION,
  };
}

function named(used: readonly ResolvedThreshold[]): ResolvedThreshold[] {
  const once = new Map(used.map((threshold) => [threshold.quantity, threshold]));
  return [...once.values()]
    .map(({ quantity, id, value, validFrom, method }) => ({ quantity, id, value, validFrom, method }))
    .toSorted((a, b) => (a.quantity < b.quantity ? -1 : 1));
}

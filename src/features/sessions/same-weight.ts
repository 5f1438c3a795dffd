import type { SessionWeight } from './sessions.types.ts';

/**
 * Whether a session weighs the same from the same values. Which policy says so and when it was weighed do not matter:
 * a new policy that weighs the session as the old one did does not touch it.
 */
export function sameWeight(a: SessionWeight, b: SessionWeight): boolean {
  return canonical(a) === canonical(b);
}

function canonical({ ratingLoad, domain, basis, measures, thresholdsUsed, methodVersion }: SessionWeight): string {
  const used = thresholdsUsed.map(({ quantity, id, value, validFrom, method }) => [
    quantity,
    id,
    value,
    validFrom,
    method,
  ]);
  const others = measures.map(({ measure, method, version, value, reason }) => [
    measure,
    method,
    version,
    value,
    reason,
  ]);
  const parts =
    domain.state === 'present'
      ? [domain.load, ...minutesOf(domain.minutes), domain.unassignedMin]
      : [domain.reason, domain.state === 'absent' ? domain.unassignedMin : null];
  return JSON.stringify([ratingLoad, domain.state, parts, basis, others, used, methodVersion]);
}

function minutesOf({ moderate, heavy, severe, extreme }: Record<'moderate' | 'heavy' | 'severe' | 'extreme', number>) {
  return [moderate, heavy, severe, extreme];
}

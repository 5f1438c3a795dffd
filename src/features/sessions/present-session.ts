import type { SessionView } from './sessions.schema.ts';
import type { DomainResult, StoredWeight, WeighedSession } from './sessions.types.ts';

/** A session as the API shows it. */
export function presentSession({ weight, content, ...session }: WeighedSession): SessionView {
  return {
    ...session,
    startedAt: session.startedAt.toISOString(),
    createdAt: session.createdAt.toISOString(),
    updatedAt: session.updatedAt.toISOString(),
    withdrawnAt: session.withdrawnAt?.toISOString() ?? null,
    content: content.kind === 'none' ? null : content,
    weight: weight === null ? null : presentWeight(weight),
  };
}

function presentWeight({ domain, weighedAt, ...weight }: StoredWeight): NonNullable<SessionView['weight']> {
  return { ...weight, domain: presentDomain(domain), weighedAt: weighedAt.toISOString() };
}

function presentDomain(domain: DomainResult): NonNullable<SessionView['weight']>['domain'] {
  if (domain.state === 'present') {
    const { state, load, minutes, unassignedMin } = domain;
    return { state, reason: null, load, minutes, unassignedMin };
  }
  const unassignedMin = domain.state === 'absent' ? domain.unassignedMin : null;
  return { state: domain.state, reason: domain.reason, load: null, minutes: null, unassignedMin };
}

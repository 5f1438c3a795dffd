import { storedContentSchema } from '../features/sessions/session-content.schema.ts';
import { otherMeasuresSchema, thresholdsUsedSchema } from '../features/sessions/sessions.schema.ts';
import { qualities, sessionKinds } from '../features/sessions/sessions.types.ts';
import type { DomainResult, SessionRecord, StoredWeight } from '../features/sessions/sessions.types.ts';
import { modalities, settings } from '../features/thresholds/thresholds.types.ts';
import { dateOf, dayOf } from './days.ts';
import type { Prisma } from './generated/client.ts';
import type { SessionWeightModel, TrainingSessionModel } from './generated/models.ts';
import { oneOf } from './one-of.ts';

const bases = ['power', 'speed', 'interval', 'minutes', 'heart-rate', 'rating'] as const;
const domainStates = ['present', 'absent', 'not-applicable'] as const;

export function toSessionRow(clubId: string, session: SessionRecord): Prisma.TrainingSessionCreateManyInput {
  const { trainingDay, content, ...rest } = session;
  return {
    ...rest,
    clubId,
    trainingDay: dateOf(trainingDay),
    content: content as unknown as Prisma.InputJsonObject,
  };
}

export function toSession(row: TrainingSessionModel): SessionRecord {
  const { clubId: _, trainingDay, modality, setting, kind, ratingBy, content, quality, ...rest } = row;
  return {
    ...rest,
    trainingDay: dayOf(trainingDay),
    modality: oneOf(modalities, modality),
    setting: oneOf(settings, setting),
    kind: oneOf(sessionKinds, kind),
    ratingBy: ratingBy === null ? null : oneOf(['athlete', 'staff'] as const, ratingBy),
    content: storedContentSchema.parse(content),
    quality: oneOf(qualities, quality),
  };
}

/** A weight as a row of columns; also what the set-wise update sends as JSON. */
export function toWeightRow(clubId: string, sessionId: string, weight: StoredWeight) {
  const { domain, measures, thresholdsUsed, ...rest } = weight;
  const minutes = domain.state === 'present' ? domain.minutes : null;
  return {
    ...rest,
    clubId,
    sessionId,
    domainState: domain.state,
    domainReason: domain.state === 'present' ? null : domain.reason,
    domainLoad: domain.state === 'present' ? domain.load : null,
    moderateMin: minutes?.moderate ?? null,
    heavyMin: minutes?.heavy ?? null,
    severeMin: minutes?.severe ?? null,
    extremeMin: minutes?.extreme ?? null,
    unassignedMin: domain.state === 'not-applicable' ? null : domain.unassignedMin,
    measures: measures as unknown as Prisma.InputJsonArray,
    thresholdsUsed: thresholdsUsed as unknown as Prisma.InputJsonArray,
  };
}

export function toWeight(row: SessionWeightModel): StoredWeight {
  const { ratingLoad, policyId, methodVersion, weighedAt } = row;
  return {
    ratingLoad,
    domain: toDomain(row),
    basis: oneOf(bases, row.basis),
    measures: otherMeasuresSchema.parse(row.measures),
    thresholdsUsed: thresholdsUsedSchema.parse(row.thresholdsUsed),
    policyId,
    methodVersion,
    weighedAt,
  };
}

function toDomain(row: SessionWeightModel): DomainResult {
  const state = oneOf(domainStates, row.domainState);
  const reason = row.domainReason ?? '';
  if (state === 'not-applicable') return { state, reason };
  if (state === 'absent') return { state, reason, unassignedMin: row.unassignedMin };
  return {
    state,
    load: row.domainLoad ?? NaN,
    minutes: {
      moderate: row.moderateMin ?? 0,
      heavy: row.heavyMin ?? 0,
      severe: row.severeMin ?? 0,
      extreme: row.extremeMin ?? 0,
    },
    unassignedMin: row.unassignedMin ?? 0,
  };
}

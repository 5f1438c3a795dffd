import { Injectable } from '@nestjs/common';
import { AccessService } from '../access/access.service.ts';
import type { Principal } from '../access/access.types.ts';
import { AuditService } from '../access/audit.service.ts';
import { AthletesService } from '../athletes/athletes.service.ts';
import { Clock } from '../../platform/clock.ts';
import { ConflictError, ForbiddenError, NotFoundError } from '../../platform/errors.ts';
import { newId } from '../../platform/ids.ts';
import { localDay } from '../../platform/zoned-time.ts';
import { changedDays, dateValues } from './date-values.ts';
import { presentThreshold } from './present-threshold.ts';
import { ThresholdChangeListener } from './threshold-change.types.ts';
import type { Reweighed } from './threshold-change.types.ts';
import { refuseDisorder, refuseFutureDays, refuseMassJump, refuseMisfit, refuseSameDay } from './threshold-rules.ts';
import { ThresholdsRepository } from './thresholds.repository.ts';
import type { ThresholdCorrection, ThresholdEntry, ThresholdsInput } from './thresholds.schema.ts';
import type { ThresholdValue } from './thresholds.types.ts';

/** Enters, corrects and withdraws threshold values; what that changes is weighed again in the same unit of work. */
@Injectable()
export class ThresholdEntryService {
  constructor(
    private readonly thresholds: ThresholdsRepository,
    private readonly listener: ThresholdChangeListener,
    private readonly access: AccessService,
    private readonly athletes: AthletesService,
    private readonly audit: AuditService,
    private readonly clock: Clock,
  ) {}

  /** All values or none. */
  async enter(principal: Principal, athleteId: string, { values }: ThresholdsInput) {
    for (const { quantity } of values) await this.requireRight(principal, athleteId, quantity);
    const now = this.clock.now();
    refuseFutureDays(values, localDay(now, await this.athletes.zoneOn(athleteId, now)));
    await this.thresholds.lockForChange(athleteId);
    const before = await this.thresholds.list([athleteId]);
    refuseMassJump(values, before);
    const added = values.map((entry) => newValue(entry, { athleteId, enteredBy: principal.personId, enteredAt: now }));
    const { after, reweighed } = await this.change(athleteId, before, [...before, ...added]);
    await this.note('enter', athleteId, added);
    const stored = new Map(after.map((value) => [value.id, value]));
    return { items: added.map(({ id }) => presentThreshold(stored.get(id)!)), reweighed };
  }

  /** The old value stays in the history; the new one takes its days. */
  async correct(principal: Principal, athleteId: string, valueId: string, correction: ThresholdCorrection) {
    const { before, value } = await this.liveValue(principal, athleteId, valueId);
    refuseMisfit(value.quantity, correction);
    const enteredAt = this.clock.now();
    const corrected: ThresholdValue = {
      ...value,
      id: newId(enteredAt),
      value: correction.value,
      standardError: correction.standardError ?? null,
      method: correction.method ?? value.method,
      enteredBy: principal.personId,
      enteredAt,
      supersedes: value.id,
    };
    const rest = before.map((other) =>
      other.id === valueId ? withdrawn(other, principal, enteredAt, correction.reason) : other,
    );
    const { after, reweighed } = await this.change(athleteId, before, [...rest, corrected]);
    await this.note('correct', athleteId, [corrected]);
    return { item: presentThreshold(after.find(({ id }) => id === corrected.id)!), reweighed };
  }

  /** The value's days go back to the one before it. */
  async withdraw(principal: Principal, athleteId: string, valueId: string, reason: string) {
    const { before, value } = await this.liveValue(principal, athleteId, valueId);
    const now = this.clock.now();
    const rest = before.map((other) => (other.id === valueId ? withdrawn(other, principal, now, reason) : other));
    const { reweighed } = await this.change(athleteId, before, rest);
    await this.note('withdraw', athleteId, [value]);
    return { reweighed };
  }

  private async change(
    athleteId: string,
    before: ThresholdValue[],
    undated: ThresholdValue[],
  ): Promise<{ after: ThresholdValue[]; reweighed: Reweighed }> {
    refuseSameDay(undated, before);
    const after = dateValues(undated);
    refuseDisorder(after, before);
    await this.thresholds.save(before, after);
    const changes = changedDays(before, after);
    return { after, reweighed: await this.listener.thresholdsChanged(athleteId, changes) };
  }

  private async liveValue(principal: Principal, athleteId: string, valueId: string) {
    await this.thresholds.lockForChange(athleteId);
    const before = await this.thresholds.list([athleteId]);
    const value = before.find(({ id }) => id === valueId);
    if (value === undefined) throw new NotFoundError();
    await this.requireRight(principal, athleteId, value.quantity);
    if (value.withdrawnAt !== null) throw new ConflictError('The value was corrected or withdrawn before.');
    return { before, value };
  }

  private async requireRight(principal: Principal, athleteId: string, quantity: ThresholdValue['quantity']) {
    const target = { kind: 'athlete', id: athleteId } as const;
    const action = quantity === 'body-mass' ? 'health.write' : 'thresholds.write';
    if (await this.access.allows(principal, action, target)) return;
    if (quantity === 'body-mass') throw new ForbiddenError('Body mass is entered by the athlete or a medic.');
    throw new ForbiddenError(`This access may not enter ${quantity}.`);
  }

  private async note(what: string, athleteId: string, values: readonly ThresholdValue[]): Promise<void> {
    const noted = values.map(({ id, validFrom }) => ({ id, validFrom }));
    await this.audit.record(`thresholds.${what}`, 'athlete', athleteId, { values: noted });
  }
}

function newValue(
  { quantity, modality, setting, value, standardError, method, validFrom }: ThresholdEntry,
  made: Pick<ThresholdValue, 'athleteId' | 'enteredBy' | 'enteredAt'>,
): ThresholdValue {
  return {
    ...made,
    ...{ id: newId(made.enteredAt), quantity, modality: modality ?? 'other', setting, value },
    ...{ standardError: standardError ?? null, method, validFrom, validTo: null, supersedes: null },
    ...{ withdrawnAt: null, withdrawnBy: null, withdrawReason: null },
  };
}

function withdrawn(value: ThresholdValue, { personId }: Principal, at: Date, reason: string): ThresholdValue {
  return { ...value, withdrawnAt: at, withdrawnBy: personId, withdrawReason: reason };
}

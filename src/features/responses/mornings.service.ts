import { Injectable } from '@nestjs/common';
import { cleanRrIntervals } from '../../core/monitoring/clean-rr-intervals.ts';
import { rmssd } from '../../core/monitoring/rmssd.ts';
import { Clock } from '../../platform/clock.ts';
import { ConflictError, NotFoundError, PreconditionFailedError, RuleError } from '../../platform/errors.ts';
import { newId } from '../../platform/ids.ts';
import { localDay } from '../../platform/zoned-time.ts';
import { AccessService } from '../access/access.service.ts';
import type { Principal } from '../access/access.types.ts';
import { AuditService } from '../access/audit.service.ts';
import { AthletesService } from '../athletes/athletes.service.ts';
import { judgeMorning } from './judge-morning.ts';
import { MorningsRepository } from './mornings.repository.ts';
import type { MorningAddition, MorningInput, MorningReceipt, MorningsQuery, MorningView } from './mornings.schema.ts';
import type { Morning, MorningReadings, MorningValues } from './mornings.types.ts';
import { presentMorning, readingsOf, receiptOf } from './present-morning.ts';

const nothing: MorningValues = {
  ...{ sleepHours: null, sleep: null, fatigue: null, stress: null, soreness: null, mood: null },
  ...{ restingHeartRateBpm: null, rmssdMs: null },
};

/** Morning answers and measurements: the athlete's and the medic's to read, also staff's to enter. */
@Injectable()
export class MorningsService {
  constructor(
    private readonly mornings: MorningsRepository,
    private readonly athletes: AthletesService,
    private readonly access: AccessService,
    private readonly audit: AuditService,
    private readonly clock: Clock,
  ) {}

  async add(principal: Principal, athleteId: string, input: MorningInput): Promise<MorningView | MorningReceipt> {
    const { day, rrIntervalsMs = [], ...given } = input;
    const { today } = await this.refuseOutside(athleteId, day);
    if ((await this.mornings.find(athleteId, day)) !== null) {
      throw new ConflictError(`There is a morning of ${day} already.`, {
        fields: [{ field: 'day', value: day, allowed: 'a day without a morning', hint: 'Add to it with PATCH.' }],
      });
    }
    const now = this.clock.now();
    const morning: Morning = {
      ...nothing,
      ...withRmssd(given, rrIntervalsMs, { day, today }),
      ...{ id: newId(now), athleteId, day, version: 1 },
      ...{ enteredBy: principal.personId, enteredAt: now, updatedAt: now, withdrawnAt: null, withdrawReason: null },
    };
    await this.mornings.insert(morning);
    await this.audit.record('mornings.add', 'athlete', athleteId, { id: morning.id, day });
    return this.shown(principal, morning);
  }

  /** Adds what was not answered yet; changing an answer needs a reason, and keeps the version before. */
  async addTo(
    principal: Principal,
    { athleteId, day }: { athleteId: string; day: string },
    basedOn: number,
    { changeReason, rrIntervalsMs, ...given }: MorningAddition,
  ): Promise<MorningView | MorningReceipt> {
    const old = await this.current(athleteId, day, basedOn);
    const changed = (Object.keys(given) as (keyof MorningValues)[]).filter(
      (name) => old[name] !== null && given[name] !== undefined && given[name] !== old[name],
    );
    const measuredAgain = (rrIntervalsMs !== undefined || given.rmssdMs !== undefined) && old.rmssdMs !== null;
    if ((changed.length > 0 || measuredAgain) && changeReason === undefined) {
      throw new RuleError('An answer that is there is changed only with a reason.', [
        { field: 'changeReason', allowed: `text that says why ${changed.join(', ') || 'rmssdMs'} changes` },
      ]);
    }
    const { today, zone } = await this.refuseOutside(athleteId, day);
    const adds = (Object.keys(given) as (keyof MorningValues)[]).some((name) => old[name] === null);
    const intervals = rrIntervalsMs ?? (given.rmssdMs === undefined ? old.rrIntervalsMs : []);
    // A correction is as fresh as the answer it corrects; an addition is as late as it is made.
    const entered = adds ? today : localDay(old.enteredAt, zone);
    const next = {
      ...old,
      ...withRmssd({ ...valuesOf(old), ...given }, intervals, { day, today: entered }),
      ...{ version: old.version + 1, updatedAt: this.clock.now() },
    };
    await this.replace(principal, old, next, changeReason ?? null);
    return this.shown(principal, next);
  }

  /** Takes a morning out of everything; what was entered stays readable with the reason. */
  async withdraw(
    principal: Principal,
    { athleteId, day }: { athleteId: string; day: string },
    basedOn: number,
    reason: string,
  ): Promise<MorningView | MorningReceipt> {
    const old = await this.current(athleteId, day, basedOn);
    const now = this.clock.now();
    const next = { ...old, version: old.version + 1, updatedAt: now, withdrawnAt: now, withdrawReason: reason };
    await this.replace(principal, old, next, reason);
    return this.shown(principal, next);
  }

  async one(athleteId: string, day: string): Promise<MorningView> {
    const morning = await this.mornings.find(athleteId, day);
    if (morning === null) throw new NotFoundError();
    return presentMorning(morning);
  }

  async list(athleteId: string, { from, to }: MorningsQuery): Promise<MorningView[]> {
    return (await this.mornings.list([athleteId], from, to)).map(presentMorning);
  }

  async history(athleteId: string, day: string) {
    const revisions = await this.mornings.revisions(athleteId, day);
    return { items: revisions.map((one) => ({ ...one, changedAt: one.changedAt.toISOString() })) };
  }

  /** By athlete and day, of mornings that were not withdrawn: what flags rest on. */
  async readings(athleteIds: readonly string[], from: string, to: string): Promise<MorningReadings[]> {
    return (await this.mornings.list(athleteIds, from, to)).map(readingsOf);
  }

  private async current(athleteId: string, day: string, basedOn: number): Promise<Morning> {
    const morning = await this.mornings.find(athleteId, day);
    if (morning === null) throw new NotFoundError();
    if (morning.version !== basedOn) throw new PreconditionFailedError();
    return morning;
  }

  private async replace(principal: Principal, old: Morning, next: Morning, reason: string | null): Promise<void> {
    if (!(await this.mornings.replace(next, old.version))) throw new PreconditionFailedError();
    await this.mornings.insertRevision(old.id, {
      ...{ version: old.version, snapshot: presentMorning(old), reason },
      ...{ changedBy: principal.personId, changedAt: next.updatedAt },
    });
    const what = next.withdrawnAt === null ? 'mornings.change' : 'mornings.withdraw';
    await this.audit.record(what, 'athlete', old.athleteId, { id: old.id, day: old.day, version: next.version });
  }

  /** The athlete's zone and today; refuses a morning that has not come and one outside every membership. */
  private async refuseOutside(athleteId: string, day: string): Promise<{ zone: string; today: string }> {
    const now = this.clock.now();
    const zone = await this.athletes.zoneOn(athleteId, now);
    const today = localDay(now, zone);
    if (day > today) {
      throw new RuleError('That morning has not come yet.', [
        { field: 'day', value: day, allowed: `a date not after ${today}, the athlete's today` },
      ]);
    }
    if ((await this.athletes.squadOn(athleteId, day)) === null) {
      throw new RuleError('The athlete belonged to no squad that day.', [
        { field: 'day', value: day, allowed: 'a date within a membership' },
      ]);
    }
    return { zone, today };
  }

  private async shown(principal: Principal, morning: Morning): Promise<MorningView | MorningReceipt> {
    const reads = await this.access.allows(principal, 'responses.read', { kind: 'athlete', id: morning.athleteId });
    return reads ? presentMorning(morning) : receiptOf(morning);
  }
}

type Given = { [Name in keyof MorningValues]?: number | null | undefined };

/** RMSSD from the intervals where they are given, and how far the morning can be trusted. */
function withRmssd(given: Given, rrIntervalsMs: number[], when: { day: string; today: string }) {
  const cleaned = cleanRrIntervals(rrIntervalsMs);
  const removed = rrIntervalsMs.length === 0 ? null : cleaned.filter(Number.isNaN).length;
  const computed = removed === null ? undefined : rmssd(cleaned);
  if (computed !== undefined && !(computed >= 1 && computed <= 500)) {
    const allowed = 'intervals that give an RMSSD from 1 to 500 ms after artefacts are removed';
    const value = Number.isNaN(computed) ? null : Number(computed.toFixed(1));
    throw new RuleError('These intervals give no usable RMSSD.', [{ field: 'rrIntervalsMs', value, allowed }]);
  }
  const { quality, notes } = judgeMorning({ ...when, intervals: rrIntervalsMs.length, removed });
  const values = Object.fromEntries(Object.entries(given).filter(([, value]) => value !== undefined)) as Given;
  return {
    ...(values as Partial<MorningValues>),
    ...(computed === undefined ? {} : { rmssdMs: computed }),
    ...{ rrIntervalsMs, rrRemoved: removed, quality, qualityNotes: notes },
  };
}

function valuesOf({
  sleepHours,
  sleep,
  fatigue,
  stress,
  soreness,
  mood,
  restingHeartRateBpm,
  rmssdMs,
}: Morning): Given {
  return { sleepHours, sleep, fatigue, stress, soreness, mood, restingHeartRateBpm, rmssdMs };
}

import { Injectable } from '@nestjs/common';
import { dayNumber, isoDay } from '../../core/series/day.ts';
import { Clock } from '../../platform/clock.ts';
import { ConflictError, NotFoundError } from '../../platform/errors.ts';
import { newId } from '../../platform/ids.ts';
import { AuditService } from '../access/audit.service.ts';

import { defaultSettings, firstPolicyDay } from './default-settings.ts';
import { mergeSettings, weighsDifferently } from './merge-settings.ts';
import { PoliciesRepository } from './policies.repository.ts';
import type { PolicyInput } from './policies.schema.ts';
import type { LoadPolicy } from './policies.types.ts';

@Injectable()
export class PoliciesService {
  constructor(
    private readonly policies: PoliciesRepository,
    private readonly audit: AuditService,
    private readonly clock: Clock,
  ) {}

  /** The policy a squad is born with, valid for every day there may be. */
  async addFirst(squadId: string): Promise<LoadPolicy> {
    return this.insert(squadId, firstPolicyDay, defaultSettings);
  }

  /**
   * A new policy from a day on; the one in force until then ends the day before. Only the newest policy can be
   * followed: the past is not rewritten.
   * @returns the policy, and whether sessions from that day on weigh differently under it
   */
  async add(squadId: string, { validFrom, settings }: PolicyInput): Promise<{ policy: LoadPolicy; reweigh: boolean }> {
    const [newest] = await this.policies.list(squadId, { lock: true });
    if (newest === undefined) throw new NotFoundError();
    if (validFrom <= newest.validFrom) {
      throw new ConflictError(`A policy from ${newest.validFrom} on is there; a new one starts later.`, {
        fields: [{ field: 'validFrom', value: validFrom, allowed: `a date after ${newest.validFrom}` }],
      });
    }
    const merged = mergeSettings(newest.settings, settings);
    await this.policies.close(newest.id, isoDay(dayNumber(validFrom) - 1));
    const policy = await this.insert(squadId, validFrom, merged);
    await this.audit.record('policies.write', 'policy', policy.id, { squadId, validFrom });
    return { policy, reweigh: weighsDifferently(newest.settings, merged) };
  }

  /** The policy in force on a day. @throws {NotFoundError} before 2000 or for a squad that is not there */
  async policyOn(squadId: string, day: string): Promise<LoadPolicy> {
    const policy = await this.policies.on(squadId, day);
    if (policy === null) throw new NotFoundError('No policy is in force on that day.');
    return policy;
  }

  /** Newest first. */
  async list(squadId: string): Promise<LoadPolicy[]> {
    return this.policies.list(squadId);
  }

  private async insert(squadId: string, validFrom: string, settings: LoadPolicy['settings']): Promise<LoadPolicy> {
    const now = this.clock.now();
    const policy = { id: newId(now), squadId, validFrom, validTo: null, settings };
    await this.policies.insert({ ...policy, createdAt: now });
    return policy;
  }
}

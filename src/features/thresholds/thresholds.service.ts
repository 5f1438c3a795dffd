import { Injectable } from '@nestjs/common';
import { AccessService } from '../access/access.service.ts';
import type { Principal } from '../access/access.types.ts';
import { presentThreshold } from './present-threshold.ts';
import { resolveThresholds } from './resolve-thresholds.ts';
import { ThresholdsRepository } from './thresholds.repository.ts';
import type { InForceQuery, ThresholdQuery, ThresholdValueView } from './thresholds.schema.ts';
import type { Modality, Quantity, Setting, ThresholdResolver, ThresholdValue } from './thresholds.types.ts';

/** Reads thresholds. */
@Injectable()
export class ThresholdsService {
  constructor(
    private readonly thresholds: ThresholdsRepository,
    private readonly access: AccessService,
  ) {}

  /** Reads all values of these athletes at once; the answer resolves the set in force wherever it is asked. */
  async resolver(athleteIds: readonly string[]): Promise<ThresholdResolver> {
    const values = Map.groupBy(await this.thresholds.list(athleteIds), ({ athleteId }) => athleteId);
    return (athleteId, day, modality, setting) =>
      resolveThresholds(values.get(athleteId) ?? [], day, modality, setting);
  }

  /** The set in force on a day for one modality and setting. */
  async inForce(
    athleteId: string,
    day: string,
    modality: Modality,
    setting: Setting,
  ): Promise<Map<Quantity, ThresholdValue>> {
    return resolveThresholds(await this.thresholds.list([athleteId]), day, modality, setting);
  }

  /** The set in force as this person may see it. */
  async inForceView(principal: Principal, athleteId: string, query: InForceQuery) {
    const { date, modality, setting } = query;
    const set = await this.inForce(athleteId, date, modality, setting);
    return { date, modality, setting, items: await this.visible(principal, athleteId, [...set.values()]) };
  }

  /** The history as this person may see it, corrected and withdrawn values included. */
  async history(principal: Principal, athleteId: string, query: ThresholdQuery): Promise<ThresholdValueView[]> {
    const values = await this.thresholds.list([athleteId]);
    const asked = values.filter(
      ({ quantity, modality }) =>
        (query.quantity === undefined || query.quantity === quantity) &&
        (query.modality === undefined || query.modality === modality),
    );
    return this.visible(principal, athleteId, asked);
  }

  /** Body mass is the athlete's and the medic's. */
  private async visible(principal: Principal, athleteId: string, values: readonly ThresholdValue[]) {
    const all = await this.access.canSeeHealth(principal, athleteId);
    return values.filter(({ quantity }) => all || quantity !== 'body-mass').map(presentThreshold);
  }
}

import { Injectable } from '@nestjs/common';
import { PoliciesService } from '../policies/policies.service.ts';
import type { LoadPolicy } from '../policies/policies.types.ts';
import { ThresholdsService } from '../thresholds/thresholds.service.ts';
import { judgeSession } from './judge-session.ts';
import type { Judgement } from './judge-session.ts';
import type { AthleteContext, SessionEntry, SessionWeight } from './sessions.types.ts';
import { weighSession } from './weighing/weigh-session.ts';

export interface WeighPlace {
  /** The training day, and the squad of that day whose policy weighs. */
  day: string;
  squadId: string;
}

export type Weigh = (
  athlete: AthleteContext,
  place: WeighPlace,
  session: SessionEntry,
) => { judgement: Judgement; weight: SessionWeight };

/** Reads thresholds and policies of many sessions at once, and weighs each with those of its day. */
@Injectable()
export class WeigherService {
  constructor(
    private readonly thresholds: ThresholdsService,
    private readonly policies: PoliciesService,
  ) {}

  async weigher(athleteIds: readonly string[], squadIds: readonly string[]): Promise<Weigh> {
    const resolve = await this.thresholds.resolver(athleteIds);
    const policies = new Map<string, LoadPolicy[]>();
    for (const squadId of new Set(squadIds)) policies.set(squadId, await this.policies.list(squadId));
    return (athlete, { day, squadId }, session) => {
      const thresholds = resolve(athlete.athleteId, day, session.modality, session.setting);
      const { id, settings } = policyOn(policies.get(squadId) ?? [], day);
      const policy = { id, weights: settings.weights, bound: settings.bound };
      return {
        judgement: judgeSession(session, thresholds),
        weight: weighSession(session, { thresholds, sex: athlete.sex, policy }),
      };
    };
  }
}

function policyOn(policies: readonly LoadPolicy[], day: string): LoadPolicy {
  const policy = policies.find(({ validFrom, validTo }) => validFrom <= day && (validTo === null || day <= validTo));
  if (policy === undefined) throw new Error(`no load policy covers ${day}`);
  return policy;
}

import { Injectable } from '@nestjs/common';
import { Clock } from '../../platform/clock.ts';
import { newId } from '../../platform/ids.ts';
import { checkDays, checkExternalIds } from './check-days.ts';
import { placeSessions } from './place-sessions.ts';
import type { NewSession, PlacedSession } from './place-sessions.ts';
import type { SessionFault } from './session-faults.ts';
import { SessionsRepository } from './sessions.repository.ts';
import type { SessionRecord, SessionWeight, StoredWeight } from './sessions.types.ts';
import { WeigherService } from './weigher.service.ts';

export interface StoreOptions {
  enteredBy: string;
  groupId: string | null;
  /** Every session has to lie in the athlete's time with this squad. */
  squadId?: string;
  /** Told everything that is wrong with any of them; throws if that is anything. */
  refuse: (faults: readonly SessionFault[]) => void;
  /** Judge all, store nothing. */
  dryRun?: boolean;
}

type NewRecord = SessionRecord & { weight: StoredWeight };
type Weighed = PlacedSession & { weight: SessionWeight; quality: SessionRecord['quality']; qualityNotes: string[] };

/** Judges, weighs and stores sessions with their days' sums: all of them or none. */
@Injectable()
export class SessionStoreService {
  constructor(
    private readonly sessions: SessionsRepository,
    private readonly weigher: WeigherService,
    private readonly clock: Clock,
  ) {}

  async store(given: readonly NewSession[], options: StoreOptions): Promise<NewRecord[]> {
    const { weighed, faults } = await this.weigh(given, options.squadId);
    options.refuse(faults);
    if (options.dryRun === true) return [];
    const now = this.clock.now();
    const records = weighed.map((session) => newRecord(session, options, now));
    await this.sessions.insert(records);
    await this.sessions.recomputeDays(weighed);
    return records;
  }

  /** Holds the days, weighs each session and finds everything that is wrong with any of them. */
  private async weigh(given: readonly NewSession[], squadId: string | undefined) {
    const contexts = await this.sessions.athleteContexts([...new Set(given.map(({ athleteId }) => athleteId))]);
    const within = squadId === undefined ? {} : { squadId };
    const { placed, faults } = placeSessions(given, contexts, { now: this.clock.now(), ...within });
    const squadIds = [...new Set(placed.map((session) => session.squadId))];
    await this.sessions.holdForWriting({ squadIds, days: distinctDays(placed) });
    faults.push(...(await this.checkStored(placed)));
    const weigh = await this.weigher.weigher([...contexts.keys()], squadIds);
    const weighed = placed.map((session): Weighed => {
      const { judgement, weight } = weigh(session.athlete, session, session.entry);
      faults.push(...judgement.refused.map((fault) => ({ ...fault, index: session.index, kind: 'rule' as const })));
      return { ...session, weight, quality: judgement.quality, qualityNotes: judgement.notes };
    });
    return { weighed, faults: faults.toSorted((a, b) => a.index - b.index) };
  }

  private async checkStored(placed: readonly PlacedSession[]): Promise<SessionFault[]> {
    const named = placed.flatMap(({ athleteId, entry: { source, externalId } }) =>
      externalId === null ? [] : [{ athleteId, source, externalId }],
    );
    return [
      ...checkDays(placed, await this.sessions.minutesOfDays(distinctDays(placed))),
      ...checkExternalIds(placed, await this.sessions.knownExternalIds(named)),
    ];
  }
}

function newRecord(session: Weighed, { enteredBy, groupId }: StoreOptions, now: Date): NewRecord {
  const { athleteId, entry, day, zone, weight, quality, qualityNotes } = session;
  return {
    ...entry,
    ...{ id: newId(now), athleteId, groupId, zone, trainingDay: day, quality, qualityNotes, version: 1, enteredBy },
    ...{ createdAt: now, updatedAt: now, withdrawnAt: null, withdrawReason: null },
    weight: { ...weight, weighedAt: now },
  };
}

function distinctDays(placed: readonly PlacedSession[]): { athleteId: string; day: string }[] {
  return [...new Map(placed.map(({ athleteId, day }) => [`${athleteId}|${day}`, { athleteId, day }])).values()];
}

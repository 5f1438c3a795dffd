import { Injectable } from '@nestjs/common';
import { Clock } from '../../platform/clock.ts';
import { NotFoundError } from '../../platform/errors.ts';
import { newId } from '../../platform/ids.ts';
import { JobQueue } from '../../platform/job-queue.ts';
import { UnitOfWork } from '../../platform/unit-of-work.ts';
import type { Reweighed } from '../thresholds/threshold-change.types.ts';
import { unweighedQuantities } from '../thresholds/thresholds.types.ts';
import type { ThresholdChange } from '../thresholds/thresholds.types.ts';
import { ReweighRepository } from './reweigh.repository.ts';
import type { ReweighScope, ReweighTask } from './reweigh.repository.ts';
import { sameWeight } from './same-weight.ts';
import { SessionsRepository } from './sessions.repository.ts';
import type { WeighedSession } from './sessions.types.ts';
import { WeigherService } from './weigher.service.ts';

/** More sessions than this are weighed anew by a job, so that the request is not kept waiting. */
export const REWEIGH_IN_REQUEST = 500;
const BATCH = 200;

/** Weighs again exactly the sessions a change of thresholds or policy touches, and their days' sums. */
@Injectable()
export class ReweighService {
  constructor(
    private readonly tasks: ReweighRepository,
    private readonly sessions: SessionsRepository,
    private readonly weigher: WeigherService,
    private readonly queue: JobQueue,
    private readonly work: UnitOfWork,
    private readonly clock: Clock,
  ) {}

  /** Inside the unit of work of the change, which holds the athlete. */
  async thresholdsChanged(athleteId: string, changes: readonly ThresholdChange[]): Promise<Reweighed> {
    const weighing = changes.filter(({ quantity }) => !unweighedQuantities.includes(quantity));
    if (weighing.length === 0) return { sessionIds: [], task: null };
    return this.start({ kind: 'thresholds', athleteId, changes: weighing });
  }

  /** Inside the unit of work of the change. */
  async policyChanged(squadId: string, from: string): Promise<Reweighed> {
    return this.start({ kind: 'policy', squadId, from });
  }

  /**
   * Works on a task until it is done, each batch in a unit of work of its own: interrupted, it goes on behind the last
   * batch that was committed; done, it does nothing. Call it outside of a unit of work.
   */
  async processTask(clubId: string, taskId: string): Promise<void> {
    let state: ReweighTask['state'] = 'running';
    while (state !== 'done') {
      state = await this.work.run({ clubId, personId: null }, () => this.processBatch(taskId));
    }
  }

  /** @throws {NotFoundError} */
  async progress(taskId: string) {
    const { state, total, done, touched } = await this.task(taskId);
    return { state, total, done, sessionIds: touched };
  }

  private async start(scope: ReweighScope): Promise<Reweighed> {
    await this.hold(scope);
    const total = await this.tasks.count(scope);
    if (total === 0) return { sessionIds: [], task: null };
    const now = this.clock.now();
    if (total > REWEIGH_IN_REQUEST)
      return { sessionIds: [], task: { id: await this.addTask(scope, total, now), total } };
    const found = await this.tasks.candidates(scope, { after: null, limit: REWEIGH_IN_REQUEST });
    return { sessionIds: await this.weighAgain(found), task: null };
  }

  private async addTask(scope: ReweighScope, total: number, createdAt: Date): Promise<string> {
    const id = newId(createdAt);
    const [athleteId] = await this.tasks.athletes(scope);
    const progress = { done: 0, cursor: null, state: 'waiting', finishedAt: null } as const;
    const task = { id, athleteId: athleteId!, scope, total, ...progress, touched: [], createdAt };
    const clubId = await this.tasks.insertTask(task);
    await this.queue.enqueueOnce({ name: 'reweigh', key: id, clubId, data: { clubId, taskId: id } });
    return id;
  }

  private async processBatch(taskId: string): Promise<ReweighTask['state']> {
    await this.tasks.holdTask(taskId);
    const task = await this.task(taskId);
    if (task.state === 'done') return 'done';
    await this.hold(task.scope);
    const found = await this.tasks.candidates(task.scope, { after: task.cursor, limit: BATCH });
    const touched = await this.weighAgain(found);
    const state = found.length < BATCH ? 'done' : 'running';
    const finishedAt = state === 'done' ? this.clock.now() : null;
    const cursor = found.at(-1)?.id ?? task.cursor;
    await this.tasks.advance(taskId, { done: task.done + found.length, cursor, state, finishedAt, touched });
    return state;
  }

  /** Weighs each anew and stores those that weigh differently or from other values; answers their ids. */
  private async weighAgain(found: readonly WeighedSession[]): Promise<string[]> {
    const athletes = await this.sessions.athleteContexts([...new Set(found.map(({ athleteId }) => athleteId))]);
    const placed = found.flatMap((session) => {
      const athlete = athletes.get(session.athleteId);
      const squadId = athlete?.memberships.find(
        ({ from, to }) => from <= session.trainingDay && (to === null || session.trainingDay <= to),
      )?.squadId;
      // A day that is outside every membership by now keeps what it weighed then.
      return athlete === undefined || squadId === undefined ? [] : [{ session, athlete, squadId }];
    });
    const weigh = await this.weigher.weigher(
      [...athletes.keys()],
      placed.map(({ squadId }) => squadId),
    );
    const weighedAt = this.clock.now();
    const changed = placed.flatMap(({ session, athlete, squadId }) => {
      const { judgement, weight } = weigh(athlete, { day: session.trainingDay, squadId }, session);
      // What was accepted once stays; a value that would refuse it today makes it suspect.
      const quality = judgement.refused.length > 0 ? ('suspect' as const) : judgement.quality;
      const qualityNotes = [
        ...judgement.refused.map(({ field, allowed }) => `${field}: ${allowed}`),
        ...judgement.notes,
      ];
      const asBefore =
        session.weight !== null &&
        sameWeight(session.weight, weight) &&
        quality === session.quality &&
        qualityNotes.join('\n') === session.qualityNotes.join('\n');
      if (asBefore) return [];
      return [{ session, sessionId: session.id, weight: { ...weight, weighedAt }, quality, qualityNotes }];
    });
    await this.tasks.save(changed);
    await this.sessions.recomputeDays(
      changed.map(({ session: { athleteId, trainingDay: day } }) => ({ athleteId, day })),
    );
    return changed.map(({ sessionId }) => sessionId);
  }

  private async hold(scope: ReweighScope): Promise<void> {
    const athleteIds = await this.tasks.athletes(scope);
    const athletes = await this.sessions.athleteContexts(athleteIds);
    const squadIds = [...athletes.values()].flatMap(({ memberships }) => memberships.map(({ squadId }) => squadId));
    await this.sessions.holdAthletes({
      squadIds,
      changedSquadId: scope.kind === 'policy' ? scope.squadId : null,
      athleteIds,
    });
  }

  private async task(taskId: string): Promise<ReweighTask> {
    const task = await this.tasks.task(taskId);
    if (task === null) throw new NotFoundError();
    return task;
  }
}

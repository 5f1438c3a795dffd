import { afterAll, beforeAll, describe, expect, it } from '@jest/globals';
import { Logger } from '@nestjs/common';
import { schedule } from '../../jobs/schedule.ts';
import type { JobHandler } from '../../jobs/runner/job-handler.ts';
import { StaleAttemptError } from '../../src/features/jobs/jobs.errors.ts';
import type { JobKey } from '../../src/features/jobs/jobs.types.ts';
import { jobId } from '../../src/persistence/boss-job-queue.ts';
import { fixedClock } from '../support/clock.ts';
import { createTestDatabase } from '../support/database.ts';
import type { TestDatabase } from '../support/database.ts';
import { asOwner, makeSquad, workplace } from './support/workplace.ts';
import type { Workplace } from './support/workplace.ts';

const clock = fixedClock('2026-11-30T06:00:10Z');
let database: TestDatabase;
let one: Workplace;
let five: Workplace[];

beforeAll(async () => {
  Logger.overrideLogger(false);
  database = await createTestDatabase();
  five = Array.from({ length: 5 }, () => workplace(database, clock));
  one = five[0]!;
});

afterAll(async () => {
  await Promise.all(five.map((place) => place.close()));
  await database.drop();
});

const inClub = <T>(clubId: string, work: () => Promise<T>) => one.unitOfWork.run({ clubId, personId: null }, work);
const recordOf = (clubId: string, key: JobKey) => inClub(clubId, () => one.repository.find(key));
const queued = (clubId: string) =>
  asOwner(database, async (client) => {
    const { rows } = await client.query<{ id: string; state: string }>(
      `select id, state::text from pgboss.job where data ->> 'clubId' = $1 order by created_on`,
      [clubId],
    );
    return rows;
  });

describe('the queue', () => {
  it('takes a job with one name and key once, also when it is done', async () => {
    const { clubId } = await makeSquad(database);
    const job = { name: 'once', key: 'once|a|b', clubId, data: { a: 1 } };
    const send = () => inClub(clubId, () => one.queue.enqueueOnce(job));
    expect(await send()).toBe(true);
    expect(await send()).toBe(false);
    let seen: unknown;
    const handled = new Promise<void>((resolve) => {
      void one.workers.work('once', {}, async (attempt) => {
        seen = attempt;
        resolve();
      });
    });
    await handled;
    expect(seen).toEqual({ clubId, data: { a: 1 }, willBeTriedAgain: true });
    await until(async () => (await queued(clubId))[0]?.state === 'completed');
    expect(await send()).toBe(false);
    expect(await queued(clubId)).toHaveLength(1);
  });

  it('joins the transaction under way: what is rolled back was never queued', async () => {
    const { clubId } = await makeSquad(database);
    const job = { name: 'rolled', key: 'rolled|a', clubId, data: {} };
    const failing = inClub(clubId, async () => {
      expect(await one.queue.enqueueOnce(job)).toBe(true);
      throw new Error('no');
    });
    await expect(failing).rejects.toThrow('no');
    expect(await queued(clubId)).toEqual([]);
  });

  it('takes one that failed for good once more', async () => {
    const { clubId } = await makeSquad(database);
    const job = { name: 'failed', key: 'failed|a', clubId, data: {} };
    await inClub(clubId, () => one.queue.enqueueOnce(job));
    await asOwner(database, (client) =>
      client.query(`update pgboss.job set state = 'failed', completed_on = now() where id = $1`, [
        jobId('failed', 'failed|a'),
      ]),
    );
    expect(await inClub(clubId, () => one.queue.enqueueOnce(job))).toBe(true);
    expect(await inClub(clubId, () => one.queue.enqueueOnce(job))).toBe(false);
  });

  it('refuses to be used for another club', async () => {
    const [{ clubId }, other] = [await makeSquad(database), await makeSquad(database)];
    const job = { name: 'once', key: 'x', clubId: other.clubId, data: {} };
    await expect(inClub(clubId, () => one.queue.enqueueOnce(job))).rejects.toThrow('own club');
  });
});

describe('a tick', () => {
  it('of five workers at one moment claims each run once', async () => {
    const squads = [await makeSquad(database), await makeSquad(database, 'Pacific/Auckland')];
    const claims = (await Promise.all(five.map((place) => place.ticks.tick()))).flat();
    for (const { clubId, squadId } of squads) {
      const mine = claims.filter((run) => run.squadId === squadId);
      expect(mine.map(({ job }) => job).sort()).toEqual(['nightly-flags', 'weekly-report']);
      expect((await queued(clubId)).map(({ id }) => id).sort()).toEqual(
        mine.map((run) => jobId(run.job, `${run.job}|${squadId}|${run.period}`)).sort(),
      );
    }
    expect((await Promise.all(five.map((place) => place.ticks.tick()))).flat()).toEqual([]);
  });

  it('claims nothing again when the clock goes back, and the next period when it goes on', async () => {
    const { squadId } = await makeSquad(database, 'UTC', '2026-11-29T12:00:00Z');
    const mine = async () =>
      (await one.ticks.tick()).filter((run) => run.squadId === squadId).map(({ period }) => period);
    expect(await mine()).toEqual(['2026-W48', '2026-11-29']);
    clock.set('2026-11-29T23:00:00Z');
    expect(await mine()).toEqual(['2026-W48']);
    clock.set('2026-11-30T06:00:10Z');
    expect(await mine()).toEqual([]);
    clock.set('2026-12-07T06:00:00Z');
    expect(await mine()).toEqual(['2026-W49', '2026-12-06']);
    clock.set('2026-11-30T06:00:10Z');
  });
});

describe('an attempt', () => {
  const handler = (run: JobHandler['run']): JobHandler => ({ id: 'weekly-report', run, preview: async () => [] });
  const setUp = async () => {
    const { clubId, squadId } = await makeSquad(database);
    const key: JobKey = { job: 'weekly-report', squadId, period: '2026-W48' };
    return { clubId, key };
  };

  it('goes on from the steps that are done and is done once', async () => {
    const { clubId, key } = await setUp();
    const done: string[] = [];
    const steps = handler(async (run) => {
      await run.stepOnce('first', async () => void done.push('first'));
      if (done.length === 1 && !done.includes('failed')) {
        done.push('failed');
        throw new RangeError('a detail nobody should read');
      }
      await run.stepOnce('second', async () => void done.push('second'));
      return 'two steps';
    });
    await expect(one.runner.run(steps, clubId, key, true)).rejects.toThrow(RangeError);
    expect(await recordOf(clubId, key)).toMatchObject({
      state: 'queued',
      attempts: 1,
      progress: { steps: ['first'], note: 'RangeError' },
    });
    expect(await one.runner.run(steps, clubId, key, true)).toEqual({ state: 'done', note: 'two steps' });
    expect(done).toEqual(['first', 'failed', 'second']);
    expect(await recordOf(clubId, key)).toMatchObject({ state: 'done', attempts: 2, finishedAt: clock.now() });
    expect(await one.runner.run(steps, clubId, key, true)).toEqual({ state: 'done-before' });
    expect(done).toHaveLength(3);
  });

  it('that was overtaken writes nothing more and does not spoil the record', async () => {
    const { clubId, key } = await setUp();
    const done: string[] = [];
    const slow = handler(async (run) => {
      const fast = handler(async (later) => {
        await later.step(async () => void done.push('fast'));
        return 'fast';
      });
      await one.runner.run(fast, clubId, key, true);
      await run.step(async () => void done.push('slow'));
      return 'slow';
    });
    await expect(one.runner.run(slow, clubId, key, true)).rejects.toThrow(StaleAttemptError);
    expect(done).toEqual(['fast']);
    expect(await recordOf(clubId, key)).toMatchObject({ state: 'done', attempts: 2, progress: { note: 'fast' } });
  });

  it('that failed, or was killed where no queue looks after it, is taken up again by the schedule', async () => {
    const { clubId, key } = await setUp();
    const claimed = async (minutes: number) =>
      one.unitOfWork.runAsOperator(() =>
        one.repository.claimed([key], new Date(clock.now().getTime() + minutes * 60_000)),
      );
    const mine = (keys: JobKey[]) => keys.filter(({ squadId }) => squadId === key.squadId);
    // As the command does: begun without the queue, and killed.
    await inClub(clubId, () => one.records.begin(key));
    expect(mine(await claimed(0))).toHaveLength(1);
    expect(mine(await claimed(46))).toEqual([]);
    await expect(
      one.runner.run(
        handler(async () => Promise.reject(new Error('x'))),
        clubId,
        key,
        false,
      ),
    ).rejects.toThrow('x');
    expect(mine(await claimed(0))).toEqual([]);
    expect(await inClub(clubId, () => one.records.claim(clubId, key))).toBe(true);
    expect(mine(await claimed(46))).toHaveLength(1);
  });

  it('that fails last leaves the record failed, and a person may have it queued once more', async () => {
    const { clubId, key } = await setUp();
    const broken = handler(async () => Promise.reject(new Error('x')));
    expect(await inClub(clubId, () => one.records.claim(clubId, key))).toBe(true);
    await expect(one.runner.run(broken, clubId, key, false)).rejects.toThrow('x');
    expect(await recordOf(clubId, key)).toMatchObject({ state: 'failed', attempts: 1 });
    await asOwner(database, (client) =>
      client.query(`update pgboss.job set state = 'failed', completed_on = now() where data ->> 'clubId' = $1`, [
        clubId,
      ]),
    );
    expect(await inClub(clubId, () => one.records.claim(clubId, key))).toBe(true);
    expect(await recordOf(clubId, key)).toMatchObject({ state: 'queued', attempts: 1 });
    expect(await inClub(clubId, () => one.records.claim(clubId, key))).toBe(false);
  });
});

it('every scheduled job names each of its runs by a period of its kind', () => {
  for (const { id, period, catchUpHours } of schedule) {
    expect(['iso-week', 'day']).toContain(period);
    expect(catchUpHours).toBeLessThan(period === 'day' ? 24 : 168);
    expect(id).toMatch(/^[a-z-]+$/);
  }
});

async function until(test: () => Promise<boolean>): Promise<void> {
  while (!(await test())) await new Promise((resolve) => setTimeout(resolve, 50));
}

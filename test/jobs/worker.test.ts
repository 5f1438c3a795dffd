import { afterAll, afterEach, beforeAll, describe, expect, it } from '@jest/globals';
import type { INestApplicationContext } from '@nestjs/common';
import { randomUUID } from 'node:crypto';
import { runWorker } from '../../jobs/worker.ts';
import { readEnv } from '../../src/platform/env.ts';
import { JobQueue } from '../../src/platform/job-queue.ts';
import { UnitOfWork } from '../../src/platform/unit-of-work.ts';
import { startTestApp } from '../support/app.ts';
import type { TestApp, TestClub } from '../support/app.ts';
import { fixedClock } from '../support/clock.ts';
import { command, until } from '../commands/support/command.ts';
import type { Command } from '../commands/support/command.ts';
import { startMailServer } from './support/mail-server.ts';
import type { MailServer } from './support/mail-server.ts';
import { asOwner } from './support/workplace.ts';

const clock = fixedClock('2026-11-22T12:00:00Z');
const from = 'Loadweir <reports@loadweir.example>';
let app: TestApp;
let mail: MailServer;
let club: TestClub;
let squadId: string;
let people: { personId: string; token: string }[];
const workers: INestApplicationContext[] = [];
const children: Command[] = [];

beforeAll(async () => {
  app = await startTestApp({ clock });
  mail = await startMailServer();
  club = await app.newClub();
  squadId = await club.squad('Eight', 'UTC');
  people = [
    await club.person([{ role: 'coach', squadId }], 'Coach One'),
    await club.person([{ role: 'coach' }], 'Coach Two'),
    await club.person([{ role: 'staff', squadId }], 'Staff'),
    await club.person([{ role: 'manager' }], 'Manager'),
  ];
  const { athleteId } = await club.athlete(squadId, { memberFrom: '2026-11-01' });
  const days = Array.from({ length: 14 }, (_, i) => `2026-11-${String(16 + i).padStart(2, '0')}`);
  clock.set('2026-11-29T12:00:00Z');
  for (const day of days) {
    await post(`/v1/athletes/${athleteId}/sessions`, 201, {
      startedAt: `${day}T08:00:00Z`,
      durationMin: 60,
      modality: 'rowing',
      rating: 5,
    });
    if (day < '2026-11-28') await post(`/v1/squads/${squadId}/days/${day}/closing`, 200, {});
  }
});

afterEach(async () => {
  mail.release();
  for (const child of children.splice(0)) {
    child.signal('SIGKILL');
    await child.finished;
  }
  await Promise.all(workers.splice(0).map((worker) => worker.close()));
});

afterAll(async () => {
  await mail.close();
  await app.close();
});

const post = async (path: string, status: number, body: object, token = people[3]!.token) => {
  const answer = await app.api('POST', path, { token, body });
  expect([path, answer.status, answer.body]).toEqual([path, status, answer.body]);
  return answer.body as Record<string, unknown>;
};

async function startWorker(): Promise<INestApplicationContext> {
  const env = readEnv({ ...environment(), LOADWEIR_MODE: 'test' });
  const worker = await runWorker(env, clock, { tickSeconds: 1, pollingSeconds: 0.5 });
  workers.push(worker);
  return worker;
}

const environment = () => ({
  DATABASE_APP_URL: app.db.appUrl,
  SMTP_URL: mail.url,
  MAIL_FROM: from,
  LOG_LEVEL: process.env.TEST_LOG_LEVEL ?? 'silent',
});

const state = (job: string, period: string) =>
  asOwner(app.db, async (client) => {
    const { rows } = await client.query<{ state: string; attempts: number; detail: string }>(
      'select state, attempts, detail from job_record where job = $1 and period = $2 and squad_id = $3',
      [job, period, squadId],
    );
    return rows[0];
  });
const isDone = (job: string, period: string) => async () => (await state(job, period))?.state === 'done';

const deliveries = (isoWeek: string) =>
  asOwner(app.db, async (client) => {
    const { rows } = await client.query<{ email: string; message_id: string; state: string; version: number }>(
      `select d.email, d.message_id, d.state, r.version from report r
       left join report_delivery d on d.club_id = r.club_id and d.report_id = r.id
       where r.squad_id = $1 and r.iso_week = $2 order by d.email`,
      [squadId, isoWeek],
    );
    return rows;
  });

describe('workers', () => {
  it('remind the staff on Sunday evening of the days that are open', async () => {
    clock.set('2026-11-29T18:00:00Z');
    await startWorker();
    await until(isDone('log-reminder', '2026-W48'));
    expect(mail.accepted).toHaveLength(1);
    const [{ to, messageId, subject, raw }] = mail.accepted as [(typeof mail.accepted)[0]];
    expect(to).toHaveLength(1);
    expect(messageId).toBe(`<log-reminder.2026-W48.${squadId}.${people[2]!.personId}@loadweir.example>`);
    expect(subject).toBe('Eight: 2 days of week 2026-W48 are not closed');
    expect(raw).toContain('Saturday 2026-11-28');
    expect(raw).toContain('Sunday 2026-11-29 (today)');
    expect(raw).not.toContain('2026-11-27');
  });

  it('five at one moment make one report and mail it once to each coach', async () => {
    mail.accepted.length = 0;
    for (const day of ['2026-11-28', '2026-11-29']) await post(`/v1/squads/${squadId}/days/${day}/closing`, 200, {});
    clock.set('2026-11-30T06:00:10Z');
    await Promise.all(Array.from({ length: 5 }, () => startWorker()));
    await until(isDone('weekly-report', '2026-W48'));
    await until(isDone('nightly-flags', '2026-11-29'));
    const rows = await deliveries('2026-W48');
    expect(rows.map(({ state: sent, version }) => [sent, version])).toEqual([
      ['sent', 1],
      ['sent', 1],
    ]);
    expect(mail.accepted.map(({ messageId }) => messageId).sort()).toEqual(rows.map((row) => row.message_id).sort());
    expect(mail.accepted.flatMap(({ to }) => to).sort()).toEqual(rows.map(({ email }) => email).sort());
    expect(mail.offered()).toBe(3);
    expect((await state('weekly-report', '2026-W48'))?.attempts).toBe(1);
  });

  it('killed in the middle of a mail is replaced by another, and the mail still comes once', async () => {
    mail.accepted.length = 0;
    clock.set('2026-12-07T06:00:10Z');
    mail.hold();
    const offered = mail.offered();
    const killed = command('jobs/main.js', [], {
      ...environment(),
      LOADWEIR_MODE: 'test',
      LOADWEIR_CLOCK_OFFSET_MS: String(clock.now().getTime() - Date.now()),
    });
    children.push(killed);
    await until(() => mail.offered() === offered + 1, 60_000);
    killed.signal('SIGKILL');
    expect(await killed.finished).toMatchObject({ signal: 'SIGKILL' });
    expect(await state('weekly-report', '2026-W49')).toMatchObject({ state: 'running', attempts: 1 });
    mail.release();
    await startWorker();
    await until(isDone('weekly-report', '2026-W49'), 45_000);
    expect((await state('weekly-report', '2026-W49'))?.attempts).toBe(2);
    const rows = await deliveries('2026-W49');
    expect(rows.map(({ state: sent, version }) => [sent, version])).toEqual([
      ['sent', 1],
      ['sent', 1],
    ]);
    expect(mail.accepted.map(({ messageId }) => messageId).sort()).toEqual(rows.map((row) => row.message_id).sort());
  });

  it('take the runs a person asks for: once, and only for a period that has its time', async () => {
    await startWorker();
    const path = `/v1/squads/${squadId}/job-runs`;
    const run = { job: 'nightly-flags', period: '2026-12-04' };
    expect(await post(path, 202, run)).toEqual({ queued: true });
    await until(isDone('nightly-flags', '2026-12-04'));
    expect(await post(path, 202, run)).toEqual({ queued: false });
    expect(await post(path, 422, { ...run, period: '2026-12-07' })).toMatchObject({ errors: [{ field: 'period' }] });
    await post(path, 400, { ...run, period: '2026-W49' });
    await post(path, 400, { job: 'everything', period: '2026-12-04' });
    await post(path, 403, run, people[0]!.token);
    const { body } = await app.api('GET', path, { token: people[3]!.token });
    const listed = (body as { items: Record<string, unknown>[] }).items.map(({ job, period, state: of }) => [
      job,
      period,
      of,
    ]);
    expect(listed).toContainEqual(['weekly-report', '2026-W49', 'done']);
    expect(listed).toContainEqual(['nightly-flags', '2026-12-04', 'done']);
  });

  it('weigh anew what a change of policy touches, once', async () => {
    const taskId = randomUUID();
    await asOwner(app.db, async (client) => {
      await client.query(
        `insert into reweigh_task (club_id, id, athlete_id, scope, total, done, touched, state, created_at)
         select club_id, $1, id, $2, 14, 0, '{}', 'waiting', $3 from athlete`,
        [taskId, JSON.stringify({ kind: 'policy', squadId, from: '2026-11-01' }), clock.now()],
      );
    });
    const job = { name: 'reweigh', key: taskId, clubId: club.clubId, data: { clubId: club.clubId, taskId } };
    const scope = { clubId: club.clubId, personId: null };
    const queue = () => app.app.get(UnitOfWork).run(scope, () => app.app.get(JobQueue).enqueueOnce(job));
    expect(await queue()).toBe(true);
    await startWorker();
    const progress = async () =>
      (await app.api('GET', `/v1/reweighings/${taskId}`, { token: people[3]!.token })).body as Record<string, unknown>;
    await until(async () => (await progress()).state === 'done');
    expect(await progress()).toMatchObject({ total: 14, done: 14, sessionIds: [] });
    expect(await queue()).toBe(false);
  });
});

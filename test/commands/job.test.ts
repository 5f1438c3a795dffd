import { afterAll, beforeAll, describe, expect, it } from '@jest/globals';
import { randomUUID } from 'node:crypto';
import { existsSync, readdirSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import { jobArguments } from '../../src/commands/job/arguments.ts';
import { findSquad } from '../../src/commands/job/find-squad.ts';
import { rolledBack } from '../../src/commands/job/rolled-back.ts';
import { UsageError } from '../../src/commands/support/usage-error.ts';
import { defaultSettings } from '../../src/features/policies/default-settings.ts';
import { asOwner, makeSquad } from '../jobs/support/workplace.ts';
import { createTestDatabase } from '../support/database.ts';
import type { TestDatabase } from '../support/database.ts';
import { command, temporaryFolder } from './support/command.ts';

const refusal = (work: () => unknown): string => {
  try {
    work();
  } catch (error) {
    expect(error).toBeInstanceOf(UsageError);
    return (error as Error).message;
  }
  throw new Error('it was not refused');
};

describe('the arguments of npm run job', () => {
  const read = (text: string) => jobArguments(text.split(' '));

  it('name job, squad and period', () => {
    expect(read('weekly-report --squad Eight --week 2026-W53 --dry-run')).toEqual({
      job: 'weekly-report',
      squad: 'Eight',
      club: undefined,
      period: '2026-W53',
      dryRun: true,
    });
    expect(read('nightly-flags --squad Eight --club Rowers')).toMatchObject({ club: 'Rowers', period: undefined });
    expect(read('--help')).toBeNull();
    expect(jobArguments([])).toBeNull();
  });

  it('are refused with what would be right', () => {
    expect(refusal(() => read('weekly --squad Eight'))).toContain('weekly-report, log-reminder, nightly-flags');
    expect(refusal(() => read('weekly-report --week 2026-W48'))).toContain('--squad');
    expect(refusal(() => read('weekly-report --squad Eight --week 2025-W53'))).toContain('an ISO week like');
    expect(refusal(() => read('weekly-report --squad Eight --day 2026-11-23'))).toContain('takes --week');
    expect(refusal(() => read('nightly-flags --squad Eight --day 2026-02-29'))).toContain('a date like');
    expect(refusal(() => read('nightly-flags --squad Eight --loud'))).toContain('--loud');
  });

  it('find a squad by name or id, in a club where the name alone is not enough', () => {
    const createdAt = new Date();
    const squads = ['a', 'b'].map((clubId) => ({
      clubId,
      squadId: `${clubId}1`,
      name: 'Eight',
      zone: 'UTC',
      createdAt,
    }));
    const clubs = new Map([
      ['a', 'Rowers'],
      ['b', 'Runners'],
    ]);
    const find = (squad: string, club?: string) => findSquad(squads, clubs, { squad, club });
    expect(find('b1').clubId).toBe('b');
    expect(find('Eight', 'Rowers').squadId).toBe('a1');
    expect(refusal(() => find('Eight'))).toContain('Eight (club Runners, id b1)');
    expect(refusal(() => find('Four'))).toContain('Eight (club Rowers, id a1)');
    expect(refusal(() => find('Eight', 'Swimmers'))).toContain('Rowers, Runners');
    expect(refusal(() => findSquad([], new Map(), { squad: 'x', club: undefined }))).toContain('none yet');
  });
});

it('a unit of work that is rolled back gives its answer, and its failure', async () => {
  const unit = (work: () => Promise<never>) => work();
  expect(await rolledBack(unit, async () => 7)).toBe(7);
  await expect(rolledBack(unit, () => Promise.reject(new Error('broken')))).rejects.toThrow('broken');
});

describe('npm run job', () => {
  let database: TestDatabase;
  const outbox = temporaryFolder();
  const coaches = ['anna@example.org', 'bo@example.org'];

  beforeAll(async () => {
    database = await createTestDatabase();
    const { clubId } = await makeSquad(database, 'Europe/Prague', '2026-01-01T00:00:00Z');
    await asOwner(database, async (client) => {
      for (const email of coaches) {
        const personId = randomUUID();
        await client.query(
          `insert into person (club_id, id, name, email, created_at) values ($1, $2, 'Coach', $3, now())`,
          [clubId, personId, email],
        );
        await client.query(
          `insert into role_assignment (club_id, id, person_id, role, created_at) values ($1, $2, $3, 'coach', now())`,
          [clubId, randomUUID(), personId],
        );
      }
      await client.query(
        `insert into load_policy (club_id, id, squad_id, valid_from, settings, created_at)
         select club_id, gen_random_uuid(), id, '2000-01-01', $1, now() from squad`,
        [JSON.stringify(defaultSettings)],
      );
    });
  });

  afterAll(async () => {
    outbox.remove();
    await database.drop();
  });

  const job = (args: string, env: Record<string, string> = {}) =>
    command('src/commands/job.js', args.split(' '), {
      DATABASE_URL: database.ownerUrl,
      DATABASE_APP_URL: database.appUrl,
      OUTBOX_DIR: outbox.path,
      LOADWEIR_MODE: 'test',
      LOADWEIR_FIXED_TODAY: '2026-12-01',
      ...env,
    }).finished;

  const written = () =>
    asOwner(database, async (client) => {
      const { rows } = await client.query<{ count: string }>(
        `select (select count(*) from report) + (select count(*) from report_delivery) + (select count(*) from flag)
           + (select count(*) from job_record) + (select count(*) from audit_entry) as count`,
      );
      return Number(rows[0]!.count);
    });

  it('says in a dry run what would be made and sent, and writes nothing', async () => {
    const { code, stdout, stderr } = await job('weekly-report --squad Eight --week 2026-W48 --dry-run');
    expect([code, stderr]).toEqual([0, '']);
    expect(stdout).toContain('dry run, nothing is written');
    expect(stdout).toContain('It was not run before.');
    expect(stdout).toContain('version 1 would be made');
    for (const email of coaches) expect(stdout).toContain(email);
    expect(await written()).toBe(0);
    expect(readdirSync(outbox.path)).toEqual([]);
  });

  it('runs the job once, and says so the second time', async () => {
    const first = await job('weekly-report --squad Eight');
    expect([first.code, first.stderr]).toEqual([0, '']);
    expect(first.stdout).toContain('Report 2026-W48 version 1: mailed to 2.');
    const mails = readdirSync(outbox.path).filter((name) => name.endsWith('.eml'));
    expect(mails).toHaveLength(2);
    const texts = mails.map((name) => readFileSync(join(outbox.path, name), 'utf8'));
    for (const email of coaches) expect(texts.filter((text) => text.includes(`To: ${email}`))).toHaveLength(1);
    const rows = await written();
    const again = await job('weekly-report --squad Eight --week 2026-W48');
    expect(again).toMatchObject({ code: 0 });
    expect(again.stdout).toMatch(/It is done since 2026-12-01\S+ and would not run again\. Report 2026-W48 version 1/);
    expect(await written()).toBe(rows);
    expect(existsSync(join(outbox.path, mails[0]!))).toBe(true);
  });

  it('refuses a period before its time with one clear line', async () => {
    const { code, stdout, stderr } = await job('weekly-report --squad Eight --week 2026-W49');
    expect([code, stdout]).toEqual([1, '']);
    expect(stderr).toBe('The job weekly-report needs a period that has ended.\n');
  });
});

describe('npm run bench', () => {
  it('lists its benches for a name it does not know', async () => {
    const { code, stdout, stderr } = await command('src/commands/bench.js', ['get', '--json'], {}).finished;
    expect([code, stdout]).toEqual([2, '']);
    expect(stderr).toContain('there are: post');
  });
});

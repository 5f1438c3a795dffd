import { NestFactory } from '@nestjs/core';
import type { INestApplicationContext } from '@nestjs/common';
import { JobHandlersModule } from '../../jobs/jobs.module.ts';
import { JOB_HANDLERS } from '../../jobs/runner/job-handler.ts';
import type { JobHandler } from '../../jobs/runner/job-handler.ts';
import { JobRunner } from '../../jobs/runner/job-runner.ts';
import { schedule } from '../../jobs/schedule.ts';
import { coveredPeriod } from '../features/jobs/job-period.ts';
import { JobRecordRepository } from '../features/jobs/job-record.repository.ts';
import { JobRunsService } from '../features/jobs/job-runs.service.ts';
import { jobKinds } from '../features/jobs/jobs.types.ts';
import type { JobKey, JobRecord } from '../features/jobs/jobs.types.ts';
import { Clock, SystemClock } from '../platform/clock.ts';
import { readEnv } from '../platform/env.ts';
import { UnitOfWork } from '../platform/unit-of-work.ts';
import { localDay } from '../platform/zoned-time.ts';
import { jobArguments } from './job/arguments.ts';
import type { JobArguments } from './job/arguments.ts';
import { findSquad } from './job/find-squad.ts';
import { rolledBack } from './job/rolled-back.ts';
import { openDatabase } from './support/open-database.ts';
import { runCommand } from './support/run-command.ts';

const HELP = `Runs one job of a squad now, by the same code as the worker. A run that is done is not done again.

  npm run job -- weekly-report --squad NAME|ID [--week 2026-W48] [--club NAME|ID] [--dry-run]
  npm run job -- log-reminder  --squad NAME|ID [--week 2026-W48] [--club NAME|ID] [--dry-run]
  npm run job -- nightly-flags --squad NAME|ID [--day 2026-11-23] [--club NAME|ID] [--dry-run]
  npm run job -- --help

Without --week or --day: the period the schedule would take now. --dry-run says what would be made and sent and writes
nothing. The database is the one in DATABASE_URL, or the embedded one under DATA_DIR, running or not.

${schedule.map(({ id, description }) => `  ${id.padEnd(14)} ${description}`).join('\n')}
`;

await runCommand(async (args) => {
  const given = jobArguments(args);
  if (given === null) {
    process.stdout.write(HELP);
    return 0;
  }
  const database = await openDatabase(readEnv(), (line) => process.stderr.write(`${line}\n`));
  try {
    const clock = new SystemClock(database.env.LOADWEIR_CLOCK_OFFSET_MS);
    const module = JobHandlersModule.for(database.env, clock);
    const context = await NestFactory.createApplicationContext(module, { logger: false, abortOnError: false });
    try {
      for (const line of await answer(context, given)) process.stdout.write(`${line}\n`);
      return 0;
    } finally {
      await context.close();
    }
  } finally {
    await database.stop();
  }
});

async function answer(context: INestApplicationContext, given: JobArguments): Promise<string[]> {
  const unitOfWork = context.get(UnitOfWork);
  const records = context.get(JobRecordRepository);
  const squad = await unitOfWork.runAsOperator(async () =>
    findSquad(await records.squadsOfAllClubs(), await records.clubNames(), given),
  );
  const { clubId, squadId, zone } = squad;
  const today = localDay(context.get(Clock).now(), zone);
  const key: JobKey = { job: given.job, squadId, period: given.period ?? coveredPeriod(jobKinds[given.job], today) };
  context.get(JobRunsService).refuseTooEarly(key.job, key.period, zone);
  const handler = context.get<JobHandler[]>(JOB_HANDLERS).find(({ id }) => id === key.job)!;
  const title = `${key.job} ${key.period}, squad ${squad.name}`;
  const inClub = <T>(work: () => Promise<T>) => unitOfWork.run({ clubId, personId: null }, work);
  if (given.dryRun) {
    const lines = await rolledBack(inClub, async () => [
      recorded(await records.find(key)),
      ...(await handler.preview(key)),
    ]);
    return [`${title}: dry run, nothing is written.`, ...lines];
  }
  const outcome = await context.get(JobRunner).run(handler, clubId, key, false);
  if (outcome.state === 'done') return [`${title}: ${outcome.note}`];
  return [`${title}: ${recorded(await inClub(() => records.find(key)))}`];
}

function recorded(record: JobRecord | null): string {
  if (record === null) return 'It was not run before.';
  const { state, attempts, finishedAt, progress } = record;
  const note = progress.note === undefined ? '' : ` ${progress.note}`;
  if (state === 'done') return `It is done since ${finishedAt?.toISOString()} and would not run again.${note}`;
  return `It is ${state}, begun ${attempts} times.${note}`;
}

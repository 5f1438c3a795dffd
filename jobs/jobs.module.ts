import { Module } from '@nestjs/common';
import type { DynamicModule, Type } from '@nestjs/common';
import { ScheduleModule } from '@nestjs/schedule';
import { LoggerModule, PinoLogger } from 'nestjs-pino';
import { BossJobWorkers } from '../src/persistence/boss-job-workers.ts';
import type { Clock } from '../src/platform/clock.ts';
import { databaseAppUrl } from '../src/platform/database-url.ts';
import type { Env } from '../src/platform/env.ts';
import { JobWorkers } from '../src/platform/job-workers.ts';
import { httpLoggerOptions } from '../src/platform/logger.ts';
import { ServicesModule } from '../src/services.module.ts';
import { LogReminderJob } from './log-reminder.job.ts';
import { NightlyFlagsJob } from './nightly-flags.job.ts';
import { ReweighJob } from './reweigh.job.ts';
import { JOB_HANDLERS } from './runner/job-handler.ts';
import type { JobHandler } from './runner/job-handler.ts';
import { JobHands } from './runner/job-hands.ts';
import { JobRunner } from './runner/job-runner.ts';
import { TickService } from './runner/tick.service.ts';
import { TICK_SECONDS, Ticker } from './runner/ticker.ts';
import { WeeklyReportJob } from './weekly-report.job.ts';

export interface WorkerOptions {
  tickSeconds?: number;
  /** How often an idle worker looks for work. */
  pollingSeconds?: number;
}

const handlers: Type<JobHandler>[] = [WeeklyReportJob, LogReminderJob, NightlyFlagsJob];

/** The jobs and what runs one of them now; no worker, no ticking. */
@Module({})
export class JobHandlersModule {
  static for(env: Env, clock: Clock): DynamicModule {
    const logging = LoggerModule.forRoot({ pinoHttp: httpLoggerOptions(env) });
    return {
      module: JobHandlersModule,
      imports: [logging, ServicesModule.for(env, clock)],
      providers: [
        ...handlers,
        { provide: JOB_HANDLERS, inject: handlers, useFactory: (...list: JobHandler[]) => list },
        JobRunner,
      ],
      exports: [JOB_HANDLERS, JobRunner],
    };
  }
}

/** The worker process: looks every half minute what is due, and works on what is queued. */
@Module({})
export class JobsModule {
  static for(env: Env, clock: Clock, options: WorkerOptions = {}): DynamicModule {
    const workers = (logger: PinoLogger) =>
      new BossJobWorkers({
        url: databaseAppUrl(env),
        onError: (error) => logger.error({ err: error }, 'the queue met an error'),
        ...(options.pollingSeconds === undefined ? {} : { pollingSeconds: options.pollingSeconds }),
      });
    return {
      module: JobsModule,
      imports: [ScheduleModule.forRoot(), JobHandlersModule.for(env, clock)],
      providers: [
        { provide: JobWorkers, inject: [PinoLogger], useFactory: workers },
        { provide: TICK_SECONDS, useValue: options.tickSeconds ?? 30 },
        TickService,
        Ticker,
        ReweighJob,
        JobHands,
      ],
    };
  }
}

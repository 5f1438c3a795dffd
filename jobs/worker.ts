import { NestFactory } from '@nestjs/core';
import type { INestApplicationContext } from '@nestjs/common';
import { Logger } from 'nestjs-pino';
import type { Clock } from '../src/platform/clock.ts';
import type { Env } from '../src/platform/env.ts';
import { JobsModule } from './jobs.module.ts';
import type { WorkerOptions } from './jobs.module.ts';

/** Starts a worker in this process; `close` of what it answers gives attempts under way time to end. */
export async function runWorker(env: Env, clock: Clock, options: WorkerOptions = {}): Promise<INestApplicationContext> {
  const context = await NestFactory.createApplicationContext(JobsModule.for(env, clock, options), {
    bufferLogs: true,
    abortOnError: false,
  });
  context.useLogger(context.get(Logger));
  return context;
}

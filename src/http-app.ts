import { NestFactory } from '@nestjs/core';
import type { NestFastifyApplication } from '@nestjs/platform-fastify';
import { Logger } from 'nestjs-pino';
import type { DestinationStream } from 'pino';
import { AppModule } from './app.module.ts';
import { serveDocs } from './delivery/http/docs.ts';
import { createAdapter, prepareServer } from './delivery/http/server.ts';
import { SystemClock } from './platform/clock.ts';
import type { Clock } from './platform/clock.ts';
import type { Env } from './platform/env.ts';

export interface RunningApi {
  /** Where it listens. */
  url: string;
  app: NestFastifyApplication;
  /** Lets requests under way be answered, then closes. */
  close: () => Promise<void>;
}

/** The API, ready to listen; logs go to standard output where nothing else is said. */
export async function createHttpApp(
  env: Env,
  clock: Clock,
  logTo?: DestinationStream,
): Promise<NestFastifyApplication> {
  const module = AppModule.for(env, clock, logTo);
  const app = await NestFactory.create<NestFastifyApplication>(module, createAdapter(clock), {
    bodyParser: false,
    bufferLogs: true,
    abortOnError: false,
  });
  try {
    app.useLogger(app.get(Logger));
    await prepareServer(app);
    serveDocs(app);
    await app.init();
    return app;
  } catch (error) {
    await app.close();
    throw error;
  }
}

/** Starts the API in this process at HOST and PORT. Signals are the caller's matter. */
export async function runApi(env: Env, clock: Clock = clockOf(env), logTo?: DestinationStream): Promise<RunningApi> {
  const app = await createHttpApp(env, clock, logTo);
  try {
    await app.listen(env.PORT, env.HOST);
  } catch (error) {
    await app.close();
    throw error;
  }
  return { url: (await app.getUrl()).replace('[::1]', 'localhost'), app, close: () => app.close() };
}

function clockOf(env: Env): Clock {
  return new SystemClock(env.LOADWEIR_CLOCK_OFFSET_MS);
}

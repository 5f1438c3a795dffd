import { Module } from '@nestjs/common';
import type { DynamicModule } from '@nestjs/common';
import { LoggerModule } from 'nestjs-pino';
import type { DestinationStream } from 'pino';
import { HttpModule } from './delivery/http/http.module.ts';
import type { Clock } from './platform/clock.ts';
import type { Env } from './platform/env.ts';
import { httpLoggerOptions } from './platform/logger.ts';
import { ServicesModule } from './services.module.ts';

/** The API process: the services, and HTTP in front of them. */
@Module({})
export class AppModule {
  static for(env: Env, clock: Clock, logTo?: DestinationStream): DynamicModule {
    // The default route of nestjs-pino matches nothing on Fastify.
    const options = httpLoggerOptions(env);
    const pinoHttp = logTo === undefined ? options : ([options, logTo] as [typeof options, DestinationStream]);
    const logging = LoggerModule.forRoot({ pinoHttp, forRoutes: ['/*splat'] });
    return { module: AppModule, imports: [logging, ServicesModule.for(env, clock), HttpModule] };
  }
}

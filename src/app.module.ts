import { Module } from '@nestjs/common';
import type { DynamicModule } from '@nestjs/common';
import { LoggerModule } from 'nestjs-pino';
import { HttpModule } from './delivery/http/http.module.ts';
import type { Clock } from './platform/clock.ts';
import type { Env } from './platform/env.ts';
import { loggerOptions } from './platform/logger.ts';
import { ServicesModule } from './services.module.ts';

/** The API process: the services, and HTTP in front of them. */
@Module({})
export class AppModule {
  static for(env: Env, clock: Clock): DynamicModule {
    // The default route of nestjs-pino matches nothing on Fastify.
    const logging = LoggerModule.forRoot({ pinoHttp: loggerOptions(env), forRoutes: ['/*splat'] });
    return { module: AppModule, imports: [logging, ServicesModule.for(env, clock), HttpModule] };
  }
}

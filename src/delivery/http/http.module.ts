import { Module } from '@nestjs/common';
import { APP_FILTER, APP_INTERCEPTOR, APP_PIPE, DiscoveryModule } from '@nestjs/core';
import { AccessRules } from './access-rules.ts';
import { AthletesController } from './athletes.controller.ts';
import { AvailabilityController } from './availability.controller.ts';
import { CircumstancesController } from './circumstances.controller.ts';
import { ClubsController } from './clubs.controller.ts';
import { DaysController } from './days.controller.ts';
import { FlagsController } from './flags.controller.ts';
import { HealthController } from './health.controller.ts';
import { JobRunsController } from './job-runs.controller.ts';
import { MeController } from './me.controller.ts';
import { MorningsController } from './mornings.controller.ts';
import { PeopleController } from './people.controller.ts';
import { PeriodsController } from './periods.controller.ts';
import { PoliciesController } from './policies.controller.ts';
import { ProblemFilter } from './problem.filter.ts';
import { ReportsController } from './reports.controller.ts';
import { RequestInterceptor } from './request.interceptor.ts';
import { ReweighingsController } from './reweighings.controller.ts';
import { RouteTable } from './route-table.ts';
import { SeriesController } from './series.controller.ts';
import { SessionImportsController } from './session-imports.controller.ts';
import { SessionsController } from './sessions.controller.ts';
import { SquadsController } from './squads.controller.ts';
import { TestsController } from './tests.controller.ts';
import { ThresholdsController } from './thresholds.controller.ts';
import { TokensController } from './tokens.controller.ts';
import { ZodPipe } from './zod.pipe.ts';

@Module({
  imports: [DiscoveryModule],
  controllers: [
    AthletesController,
    AvailabilityController,
    CircumstancesController,
    ClubsController,
    DaysController,
    FlagsController,
    HealthController,
    JobRunsController,
    MeController,
    MorningsController,
    PeopleController,
    PeriodsController,
    PoliciesController,
    ReportsController,
    ReweighingsController,
    SeriesController,
    SessionImportsController,
    SessionsController,
    SquadsController,
    TestsController,
    ThresholdsController,
    TokensController,
  ],
  providers: [
    AccessRules,
    RouteTable,
    { provide: APP_INTERCEPTOR, useClass: RequestInterceptor },
    { provide: APP_PIPE, useClass: ZodPipe },
    { provide: APP_FILTER, useClass: ProblemFilter },
  ],
  exports: [RouteTable],
})
export class HttpModule {}

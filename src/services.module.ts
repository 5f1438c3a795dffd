import { Module } from '@nestjs/common';
import type { DynamicModule } from '@nestjs/common';
import { AccessModule } from './features/access/access.module.ts';
import { AthletesModule } from './features/athletes/athletes.module.ts';
import { AvailabilityModule } from './features/availability/availability.module.ts';
import { ClubsModule } from './features/clubs/clubs.module.ts';
import { DaysModule } from './features/days/days.module.ts';
import { FlagsModule } from './features/flags/flags.module.ts';
import { JobRecordsModule } from './features/jobs/jobs.module.ts';
import { PeopleModule } from './features/people/people.module.ts';
import { PeriodsModule } from './features/periods/periods.module.ts';
import { PoliciesModule } from './features/policies/policies.module.ts';
import { ReportsModule } from './features/reports/reports.module.ts';
import { ResponsesModule } from './features/responses/responses.module.ts';
import { SeriesModule } from './features/series/series.module.ts';
import { ReweighModule } from './features/sessions/reweigh.module.ts';
import { SessionsModule } from './features/sessions/sessions.module.ts';
import { SquadsModule } from './features/squads/squads.module.ts';
import { TestsModule } from './features/tests/tests.module.ts';
import { ThresholdsModule } from './features/thresholds/thresholds.module.ts';
import { PersistenceModule } from './persistence/persistence.module.ts';
import { Clock } from './platform/clock.ts';
import type { Env } from './platform/env.ts';
import { createMailTransport } from './platform/mail/create-mail-transport.ts';
import { MailTransport } from './platform/mail/mail-transport.ts';
import { ENV } from './platform/tokens.ts';

const features = [
  AccessModule,
  AthletesModule,
  AvailabilityModule,
  ClubsModule,
  DaysModule,
  FlagsModule,
  JobRecordsModule,
  PeopleModule,
  PeriodsModule,
  PoliciesModule,
  ReportsModule,
  ResponsesModule,
  ReweighModule,
  SeriesModule,
  SessionsModule,
  SquadsModule,
  TestsModule,
  ThresholdsModule,
];

/** What the API and the worker share: environment, clock, persistence and every feature. */
@Module({})
export class ServicesModule {
  static for(env: Env, clock: Clock): DynamicModule {
    return {
      module: ServicesModule,
      global: true,
      imports: [PersistenceModule.for(env), ...features],
      providers: [
        { provide: ENV, useValue: env },
        { provide: Clock, useValue: clock },
        { provide: MailTransport, useFactory: () => createMailTransport(env) },
      ],
      exports: [ENV, Clock, MailTransport, ...features],
    };
  }
}

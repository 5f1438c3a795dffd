import { Module } from '@nestjs/common';
import type { DynamicModule, Provider } from '@nestjs/common';
import { AccessRepository } from '../features/access/access.repository.ts';
import { AuditRepository } from '../features/access/audit.repository.ts';
import { IdempotencyRepository } from '../features/access/idempotency.repository.ts';
import { TokensRepository } from '../features/access/tokens.repository.ts';
import { AthletesRepository } from '../features/athletes/athletes.repository.ts';
import { AvailabilityRepository } from '../features/availability/availability.repository.ts';
import { CircumstancesRepository } from '../features/responses/circumstances.repository.ts';
import { MorningsRepository } from '../features/responses/mornings.repository.ts';
import { ClubsRepository } from '../features/clubs/clubs.repository.ts';
import { DaysRepository } from '../features/days/days.repository.ts';
import { JobRecordRepository } from '../features/jobs/job-record.repository.ts';
import { FlagRepository } from '../features/flags/flags.repository.ts';
import { PeopleRepository } from '../features/people/people.repository.ts';
import { PeriodsRepository } from '../features/periods/periods.repository.ts';
import { PoliciesRepository } from '../features/policies/policies.repository.ts';
import { ReportRepository } from '../features/reports/reports.repository.ts';
import { ReweighRepository } from '../features/sessions/reweigh.repository.ts';
import { SessionsRepository } from '../features/sessions/sessions.repository.ts';
import { SquadsRepository } from '../features/squads/squads.repository.ts';
import { TestsRepository } from '../features/tests/tests.repository.ts';
import { ThresholdsRepository } from '../features/thresholds/thresholds.repository.ts';
import { databaseAppUrl } from '../platform/database-url.ts';
import type { Env } from '../platform/env.ts';
import { JobQueue } from '../platform/job-queue.ts';
import { Readiness } from '../platform/readiness.ts';
import { UnitOfWork } from '../platform/unit-of-work.ts';
import { BossJobQueue } from './boss-job-queue.ts';
import { PrismaAccessRepository } from './prisma-access.repository.ts';
import { PrismaAthletesRepository } from './prisma-athletes.repository.ts';
import { PrismaAuditRepository } from './prisma-audit.repository.ts';
import { PrismaAvailabilityRepository } from './prisma-availability.repository.ts';
import { PrismaCircumstancesRepository } from './prisma-circumstances.repository.ts';
import { PrismaMorningsRepository } from './prisma-mornings.repository.ts';
import { PrismaClubsRepository } from './prisma-clubs.repository.ts';
import { PrismaDayRepository } from './prisma-day.repository.ts';
import { PrismaFlagRepository } from './prisma-flag.repository.ts';
import { PrismaIdempotencyRepository } from './prisma-idempotency.repository.ts';
import { PrismaJobRecordRepository } from './prisma-job-record.repository.ts';
import { PrismaPeopleRepository } from './prisma-people.repository.ts';
import { PrismaPeriodRepository } from './prisma-period.repository.ts';
import { PrismaPoliciesRepository } from './prisma-policies.repository.ts';
import { PrismaReadiness } from './prisma-readiness.ts';
import { PrismaReportRepository } from './prisma-report.repository.ts';
import { PrismaReweighRepository } from './prisma-reweigh.repository.ts';
import { PrismaSessionRepository } from './prisma-session.repository.ts';
import { PrismaSquadsRepository } from './prisma-squads.repository.ts';
import { PrismaTestsRepository } from './prisma-tests.repository.ts';
import { PrismaThresholdRepository } from './prisma-threshold.repository.ts';
import { PrismaTokensRepository } from './prisma-tokens.repository.ts';
import { PrismaUnitOfWork } from './prisma-unit-of-work.ts';
import { PrismaService } from './prisma.service.ts';

/** Every port of the services and what stands behind it; one line each. */
const ports: Provider[] = [
  { provide: UnitOfWork, useClass: PrismaUnitOfWork },
  { provide: Readiness, useClass: PrismaReadiness },
  { provide: AccessRepository, useClass: PrismaAccessRepository },
  { provide: AthletesRepository, useClass: PrismaAthletesRepository },
  { provide: AuditRepository, useClass: PrismaAuditRepository },
  { provide: AvailabilityRepository, useClass: PrismaAvailabilityRepository },
  { provide: CircumstancesRepository, useClass: PrismaCircumstancesRepository },
  { provide: MorningsRepository, useClass: PrismaMorningsRepository },
  { provide: ClubsRepository, useClass: PrismaClubsRepository },
  { provide: DaysRepository, useClass: PrismaDayRepository },
  { provide: FlagRepository, useClass: PrismaFlagRepository },
  { provide: IdempotencyRepository, useClass: PrismaIdempotencyRepository },
  { provide: JobRecordRepository, useClass: PrismaJobRecordRepository },
  { provide: PeopleRepository, useClass: PrismaPeopleRepository },
  { provide: PeriodsRepository, useClass: PrismaPeriodRepository },
  { provide: PoliciesRepository, useClass: PrismaPoliciesRepository },
  { provide: ReportRepository, useClass: PrismaReportRepository },
  { provide: ReweighRepository, useClass: PrismaReweighRepository },
  { provide: SessionsRepository, useClass: PrismaSessionRepository },
  { provide: SquadsRepository, useClass: PrismaSquadsRepository },
  { provide: TestsRepository, useClass: PrismaTestsRepository },
  { provide: ThresholdsRepository, useClass: PrismaThresholdRepository },
  { provide: TokensRepository, useClass: PrismaTokensRepository },
];

@Module({})
export class PersistenceModule {
  static for(env: Env): DynamicModule {
    const database: Provider = {
      provide: PrismaService,
      useFactory: () => new PrismaService({ url: databaseAppUrl(env) }),
    };
    const queue: Provider = { provide: JobQueue, useFactory: () => new BossJobQueue({ url: databaseAppUrl(env) }) };
    return {
      module: PersistenceModule,
      global: true,
      providers: [database, queue, ...ports],
      exports: [PrismaService, JobQueue, ...ports.map((port) => ('provide' in port ? port.provide : port))],
    };
  }
}

import { Module } from '@nestjs/common';
import { AccessModule } from '../access/access.module.ts';
import { SquadsModule } from '../squads/squads.module.ts';
import { ReweighModule } from './reweigh.module.ts';
import { SessionImportService } from './session-import.service.ts';
import { SessionReadingService } from './session-reading.service.ts';
import { SessionStoreService } from './session-store.service.ts';
import { SessionsService } from './sessions.service.ts';

@Module({
  imports: [AccessModule, ReweighModule, SquadsModule],
  providers: [SessionsService, SessionStoreService, SessionReadingService, SessionImportService],
  exports: [SessionsService, SessionReadingService, SessionImportService],
})
export class SessionsModule {}

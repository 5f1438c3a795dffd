import { Module } from '@nestjs/common';
import { AccessModule } from '../access/access.module.ts';
import { AthletesModule } from '../athletes/athletes.module.ts';
import { TestDefinitionsService } from './test-definitions.service.ts';
import { TestResultsService } from './test-results.service.ts';

@Module({
  imports: [AccessModule, AthletesModule],
  providers: [TestDefinitionsService, TestResultsService],
  exports: [TestDefinitionsService, TestResultsService],
})
export class TestsModule {}

import { Module } from '@nestjs/common';
import { AccessModule } from '../access/access.module.ts';
import { AthletesModule } from '../athletes/athletes.module.ts';
import { ThresholdEntryService } from './threshold-entry.service.ts';
import { ThresholdsService } from './thresholds.service.ts';

@Module({
  imports: [AccessModule, AthletesModule],
  providers: [ThresholdsService, ThresholdEntryService],
  exports: [ThresholdsService, ThresholdEntryService],
})
export class ThresholdsModule {}

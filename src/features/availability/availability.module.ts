import { Module } from '@nestjs/common';
import { AccessModule } from '../access/access.module.ts';
import { AthletesModule } from '../athletes/athletes.module.ts';
import { AvailabilityService } from './availability.service.ts';

@Module({
  imports: [AccessModule, AthletesModule],
  providers: [AvailabilityService],
  exports: [AvailabilityService],
})
export class AvailabilityModule {}

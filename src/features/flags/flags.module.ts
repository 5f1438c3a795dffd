import { Module } from '@nestjs/common';
import { PoliciesModule } from '../policies/policies.module.ts';
import { SeriesModule } from '../series/series.module.ts';
import { SquadsModule } from '../squads/squads.module.ts';
import { FlagsService } from './flags.service.ts';

@Module({ imports: [SeriesModule, SquadsModule, PoliciesModule], providers: [FlagsService], exports: [FlagsService] })
export class FlagsModule {}

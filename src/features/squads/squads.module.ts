import { Module } from '@nestjs/common';
import { AccessModule } from '../access/access.module.ts';
import { PoliciesModule } from '../policies/policies.module.ts';
import { SquadsService } from './squads.service.ts';

@Module({ imports: [AccessModule, PoliciesModule], providers: [SquadsService], exports: [SquadsService] })
export class SquadsModule {}

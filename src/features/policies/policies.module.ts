import { Module } from '@nestjs/common';
import { AccessModule } from '../access/access.module.ts';
import { PoliciesService } from './policies.service.ts';

@Module({ imports: [AccessModule], providers: [PoliciesService], exports: [PoliciesService] })
export class PoliciesModule {}

import { Module } from '@nestjs/common';
import { AccessModule } from '../access/access.module.ts';
import { PeopleService } from './people.service.ts';

@Module({ imports: [AccessModule], providers: [PeopleService], exports: [PeopleService] })
export class PeopleModule {}

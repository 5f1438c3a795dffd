import { Module } from '@nestjs/common';
import { AccessModule } from '../access/access.module.ts';
import { PeopleModule } from '../people/people.module.ts';
import { ClubsService } from './clubs.service.ts';

@Module({ imports: [AccessModule, PeopleModule], providers: [ClubsService], exports: [ClubsService] })
export class ClubsModule {}

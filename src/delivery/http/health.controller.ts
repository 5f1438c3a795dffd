import { Controller, Get } from '@nestjs/common';
import { ApiOperation, ApiTags } from '@nestjs/swagger';
import { z } from 'zod';
import { UnavailableError } from '../../platform/errors.ts';
import { Readiness } from '../../platform/readiness.ts';
import { Public } from './access.decorator.ts';
import { Answer } from './answer.decorator.ts';

@ApiTags('health')
@Controller('health')
export class HealthController {
  constructor(private readonly readiness: Readiness) {}

  @Get('live')
  @ApiOperation({ summary: 'The process runs.' })
  @Public()
  @Answer(200, z.object({ live: z.literal(true) }))
  live() {
    return { live: true };
  }

  @Get('ready')
  @ApiOperation({ summary: 'It can do its work: the database answers and has every table.' })
  @Public()
  @Answer(200, z.object({ ready: z.literal(true) }))
  async ready() {
    const { database, schema } = await this.readiness.check();
    if (!database) throw new UnavailableError('The database does not answer.', { code: 'not-ready' });
    if (!schema) throw new UnavailableError('The database lacks migrations.', { code: 'not-ready' });
    return { ready: true };
  }
}

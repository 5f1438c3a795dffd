import { Body, Controller, Param, Post, Query, Res } from '@nestjs/common';
import { ApiBearerAuth, ApiBody, ApiConsumes, ApiOperation, ApiTags } from '@nestjs/swagger';
import type { Principal } from '../../features/access/access.types.ts';
import { SessionImportService } from '../../features/sessions/session-import.service.ts';
import {
  importAnswerSchema,
  importQuerySchema,
  sheetTextSchema,
  squadSessionsParamsSchema,
} from '../../features/sessions/sessions.schema.ts';
import { Access, CurrentPrincipal } from './access.decorator.ts';
import { Answer } from './answer.decorator.ts';
import type { AppReply } from './request.types.ts';

@ApiTags('sessions')
@ApiBearerAuth()
@Controller('v1/squads/:squadId/session-imports')
export class SessionImportsController {
  constructor(private readonly imports: SessionImportService) {}

  @Post()
  @ApiOperation({
    summary:
      'A sheet of sessions, one a row: every row, or none and everything that is wrong. A dry run only looks (200).',
  })
  @Access('sessions.import', { kind: 'squad', param: 'squadId' })
  @ApiConsumes('text/csv')
  @ApiBody({ schema: { type: 'string' } })
  @Answer(201, importAnswerSchema)
  async bringIn(
    @Param({ schema: squadSessionsParamsSchema }) { squadId }: { squadId: string },
    @Query({ schema: importQuerySchema }) { dryRun }: { dryRun: 'true' | 'false' },
    @Body({ schema: sheetTextSchema }) text: string,
    @CurrentPrincipal() principal: Principal,
    @Res({ passthrough: true }) reply: AppReply,
  ) {
    const result = await this.imports.import(principal, squadId, text, dryRun === 'true');
    if (dryRun === 'true') reply.status(200);
    return result;
  }
}

import { Body, Controller, Get, Param, Post } from '@nestjs/common';
import { ApiBearerAuth, ApiOperation, ApiTags } from '@nestjs/swagger';
import { PolicyChangeListener } from '../../features/policies/policy-change.ts';
import {
  policyAddedSchema,
  policyInputSchema,
  policyListSchema,
  policyParamsSchema,
} from '../../features/policies/policies.schema.ts';
import type { PolicyInput } from '../../features/policies/policies.schema.ts';
import { PoliciesService } from '../../features/policies/policies.service.ts';
import { Access } from './access.decorator.ts';
import { Answer } from './answer.decorator.ts';

@ApiTags('squads')
@ApiBearerAuth()
@Controller('v1/squads/:squadId/policies')
export class PoliciesController {
  constructor(
    private readonly policies: PoliciesService,
    private readonly listener: PolicyChangeListener,
  ) {}

  @Post()
  @ApiOperation({
    summary: 'Settings that are not named stay as they were. Other weights or another bound weigh later sessions anew.',
  })
  @Access('policies.write', { kind: 'squad', param: 'squadId' })
  @Answer(201, policyAddedSchema)
  async add(
    @Param({ schema: policyParamsSchema }) { squadId }: { squadId: string },
    @Body({ schema: policyInputSchema }) input: PolicyInput,
  ) {
    const { policy, reweigh } = await this.policies.add(squadId, input);
    if (!reweigh) return policy;
    return { ...policy, reweighed: await this.listener.policyChanged(squadId, policy.validFrom) };
  }

  @Get()
  @ApiOperation({ summary: 'How the squad’s load is weighed and judged, newest first.' })
  @Access('policies.read', { kind: 'squad', param: 'squadId' })
  @Answer(200, policyListSchema)
  async list(@Param({ schema: policyParamsSchema }) { squadId }: { squadId: string }) {
    return { items: await this.policies.list(squadId) };
  }
}

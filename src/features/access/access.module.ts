import { Module } from '@nestjs/common';
import { AccessService } from './access.service.ts';
import { AuditService } from './audit.service.ts';
import { IdempotencyService } from './idempotency.service.ts';
import { TokensService } from './tokens.service.ts';

@Module({
  providers: [AccessService, AuditService, IdempotencyService, TokensService],
  exports: [AccessService, AuditService, IdempotencyService, TokensService],
})
export class AccessModule {}

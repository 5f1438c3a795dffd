import { Inject, Injectable } from '@nestjs/common';
import type { CallHandler, ExecutionContext, NestInterceptor } from '@nestjs/common';
import { Reflector } from '@nestjs/core';
import { lastValueFrom, of } from 'rxjs';
import type { Observable } from 'rxjs';
import { AccessService } from '../../features/access/access.service.ts';
import type { Principal, Target } from '../../features/access/access.types.ts';
import { IdempotencyService } from '../../features/access/idempotency.service.ts';
import { clubOfToken } from '../../features/access/token.ts';
import type { Env } from '../../platform/env.ts';
import { UnauthenticatedError, ValidationError } from '../../platform/errors.ts';
import { idSchema } from '../../platform/schemas.ts';
import { ENV } from '../../platform/tokens.ts';
import { UnitOfWork } from '../../platform/unit-of-work.ts';
import { ACCESS_RULE } from './access.decorator.ts';
import type { AccessRule } from './access.decorator.ts';
import { bearerOf, idempotencyKeyOf, sameSecret } from './bearer.ts';
import { refuseOtherMediaType } from './media-type.ts';
import type { AppReply, AppRequest } from './request.types.ts';

const keptHeaders = ['etag', 'location'];

/**
 * Every request's way in: who asks, one unit of work for them, whether they may, and the answer given before if the
 * request came before. Checks and handler run in the same transaction, which is committed before the answer leaves.
 */
@Injectable()
export class RequestInterceptor implements NestInterceptor {
  constructor(
    private readonly reflector: Reflector,
    private readonly work: UnitOfWork,
    private readonly access: AccessService,
    private readonly idempotency: IdempotencyService,
    @Inject(ENV) private readonly env: Env,
  ) {}

  async intercept(context: ExecutionContext, next: CallHandler): Promise<Observable<unknown>> {
    const rule = this.reflector.get<AccessRule | null | undefined>(ACCESS_RULE, context.getHandler());
    if (rule === undefined) throw new Error('a route has no access rule');
    if (rule === null) return next.handle();
    const request = context.switchToHttp().getRequest<AppRequest>();
    const reply = context.switchToHttp().getResponse<AppReply>();
    const handle = () => lastValueFrom<unknown, undefined>(next.handle(), { defaultValue: undefined });
    if (rule.target.kind === 'operator') {
      this.requireOperator(request);
      refuseOtherMediaType(request, context.getHandler());
      return of(await this.work.runAsOperator(handle));
    }
    const token = bearerOf(request);
    const clubId = token === null ? null : clubOfToken(token);
    if (token === null || clubId === null) throw new UnauthenticatedError();
    // Until it is known who asks, the unit of work sees one club and no person.
    const answer = await this.work.run({ clubId, personId: null }, async () => {
      const principal = await this.access.principal(token);
      if (principal === null) throw new UnauthenticatedError();
      request.principal = principal;
      refuseOtherMediaType(request, context.getHandler());
      return this.work.run({ clubId, personId: principal.personId }, async () => {
        await this.requireAccess(principal, rule, request);
        return this.once(request, reply, handle);
      });
    });
    return of(answer);
  }

  private requireOperator(request: AppRequest): void {
    const key = this.env.LOADWEIR_OPERATOR_KEY;
    const given = bearerOf(request);
    if (key === undefined || given === null || !sameSecret(given, key)) {
      throw new UnauthenticatedError('The operator key is needed.');
    }
  }

  private async requireAccess(principal: Principal, { action, target }: AccessRule, request: AppRequest) {
    if (target.kind === 'self' || target.kind === 'operator') return;
    const asked: Target = target.kind === 'club' ? target : { kind: target.kind, id: idFrom(request, target.param) };
    await this.access.require(principal, action, asked);
  }

  /** Runs the handler, or answers what it answered before to the same key. */
  private async once(request: AppRequest, reply: AppReply, handle: () => Promise<unknown>): Promise<unknown> {
    const key = idempotencyKeyOf(request);
    if (key === null) return handle();
    const requestHash = this.idempotency.hash(request.method, request.url, request.body);
    const stored = await this.idempotency.begin(key, requestHash);
    if (stored !== null) {
      reply.status(stored.status).headers({ ...stored.headers, 'idempotent-replayed': 'true' });
      return stored.body ?? undefined;
    }
    const body = await handle();
    const headers = Object.fromEntries(
      keptHeaders.flatMap((name) => (reply.hasHeader(name) ? [[name, String(reply.getHeader(name))]] : [])),
    );
    await this.idempotency.keep(key, { requestHash, status: reply.statusCode, body, headers });
    return body;
  }
}

function idFrom(request: AppRequest, param: string): string {
  const given = (request.params as Record<string, unknown>)[param];
  const result = idSchema.safeParse(given);
  if (result.success) return result.data;
  throw new ValidationError([{ field: param, value: String(given).slice(0, 100), allowed: 'a UUID' }]);
}

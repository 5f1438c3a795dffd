import { createParamDecorator, SetMetadata } from '@nestjs/common';
import type { ExecutionContext } from '@nestjs/common';
import type { Action } from '../../features/access/access-table.ts';
import type { Principal, RouteTarget } from '../../features/access/access.types.ts';
import type { AppRequest } from './request.types.ts';

export const ACCESS_RULE = 'loadweir:access';

/** What a route asks for before its handler runs; null: nothing, the route is public. */
export interface AccessRule {
  action: Action;
  target: RouteTarget;
}

/** The right a route needs. A route with neither this nor `@Public()` stops the start. */
export const Access = (action: Action, target: RouteTarget) =>
  SetMetadata<string, AccessRule>(ACCESS_RULE, { action, target });

/** A route for everybody: no person, no club, no unit of work. */
export const Public = () => SetMetadata(ACCESS_RULE, null);

/** The person who is asking, as the interceptor found them. */
export const CurrentPrincipal = createParamDecorator((_: undefined, context: ExecutionContext): Principal => {
  const { principal } = context.switchToHttp().getRequest<AppRequest>();
  if (principal === undefined) throw new Error('a handler asked for the person of a request that has none');
  return principal;
});

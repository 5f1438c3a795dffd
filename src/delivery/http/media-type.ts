import { HttpException } from '@nestjs/common';
import type { AppRequest } from './request.types.ts';

/** The metadata `@ApiConsumes('text/csv')` leaves on a handler; without it a body is JSON. */
const consumesKey = 'swagger/apiConsumes';

/** @throws {HttpException} 415 for a body of another media type than the route takes */
export function refuseOtherMediaType(request: AppRequest, handler: object): void {
  if (request.body === undefined || request.body === null) return;
  const accepted = (Reflect.getMetadata(consumesKey, handler) as string[] | undefined) ?? ['application/json'];
  const given = request.headers['content-type']?.split(';', 1)[0]?.trim().toLowerCase() ?? '';
  if (!accepted.includes(given)) throw new HttpException(`This route takes ${accepted.join(' or ')}.`, 415);
}

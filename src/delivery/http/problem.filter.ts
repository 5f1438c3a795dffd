import { Catch } from '@nestjs/common';
import type { ArgumentsHost, ExceptionFilter } from '@nestjs/common';
import { PinoLogger } from 'nestjs-pino';
import { pathOf, sendProblem, tell } from './problem.ts';
import type { Told } from './problem.ts';
import type { AppReply, AppRequest } from './request.types.ts';
import { RouteTable } from './route-table.ts';

/** The one way errors leave: as problem documents, logged once, at the error's own level. */
@Catch()
export class ProblemFilter implements ExceptionFilter {
  constructor(
    private readonly logger: PinoLogger,
    private readonly routes: RouteTable,
  ) {}

  catch(error: unknown, host: ArgumentsHost): void {
    const request = host.switchToHttp().getRequest<AppRequest>();
    const reply = host.switchToHttp().getResponse<AppReply>();
    const told = this.methodNotAllowed(tell(error), request, reply);
    this.log(error, told, request.id);
    if (!reply.sent) sendProblem(request, reply, told);
  }

  private log(error: unknown, { level, code, status }: Told, correlationId: string): void {
    const facts = { code, status, correlationId };
    this.logger[level](level === 'error' ? { ...facts, err: error } : facts, `answered with problem ${code}`);
  }

  /** A path that knows other methods: 405 and which. */
  private methodNotAllowed(told: Told, request: AppRequest, reply: AppReply): Told {
    if (told.status !== 404 || request.routeOptions.url !== undefined) return told;
    const methods = this.routes.methodsOf(pathOf(request));
    if (methods.length === 0) return { ...told, detail: 'There is no such path.' };
    reply.header('allow', methods.join(', '));
    return {
      ...told,
      status: 405,
      code: 'method-not-allowed',
      title: 'Method not allowed',
      detail: `Use ${methods.join(', ')}.`,
    };
  }
}

import type { IncomingMessage } from 'node:http';
import type { Socket } from 'node:net';
import helmet from '@fastify/helmet';
import { FastifyAdapter } from '@nestjs/platform-fastify';
import type { NestFastifyApplication } from '@nestjs/platform-fastify';
import type { FastifyInstance } from 'fastify';
import type { Clock } from '../../platform/clock.ts';
import { newId } from '../../platform/ids.ts';
import { sendProblem, tell } from './problem.ts';
import type { AppReply, AppRequest } from './request.types.ts';
import { RouteTable } from './route-table.ts';

const jsonLimit = 1024 * 1024;
const csvLimit = 5 * 1024 * 1024;
const givenId = /^[\w.-]{8,64}$/;

/** The Fastify underneath: limits, and an id for every request (the client's own where it is harmless). */
export function createAdapter(clock: Clock): FastifyAdapter {
  return new FastifyAdapter({
    bodyLimit: jsonLimit,
    requestTimeout: 60_000,
    // What still comes on a kept connection while the server closes is answered like everything else.
    return503OnClosing: false,
    // A path that cannot be decoded is refused before any filter stands in the way.
    frameworkErrors: (error: Error, request: AppRequest, reply: AppReply) => sendProblem(request, reply, tell(error)),
    genReqId: ({ headers }: IncomingMessage) => {
      const given = headers['x-request-id'];
      return typeof given === 'string' && givenId.test(given) ? given : newId(clock.now());
    },
  });
}

/** Headers, bodies and closing; before any route is registered. */
export async function prepareServer(app: NestFastifyApplication): Promise<void> {
  const server = app.getHttpAdapter().getInstance();
  const routes = app.get(RouteTable);
  server.addHook('onRoute', ({ method, url }) => routes.add(method, url));
  acceptBodies(server);
  closeInPeace(server);
  server.addHook('onSend', async (request, reply) => {
    reply.header('x-request-id', request.id);
    if (request.url.startsWith('/v1')) reply.header('cache-control', 'no-store');
  });
  await app.register(helmet, {
    // The description's page needs its own scripts, inline styles and icons given as data; nothing comes from elsewhere.
    contentSecurityPolicy: {
      useDefaults: false,
      directives: {
        defaultSrc: ["'self'"],
        styleSrc: ["'self'", "'unsafe-inline'"],
        imgSrc: ["'self'", 'data:'],
        objectSrc: ["'none'"],
        frameAncestors: ["'none'"],
        baseUri: ["'none'"],
        formAction: ["'self'"],
      },
    },
  });
}

/** JSON, and CSV as the text it is; no other media type is read. */
function acceptBodies(server: FastifyInstance): void {
  server.removeContentTypeParser('text/plain');
  server.addContentTypeParser('text/csv', { parseAs: 'string', bodyLimit: csvLimit }, (_request, body, done) =>
    done(null, body),
  );
}

/**
 * While the server closes, every answer tells its client to let go, and connections on which nothing was ever asked are
 * ended (clients open some in advance); else either would hold the close.
 */
function closeInPeace(server: FastifyInstance): void {
  const connections = new Set<Socket>();
  let closing = false;
  server.server.on('connection', (socket: Socket) => {
    connections.add(socket);
    socket.once('close', () => connections.delete(socket));
  });
  server.addHook('preClose', (done) => {
    closing = true;
    for (const socket of connections) if (socket.bytesRead === 0) socket.destroy();
    done();
  });
  server.addHook('onSend', async (_request, reply) => {
    if (closing) reply.header('connection', 'close');
  });
}

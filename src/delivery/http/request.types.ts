import type { FastifyReply, FastifyRequest } from 'fastify';
import type { Principal } from '../../features/access/access.types.ts';

/** A request as interceptors and handlers see it. */
export type AppRequest = FastifyRequest & { principal?: Principal };
export type AppReply = FastifyReply;

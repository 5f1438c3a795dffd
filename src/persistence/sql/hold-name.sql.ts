import type { Prisma } from '../generated/client.ts';

/** Waits for every other transaction that holds the name, then holds it until this one ends. */
export async function holdName(tx: Prisma.TransactionClient, name: string): Promise<void> {
  await tx.$executeRaw`select pg_advisory_xact_lock(hashtextextended(${name}, 0))`;
}

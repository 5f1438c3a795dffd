import type { Prisma } from '../generated/client.ts';

export interface WeighingHold {
  /** Squads come before athletes, athletes before their days. */
  level: 1 | 2 | 3;
  name: string;
  shared: boolean;
}

/**
 * Takes advisory locks of the transaction in one order, whoever asks: by level, then by key. Two transactions that each
 * take theirs in one call can therefore wait for each other only one way. Where one name is asked for both ways the
 * stronger lock is taken at once, because raising a shared one later is a way to a deadlock.
 */
export async function holdWeighing(tx: Prisma.TransactionClient, holds: readonly WeighingHold[]): Promise<void> {
  if (holds.length === 0) return;
  await tx.$executeRaw`
    select case when ordered.shared
      then pg_advisory_xact_lock_shared(ordered.key) else pg_advisory_xact_lock(ordered.key) end
    from (
      select hold.level, hashtextextended(hold.name, 0) as key, bool_and(hold.shared) as shared
      from unnest(${holds.map(({ level }) => level)}::int[], ${holds.map(({ name }) => name)}::text[],
        ${holds.map(({ shared }) => shared)}::boolean[]) as hold (level, name, shared)
      group by 1, 2 order by 1, 2
    ) as ordered`;
}

/** Names of what is held; the club keeps clubs apart on one server. */
export const holdNames = {
  squad: (clubId: string, squadId: string) => `weighing|${clubId}|squad|${squadId}`,
  athlete: (clubId: string, athleteId: string) => `weighing|${clubId}|athlete|${athleteId}`,
  day: (clubId: string, athleteId: string, day: string) => `weighing|${clubId}|day|${athleteId}|${day}`,
};

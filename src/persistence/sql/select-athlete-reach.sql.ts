import type { Reach } from '../../features/access/access.types.ts';
import type { Prisma } from '../generated/client.ts';

interface Row {
  personId: string | null;
  current: string[];
  last: string | null;
}

/** The squads an athlete belongs to today or later, else the last one left. */
export async function selectAthleteReach(
  tx: Prisma.TransactionClient,
  athleteId: string,
  today: string,
): Promise<Reach | null> {
  const [row] = await tx.$queryRaw<Row[]>`
    select a.person_id as "personId",
      array(
        select m.squad_id::text from membership m
        where m.club_id = a.club_id and m.athlete_id = a.id and (m.valid_to is null or m.valid_to >= ${today}::date)
      ) as current,
      (
        select m.squad_id::text from membership m where m.club_id = a.club_id and m.athlete_id = a.id
        order by m.valid_to desc limit 1
      ) as last
    from athlete a where a.id = ${athleteId}::uuid`;
  if (row === undefined) return null;
  const squadIds = row.current.length > 0 ? row.current : row.last === null ? [] : [row.last];
  return { squadIds, athleteId, personId: row.personId };
}

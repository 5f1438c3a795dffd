import type { Prisma } from '../generated/client.ts';

export interface PrincipalRow {
  clubId: string;
  personId: string;
  athleteId: string | null;
  roles: { role: string; squadId: string | null }[];
}

/** The person of a live token with roles and athlete: one statement, because every request begins with it. */
export async function selectPrincipal(
  tx: Prisma.TransactionClient,
  tokenHash: Buffer,
  now: Date,
): Promise<PrincipalRow | null> {
  const rows = await tx.$queryRaw<PrincipalRow[]>`
    select t.club_id as "clubId", t.person_id as "personId", a.id as "athleteId",
      coalesce((
        select jsonb_agg(jsonb_build_object('role', r.role, 'squadId', r.squad_id))
        from role_assignment r where r.club_id = t.club_id and r.person_id = t.person_id
      ), '[]'::jsonb) as roles
    from access_token t
    left join athlete a on a.club_id = t.club_id and a.person_id = t.person_id
    where t.token_hash = ${new Uint8Array(tokenHash)} and t.revoked_at is null
      and t.expires_at > ${now.toISOString()}::timestamptz`;
  return rows[0] ?? null;
}

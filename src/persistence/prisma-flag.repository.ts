import { Injectable } from '@nestjs/common';
import { z } from 'zod';
import { FlagRepository } from '../features/flags/flags.repository.ts';
import { flagEvidence } from '../features/flags/flags.schema.ts';
import { flagKinds } from '../features/flags/flags.types.ts';
import type {
  AthleteFlag,
  PlannedPeriod,
  RunEvidence,
  StoredFlag,
  ThresholdUse,
} from '../features/flags/flags.types.ts';
import { Clock } from '../platform/clock.ts';
import { newId } from '../platform/ids.ts';
import { dateOf, dayOf, openDayOf } from './days.ts';
import { currentScope, currentTransaction } from './prisma-unit-of-work.ts';

const stored = z.object({ words: z.object({ claim: z.string(), ask: z.string() }), basis: flagEvidence });
const kind = z.enum(flagKinds);
const level = z.enum(['note', 'watch', 'act']);

@Injectable()
export class PrismaFlagRepository extends FlagRepository {
  constructor(private readonly clock: Clock) {
    super();
  }

  async ofAthletes(athleteIds: readonly string[]): Promise<StoredFlag[]> {
    const rows = await currentTransaction().flag.findMany({
      where: { athleteId: { in: [...athleteIds] } },
      orderBy: [{ since: 'desc' }, { kind: 'asc' }, { athleteId: 'asc' }],
    });
    return rows.map((row) => {
      const { words, basis } = stored.parse(row.evidence);
      return {
        id: row.id,
        athleteId: row.athleteId,
        squadId: row.squadId,
        kind: kind.parse(row.kind),
        level: level.parse(row.level),
        since: dayOf(row.since),
        until: openDayOf(row.until),
        ...words,
        sentence: row.sentence,
        clears: row.clears,
        evidence: basis,
        asOf: dayOf(row.asOf),
      };
    });
  }

  /** One statement for all; the comparison stands in it, so that an unchanged flag is not written. */
  async write(flags: readonly AthleteFlag[], asOf: string): Promise<number> {
    if (flags.length === 0) return 0;
    const now = this.clock.now();
    const { clubId } = currentScope();
    const rows = flags.map((flag) => ({
      id: newId(now),
      athlete_id: flag.athleteId,
      squad_id: flag.squadId,
      kind: flag.kind,
      level: flag.level,
      since: flag.since,
      until: flag.until,
      sentence: flag.sentence,
      clears: flag.clears,
      evidence: { words: { claim: flag.claim, ask: flag.ask }, basis: flag.evidence },
    }));
    return currentTransaction().$executeRaw`
      insert into flag as f (club_id, id, athlete_id, squad_id, kind, level, since, until, sentence, clears, evidence, as_of, updated_at)
      select ${clubId}::uuid, r.id, r.athlete_id, r.squad_id, r.kind, r.level, r.since, r.until, r.sentence, r.clears, r.evidence,
             ${asOf}::date, ${now}::timestamptz
        from jsonb_to_recordset(${JSON.stringify(rows)}::jsonb) as r(id uuid, athlete_id uuid, squad_id uuid, kind text,
             level text, since date, until date, sentence text, clears text, evidence jsonb)
       order by r.athlete_id, r.kind, r.since
      on conflict (club_id, athlete_id, kind, since) do update
         set level = excluded.level, until = excluded.until, sentence = excluded.sentence, clears = excluded.clears,
             evidence = excluded.evidence, as_of = excluded.as_of, updated_at = excluded.updated_at
       where (f.level, f.until, f.sentence, f.clears, f.evidence) is distinct from
             (excluded.level, excluded.until, excluded.sentence, excluded.clears, excluded.evidence)`;
  }

  async runs(athleteIds: readonly string[], until: string): Promise<RunEvidence[]> {
    const rows = await currentTransaction().trainingSession.findMany({
      where: {
        athleteId: { in: [...athleteIds] },
        modality: 'running',
        kind: { not: 'competition' },
        distanceM: { gt: 0 },
        quality: { not: 'suspect' },
        withdrawnAt: null,
        trainingDay: { lte: dateOf(until) },
      },
      select: { id: true, athleteId: true, trainingDay: true, distanceM: true },
      orderBy: [{ trainingDay: 'asc' }, { id: 'asc' }],
    });
    return rows.map((row) => ({
      athleteId: row.athleteId,
      day: dayOf(row.trainingDay),
      sessionId: row.id,
      distanceM: row.distanceM ?? 0,
    }));
  }

  async thresholdUse(athleteIds: readonly string[], until: string): Promise<ThresholdUse[]> {
    return currentTransaction().$queryRaw<ThresholdUse[]>`
      select s.athlete_id::text as "athleteId", s.training_day::text as day, s.modality, max(u->>'validFrom') as newest
        from training_session s
        join session_weight w on w.club_id = s.club_id and w.session_id = s.id
       cross join jsonb_array_elements(w.thresholds_used) as u
       where s.athlete_id = any(${[...athleteIds]}::uuid[])
         and s.withdrawn_at is null
         and s.training_day <= ${until}::date
         and u->>'quantity' ~ '^(lt1|lt2|critical)-'
       group by s.athlete_id, s.training_day, s.modality
       order by s.athlete_id, s.training_day, s.modality`;
  }

  async periods(squadIds: readonly string[]): Promise<PlannedPeriod[]> {
    const rows = await currentTransaction().loadPeriod.findMany({
      where: { squadId: { in: [...squadIds] } },
      orderBy: { validFrom: 'asc' },
    });
    return rows.map((row) => ({
      squadId: row.squadId,
      athleteId: row.athleteId,
      purpose: z.enum(['overload', 'unload', 'taper']).parse(row.purpose),
      from: dayOf(row.validFrom),
      to: dayOf(row.validTo),
    }));
  }
}

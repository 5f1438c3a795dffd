import { Injectable } from '@nestjs/common';
import { AuditService } from '../access/audit.service.ts';
import { Clock } from '../../platform/clock.ts';
import { RuleError, ValidationError } from '../../platform/errors.ts';
import type { FieldError } from '../../platform/errors.ts';
import { localDay } from '../../platform/zoned-time.ts';
import { SquadsService } from '../squads/squads.service.ts';
import { DaysRepository } from './days.repository.ts';
import type { AthleteDayFacts, DayRecord, MeasureDay, SquadClosing, SquadDayView } from './days.types.ts';
import { resolveDays } from './resolve-day.ts';

/** Closes a squad's days and says what every athlete's days were. */
@Injectable()
export class DaysService {
  constructor(
    private readonly days: DaysRepository,
    private readonly squads: SquadsService,
    private readonly audit: AuditService,
    private readonly clock: Clock,
  ) {}

  /** Every day of each athlete's log up to a day, gapless; an athlete without a log until then has none. */
  async dayRecords(athleteIds: readonly string[], until: string): Promise<Map<string, DayRecord[]>> {
    const firstDays = await this.days.firstDays(athleteIds);
    const begun = [...firstDays].filter(([, first]) => first <= until);
    const from = begun.map(([, first]) => first).toSorted()[0];
    if (from === undefined) return new Map();
    const starts = new Map(begun);
    return this.resolve([...starts.keys()], from, until, (athleteId) => starts.get(athleteId)!);
  }

  /** The days of each athlete from one to another, gapless, whether the log had begun or not. */
  async dayRecordsBetween(athleteIds: readonly string[], from: string, to: string): Promise<Map<string, DayRecord[]>> {
    return this.resolve(athleteIds, from, to, () => from);
  }

  /** The squad's last closed training day not after `until`; null if none is. */
  async lastClosedDay(squadId: string, until: string): Promise<string | null> {
    return this.days.lastClosedDay(squadId, until);
  }

  /** Closed days of a squad, by day. */
  async closings(squadId: string, from: string, to: string): Promise<SquadClosing[]> {
    return this.days.closings(squadId, from, to);
  }

  /** Says of every member who is not named that the day's log is whole. Closed again, the newer call counts. */
  async close(squadId: string, day: string, unknownAthleteIds: readonly string[]): Promise<SquadClosing> {
    const { zone } = await this.squads.squad(squadId);
    const now = this.clock.now();
    const today = localDay(now, zone);
    if (day > today) {
      throw new RuleError('A day in the future cannot be closed.', [
        { field: 'day', value: day, allowed: `a date up to today, ${today}` },
      ]);
    }
    const members = new Set((await this.squads.membersOn(squadId, day)).map(({ athleteId }) => athleteId));
    if (members.size === 0) {
      throw new RuleError('Nobody belonged to the squad that day.', [
        { field: 'day', value: day, allowed: 'a date on which the squad has a member' },
      ]);
    }
    refuseStrangers(unknownAthleteIds, members);
    await this.days.close(squadId, day, now, unknownAthleteIds);
    await this.audit.record('days.close', 'squad', squadId, { day, unknownAthleteIds });
    return (await this.days.closings(squadId, day, day))[0]!;
  }

  /** A day that is open stays so. */
  async reopen(squadId: string, day: string): Promise<{ squadId: string; day: string; closed: false }> {
    if (await this.days.reopen(squadId, day)) await this.audit.record('days.reopen', 'squad', squadId, { day });
    return { squadId, day, closed: false };
  }

  /** What the day was for each of that day's members. */
  async squadDay(squadId: string, day: string): Promise<SquadDayView> {
    const members = await this.squads.membersOn(squadId, day);
    const ids = members.map(({ athleteId }) => athleteId);
    const records = await this.dayRecordsBetween(ids, day, day);
    const closed = (await this.days.closedDays([squadId], day, day)).get(squadId) !== undefined;
    const athletes = members.map(({ athleteId, name }) => {
      const record = records.get(athleteId)![0]!;
      const { training, availability, completeness, minutes, sessions, rating, domain } = record;
      return {
        ...{ athleteId, name, training, availability, completeness, minutes, sessions },
        ...{ ratingLoad: shown(rating), ratingState: rating.state },
        ...{ domainLoad: shown(domain), domainState: domain.state },
      };
    });
    return { day, closed, athletes };
  }

  private async resolve(
    athleteIds: readonly string[],
    from: string,
    to: string,
    startOf: (athleteId: string) => string,
  ): Promise<Map<string, DayRecord[]>> {
    const facts = await this.days.facts(athleteIds, from, to);
    const squadIds = new Set(facts.flatMap(({ memberships }) => memberships.map(({ squadId }) => squadId)));
    const closed = await this.days.closedDays([...squadIds], from, to);
    const closedSets = new Map([...closed].map(([squadId, days]) => [squadId, new Set(days)]));
    const isClosed = (squadId: string, day: string) => closedSets.get(squadId)?.has(day) ?? false;
    const days = (each: AthleteDayFacts) => resolveDays(each, isClosed, startOf(each.athleteId), to);
    return new Map(facts.map((each) => [each.athleteId, days(each)]));
  }
}

function refuseStrangers(unknownAthleteIds: readonly string[], members: ReadonlySet<string>): void {
  const doubles = unknownAthleteIds.flatMap((value, index): FieldError[] =>
    unknownAthleteIds.indexOf(value) < index
      ? [{ field: `unknownAthleteIds[${index}]`, value, allowed: 'each athlete once' }]
      : [],
  );
  if (doubles.length > 0) throw new ValidationError(doubles);
  const strangers = unknownAthleteIds.flatMap((value, index): FieldError[] =>
    members.has(value)
      ? []
      : [{ field: `unknownAthleteIds[${index}]`, value, allowed: 'an athlete who belongs to the squad that day' }],
  );
  if (strangers.length > 0) throw new RuleError('Only members of that day can be named.', strangers);
}

function shown({ state, value }: MeasureDay): number | null {
  return state === 'unknown' ? null : value;
}

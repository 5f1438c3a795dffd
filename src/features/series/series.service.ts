import { Injectable } from '@nestjs/common';
import { dayNumber, isoDay, weekRange } from '../../core/series/day.ts';
import type { Measure } from '../../core/types.ts';
import { Clock } from '../../platform/clock.ts';
import { localDay } from '../../platform/zoned-time.ts';
import { AthletesService } from '../athletes/athletes.service.ts';
import { DaysService } from '../days/days.service.ts';
import type { DayRecord } from '../days/days.types.ts';
import { PoliciesService } from '../policies/policies.service.ts';
import { SquadsService } from '../squads/squads.service.ts';
import { buildSeries } from './build-series.ts';
import type { SeriesQuery } from './series.schema.ts';
import type { AthleteSeries, SeriesSettings, SquadWeek } from './series.types.ts';
import { weekFigures } from './week-figures.ts';

/** How far back an excerpt reaches where nothing else is asked for. */
const EXCERPT_DAYS = 56;

/** One athlete's days of the log with what is computed from them. */
export interface AthleteLog {
  records: DayRecord[];
  series: AthleteSeries;
}

/** Series are computed on reading, from daily totals, closings and availability; nothing of them is stored. */
@Injectable()
export class SeriesService {
  constructor(
    private readonly days: DaysService,
    private readonly squads: SquadsService,
    private readonly policies: PoliciesService,
    private readonly athletes: AthletesService,
    private readonly clock: Clock,
  ) {}

  /** The squad's calendar date now. */
  async today(squadId: string): Promise<string> {
    const { zone } = await this.squads.squad(squadId);
    return localDay(this.clock.now(), zone);
  }

  /** D: the squad's last closed training day not after `until`; null if none is. */
  async lastClosedDay(squadId: string, until: string): Promise<string | null> {
    return this.days.lastClosedDay(squadId, until);
  }

  /** Days and series of several athletes up to a closed day; athletes without a log are left out. */
  async logs(
    athleteIds: readonly string[],
    until: string,
    settings: SeriesSettings,
    measure?: Measure,
  ): Promise<Map<string, AthleteLog>> {
    const records = await this.days.dayRecords([...athleteIds], until);
    const logs = new Map<string, AthleteLog>();
    for (const athleteId of athleteIds) {
      const days = records.get(athleteId) ?? [];
      if (days.length === 0) continue;
      logs.set(athleteId, { records: days, series: buildSeries(athleteId, days, settings, measure) });
    }
    return logs;
  }

  /** Series of several athletes up to a closed day, each under the policy of the squad they are in then. */
  async athleteSeries(athleteIds: string[], until: string, measure?: Measure): Promise<Map<string, AthleteSeries>> {
    const bySquad = new Map<string, string[]>();
    for (const athleteId of athleteIds) {
      const squad = await this.athletes.squadOn(athleteId, until);
      if (squad !== null) bySquad.set(squad.id, [...(bySquad.get(squad.id) ?? []), athleteId]);
    }
    const series = new Map<string, AthleteSeries>();
    for (const [squadId, ids] of bySquad) {
      const { settings } = await this.policies.policyOn(squadId, until);
      for (const [id, log] of await this.logs(ids, until, settings, measure)) series.set(id, log.series);
    }
    return series;
  }

  /** One athlete's series up to the last closed day of the squad they are in today; null while there is none. */
  async ofAthlete(athleteId: string, measure?: Measure): Promise<AthleteSeries | null> {
    const place = await this.placeOf(athleteId);
    if (place === null) return null;
    const { settings } = await this.policies.policyOn(place.squadId, place.lastDay);
    return (await this.logs([athleteId], place.lastDay, settings, measure)).get(athleteId)?.series ?? null;
  }

  /** One athlete's days between two days, the last closed one and the morning after it at most. */
  async excerpt(athleteId: string, { from, to, measure }: SeriesQuery) {
    const series = await this.ofAthlete(athleteId, measure);
    const head = {
      athleteId,
      asOf: series?.lastDay ?? null,
      firstDay: series?.firstDay ?? null,
      measure: series?.measure ?? null,
      measureReason: series?.measureReason ?? null,
      ratioForm: series?.form ?? null,
      standardDeviation: series?.sd ?? null,
    };
    if (series === null) return { ...head, items: [] };
    const end = to ?? series.after.day;
    const start = from ?? isoDay(dayNumber(end) - EXCERPT_DAYS);
    const items = [...series.rows, series.after].filter(({ day }) => start <= day && day <= end);
    return { ...head, items };
  }

  /** The squad the athlete is in today and its last closed day; null without a squad or a closed day. */
  async placeOf(athleteId: string): Promise<{ squadId: string; lastDay: string } | null> {
    const now = this.clock.now();
    const today = localDay(now, await this.athletes.zoneOn(athleteId, now));
    const squad = await this.athletes.squadOn(athleteId, today);
    if (squad === null) return null;
    const lastDay = await this.lastClosedDay(squad.id, today);
    return lastDay === null ? null : { squadId: squad.id, lastDay };
  }

  /** What a report of an ISO week rests on, as far as the squad's days are closed. */
  async squadWeek(squadId: string, isoWeek: string): Promise<SquadWeek & { logs: Map<string, AthleteLog> }> {
    const range = weekRange(isoWeek);
    const [from, to] = [isoDay(range.from), isoDay(range.to)];
    const lastDay = await this.lastClosedDay(squadId, to);
    const policy = await this.policies.policyOn(squadId, lastDay ?? to);
    const members = await this.squads.membersOn(squadId, lastDay !== null && lastDay >= from ? lastDay : from);
    const closings = await this.days.closings(squadId, from, to);
    const ids = members.map(({ athleteId }) => athleteId);
    const logs = lastDay === null ? new Map<string, AthleteLog>() : await this.logs(ids, lastDay, policy.settings);
    return {
      isoWeek,
      from,
      to,
      lastDay,
      closedDays: closings.length,
      policy: { id: policy.id, validFrom: policy.validFrom, settings: policy.settings },
      athletes: members.map(({ athleteId, name }) => {
        const log = logs.get(athleteId);
        const week = log === undefined ? null : weekFigures(log.records, from, log.series.measure, squadId);
        return { athleteId, name, series: log?.series ?? null, week };
      }),
      logs,
    };
  }

  /** The squad on one day: each athlete's row, as far as the squad's days are closed. */
  async overview(squadId: string, day: string | null) {
    const asked = day ?? (await this.today(squadId));
    const lastDay = await this.lastClosedDay(squadId, asked);
    const members = await this.squads.membersOn(squadId, lastDay ?? asked);
    const { settings } = await this.policies.policyOn(squadId, lastDay ?? asked);
    const ids = members.map(({ athleteId }) => athleteId);
    const logs = lastDay === null ? new Map<string, AthleteLog>() : await this.logs(ids, lastDay, settings);
    return {
      squadId,
      day: asked,
      asOf: lastDay,
      readOn: lastDay === null ? null : isoDay(dayNumber(lastDay) + 1),
      items: members.map(({ athleteId, name }) => {
        const series = logs.get(athleteId)?.series;
        return {
          athleteId,
          name,
          measure: series?.measure ?? null,
          measureReason: series?.measureReason ?? null,
          row: series?.rows.at(-1) ?? null,
          after: series?.after ?? null,
        };
      }),
    };
  }
}

import { Injectable } from '@nestjs/common';
import { PoliciesService } from '../policies/policies.service.ts';
import { SeriesService } from '../series/series.service.ts';
import { SquadsService } from '../squads/squads.service.ts';
import type { AthleteLog } from '../series/series.service.ts';
import { evaluateFlags } from './evaluate-flags.ts';
import { FlagRepository } from './flags.repository.ts';
import { periodsOf } from './periods-of.ts';
import type { AthleteFlag, FlagSettings, StoredFlag, ThresholdUse } from './flags.types.ts';
import { flagWords, NO_LONGER_SUPPORTED } from './sentences.ts';

/** A squad's flags as of its last closed day; `written` counts the rows of the record that changed. */
export interface SquadFlags {
  asOf: string | null;
  flags: AthleteFlag[];
  written: number;
}

@Injectable()
export class FlagsService {
  constructor(
    private readonly repository: FlagRepository,
    private readonly series: SeriesService,
    private readonly squads: SquadsService,
    private readonly policies: PoliciesService,
  ) {}

  /**
   * Judges a squad's athletes on every day of their log up to the last closed day not after `until`. Whatever day is
   * looked at, the record is brought up to the squad's newest closed one.
   */
  async evaluateSquad(squadId: string, until: string): Promise<SquadFlags> {
    const lastDay = await this.series.lastClosedDay(squadId, until);
    if (lastDay === null) return { asOf: null, flags: [], written: 0 };
    const members = await this.squads.membersOn(squadId, lastDay);
    const ids = members.map(({ athleteId }) => athleteId);
    const { settings } = await this.policies.policyOn(squadId, lastDay);
    const flags = await this.judge(squadId, await this.series.logs(ids, lastDay, settings), lastDay, settings);
    const newest = await this.series.lastClosedDay(squadId, await this.series.today(squadId));
    if (newest !== null && newest > lastDay) {
      const { written } = await this.evaluateSquad(squadId, newest);
      return { asOf: lastDay, flags, written };
    }
    return { asOf: lastDay, flags, written: await this.bringUpToDate(ids, flags, lastDay) };
  }

  /** Flags of athletes whose logs are at hand, up to the day the logs end; writes nothing. */
  async judge(
    squadId: string,
    logs: ReadonlyMap<string, AthleteLog>,
    until: string,
    settings: FlagSettings,
  ): Promise<AthleteFlag[]> {
    const ids = [...logs.keys()];
    const [periods, runs, uses] = [
      await this.repository.periods(squadsOf(logs)),
      await this.repository.runs(ids, until),
      await this.repository.thresholdUse(ids, until),
    ];
    return [...logs].flatMap(([athleteId, { records, series }]) =>
      evaluateFlags({
        records,
        series,
        settings,
        periods: periodsOf(athleteId, records, periods),
        runs: runs.filter((run) => run.athleteId === athleteId),
        thresholdUse: uses.filter((use) => use.athleteId === athleteId),
      }).map((episode) => ({ athleteId, squadId, ...episode, ...flagWords(episode) })),
    );
  }

  /** Thresholds that came into use between two days: newer than any used before by that athlete in that modality. */
  async thresholdChanges(athleteIds: readonly string[], from: string, until: string): Promise<ThresholdUse[]> {
    const uses = await this.repository.thresholdUse(athleteIds, until);
    const same = (a: ThresholdUse, b: ThresholdUse): boolean =>
      a.athleteId === b.athleteId && a.modality === b.modality;
    return uses.filter(
      (use) =>
        use.newest >= from &&
        uses.some((earlier) => same(use, earlier) && earlier.newest < use.newest) &&
        !uses.some((earlier) => same(use, earlier) && earlier.newest === use.newest && earlier.day < use.day),
    );
  }

  /** Open flags of a squad on a day, highest level first. */
  async ofSquad(squadId: string, day: string | null): Promise<SquadFlags> {
    const result = await this.evaluateSquad(squadId, day ?? (await this.series.today(squadId)));
    return { ...result, flags: result.flags.filter(({ until }) => until === null) };
  }

  /** All flags of one athlete, past ones too; the record is brought up to date first. */
  async ofAthlete(athleteId: string): Promise<StoredFlag[]> {
    const place = await this.series.placeOf(athleteId);
    if (place !== null) {
      const { squadId, lastDay } = place;
      const { settings } = await this.policies.policyOn(squadId, lastDay);
      const logs = await this.series.logs([athleteId], lastDay, settings);
      await this.bringUpToDate([athleteId], await this.judge(squadId, logs, lastDay, settings), lastDay);
    }
    return this.repository.ofAthletes([athleteId]);
  }

  /**
   * Writes what is new or different. A flag on record that the log no longer shows keeps its row: it ends (if open, on
   * the last closed day) and says that it was taken back.
   */
  private async bringUpToDate(
    athleteIds: readonly string[],
    flags: readonly AthleteFlag[],
    asOf: string,
  ): Promise<number> {
    const key = (flag: AthleteFlag): string => `${flag.athleteId} ${flag.kind} ${flag.since}`;
    const shown = new Set(flags.map(key));
    const recorded = await this.repository.ofAthletes(athleteIds);
    const takenBack = recorded
      .filter((flag) => !shown.has(key(flag)))
      .map((flag) => ({
        ...flag,
        until: flag.until ?? (asOf > flag.since ? asOf : flag.since),
        clears: NO_LONGER_SUPPORTED,
      }));
    return this.repository.write([...flags, ...takenBack], asOf);
  }
}

/** Every squad the athletes were in. */
function squadsOf(logs: ReadonlyMap<string, AthleteLog>): string[] {
  const all = [...logs.values()].flatMap(({ records }) => records.flatMap((record) => record.squadId ?? []));
  return [...new Set(all)];
}

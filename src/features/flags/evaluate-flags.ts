import { loadConcern } from '../../core/flags/load-concern.ts';
import { logGap } from '../../core/flags/log-gap.ts';
import { sessionSpikePercent } from '../../core/flags/session-spike.ts';
import { dayNumber, isoDay } from '../../core/series/day.ts';
import type { LoadConcernDay, LoadEvidence, Muting } from '../../core/types.ts';
import type { DayRecord } from '../days/days.types.ts';
import type { AthleteSeries } from '../series/series.types.ts';
import type { FlagEpisode, FlagSettings, LoadPart, PlannedPeriod, RunEvidence, ThresholdUse } from './flags.types.ts';
import { overloadEpisodes, returnEpisodes, suspectEpisodes, thresholdEpisodes } from './other-episodes.ts';

const SPIKE_LOOK_BACK_DAYS = 30;

export interface FlagInput {
  records: readonly DayRecord[];
  series: AthleteSeries;
  periods: readonly PlannedPeriod[];
  runs: readonly RunEvidence[];
  thresholdUse: readonly ThresholdUse[];
  settings: FlagSettings;
}

/**
 * All flags of one athlete from the first day of the log to the last closed one. Pure, and folded day by day: a flag's
 * past does not depend on when it is looked at.
 */
export function evaluateFlags(input: FlagInput): FlagEpisode[] {
  return [
    ...loadConcernEpisodes(input),
    ...returnEpisodes(input.series),
    ...overloadEpisodes(input.series, input.periods),
    ...gapEpisodes(input.records),
    ...suspectEpisodes(input.records),
    ...thresholdEpisodes(input.records, input.thresholdUse, input.settings.thresholdMaxAgeWeeks),
  ];
}

function loadConcernEpisodes({ records, series, periods, runs, settings }: FlagInput): FlagEpisode[] {
  const spikes = spikesByDay(runs);
  const days = series.rows.map((row, index): LoadConcernDay => ({
    day: dayNumber(row.day),
    ratio: row.ratio.value ?? NaN,
    chronic: row.chronic ?? NaN,
    monotony: row.monotony ?? NaN,
    strain: row.strain ?? NaN,
    muted: mutedBy(records[index]!, row.returning !== null, periods),
    spike: spikes.get(row.day) ?? null,
  }));
  const limits = {
    ratioLimit: settings.ratio.upper,
    monotonyLimit: settings.monotony.upper,
    chronicLowShare: settings.chronicLowShare,
  };
  return loadConcern({ days, firstDay: dayNumber(series.firstDay) }, limits).map((episode) => {
    const parts = episode.evidence.map((part) => loadPart(part, settings.chronicLowShare));
    const day = parts.reduce((last, part) => (part.day > last ? part.day : last), parts[0]!.day);
    return {
      kind: 'load-concern',
      level: 'note',
      since: isoDay(episode.since),
      until: lastDayOf(episode),
      evidence: {
        kind: 'load-concern',
        day,
        strongest: episode.strongest,
        parts,
        ratioLimit: settings.ratio.upper,
        loadMeasure: series.measure,
        form: series.form,
      },
    };
  });
}

function loadPart({ day, since, until, ...rest }: LoadEvidence, chronicLowShare: number): LoadPart {
  const part = { ...rest, day: isoDay(day), since: isoDay(since), until: lastDayOf({ since, until }) };
  return part.measure === 'chronic-low' ? { ...part, usual: part.limit / chronicLowShare } : part;
}

/** The core names the first clear day; a flag on record ends on its last day, both ends included. */
export function lastDayOf({ since, until }: { since: number; until: number | null }): string | null {
  return until === null ? null : isoDay(Math.max(since, until - 1));
}

function mutedBy(record: DayRecord, returning: boolean, periods: readonly PlannedPeriod[]): Muting | null {
  if (record.availability === 'none' && !record.away) return 'unavailable';
  if (returning) return 'return';
  const now = periods.filter(({ from, to }) => from <= record.day && record.day <= to).map(({ purpose }) => purpose);
  if (now.includes('overload')) return 'planned-overload';
  if (now.includes('taper')) return 'taper';
  return now.includes('unload') ? 'unload' : null;
}

/** By day the run that exceeds the longest of the 30 days before it by most; none without an earlier run. */
function spikesByDay(runs: readonly RunEvidence[]): Map<string, { percent: number; sessionId: string }> {
  const spikes = new Map<string, { percent: number; sessionId: string }>();
  for (const run of runs) {
    const day = dayNumber(run.day);
    const before = runs.filter((other) => {
      const age = day - dayNumber(other.day);
      return age >= 1 && age <= SPIKE_LOOK_BACK_DAYS && other.distanceM > 0;
    });
    if (before.length === 0) continue;
    const longest = Math.max(...before.map((other) => other.distanceM));
    const percent = sessionSpikePercent(run.distanceM / 1000, longest / 1000);
    const known = spikes.get(run.day);
    if (known === undefined || percent > known.percent) spikes.set(run.day, { percent, sessionId: run.sessionId });
  }
  return spikes;
}

function gapEpisodes(records: readonly DayRecord[]): FlagEpisode[] {
  const days = records.map((record) => ({
    day: dayNumber(record.day),
    state: record.completeness === 'complete' ? ('known' as const) : record.completeness,
  }));
  return logGap(days).map((stretch) => ({
    kind: 'log-gap',
    level: 'note',
    since: isoDay(stretch.since),
    until: lastDayOf(stretch),
    evidence: {
      kind: 'log-gap',
      day: isoDay(stretch.evidence.day),
      known: stretch.evidence.known,
      of: stretch.evidence.of,
    },
  }));
}

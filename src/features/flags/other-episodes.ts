import { plannedOverloadPhase } from '../../core/flags/planned-overload-phase.ts';
import { thresholdsOutOfDate } from '../../core/flags/thresholds-out-of-date.ts';
import { dayNumber, isoDay } from '../../core/series/day.ts';
import type { DayRecord } from '../days/days.types.ts';
import type { AthleteSeries } from '../series/series.types.ts';
import type { FlagEpisode, FlagEvidence, PlannedPeriod, ThresholdUse } from './flags.types.ts';

/** A doubtful value is worth a look this long after it was last logged, unless it is corrected before: own convention. */
const SUSPECT_STAY_DAYS = 14;
const TRAINED_WITHIN_DAYS = 28;
const WEEK = 7;

export function returnEpisodes(series: AthleteSeries): FlagEpisode[] {
  return stretches(series.rows, (row) =>
    row.returning === null
      ? null
      : {
          key: 'return',
          evidence: { kind: 'return', day: row.day, dayN: row.returning.dayN, share: row.returning.share },
        },
  );
}

/** Days within a planned overload and the fourteen days after it, each a stretch of its own. */
export function overloadEpisodes(series: AthleteSeries, periods: readonly PlannedPeriod[]): FlagEpisode[] {
  const planned = periods
    .filter(({ purpose }) => purpose === 'overload')
    .map(({ from, to }) => ({ from: dayNumber(from), to: dayNumber(to) }));
  return stretches(series.rows, (row) => {
    const phase = plannedOverloadPhase(dayNumber(row.day), planned);
    if (phase === null) return null;
    const { day } = row;
    return phase.phase === 'within'
      ? {
          key: `within ${isoDay(dayNumber(day) - phase.dayN + 1)}`,
          evidence: { kind: 'planned-overload', day, dayN: phase.dayN, of: phase.ofM, ratio: row.ratio.value },
        }
      : {
          key: `after ${isoDay(dayNumber(day) - phase.dayN + 1)}`,
          evidence: { kind: 'recovering', day, dayN: phase.dayN, of: phase.of },
        };
  });
}

export function suspectEpisodes(records: readonly DayRecord[]): FlagEpisode[] {
  let lastSeen: string | null = null;
  let sessions = 0;
  return stretches(records, ({ day, suspect }) => {
    const open = lastSeen !== null && dayNumber(day) - dayNumber(lastSeen) < SUSPECT_STAY_DAYS;
    if (suspect > 0) {
      sessions = (open ? sessions : 0) + suspect;
      lastSeen = day;
    } else if (!open) {
      return null;
    }
    return { key: 'suspect', evidence: { kind: 'data-suspect', day, sessions, lastSeen: lastSeen! } };
  });
}

/**
 * Of the modalities trained in the last 28 days the one whose newest threshold is oldest. A modality counts where its
 * minutes were counted with thresholds at all.
 */
export function thresholdEpisodes(
  records: readonly DayRecord[],
  uses: readonly ThresholdUse[],
  maxAgeWeeks: number,
): FlagEpisode[] {
  const limitDays = WEEK * maxAgeWeeks;
  const oldest = records.map((record) => oldestInUse(record.day, uses));
  const days = records.map((record, index) => ({
    day: dayNumber(record.day),
    ageDays: oldest[index]?.ageDays ?? NaN,
  }));
  const first = days[0]?.day ?? 0;
  return thresholdsOutOfDate(days, { maxAgeDays: limitDays }).map((stretch) => {
    const { modality, newest, ageDays } = oldest[stretch.evidence.day - first]!;
    const day = isoDay(stretch.evidence.day);
    return {
      kind: 'thresholds-out-of-date',
      level: 'note',
      since: isoDay(stretch.since),
      until: stretch.until === null ? null : isoDay(stretch.until - 1),
      evidence: { kind: 'thresholds-out-of-date', day, modality, newest, ageDays, limitDays },
    };
  });
}

function oldestInUse(day: string, uses: readonly ThresholdUse[]): (ThresholdUse & { ageDays: number }) | null {
  const today = dayNumber(day);
  const newestOf = new Map<string, ThresholdUse>();
  for (const use of uses) {
    const since = today - dayNumber(use.day);
    if (since < 0 || since >= TRAINED_WITHIN_DAYS) continue;
    const known = newestOf.get(use.modality);
    if (known === undefined || use.newest > known.newest) newestOf.set(use.modality, use);
  }
  const ordered = [...newestOf.values()].sort(
    (a, b) => a.newest.localeCompare(b.newest) || a.modality.localeCompare(b.modality),
  );
  const use = ordered[0];
  return use === undefined ? null : { ...use, ageDays: today - dayNumber(use.newest) };
}

/** Folds days into stretches of the same key, each with the evidence of its last day; the newest one may be open. */
function stretches<Day extends { day: string }>(
  days: readonly Day[],
  judge: (day: Day) => { key: string; evidence: FlagEvidence } | null,
): FlagEpisode[] {
  const done: FlagEpisode[] = [];
  let open: { key: string; episode: FlagEpisode } | null = null;
  for (const day of days) {
    const verdict = judge(day);
    if (open !== null && verdict?.key !== open.key) {
      done.push({ ...open.episode, until: open.episode.evidence.day });
      open = null;
    }
    if (verdict === null) continue;
    const { key, evidence }: { key: string; evidence: FlagEvidence } = verdict;
    const since: string = open?.episode.since ?? day.day;
    open = { key, episode: { kind: evidence.kind, level: 'note', since, until: null, evidence } };
  }
  return open === null ? done : [...done, open.episode];
}

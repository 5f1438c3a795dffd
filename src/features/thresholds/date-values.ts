import { dayNumber, isoDay } from '../../core/series/day.ts';
import type { ThresholdChange, ThresholdSeries, ThresholdValue } from './thresholds.types.ts';

/** The word for one series of values: those of one quantity, modality and setting. */
export function seriesKey({ quantity, modality, setting }: ThresholdSeries): string {
  return `${quantity}|${modality}|${setting}`;
}

/**
 * Gives every live value its last day: the day before the next value of its series, none for the newest. A late value so
 * ends the earlier one; a withdrawn one gives its days back to it. Withdrawn values keep the days they had.
 */
export function dateValues(values: readonly ThresholdValue[]): ThresholdValue[] {
  const newestFirst = values.filter(isLive).toSorted((a, b) => b.validFrom.localeCompare(a.validFrom));
  const next = new Map<string, string>();
  const ends = new Map<string, string | null>();
  for (const value of newestFirst) {
    const key = seriesKey(value);
    const after = next.get(key);
    ends.set(value.id, after === undefined ? null : isoDay(dayNumber(after) - 1));
    next.set(key, value.validFrom);
  }
  return values.map((value) => (isLive(value) ? { ...value, validTo: ends.get(value.id) ?? null } : value));
}

/** Two live values of one series that begin on the same day, if there are any. */
export function sameDayPair(values: readonly ThresholdValue[]): [ThresholdValue, ThresholdValue] | undefined {
  const seen = new Map<string, ThresholdValue>();
  for (const value of values.filter(isLive)) {
    const key = `${seriesKey(value)}|${value.validFrom}`;
    const other = seen.get(key);
    if (other !== undefined) return [other, value];
    seen.set(key, value);
  }
  return undefined;
}

/** The days on which another value (or none) is in force afterwards than before, by series. Both sides are dated. */
export function changedDays(before: readonly ThresholdValue[], after: readonly ThresholdValue[]): ThresholdChange[] {
  const keys = new Map([...before, ...after].map((value) => [seriesKey(value), value]));
  return [...keys].flatMap(([key, { quantity, modality, setting }]) => {
    const was = before.filter((value) => isLive(value) && seriesKey(value) === key);
    const is = after.filter((value) => isLive(value) && seriesKey(value) === key);
    const starts = [...new Set([...was, ...is].flatMap(edges))].toSorted();
    const changes: ThresholdChange[] = [];
    starts.forEach((from, index) => {
      if (inForceId(was, from) === inForceId(is, from)) return;
      const next = starts[index + 1];
      const to = next === undefined ? null : isoDay(dayNumber(next) - 1);
      const last = changes.at(-1);
      if (last !== undefined && last.to !== null && dayNumber(last.to) + 1 === dayNumber(from)) last.to = to;
      else changes.push({ quantity, modality, setting, from, to });
    });
    return changes;
  });
}

function isLive(value: ThresholdValue): boolean {
  return value.withdrawnAt === null;
}

function edges({ validFrom, validTo }: ThresholdValue): string[] {
  return validTo === null ? [validFrom] : [validFrom, isoDay(dayNumber(validTo) + 1)];
}

function inForceId(values: readonly ThresholdValue[], day: string): string | undefined {
  return values.find(({ validFrom, validTo }) => validFrom <= day && (validTo === null || day <= validTo))?.id;
}

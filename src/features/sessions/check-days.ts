import { dayLengthMin } from '../../platform/zoned-time.ts';
import type { PlacedSession } from './place-sessions.ts';
import type { SessionFault } from './session-faults.ts';

/** A day of 23, 24 or 25 hours cannot hold more training than it has minutes. */
export function checkDays(
  placed: readonly PlacedSession[],
  minutesBefore: ReadonlyMap<string, number>,
): SessionFault[] {
  const faults: SessionFault[] = [];
  const sums = new Map(minutesBefore);
  for (const { athleteId, day, zone, entry, index } of placed) {
    const key = `${athleteId}|${day}`;
    const before = sums.get(key) ?? 0;
    const length = dayLengthMin(day, zone);
    if (before + entry.durationMin > length + 1e-9) {
      const left = Math.max(0, Math.round((length - before) * 100) / 100);
      const allowed = `at most ${left} min: ${day} has ${length} min, ${Math.round(before * 100) / 100} of them logged`;
      faults.push({ index, kind: 'rule', field: 'durationMin', value: entry.durationMin, allowed });
    } else sums.set(key, before + entry.durationMin);
  }
  return faults;
}

/** One session a source and external id of an athlete, among these and against those that are there. */
export function checkExternalIds(placed: readonly PlacedSession[], known: ReadonlySet<string>): SessionFault[] {
  const faults: SessionFault[] = [];
  const seen = new Set<string>();
  for (const { athleteId, entry, index } of placed) {
    if (entry.externalId === null) continue;
    const key = externalKey(athleteId, entry.source, entry.externalId);
    if (known.has(key)) faults.push(double(index, entry.externalId, 'one that is not stored yet'));
    else if (seen.has(key)) faults.push(double(index, entry.externalId, 'each externalId once'));
    seen.add(key);
  }
  return faults;
}

export function externalKey(athleteId: string, source: string, externalId: string): string {
  return `${athleteId}|${source}|${externalId}`;
}

function double(index: number, value: string, allowed: string): SessionFault {
  return { index, kind: 'conflict', field: 'externalId', value, allowed };
}

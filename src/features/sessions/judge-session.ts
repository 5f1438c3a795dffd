import type { FieldError } from '../../platform/errors.ts';
import type { ThresholdSet } from '../thresholds/thresholds.types.ts';
import { qualities } from './sessions.types.ts';
import type { Quality, SessionEntry } from './sessions.types.ts';
import { intervalMinutes } from './weighing/interval-bouts.ts';

/** Minutes a description may be longer than its session: rounding of clock times (own convention). */
const TOLERANCE_MIN = 1;
/** Longer than this is questioned (own convention). */
const LONG_MIN = 480;
/** Less than this share of the minutes in hand-given domain minutes is questioned (own convention). */
const DESCRIBED_SHARE = 0.9;

export interface Judgement {
  /** Why the session is refused; empty if it is not. */
  refused: FieldError[];
  quality: Quality;
  notes: string[];
}

/** Holds a session against itself and the heart rates in force that day: refuse, doubt or accept. */
export function judgeSession(session: SessionEntry, thresholds: ThresholdSet): Judgement {
  const refused: FieldError[] = [];
  const doubts: { quality: Quality; note: string }[] = [];
  const doubt = (quality: Quality, note: string) => doubts.push({ quality, note });
  const max = thresholds.get('max-heart-rate')?.value;
  const resting = thresholds.get('resting-heart-rate')?.value;

  refused.push(...tooManyMinutes(session));
  for (const { field, value } of meanHeartRates(session)) {
    if (max === undefined || value <= max) continue;
    refused.push({ field, value, allowed: `at most ${max} bpm, the stored maximum`, hint: 'That may be old.' });
    // A session that was logged before the maximum was lowered stays, and is doubted.
    doubt('suspect', `${field} is above the stored maximum of ${max} bpm`);
  }
  const { meanHeartRateBpm, peakHeartRateBpm } = session;
  if (meanHeartRateBpm !== null && peakHeartRateBpm !== null && meanHeartRateBpm > peakHeartRateBpm) {
    refused.push({ field: 'meanHeartRateBpm', value: meanHeartRateBpm, allowed: 'at most peakHeartRateBpm' });
  }
  if (meanHeartRateBpm !== null && resting !== undefined && meanHeartRateBpm < resting) {
    doubt('question', `meanHeartRateBpm is below the resting heart rate of ${resting} bpm`);
  }
  if (max !== undefined && peakHeartRateBpm !== null && peakHeartRateBpm > max) {
    doubt('ok', 'HRmax may be higher, confirm');
  }
  if (session.rating === 0) doubt('question', 'a rating of 0 for a session that lasted');
  if (session.durationMin > LONG_MIN) doubt('question', 'longer than 480 min');
  if (session.content.kind === 'domain-minutes' && describedMinutes(session) < DESCRIBED_SHARE * session.durationMin) {
    doubt('question', 'domain minutes cover less than 90 % of the session');
  }
  const worst = Math.max(0, ...doubts.map(({ quality }) => qualities.indexOf(quality)));
  return { refused, quality: qualities[worst]!, notes: [...new Set(doubts.map(({ note }) => note))] };
}

function tooManyMinutes(session: SessionEntry): FieldError[] {
  const minutes = describedMinutes(session);
  if (minutes <= session.durationMin + TOLERANCE_MIN + 1e-9) return [];
  const field = session.content.kind === 'intervals' ? 'content.lines' : 'content';
  const allowed = `at most ${session.durationMin + TOLERANCE_MIN} min together (durationMin and 1)`;
  return [{ field, value: Math.round(minutes * 100) / 100, allowed }];
}

function describedMinutes({ content }: SessionEntry): number {
  if (content.kind === 'intervals') return intervalMinutes(content.lines);
  if (content.kind !== 'domain-minutes') return 0;
  return content.moderate + content.heavy + content.severe + content.extreme;
}

/** The mean of the session, and those of its intervals. */
function meanHeartRates({ meanHeartRateBpm, content }: SessionEntry): { field: string; value: number }[] {
  const lines = content.kind === 'intervals' ? content.lines : [];
  return [
    { field: 'meanHeartRateBpm', value: meanHeartRateBpm },
    ...lines.map((line, index) => ({ field: `content.lines[${index}].heartRateBpm`, value: line.heartRateBpm })),
  ].filter((each): each is { field: string; value: number } => typeof each.value === 'number');
}

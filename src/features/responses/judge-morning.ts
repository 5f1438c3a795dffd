import { dayNumber } from '../../core/series/day.ts';
import type { Quality } from './mornings.types.ts';

/** Ratings given later than this many days after the morning are remembered rather than felt: own convention. */
const LATE_AFTER_DAYS = 2;
/** With a larger share of intervals removed, the rest is no quiet recording: own convention. */
const LARGEST_REMOVED_SHARE = 0.05;

export interface MorningFacts {
  day: string;
  /** The athlete's date when it is entered. */
  today: string;
  intervals: number;
  removed: number | null;
}

/**
 * How far a morning can be trusted. A late one is asked about and counts; of a suspect one the RMSSD counts nowhere, the
 * answers do.
 */
export function judgeMorning({ day, today, intervals, removed }: MorningFacts): { quality: Quality; notes: string[] } {
  const notes: string[] = [];
  const late = dayNumber(today) - dayNumber(day);
  if (late > LATE_AFTER_DAYS) notes.push(`entered ${late} days later`);
  const noisy = removed !== null && removed > LARGEST_REMOVED_SHARE * intervals;
  if (noisy) notes.push(`${removed} of ${intervals} RR intervals were artefacts`);
  return { quality: noisy ? 'suspect' : notes.length > 0 ? 'question' : 'ok', notes };
}

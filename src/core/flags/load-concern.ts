import type { Episode, LoadConcernDay } from '../types.ts';
import { NumericInputError } from '../numeric-input-error.ts';
import { chronicLowConcern } from './chronic-low-concern.ts';
import type { Constituent } from './constituent.ts';
import type { LoadConcernSettings } from './load-concern-settings.ts';
import { loadConcernSettings } from './load-concern-settings.ts';
import { monotonyStrainConcern } from './monotony-strain-concern.ts';
import { ratioConcern } from './ratio-concern.ts';
import { spikeConcern } from './spike-concern.ts';

/**
 * Episodes of load concern of one athlete.
 *
 * Ratio, low chronic load, monotony with strain and a long single run are views of one series: together they are one piece of evidence, at most a note.
 *
 * @param input days: figures by day [days since 1970-01-01; ratio and monotony no unit; chronic and strain load units; spike %], in order
 *   without gaps, NaN where unknown; firstDay: first day of the log
 * @param settings ratioLimit 1.5, monotonyLimit 2, chronicLowShare 0.5, historyDays 182, historyMinDays 56, clearFactor 0.95, clearDays 3
 * @returns episodes in order: since, until (first day on which nothing stood; null while something stands), the evidence of each measure on
 *   its last open day with a value, and the strongest of the measures open on the episode's last day
 * @throws NumericInputError on days with gaps or settings out of range
 * @remarks Equation: union of the measures' stretches. A day sees only data up to it. Strongest: largest value ÷ limit (low chronic load:
 * limit ÷ value; monotony: smaller quotient of monotony and strain; spike: distance over allowed distance).
 * Limits: a screen, not a diagnosis; load figures describe training and foretell no injury.
 * @see Gabbett TJ 2016, Foster C 1998 and Frandsen JSB et al. 2025 at the measures; one piece of evidence: own convention, after Impellizzeri FM et al. 2021, Sports Med 51:581–592, doi 10.1007/s40279-020-01378-6
 * @example
 * loadConcern({ firstDay: 0, days: [1.2, 1.6].map((ratio, day) => ({ day, ratio, chronic: 50, monotony: 1, strain: 400, muted: null, spike: null })) }).map((e) => e.strongest); // => ['ratio']
 */
export function loadConcern(
  input: { readonly days: readonly LoadConcernDay[]; readonly firstDay: number },
  settings: Partial<LoadConcernSettings> = {},
): Episode[] {
  const { days, firstDay } = input;
  const limits = loadConcernSettings(settings);
  days.forEach(({ day }, index) => {
    const before = days[index - 1];
    if (before === undefined || day === before.day + 1) return;
    throw new NumericInputError('loadConcern', 'day', day, `${before.day + 1}: days in order without gaps`);
  });
  const parts = [
    ...ratioConcern(days, firstDay, limits),
    ...chronicLowConcern(days, firstDay, limits),
    ...monotonyStrainConcern(days, limits),
    ...spikeConcern(days),
  ].sort((a, b) => a.since - b.since);
  const groups: Constituent[][] = [];
  for (const part of parts) {
    const group = groups.at(-1);
    if (group !== undefined && part.since <= end(group)) group.push(part);
    else groups.push([part]);
  }
  return groups.map(episode);
}

/** First day on which none of the parts stands any more. */
function end(group: readonly Constituent[]): number {
  return Math.max(...group.map((part) => part.until ?? Infinity));
}

function episode(group: readonly Constituent[]): Episode {
  const last = end(group);
  const standing = group.filter((part) => (part.until ?? Infinity) === last);
  const strongest = standing.reduce((best, part) => (part.strength > best.strength ? part : best));
  // A measure that was raised twice within the episode is shown as it stood last.
  const latest = new Map(group.map((part) => [part.evidence.measure, part]));
  return {
    since: group[0]!.since,
    until: last === Infinity ? null : last,
    strongest: strongest.evidence.measure,
    evidence: [...latest.values()].map(({ evidence, since, until }) => ({ ...evidence, since, until })),
  };
}

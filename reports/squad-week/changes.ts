import { longDate, MEASURE_WORDS } from './squad-week.view.ts';
import type { AthleteMeasures, Cell, Changes, SquadWeekView } from './squad-week.view.ts';

/** Kinds of flags in the order in which they matter to a coach, with the words for them. */
export const KIND_WORDS: Record<string, string> = {
  'load-concern': 'load concern',
  return: 'on the way back',
  recovering: 'recovering',
  'planned-overload': 'within planned overload',
  'log-gap': 'gap in the log',
  'data-suspect': 'doubtful reading',
  'thresholds-out-of-date': 'old test',
};

const NAMED = 5;

/** What is new, better and unchanged against last week's report. */
export function changesSince(previous: SquadWeekView | null, measures: readonly AthleteMeasures[]): Changes {
  if (previous === null) return { since: null, fresh: [], better: [], unchanged: [] };
  const now = flagged(measures);
  const then = flagged(previous.measures);
  const words = (keys: string[], from: Map<string, string>): string[] => keys.map((key) => from.get(key)!);
  return {
    since: previous.isoWeek,
    fresh: words(
      [...now.keys()].filter((key) => !then.has(key)),
      now,
    ),
    // The end of a planned block is neither better nor worse.
    better: words(
      [...then.keys()].filter((key) => !now.has(key) && !key.endsWith(' planned-overload')),
      then,
    ),
    unchanged: words(
      [...now.keys()].filter((key) => then.has(key)),
      now,
    ),
  };
}

function flagged(measures: readonly AthleteMeasures[]): Map<string, string> {
  return new Map(
    measures.flatMap(({ athleteId, name, flags }) =>
      flags.map(({ kind }): [string, string] => [`${athleteId} ${kind}`, `${name} (${KIND_WORDS[kind] ?? kind})`]),
    ),
  );
}

/** What differs between two versions of the same week, in words. */
export function differences(before: SquadWeekView, after: SquadWeekView): string {
  const parts: string[] = [];
  if (before.asOf !== after.asOf && after.asOf !== null) {
    parts.push(
      `Figures now end on ${longDate(after.asOf)}${before.asOf === null ? '' : ` (before: ${longDate(before.asOf)})`}`,
    );
  }
  const earlier = new Map(before.measures.map((athlete) => [athlete.athleteId, athlete]));
  const changed = after.measures.flatMap((athlete) => {
    const old = earlier.get(athlete.athleteId);
    const what = old === undefined ? ['new in the squad'] : figures(old, athlete);
    return what.length === 0 ? [] : [`${athlete.name}: ${what.join(', ')}`];
  });
  const left = before.measures.filter(({ athleteId }) => !after.measures.some((one) => one.athleteId === athleteId));
  parts.push(...changed.slice(0, NAMED), ...left.map(({ name }) => `${name}: no longer in the squad`));
  if (changed.length > NAMED) parts.push(`and ${changed.length - NAMED} more athletes`);
  return parts.length === 0 ? 'Wording, policy or comparison with last week changed' : parts.join('; ');
}

function figures(old: AthleteMeasures, now: AthleteMeasures): string[] {
  const parts: string[] = [];
  const kinds = (athlete: AthleteMeasures): string[] => athlete.flags.map(({ kind }) => KIND_WORDS[kind] ?? kind);
  const [was, is] = [kinds(old), kinds(now)];
  parts.push(...is.filter((kind) => !was.includes(kind)).map((kind) => `${kind} is new`));
  parts.push(...was.filter((kind) => !is.includes(kind)).map((kind) => `${kind} is gone`));
  const cell = (name: string, before: Cell, after: Cell, digits: number): void => {
    const [from, to] = [shown(before, digits), shown(after, digits)];
    if (from !== to) parts.push(`${name} ${from} → ${to}`);
  };
  cell('domain load', old.domainLoad.week, now.domainLoad.week, 0);
  cell('rating load', old.ratingLoad.week, now.ratingLoad.week, 0);
  cell('ratio', old.ratio, now.ratio, 2);
  cell('monotony', old.monotony, now.monotony, 2);
  cell('long load', old.longLoad, now.longLoad, 0);
  if (old.primaryMeasure !== now.primaryMeasure) parts.push(`primary measure now ${MEASURE_WORDS[now.primaryMeasure]}`);
  return parts;
}

function shown({ value, instead, atLeast }: Cell, digits: number): string {
  if (value === null) return instead ?? 'withheld';
  return `${atLeast === true ? 'at least ' : ''}${value.toFixed(digits)}`;
}

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

/** A change names few: the mail of a new version says it above its own names. */
const NAMED = 1;

/**
 * What is new, better and unchanged against last week's report. A flag that ended and was raised again is new. Better is
 * only who is still in the squad and about whom the figures speak.
 * @param silent athletes of whom the end of a flag says nothing: absent, returning, in a planned overload
 */
export function changesSince(
  previous: SquadWeekView | null,
  measures: readonly AthleteMeasures[],
  silent: ReadonlySet<string>,
): Changes {
  if (previous === null) return { since: null, fresh: [], better: [], unchanged: [] };
  const now = flagged(measures);
  const then = flagged(previous.measures);
  const members = new Set(measures.map(({ athleteId }) => athleteId));
  const same = ({ key, since }: Flagged): boolean => then.get(key)?.since === since;
  const words = (flags: Flagged[]): string[] => flags.map((flag) => flag.words);
  return {
    since: previous.isoWeek,
    fresh: words([...now.values()].filter((flag) => !same(flag))),
    // The end of a planned block is neither better nor worse.
    better: words(
      [...then.values()].filter(
        ({ key, athleteId, kind }) =>
          !now.has(key) && kind !== 'planned-overload' && members.has(athleteId) && !silent.has(athleteId),
      ),
    ),
    unchanged: words([...now.values()].filter(same)),
  };
}

interface Flagged {
  key: string;
  athleteId: string;
  kind: string;
  since: string;
  words: string;
}

function flagged(measures: readonly AthleteMeasures[]): Map<string, Flagged> {
  return new Map(
    measures.flatMap(({ athleteId, name, flags }) =>
      flags.map(({ kind, since }): [string, Flagged] => {
        const key = `${athleteId} ${kind}`;
        return [key, { key, athleteId, kind, since, words: `${name} (${KIND_WORDS[kind] ?? kind})` }];
      }),
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
  const all = [...changed, ...left.map(({ name }) => `${name}: no longer in the squad`)];
  parts.push(...all.slice(0, NAMED));
  if (all.length > NAMED)
    parts.push(`and ${all.length - NAMED} more ${all.length - NAMED === 1 ? 'athlete' : 'athletes'}`);
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

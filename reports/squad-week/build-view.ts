import { CAUTIONS } from '../../src/features/flags/cautions.types.ts';
import type { AthleteFlag } from '../../src/features/flags/flags.types.ts';
import type { SquadWeek } from '../../src/features/series/series.types.ts';
import { athleteChartOf } from './chart-view.ts';
import { changesSince, KIND_WORDS } from './changes.ts';
import { measuresOf } from './measures-view.ts';
import { nameLimit } from './name-limit.ts';
import { methodLines } from './method.ts';
import { NO_PLAN } from './squad-week.view.ts';
import type { AthleteLine, AthleteMeasures, Cell, FlagLine, Level, SquadWeekView } from './squad-week.view.ts';

export interface ViewInput {
  squad: { id: string; name: string; zone: string };
  week: SquadWeek;
  /** Flags of all members as of the last closed day, past ones too. */
  flags: readonly AthleteFlag[];
  /** By athlete: 'rowing from 24 Nov'. */
  thresholdsChanged: ReadonlyMap<string, string[]>;
  previous: SquadWeekView | null;
}

type Athlete = SquadWeek['athletes'][number];

const LEVELS: readonly Level[] = ['act', 'watch', 'note', 'none'];
const KINDS = Object.keys(KIND_WORDS);
/** While one of these is open, load figures do not speak. */
const MUTING: readonly string[] = ['return', 'planned-overload'];
/** Of 7 and of 28: the floors of the windows. */
const [FEWEST_ACUTE, FEWEST_CHRONIC] = [6, 24];

/** Everything the Monday report says, from the squad's week and its flags. */
export function buildView({ squad, week, flags, thresholdsChanged, previous }: ViewInput): SquadWeekView {
  const flagsOf = (athleteId: string): FlagLine[] =>
    flags
      .filter((flag) => flag.athleteId === athleteId && flag.until === null)
      .sort((a, b) => rank(a) - rank(b))
      .map(({ kind, level, since, claim, ask, sentence, clears, evidence }) => ({
        kind,
        level,
        since,
        claim,
        ask,
        sentence,
        clears,
        evidence,
      }));
  const athletes = week.athletes
    .map((athlete) => athleteLine(athlete, flagsOf(athlete.athleteId), thresholdsChanged.get(athlete.athleteId) ?? []))
    .sort((a, b) => LEVELS.indexOf(a.level) - LEVELS.indexOf(b.level) || a.name.localeCompare(b.name, 'en'));
  const order = new Map(athletes.map(({ athleteId }, index) => [athleteId, index]));
  const sorted = [...week.athletes].sort((a, b) => order.get(a.athleteId)! - order.get(b.athleteId)!);
  const measures = sorted.map((athlete): AthleteMeasures =>
    measuresOf(
      athlete,
      flagsOf(athlete.athleteId),
      thresholdsChanged.get(athlete.athleteId) ?? [],
      week.policy.settings,
    ),
  );
  const talk = athletes.filter((athlete) => athlete.talk).map(({ name }) => name);
  const thin = unjudged(sorted);
  return {
    schema: 1,
    squad,
    isoWeek: week.isoWeek,
    from: week.from,
    to: week.to,
    asOf: week.lastDay,
    readOn: sorted.find(({ series }) => series !== null)?.series?.after.day ?? null,
    headline: headline(talk, { athletes: athletes.length, unjudged: thin }, week.lastDay, week.from),
    talk,
    unjudged: thin,
    line: squadFigures(week, athletes),
    changes: changesSince(previous, measures, new Set(silenced(athletes, measures))),
    athletes,
    measures,
    charts: sorted
      .filter(({ athleteId, series }) => series !== null && flagsOf(athleteId).length > 0)
      .map((athlete) => athleteChartOf(athlete.name, athlete.series!, week.policy.settings.ratio.upper)),
    method: methodLines(week.policy),
    cautions: [...CAUTIONS],
  };
}

function headline(
  talk: readonly string[],
  { athletes, unjudged: thin }: { athletes: number; unjudged: number },
  lastDay: string | null,
  from: string,
): string {
  if (athletes === 0) return 'Nobody belongs to the squad.';
  if (lastDay === null) return 'No day is closed yet: there is nothing to compare.';
  const late = lastDay < from ? ' No day of this week is closed yet.' : '';
  if (talk.length === 0 && thin === athletes) return `The log is too thin to say who needs a talk.${late}`;
  const unsaid = thin === 0 ? '' : ` Too thin a log to judge: ${thin} of ${athletes}.`;
  if (talk.length === 0) return `Nobody needs a talk.${unsaid}${late}`;
  const limit = nameLimit(athletes);
  const named = talk.slice(0, limit).join(', ');
  const rest = talk.length > limit ? ` and ${talk.length - limit} more` : '';
  return `${talk.length} of ${athletes} ${talk.length === 1 ? 'needs' : 'need'} a talk: ${named}${rest}.${unsaid}${late}`;
}

/** Athletes without a ratio because too few days are known; a return or a change of basis is another reason. */
function unjudged(athletes: readonly Athlete[]): number {
  return athletes.filter(({ series }) => {
    const ratio = series?.rows.at(-1)?.ratio;
    if (ratio === undefined) return true;
    const { acute, chronic } = ratio.knownDays;
    return ratio.value === null && (acute < FEWEST_ACUTE || chronic < FEWEST_CHRONIC);
  }).length;
}

/** Athletes of whom the end of a flag says nothing: not available, on the way back, or in a planned overload. */
function silenced(athletes: readonly AthleteLine[], measures: readonly AthleteMeasures[]): string[] {
  const away = athletes.filter(({ availability }) => ['not available', 'away', '–'].includes(availability));
  const muted = measures.filter(({ flags }) => flags.some(({ kind }) => MUTING.includes(kind)));
  return [...away, ...muted].map(({ athleteId }) => athleteId);
}

function rank(flag: { level: Level; kind: string }): number {
  return 100 * LEVELS.indexOf(flag.level) + KINDS.indexOf(flag.kind);
}

const needsTalk = (flags: readonly FlagLine[]): boolean =>
  flags.some(({ kind, level }) => kind === 'load-concern' || level !== 'note');

function athleteLine({ athleteId, name, series, week }: Athlete, flags: FlagLine[], changed: string[]): AthleteLine {
  const [first, ...others] = flags;
  const row = series?.rows.at(-1);
  const share: Cell =
    week === null
      ? { value: null, instead: 'no log yet' }
      : { value: week.share.value, instead: week.share.withheld, ...(week.share.atLeast ? { atLeast: true } : {}) };
  return {
    athleteId,
    name,
    availability: availabilityWords(row),
    level: first?.level ?? 'none',
    talk: needsTalk(flags),
    sentence: sentence(first, others, changed, row?.withheld.ratio ?? (row === undefined ? 'no day in the log' : null)),
    since: first?.since ?? null,
    ask: first === undefined ? '' : capital(first.ask),
    weekShare: share,
    sessionsDone: week?.sessions ?? 0,
    daysComplete: week?.daysComplete ?? 0,
    daysOf: week?.daysOf ?? 7,
  };
}

function sentence(
  first: FlagLine | undefined,
  others: readonly FlagLine[],
  changed: string[],
  thin: string | null,
): string {
  const parts: string[] = [];
  if (first !== undefined) parts.push(`${first.claim}.`);
  else if (thin !== null) parts.push(`Too little to compare with: ${thin}.`);
  else parts.push('Nothing stands out.');
  if (others.length > 0) parts.push(`Also: ${others.map(({ kind }) => KIND_WORDS[kind] ?? kind).join(', ')}.`);
  if (changed.length > 0) parts.push(`Thresholds changed (${changed.join(', ')}).`);
  return parts.join(' ');
}

function availabilityWords(row: { availability: string; away: boolean } | undefined): string {
  if (row === undefined) return '–';
  if (row.away) return 'away';
  return row.availability === 'none' ? 'not available' : row.availability;
}

function squadFigures(week: ViewInput['week'], athletes: readonly AthleteLine[]): SquadWeekView['line'] {
  const count = (words: string): number => athletes.filter(({ availability }) => availability === words).length;
  const sum = (pick: (athlete: AthleteLine) => number): number =>
    athletes.reduce((total, line) => total + pick(line), 0);
  return {
    athletes: athletes.length,
    plan: NO_PLAN,
    sessionsDone: sum(({ sessionsDone }) => sessionsDone),
    full: count('full'),
    modified: count('modified'),
    unavailable: count('not available'),
    away: count('away'),
    daysComplete: sum(({ daysComplete }) => daysComplete),
    daysOf: sum(({ daysOf }) => daysOf),
    closedDays: week.closedDays,
    closedOf: 7,
    nextWeek: NO_PLAN,
  };
}

function capital(words: string): string {
  return words.charAt(0).toUpperCase() + words.slice(1);
}

import { csv } from './csv.ts';
import type { CsvRow } from './csv.ts';
import type { Scenario, ScenarioSession } from './scenario.types.ts';

const columns = [
  ...(['type', 'athlete', 'day', 'from', 'to', 'externalId', 'startedAt', 'zone', 'durationMin'] as const),
  ...(['modality', 'setting', 'kind', 'title', 'distanceM', 'rating', 'ratingBy', 'ratingDelayMin'] as const),
  ...(['intendedRating', 'meanHeartRateBpm', 'line', 'repetitions', 'durationS', 'powerW', 'heartRateBpm'] as const),
  ...(['recoveryS', 'recoveryPowerW', 'moderateMin', 'heavyMin', 'severeMin', 'extremeMin'] as const),
  ...(['exercise', 'sets', 'loadKg', 'availability', 'allowedModalities', 'purpose', 'note'] as const),
  ...(['training', 'completeness', 'name', 'sex', 'birthYear'] as const),
] as const;
type Row = CsvRow<(typeof columns)[number]>;

/** What the service makes of one athlete's day; read back from it. */
export interface DayState {
  athlete: string;
  day: string;
  training: string;
  availability: string;
  completeness: string;
}

/** Everything that was logged in one table; `type` says which columns of a row speak. Health reasons are left out. */
export function logTable(scenario: Scenario, days: readonly DayState[]): string {
  const rows: Row[] = [
    ...scenario.athletes.map(({ key, name, sex, birthYear }) => ({
      ...{ type: 'athlete', athlete: key, name, sex, birthYear },
    })),
    ...scenario.athletes.map(({ key, memberFrom }) => ({ type: 'membership', athlete: key, from: memberFrom })),
    ...scenario.zonePeriods.map((period) => ({ type: 'zone-period', ...period })),
    ...scenario.availability.map(({ athlete, state, allowedModalities = [], from, to }) => ({
      ...{ type: 'availability', athlete, availability: state, from, to },
      allowedModalities: allowedModalities.join(' '),
    })),
    ...scenario.loadPeriods.map((period) => ({ type: 'load-period', ...period })),
    ...scenario.closings.map(({ day }) => ({ type: 'closing', day })),
    ...scenario.closings.flatMap(({ day, unknown }) => unknown.map((athlete) => ({ type: 'unknown', athlete, day }))),
    ...scenario.sessions.flatMap(sessionRows),
    ...days.map((day) => ({ type: 'day', ...day })),
  ];
  return csv(columns, rows);
}

/** The session itself, then its lines, sets or minutes under the same externalId. */
function sessionRows({ content, group: _, ...session }: ScenarioSession): Row[] {
  const { athlete, day, externalId } = session;
  const of = { athlete, day, externalId };
  const own: Row = { type: 'session', ...session };
  if (content === undefined) return [own];
  if (content.kind === 'domain-minutes') {
    const { moderate, heavy, severe, extreme } = content;
    const minutes = { moderateMin: moderate, heavyMin: heavy, severeMin: severe, extremeMin: extreme };
    return [own, { type: 'domain-minutes', ...of, ...minutes }];
  }
  if (content.kind === 'strength') {
    return [own, ...content.sets.map((set, index) => ({ type: 'strength-set', ...of, line: index + 1, ...set }))];
  }
  return [own, ...content.lines.map((line, index) => ({ type: 'interval', ...of, line: index + 1, ...line }))];
}

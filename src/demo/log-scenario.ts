import type { ApiClient } from './api-client.ts';
import { addDays } from './days.ts';
import type { FoundClub } from './found-club.ts';
import { inParallel } from './in-parallel.ts';
import type { Scenario, ScenarioSession, ThresholdBatch } from './scenario.types.ts';
import { logDays } from './week-plan.ts';

/** How far the logging is, for whoever waits for it. */
export type Progress = (done: number, total: number, what: string) => void;

/** Days logged at the same time: enough to keep two cores busy. */
const parallelDays = 8;

/** Logs everything as the people of the squad would: staff groups and days, athletes their own, medic and manager. */
export async function logScenario(
  api: ApiClient,
  scenario: Scenario,
  club: FoundClub,
  progress: Progress,
): Promise<void> {
  await prepare(api, scenario, club);
  const byDay = Map.groupBy(scenario.sessions, ({ day }) => day);
  const closings = new Map(scenario.closings.map((closing) => [closing.day, closing.unknown]));
  const days = Array.from({ length: logDays }, (_, index) => addDays(scenario.firstDay, index));
  let logged = 0;
  const advance = (sessions: number) => {
    logged += sessions;
    progress(logged, scenario.sessions.length, 'sessions logged');
  };
  await inParallel(days, parallelDays, async (day) => {
    const sessions = byDay.get(day) ?? [];
    const groups = Map.groupBy(
      sessions.filter(({ group }) => group !== null),
      ({ group }) => group!,
    );
    for (const [group, together] of groups) {
      await logGroup(api, club, group, together);
      advance(together.length);
    }
    for (const session of sessions.filter(({ group }) => group === null)) {
      await logOwn(api, club, session);
      advance(1);
    }
    const unknown = closings.get(day);
    if (unknown !== undefined) await close(api, club, day, unknown);
  });
  await inParallel(
    scenario.thresholds.filter(({ late }) => late),
    1,
    (batch) => enterThresholds(api, club, batch),
  );
}

/** What has to be there before the first session: zones, thresholds, availability, periods. */
async function prepare(api: ApiClient, scenario: Scenario, club: FoundClub): Promise<void> {
  const manager = club.tokens.get('manager')!;
  const medic = club.tokens.get('medic')!;
  for (const { athlete, ...period } of scenario.zonePeriods) {
    await api.post(`/v1/athletes/${club.athleteIds.get(athlete)!}/zone-periods`, {
      ...{ token: manager, key: `demo-zone-${athlete}-${period.from}` },
      body: period,
    });
  }
  // One after another for an athlete: a later value ends the one before.
  const batches = Map.groupBy(
    scenario.thresholds.filter(({ late }) => !late),
    ({ athlete }) => athlete,
  );
  await inParallel([...batches.values()], parallelDays, async (ofAthlete) => {
    for (const batch of ofAthlete) await enterThresholds(api, club, batch);
  });
  for (const { athlete, ...entry } of scenario.availability) {
    await api.post(`/v1/athletes/${club.athleteIds.get(athlete)!}/availability`, {
      ...{ token: medic, key: `demo-availability-${athlete}-${entry.from}` },
      body: entry,
    });
  }
  for (const { athlete, ...period } of scenario.loadPeriods) {
    await api.post(`/v1/squads/${club.squadId}/periods`, {
      ...{ token: manager, key: `demo-period-${athlete ?? 'squad'}-${period.from}` },
      body: athlete === null ? period : { ...period, athleteId: club.athleteIds.get(athlete)! },
    });
  }
}

async function enterThresholds(api: ApiClient, club: FoundClub, { athlete, values }: ThresholdBatch): Promise<void> {
  const path = `/v1/athletes/${club.athleteIds.get(athlete)!}/thresholds`;
  const { reweighed } = await api.post<{ reweighed?: { task: { id: string } | null } }>(path, {
    token: club.tokens.get('manager')!,
    key: `demo-thresholds-${athlete}-${values[0]!.validFrom}`,
    body: { values },
  });
  if (reweighed?.task) await reweighedWhole(api, club, reweighed.task.id);
}

/** Many sessions are weighed again by the worker. */
async function reweighedWhole(api: ApiClient, club: FoundClub, task: string): Promise<void> {
  for (let looks = 0; looks < 600; looks += 1) {
    const { state } = await api.get<{ state: string }>(`/v1/reweighings/${task}`, club.tokens.get('manager')!);
    if (state === 'done') return;
    await new Promise((resolve) => setTimeout(resolve, 100));
  }
  throw new Error('Weighing the sessions again takes longer than a minute.');
}

async function logGroup(api: ApiClient, club: FoundClub, group: string, sessions: readonly ScenarioSession[]) {
  const { startedAt, modality, setting, kind, title, intendedRating } = sessions[0]!;
  const durationMin = Math.max(...sessions.map((session) => session.durationMin));
  await api.post(`/v1/squads/${club.squadId}/sessions`, {
    token: club.tokens.get('staff')!,
    key: `demo-group-${group}`,
    body: {
      session: { startedAt, durationMin, modality, setting, kind, title, intendedRating, source: 'demo' },
      athletes: sessions.map((session) => ({
        athleteId: club.athleteIds.get(session.athlete)!,
        rating: session.rating,
        ratingBy: session.ratingBy,
        ratingDelayMin: session.ratingDelayMin,
        durationMin: session.durationMin,
        meanHeartRateBpm: session.meanHeartRateBpm,
        content: session.content,
        externalId: session.externalId,
      })),
    },
  });
}

async function logOwn(api: ApiClient, club: FoundClub, session: ScenarioSession): Promise<void> {
  const { athlete, group: _, day: __, ...input } = session;
  await api.post(`/v1/athletes/${club.athleteIds.get(athlete)!}/sessions`, {
    token: club.tokens.get(athlete)!,
    key: `demo-${session.externalId}`,
    body: { ...input, source: 'demo' },
  });
}

async function close(api: ApiClient, club: FoundClub, day: string, unknown: readonly string[]): Promise<void> {
  await api.post(`/v1/squads/${club.squadId}/days/${day}/closing`, {
    token: club.tokens.get('staff')!,
    key: `demo-closing-${day}`,
    body: { unknownAthleteIds: unknown.map((key) => club.athleteIds.get(key)!) },
  });
}

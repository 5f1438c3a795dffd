import type { ApiClient } from './api-client.ts';
import { csv } from './csv.ts';
import type { FoundClub } from './found-club.ts';
import { logTable } from './log-table.ts';
import type { DayState } from './log-table.ts';
import type { Scenario } from './scenario.types.ts';

const thresholdColumns = [
  ...(['athlete', 'quantity', 'unit', 'modality', 'setting', 'value', 'standardError', 'method'] as const),
  ...(['validFrom', 'validTo', 'enteredAt', 'withdrawnAt'] as const),
] as const;

type Threshold = Record<Exclude<(typeof thresholdColumns)[number], 'athlete'>, string | number | null>;

interface Policy {
  validFrom: string;
  validTo: string | null;
  settings: Record<string, unknown>;
}

/** What an outside script needs to compute the report's figures a second time, read back from the service. */
export async function exportsOf(api: ApiClient, scenario: Scenario, club: FoundClub) {
  const token = club.tokens.get('manager')!;
  const days: DayState[] = [];
  const thresholds: (Threshold & { athlete: string })[] = [];
  for (const { key } of scenario.athletes) {
    const path = `/v1/athletes/${club.athleteIds.get(key)!}`;
    const range = `from=${scenario.firstDay}&to=${scenario.lastSunday}`;
    const series = await api.get<{ items: (Omit<DayState, 'athlete'> | { day: string })[] }>(
      `${path}/series?${range}`,
      token,
    );
    days.push(
      // The last item is the morning after the last day and has no state of its own.
      ...series.items
        .filter((item) => 'training' in item)
        .map(({ day, training, availability, completeness }) => ({
          ...{ athlete: key, day, training, availability, completeness },
        })),
    );
    const { items } = await api.get<{ items: Threshold[] }>(`${path}/thresholds`, token);
    thresholds.push(...items.map((item) => ({ ...item, athlete: key })));
  }
  const { items } = await api.get<{ items: Policy[] }>(`/v1/squads/${club.squadId}/policies`, token);
  const policy = items.find(
    ({ validFrom, validTo }) => validFrom <= scenario.lastSunday && (validTo ?? '9999') >= scenario.lastSunday,
  );
  return {
    'log.csv': logTable(scenario, days),
    'thresholds.csv': csv(thresholdColumns, thresholds),
    'policy.json': `${JSON.stringify(policy, null, 2)}\n`,
  };
}

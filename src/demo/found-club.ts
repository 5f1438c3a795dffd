import type { ApiClient } from './api-client.ts';
import { inParallel } from './in-parallel.ts';
import type { KeyRing } from './key-ring.ts';
import type { Scenario, ScenarioAthlete, StaffMember } from './scenario.types.ts';

/** The club as the service knows it: identifiers, and who asks with which access key. */
export interface FoundClub {
  clubId: string;
  squadId: string;
  /** The service's identifier of an athlete by the scenario's key. */
  athleteIds: Map<string, string>;
  /** Access key by the key of a person, staff and athletes alike. */
  tokens: Map<string, string>;
}

/** Another last Sunday or another number is another club. */
export function clubKey({ number, lastSunday }: Pick<Scenario, 'number' | 'lastSunday'>): string {
  return `demo-${number}-${lastSunday}`;
}

const validDays = 400;
const parallel = 8;

/** Club, squad, people, their access keys and the athletes; what is there already is found again, not made twice. */
export async function foundClub(
  api: ApiClient,
  scenario: Scenario,
  operatorKey: string,
  ring: KeyRing,
): Promise<FoundClub> {
  const admin = scenario.staff.find(({ key }) => key === 'admin')!;
  const made = await api.post<{ club: { id: string }; token: { secret: string | null } | null }>('/v1/clubs', {
    token: operatorKey,
    key: clubKey(scenario),
    body: { name: scenario.club, admin: { name: admin.name, email: admin.email } },
  });
  if (made.token?.secret) ring.keep('admin', made.token.secret);
  const token = ring.get('admin');
  if (token === undefined) {
    throw new LostKeysError(
      `The club of this demo is in the database, but its access keys are not in ${ring.file}. ` +
        'Remove the data folder, or take another --scenario or --today.',
    );
  }
  const squad = await api.post<{ id: string }>('/v1/squads', {
    token,
    key: 'demo-squad',
    body: { name: scenario.squad, zone: scenario.zone },
  });
  const tokens = new Map([['admin', token]]);
  const personIds = new Map<string, string>();
  const people = [...scenario.staff.filter(({ key }) => key !== 'admin'), ...scenario.athletes];
  await inParallel(people, parallel, async (person) => {
    const { id } = await api.post<{ id: string }>('/v1/people', {
      token,
      key: `demo-person-${person.key}`,
      body: {
        name: person.name,
        email: person.email,
        // An athlete's role reaches the own data only, in whatever squad.
        roles: ['roles' in person ? { role: 'athlete' } : { role: person.key, squadId: squad.id }],
      },
    });
    personIds.set(person.key, id);
    tokens.set(person.key, await tokenOf(api, token, ring, person, id));
  });
  const athleteIds = new Map<string, string>();
  await inParallel(scenario.athletes, parallel, async (athlete) => {
    const { id } = await api.post<{ id: string }>('/v1/athletes', {
      token,
      key: `demo-${athlete.key}`,
      body: {
        name: athlete.name,
        ...(athlete.sex === null ? {} : { sex: athlete.sex }),
        birthYear: athlete.birthYear,
        personId: personIds.get(athlete.key)!,
        squadId: squad.id,
        memberFrom: athlete.memberFrom,
      },
    });
    athleteIds.set(athlete.key, id);
  });
  return { clubId: made.club.id, squadId: squad.id, athleteIds, tokens };
}

/** The database knows the club and this folder does not know its keys. */
export class LostKeysError extends Error {}

/** The person's key from the ring, or a new one; a key issued by a run cut short cannot be shown again. */
async function tokenOf(
  api: ApiClient,
  token: string,
  ring: KeyRing,
  person: StaffMember | ScenarioAthlete,
  personId: string,
): Promise<string> {
  for (let issue = 1; ; issue += 1) {
    const kept = ring.get(person.key);
    if (kept !== undefined) return kept;
    const { secret } = await api.post<{ secret: string | null }>(`/v1/people/${personId}/tokens`, {
      token,
      key: `demo-token-${person.key}-${issue}`,
      body: { label: 'demo', validDays },
    });
    if (secret !== null) ring.keep(person.key, secret);
  }
}

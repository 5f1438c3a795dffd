import type { TestApp } from './app.ts';

/** A club in which something of everything is logged, and a person who may do everything in it. */
export interface LoggedClub {
  /** Roles admin, manager and medic, club-wide. */
  token: string;
  personId: string;
  /** A coach, who may read what is there and write nothing. */
  coach: string;
  squadId: string;
  /** Member since 2026-01-10. */
  athleteId: string;
  /** Member from 2026-01-01 to 2026-01-31. */
  goneId: string;
  sessionId: string;
  membershipId: string;
  /** Critical power 280 W for rowing from 2026-01-20; LT1 200 W from the same day. */
  valueId: string;
  /** From 2026-02-10 to 2026-02-12. */
  availabilityId: string;
  /** A criterion test "2 km" of the squad; Nora did it on 2026-02-01. */
  definitionId: string;
  /** A standard bout of the squad. */
  boutId: string;
  resultId: string;
  circumstanceId: string;
}

export async function loggedClub(test: TestApp): Promise<LoggedClub> {
  const club = await test.newClub();
  const { token, personId } = await club.person([{ role: 'admin' }, { role: 'manager' }, { role: 'medic' }]);
  const squadId = await club.squad('Rowers', 'Europe/Prague');
  const { token: coach } = await club.person([{ role: 'coach' }]);
  const { athleteId } = await club.athlete(squadId, { name: 'Nora', sex: 'female', memberFrom: '2026-01-10' });
  const { athleteId: goneId } = await club.athlete(squadId, { name: 'Gone', memberFrom: '2026-01-01' });
  const post = async (path: string, body: object, headers?: Record<string, string>) => {
    const answer = await test.api('POST', path, { token, body, ...(headers === undefined ? {} : { headers }) });
    if (answer.status >= 300) throw new Error(`POST ${path}: ${answer.status} ${JSON.stringify(answer.body)}`);
    return answer.body;
  };
  const [stay] = (await test.api('GET', `/v1/athletes/${goneId}/memberships`, { token })).body.items;
  await post(`/v1/athletes/${goneId}/memberships/${stay.id}/end`, { to: '2026-01-31' });
  const common = { modality: 'rowing', method: 'step test', validFrom: '2026-01-20' };
  const thresholds = await post(`/v1/athletes/${athleteId}/thresholds`, {
    values: [
      { ...common, quantity: 'critical-power', value: 280 },
      { ...common, quantity: 'lt1-power', value: 200 },
      { ...common, quantity: 'max-heart-rate', value: 190 },
      { ...common, quantity: 'resting-heart-rate', modality: undefined, value: 50 },
    ],
  });
  const session = { startedAt: '2026-02-01T07:30:00+01:00', durationMin: 60, modality: 'rowing', externalId: 'taken' };
  const key = { 'idempotency-key': 'used-before' };
  const { id: sessionId } = await post(`/v1/athletes/${athleteId}/sessions`, session, key);
  const entry = { state: 'none', cause: 'illness', from: '2026-02-10', to: '2026-02-12' };
  const { id: availabilityId } = await post(`/v1/athletes/${athleteId}/availability`, entry);
  await post(`/v1/squads/${squadId}/periods`, { purpose: 'taper', from: '2026-04-01', to: '2026-04-10' });
  await post(`/v1/squads/${squadId}/days/2026-02-01/closing`, {});
  await post(`/v1/athletes/${athleteId}/thresholds`, {
    values: [{ quantity: 'body-mass', value: 70, method: 'scales', validFrom: '2026-01-20' }],
  });
  await post(`/v1/athletes/${athleteId}/mornings`, { day: '2026-02-01', sleep: 3, fatigue: 3, stress: 3 });
  const camp = { kind: 'heat', from: '2026-02-20', to: '2026-02-24' };
  const { id: circumstanceId } = await post(`/v1/squads/${squadId}/circumstances`, camp);
  const ofSquad = { protocol: 'as always', modality: 'rowing', setting: 'ergometer' };
  const trial = { ...ofSquad, kind: 'criterion', name: '2 km', unit: 's', direction: 'lower', typicalError: 2 };
  const { id: definitionId } = await post(`/v1/squads/${squadId}/test-definitions`, trial);
  const bout = { ...ofSquad, kind: 'standard-bout', name: 'Warm-up' };
  const { id: boutId } = await post(`/v1/squads/${squadId}/test-definitions`, bout);
  const result = { definitionId, day: '2026-02-01', value: 420 };
  const { id: resultId } = await post(`/v1/athletes/${athleteId}/test-results`, result);
  const { id: membershipId } = (await test.api('GET', `/v1/athletes/${athleteId}/memberships`, { token })).body
    .items[0];
  const valueId = thresholds.items[0].id;
  return {
    ...{ token, personId, coach, squadId, athleteId, goneId, sessionId, membershipId, valueId, availabilityId },
    ...{ definitionId, boutId, resultId, circumstanceId },
  };
}

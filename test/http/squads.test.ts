import { afterAll, beforeAll, describe, expect, test } from '@jest/globals';
import { SquadsService } from '../../src/features/squads/squads.service.ts';
import { AthletesService } from '../../src/features/athletes/athletes.service.ts';
import { PoliciesService } from '../../src/features/policies/policies.service.ts';
import { UnitOfWork } from '../../src/platform/unit-of-work.ts';
import { startTestApp } from '../support/app.ts';
import type { TestApp, TestClub } from '../support/app.ts';

let app: TestApp;
let club: TestClub;
let manager: string;
beforeAll(async () => {
  app = await startTestApp();
  club = await app.newClub();
  manager = (await club.person([{ role: 'manager' }])).token;
});
afterAll(async () => app?.close());

const get = async (path: string, token = manager) => app.api('GET', path, { token });
const post = async (path: string, body: unknown, token = manager) => app.api('POST', path, { token, body });
const inClub = <T>(work: () => Promise<T>) =>
  app.app.get(UnitOfWork).run({ clubId: club.clubId, personId: null }, work);

describe('a squad', () => {
  test('is made with a policy of defaults for every day', async () => {
    const made = await post('/v1/squads', { name: 'Lightweights', zone: 'Europe/Berlin' });
    expect(made.status).toBe(201);
    expect((await get(`/v1/squads/${made.body.id}`)).body).toEqual(made.body);
    const { items } = (await get(`/v1/squads/${made.body.id}/policies`)).body;
    expect(items).toEqual([
      {
        id: expect.any(String),
        squadId: made.body.id,
        validFrom: '2000-01-01',
        validTo: null,
        settings: {
          primaryMeasure: 'domain-load',
          weights: { moderate: 1, heavy: 2, severe: 3, extreme: 3 },
          weightsSource: 'published three-phase weights',
          bound: { quantity: 'critical', fallbackLt2Method: null },
          ratio: { form: 'rolling-coupled', upper: 1.5 },
          monotony: { sd: 'population', upper: 2 },
          chronicLowShare: 0.5,
          thresholdMaxAgeWeeks: 8,
          filterTimeConstantS: 30,
        },
      },
    ]);
  });

  test('has a name of its own and a real zone', async () => {
    await post('/v1/squads', { name: 'Sweep', zone: 'UTC' });
    const again = await post('/v1/squads', { name: 'Sweep', zone: 'UTC' });
    expect([again.status, again.body.errors[0].field]).toEqual([409, 'name']);
    for (const zone of ['+02:00', 'Europe/Atlantis', '']) {
      expect((await post('/v1/squads', { name: 'Odd', zone })).status).toBe(400);
    }
  });

  test('is listed for those who may read it', async () => {
    const [a, b] = [await club.squad(), await club.squad()];
    const { token } = await club.person([
      { role: 'coach', squadId: a },
      { role: 'staff', squadId: b },
    ]);
    const { items } = (await get('/v1/squads', token)).body as { items: { id: string }[] };
    expect(new Set(items.map(({ id }) => id))).toEqual(new Set([a, b]));
  });

  test('knows its members of a day and its coaches', async () => {
    const squadId = await club.squad();
    const { athleteId } = await club.athlete(squadId, { name: 'Bo', memberFrom: '2026-01-10' });
    await club.athlete(squadId, { name: 'Al', memberFrom: '2026-01-20' });
    const { personId } = await club.person([{ role: 'coach', squadId }], 'Cora');
    await club.person([{ role: 'staff', squadId }]);
    const names = (day: string) =>
      inClub(async () => (await app.app.get(SquadsService).membersOn(squadId, day)).map(({ name }) => name));
    expect(await names('2026-01-09')).toEqual([]);
    expect(await names('2026-01-10')).toEqual(['Bo']);
    expect(await names('2026-01-20')).toEqual(['Al', 'Bo']);
    const stays = await inClub(() => app.app.get(SquadsService).members(squadId, '2026-01-01', '2026-01-15'));
    expect(stays).toEqual([{ athleteId, name: 'Bo', from: '2026-01-10', to: null }]);
    const coaches = await inClub(() => app.app.get(SquadsService).coaches(squadId));
    expect(coaches.map((coach) => coach.personId)).toEqual([personId]);
  });
});

describe('a policy', () => {
  const add = (squadId: string, validFrom: string, settings: object) =>
    post(`/v1/squads/${squadId}/policies`, { validFrom, settings });

  test('ends the one before and keeps what is not named', async () => {
    const squadId = await club.squad();
    const first = await add(squadId, '2026-02-02', { thresholdMaxAgeWeeks: 10 });
    expect(first.status).toBe(201);
    const second = await add(squadId, '2026-03-02', { weights: { moderate: 1, heavy: 2, severe: 4, extreme: 8 } });
    expect(second.body.settings).toMatchObject({
      thresholdMaxAgeWeeks: 10,
      weights: { moderate: 1, heavy: 2, severe: 4, extreme: 8 },
      weightsSource: 'own convention of the squad',
    });
    const { items } = (await get(`/v1/squads/${squadId}/policies`)).body as { items: Record<string, string | null>[] };
    expect(items.map(({ validFrom, validTo }) => [validFrom, validTo])).toEqual([
      ['2026-03-02', null],
      ['2026-02-02', '2026-03-01'],
      ['2000-01-01', '2026-02-01'],
    ]);
    const on = (day: string) => inClub(() => app.app.get(PoliciesService).policyOn(squadId, day));
    expect((await on('2026-03-01')).id).toBe(first.body.id);
    expect((await on('2026-03-02')).id).toBe(second.body.id);
    await expect(on('1999-12-31')).rejects.toMatchObject({ status: 404 });
  });

  test('tells what was weighed anew only where weights or bound changed', async () => {
    const squadId = await club.squad();
    expect((await add(squadId, '2026-02-02', { chronicLowShare: 0.4 })).body.reweighed).toBeUndefined();
    const changed = await add(squadId, '2026-02-03', { bound: { quantity: 'lt2', fallbackLt2Method: 'D-max' } });
    expect(changed.body.reweighed).toEqual({ sessionIds: [], task: null });
  });

  test('starts after the newest one', async () => {
    const squadId = await club.squad();
    await add(squadId, '2026-02-02', {});
    for (const day of ['2026-02-02', '2026-02-01']) {
      const answer = await add(squadId, day, {});
      expect(answer.status).toBe(409);
      expect(answer.body.errors).toEqual([{ field: 'validFrom', value: day, allowed: 'a date after 2026-02-02' }]);
    }
  });

  test('with another form needs a limit set for that form', async () => {
    const squadId = await club.squad();
    const answer = await add(squadId, '2026-02-02', { ratio: { form: 'exponential' }, monotony: { sd: 'sample' } });
    expect([answer.status, answer.body.type]).toEqual([422, 'urn:loadweir:problem:rule-broken']);
    const fields = (answer.body.errors as { field: string }[]).map(({ field }) => field);
    expect(fields).toEqual(['settings.ratio.upper', 'settings.monotony.upper']);
    const whole = await add(squadId, '2026-02-02', { ratio: { form: 'exponential', upper: 1.4 } });
    expect(whole.body.settings.ratio).toEqual({ form: 'exponential', upper: 1.4 });
  });

  test('two at the same moment: one comes first, the other is a conflict', async () => {
    const squadId = await club.squad();
    const answers = await Promise.all([add(squadId, '2026-02-02', {}), add(squadId, '2026-02-02', {})]);
    expect(answers.map(({ status }) => status).toSorted()).toEqual([201, 409]);
  });

  test.each([
    [{ weights: { moderate: 1, heavy: 2, severe: 3 } }, 'settings.weights.extreme'],
    [{ weights: { moderate: -1, heavy: 2, severe: 3, extreme: 3 } }, 'settings.weights.moderate'],
    [{ ratio: { upper: 0 } }, 'settings.ratio.upper'],
    [
      { bound: { byModality: { chess: { quantity: 'lt2', fallbackLt2Method: null } } } },
      'settings.bound.byModality.chess',
    ],
    [{ weightsSource: 'published three-phase weights' }, 'settings.weightsSource'],
    [{ chronicLowShare: 1 }, 'settings.chronicLowShare'],
  ])('%j is refused', async (settings, field) => {
    const answer = await add(await club.squad(), '2026-02-02', settings);
    expect(answer.status).toBe(400);
    expect(answer.body.errors).toEqual([expect.objectContaining({ field })]);
  });
});

describe('an athlete', () => {
  test('is made with a membership and changes squads', async () => {
    const [a, b] = [await club.squad(), await club.squad('New one', 'America/New_York')];
    const input = { name: 'Alex', sex: 'female', birthYear: 2001, squadId: a, memberFrom: '2025-09-01' };
    const { body: athlete } = await post('/v1/athletes', input);
    const path = `/v1/athletes/${athlete.id}`;
    expect((await get(path)).body).toEqual({
      id: athlete.id,
      name: 'Alex',
      sex: 'female',
      birthYear: 2001,
      personId: null,
    });
    const overlap = await post(`${path}/memberships`, { squadId: b, from: '2026-03-09' });
    expect([overlap.status, overlap.body.errors[0].hint]).toEqual([409, 'End the present membership first.']);
    const [stay] = (await get(`${path}/memberships`)).body.items as { id: string }[];
    const ended = await post(`${path}/memberships/${stay!.id}/end`, { to: '2026-03-08' });
    expect(ended.body).toMatchObject({ from: '2025-09-01', to: '2026-03-08' });
    expect((await post(`${path}/memberships`, { squadId: b, from: '2026-03-09' })).status).toBe(201);
    const squadOn = (day: string) => inClub(() => app.app.get(AthletesService).squadOn(athlete.id as string, day));
    expect((await squadOn('2026-03-08'))?.id).toBe(a);
    expect((await squadOn('2026-03-09'))?.id).toBe(b);
    expect(await squadOn('2025-08-31')).toBeNull();
  });

  test('is in sight of the squads of today and later, and of nobody who was left behind', async () => {
    const [a, b] = [await club.squad(), await club.squad()];
    const { athleteId } = await club.athlete(a);
    const [coachA, coachB] = [
      (await club.person([{ role: 'coach', squadId: a }])).token,
      (await club.person([{ role: 'coach', squadId: b }])).token,
    ];
    const seen = async () => [
      (await get(`/v1/athletes/${athleteId}`, coachA)).status,
      (await get(`/v1/athletes/${athleteId}`, coachB)).status,
    ];
    const [stay] = (await get(`/v1/athletes/${athleteId}/memberships`)).body.items as { id: string }[];
    expect(await seen()).toEqual([200, 404]);
    // Today is 2026-03-02.
    await post(`/v1/athletes/${athleteId}/memberships/${stay!.id}/end`, { to: '2026-03-02' });
    expect(await seen()).toEqual([200, 404]);
    await post(`/v1/athletes/${athleteId}/memberships`, { squadId: b, from: '2026-03-03' });
    expect(await seen()).toEqual([200, 200]);
    await post(`/v1/athletes/${athleteId}/memberships/${stay!.id}/end`, { to: '2026-03-01' });
    expect(await seen()).toEqual([404, 200]);
  });

  test('of all stays ended is in sight of the last squad', async () => {
    const squadId = await club.squad();
    const { token } = await club.person([{ role: 'coach', squadId }]);
    const { athleteId } = await club.athlete(squadId);
    const [stay] = (await get(`/v1/athletes/${athleteId}/memberships`)).body.items as { id: string }[];
    await post(`/v1/athletes/${athleteId}/memberships/${stay!.id}/end`, { to: '2026-01-31' });
    expect((await get(`/v1/athletes/${athleteId}`, token)).status).toBe(200);
    const { items } = (await get(`/v1/athletes?squadId=${squadId}`)).body as { items: unknown[] };
    expect(items).toEqual([]);
  });

  test('cannot be put into, or moved to, a squad of someone else', async () => {
    const [a, b] = [await club.squad(), await club.squad()];
    const { token } = await club.person([{ role: 'manager', squadId: a }]);
    const newcomer = { name: 'Nova', memberFrom: '2026-01-01' };
    expect((await post('/v1/athletes', { ...newcomer, squadId: b }, token)).status).toBe(404);
    const { body } = await post('/v1/athletes', { ...newcomer, squadId: a }, token);
    const stay = { squadId: b, from: '2027-01-01' };
    expect((await post(`/v1/athletes/${body.id}/memberships`, stay, token)).status).toBe(404);
  });

  test('lives in another zone for the days of a camp', async () => {
    const squadId = await club.squad(undefined, 'Europe/Prague');
    const { athleteId } = await club.athlete(squadId, { memberFrom: '2026-01-01' });
    const camp = { zone: 'America/Denver', from: '2026-02-01', to: '2026-02-14' };
    expect((await post(`/v1/athletes/${athleteId}/zone-periods`, camp)).status).toBe(201);
    expect((await post(`/v1/athletes/${athleteId}/zone-periods`, camp)).status).toBe(409);
    const zoneOn = (at: string | Date) => inClub(() => app.app.get(AthletesService).zoneOn(athleteId, at));
    expect(await zoneOn('2026-01-31')).toBe('Europe/Prague');
    expect(await zoneOn('2026-02-14')).toBe('America/Denver');
    // Still 14 February in Denver, already the 15th in Prague.
    expect(await zoneOn(new Date('2026-02-15T05:00:00Z'))).toBe('America/Denver');
    expect(await zoneOn(new Date('2026-02-15T08:00:00Z'))).toBe('Europe/Prague');
    expect(await zoneOn('2020-01-01')).toBe('Europe/Prague');
  });

  test.each([
    [{ memberFrom: '2026-02-30' }, 'memberFrom'],
    [{ sex: 'unknown' }, 'sex'],
    [{ birthYear: 1850 }, 'birthYear'],
  ])('with %j is refused', async (bad, field) => {
    const input = { name: 'Alex', squadId: await club.squad(), memberFrom: '2026-01-01', ...bad };
    const answer = await post('/v1/athletes', input);
    expect(answer.status).toBe(400);
    expect(answer.body.errors).toEqual([expect.objectContaining({ field })]);
  });
});

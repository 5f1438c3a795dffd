import { afterAll, beforeAll, describe, expect, it } from '@jest/globals';
import { startTestApp } from '../support/app.ts';
import type { TestApp, TestClub } from '../support/app.ts';

let test: TestApp;
let club: TestClub;
let squadId: string;
let manager: string;
let medic: string;

beforeAll(async () => {
  test = await startTestApp();
  club = await test.newClub();
  squadId = await club.squad('Rowers');
  manager = (await club.person([{ role: 'manager', squadId }])).token;
  medic = (await club.person([{ role: 'medic', squadId }])).token;
});
afterAll(async () => test?.close());

const value = (quantity: string, amount: number, validFrom: string, more: object = {}) => ({
  ...{ quantity, modality: 'rowing', value: amount, method: 'step test', validFrom },
  ...more,
});
const newAthlete = async () => club.athlete(squadId, { name: 'Nora', login: true });
const enter = (athleteId: string, values: object[], token = manager) =>
  test.api('POST', `/v1/athletes/${athleteId}/thresholds`, { token, body: { values } });
const get = (athleteId: string, path: string, token = manager) =>
  test.api('GET', `/v1/athletes/${athleteId}/thresholds${path}`, { token });
const act = (athleteId: string, id: string, what: string, body: object, token = manager) =>
  test.api('POST', `/v1/athletes/${athleteId}/thresholds/${id}/${what}`, { token, body });
const spans = async (athleteId: string) =>
  (await get(athleteId, '')).body.items.map((item: Record<string, unknown>) => [
    item.value,
    item.validFrom,
    item.validTo,
    item.withdrawnAt !== null,
  ]);

describe('thresholds', () => {
  it('a late value ends the earlier one; a correction takes its days; a withdrawal gives them back', async () => {
    const { athleteId } = await newAthlete();
    const first = await enter(athleteId, [
      value('critical-power', 280, '2026-01-10'),
      value('critical-power', 300, '2026-02-20'),
    ]);
    expect(first.status).toBe(201);
    expect(first.body).toMatchObject({
      items: [
        { quantity: 'critical-power', unit: 'W', modality: 'rowing', setting: 'any', validTo: '2026-02-19' },
        { validTo: null },
      ],
      reweighed: { sessionIds: [], task: null },
    });
    const late = (await enter(athleteId, [value('critical-power', 290, '2026-02-01')])).body.items[0];
    expect(late.validTo).toBe('2026-02-19');
    const body = { value: 291, standardError: 4, reason: 'read off wrongly' };
    const corrected = (await act(athleteId, late.id, 'correction', body)).body.item;
    expect(corrected).toMatchObject({ value: 291, supersedes: late.id, validFrom: '2026-02-01', method: 'step test' });
    expect(await spans(athleteId)).toEqual([
      [280, '2026-01-10', '2026-01-31', false],
      [290, '2026-02-01', '2026-02-19', true],
      [291, '2026-02-01', '2026-02-19', false],
      [300, '2026-02-20', null, false],
    ]);
    expect((await act(athleteId, late.id, 'withdrawal', { reason: 'again' })).status).toBe(409);
    expect((await act(athleteId, corrected.id, 'withdrawal', { reason: 'not rowing' })).status).toBe(200);
    expect((await spans(athleteId))[0]).toEqual([280, '2026-01-10', '2026-02-19', false]);
    const newest = (await get(athleteId, '')).body.items.at(-1);
    await act(athleteId, newest.id, 'withdrawal', { reason: 'rig was wrong' });
    expect((await spans(athleteId))[0]).toEqual([280, '2026-01-10', null, false]);
  });

  it('the set in force goes quantity by quantity and prefers the setting’s own value', async () => {
    const { athleteId } = await newAthlete();
    await enter(athleteId, [
      value('lt1-power', 200, '2026-01-10'),
      value('critical-power', 280, '2026-01-10'),
      value('critical-power', 300, '2026-02-01', { setting: 'water' }),
      value('resting-heart-rate', 48, '2026-01-10', { modality: undefined }),
    ]);
    const at = async (date: string, setting: string) =>
      Object.fromEntries(
        (await get(athleteId, `/in-force?date=${date}&modality=rowing&setting=${setting}`)).body.items.map(
          (item: { quantity: string; value: number }) => [item.quantity, item.value],
        ),
      );
    expect(await at('2026-02-01', 'water')).toEqual({
      'critical-power': 300,
      'lt1-power': 200,
      'resting-heart-rate': 48,
    });
    expect(await at('2026-02-01', 'ergometer')).toMatchObject({ 'critical-power': 280 });
    expect(await at('2026-01-31', 'water')).toMatchObject({ 'critical-power': 280 });
    expect(await at('2026-01-09', 'water')).toEqual({});
  });

  it('all values or none: LT1 has to stay below the bound on every day, and the answer names both and the day', async () => {
    const { athleteId } = await newAthlete();
    await enter(athleteId, [value('critical-power', 280, '2026-01-10'), value('critical-power', 240, '2026-02-10')]);
    const answer = await enter(athleteId, [value('vo2max', 5, '2026-01-20'), value('lt1-power', 250, '2026-01-20')]);
    expect(answer.status).toBe(422);
    expect(answer.body.detail).toBe(
      'On 2026-02-10 the set in force for rowing (any) would hold lt1-power 250 W from 2026-01-20 and ' +
        'critical-power 240 W from 2026-02-10: lt1-power has to be below critical-power.',
    );
    expect(answer.body.errors).toEqual([
      {
        field: 'values[1].value',
        value: 250,
        allowed: 'below critical-power 240 W from 2026-02-10 in force on 2026-02-10',
      },
    ]);
    expect((await get(athleteId, '')).body.items).toHaveLength(2);
    const fine = await enter(athleteId, [value('lt1-power', 239, '2026-01-20')]);
    expect(fine.status).toBe(201);
    const { id } = (await get(athleteId, '?quantity=critical-power')).body.items[1];
    const low = await act(athleteId, id, 'correction', { value: 239, reason: 'lower' });
    expect([low.status, low.body.errors[0].field]).toEqual([422, 'value']);
  });

  it('a withdrawal that leaves a set out of order is refused', async () => {
    const { athleteId } = await newAthlete();
    await enter(athleteId, [value('critical-power', 200, '2026-01-10'), value('critical-power', 280, '2026-02-01')]);
    await enter(athleteId, [value('lt1-power', 210, '2026-02-01')]);
    const { id } = (await get(athleteId, '?quantity=critical-power')).body.items[1];
    const answer = await act(athleteId, id, 'withdrawal', { reason: 'mistake' });
    expect(answer.status).toBe(422);
    expect(answer.body.detail).toContain('On 2026-02-01');
  });

  it.each([
    [value('lt2-heart-rate', 191, '2026-01-10'), value('max-heart-rate', 190, '2026-01-10')],
    [value('lt1-heart-rate', 165, '2026-01-10'), value('lt2-heart-rate', 165, '2026-01-10')],
    [
      value('resting-heart-rate', 110, '2026-01-10', { modality: undefined }),
      value('max-heart-rate', 105, '2026-01-10'),
    ],
    [value('lt1-speed', 4, '2026-01-10'), value('lt2-speed', 4, '2026-01-10')],
  ])('refuses %j with %j', async (lower, higher) => {
    const { athleteId } = await newAthlete();
    expect((await enter(athleteId, [lower, higher])).status).toBe(422);
  });

  it('one value of a series a day; not from the future', async () => {
    const { athleteId } = await newAthlete();
    await enter(athleteId, [value('critical-power', 280, '2026-01-10')]);
    const second = await enter(athleteId, [value('critical-power', 281, '2026-01-10')]);
    expect([second.status, second.body.errors[0].field]).toEqual([409, 'values[0].validFrom']);
    const tomorrow = await enter(athleteId, [value('critical-power', 281, '2026-03-03')]);
    expect([tomorrow.status, tomorrow.body.errors[0].field]).toEqual([422, 'values[0].validFrom']);
    expect((await enter(athleteId, [value('critical-power', 281, '2026-03-02')])).status).toBe(201);
  });

  it('body mass is the athlete’s and the medic’s to write and to see', async () => {
    const { athleteId, token } = await newAthlete();
    const mass = value('body-mass', 68.5, '2026-02-01', { modality: undefined });
    expect((await enter(athleteId, [mass])).status).toBe(403);
    expect((await enter(athleteId, [mass], token)).status).toBe(201);
    expect((await enter(athleteId, [{ ...mass, validFrom: '2026-02-08', value: 68 }], medic)).status).toBe(201);
    await enter(athleteId, [value('critical-power', 280, '2026-01-10')]);
    const seen = async (who: string) =>
      (await get(athleteId, '', who)).body.items.map(({ quantity }: { quantity: string }) => quantity);
    expect(await seen(manager)).toEqual(['critical-power']);
    expect(await seen(token!)).toEqual(['body-mass', 'body-mass', 'critical-power']);
    expect(await seen(medic)).toEqual(['body-mass', 'body-mass', 'critical-power']);
    const inForce = await get(athleteId, '/in-force?date=2026-02-10&modality=rowing');
    expect(inForce.body.items.map(({ quantity }: { quantity: string }) => quantity)).toEqual(['critical-power']);
    const mine = (await get(athleteId, '?quantity=body-mass', token)).body.items[0].id;
    expect((await act(athleteId, mine, 'withdrawal', { reason: 'x' })).status).toBe(403);
    expect((await enter(athleteId, [value('lt1-power', 200, '2026-02-01')], token)).status).toBe(403);
    expect((await enter(athleteId, [value('lt1-power', 200, '2026-02-01')], medic)).status).toBe(403);
  });

  it('of several entries at the same moment none breaks another’s order', async () => {
    const { athleteId } = await newAthlete();
    const answers = await Promise.all([
      enter(athleteId, [value('lt1-power', 250, '2026-01-10')]),
      enter(athleteId, [value('critical-power', 240, '2026-01-10')]),
      enter(athleteId, [value('critical-power', 245, '2026-01-20')]),
      enter(athleteId, [value('lt1-power', 230, '2026-01-20')]),
    ]);
    for (const { status } of answers) expect([201, 422]).toContain(status);
    const items = (await get(athleteId, '/in-force?date=2026-02-01&modality=rowing')).body.items;
    const now = new Map(items.map((item: { quantity: string; value: number }) => [item.quantity, item.value]));
    if (now.size === 2) expect(now.get('lt1-power')).toBeLessThan(Number(now.get('critical-power')));
    expect(answers.some(({ status }) => status === 201)).toBe(true);
  });

  it('a body mass far from the one before has to be confirmed', async () => {
    const { athleteId, token } = await newAthlete();
    const mass = (amount: number, validFrom: string, more: object = {}) =>
      enter(athleteId, [value('body-mass', amount, validFrom, { modality: undefined, ...more })], token);
    expect((await mass(68, '2026-01-10')).status).toBe(201);
    const jump = await mass(83, '2026-02-01');
    expect([jump.status, jump.body.errors]).toEqual([
      422,
      [
        {
          ...{ field: 'values[0].value', value: 83, allowed: '61.2 to 74.8 kg, within 10 % of 68 kg of 2026-01-10' },
          hint: 'If it is right, send it with confirmed: true.',
        },
      ],
    ]);
    expect((await mass(74, '2026-02-01')).status).toBe(201);
    expect((await mass(90, '2026-02-10', { confirmed: true })).status).toBe(201);
    expect((await mass(60, '2026-02-12', { confirmed: false })).status).toBe(400);
  });
});

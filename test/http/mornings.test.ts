import { afterAll, beforeAll, describe, expect, test } from '@jest/globals';
import { startTestApp } from '../support/app.ts';
import type { ApiAnswer, TestApp, TestClub } from '../support/app.ts';

// The clock stands at noon UTC of 2026-03-02: in Auckland that is the 3rd.
let app: TestApp;
let club: TestClub;
let ada: { athleteId: string; token?: string };
let tokens: Record<'staff' | 'medic' | 'manager' | 'coach' | 'ada' | 'other', string>;

beforeAll(async () => {
  app = await startTestApp();
  club = await app.newClub();
  const squadId = await club.squad('Rowers', 'Pacific/Auckland');
  const inSquad = async (role: string) => (await club.person([{ role, squadId }])).token;
  ada = await club.athlete(squadId, { name: 'Ada', memberFrom: '2026-01-10', login: true });
  const other = await club.athlete(squadId, { name: 'Bea', memberFrom: '2026-01-10', login: true });
  tokens = {
    staff: await inSquad('staff'),
    medic: await inSquad('medic'),
    manager: await inSquad('manager'),
    coach: await inSquad('coach'),
    ada: ada.token!,
    other: other.token!,
  };
});
afterAll(async () => app?.close());

const path = (rest = '') => `/v1/athletes/${ada.athleteId}/mornings${rest}`;
const call = (who: keyof typeof tokens, method: string, rest: string, body?: object, version?: number) =>
  app.api(method, path(rest), {
    token: tokens[who],
    body,
    ...(version === undefined ? {} : { headers: { 'if-match': `"v${version}"` } }),
  });
const enter = (body: object, who: keyof typeof tokens = 'ada') => call(who, 'POST', '', body);
const four = { sleep: 3, fatigue: 4, stress: 2, soreness: 5 };

describe('a morning', () => {
  test('shows the sum of the four ratings, and none where one is missing', async () => {
    const whole = await enter({ day: '2026-03-02', ...four, mood: 2, sleepHours: 7.5, restingHeartRateBpm: 48 });
    expect(whole.status).toBe(201);
    expect(whole.headers.get('etag')).toBe('"v1"');
    expect(whole.body).toMatchObject({ ...four, sum: 14, mood: 2, sleepHours: 7.5, restingHeartRateBpm: 48 });
    expect(whole.body).toMatchObject({ rmssdMs: null, rrIntervals: 0, quality: 'ok', qualityNotes: [], version: 1 });
    const part = await enter({ day: '2026-03-01', sleep: 3, stress: 2, soreness: 5 });
    expect(part.body).toMatchObject({ sum: null, fatigue: null });
  });

  test('is completed later, and changed only with a reason; every version stays readable', async () => {
    await enter({ day: '2026-02-28', sleep: 3, stress: 2 });
    const added = await call('ada', 'PATCH', '/2026-02-28', { fatigue: 4, soreness: 5 }, 1);
    expect([added.status, added.body.sum, added.body.version]).toEqual([200, 14, 2]);
    const silent = await call('ada', 'PATCH', '/2026-02-28', { fatigue: 6 }, 2);
    expect([silent.status, silent.body.errors[0].field]).toEqual([422, 'changeReason']);
    const same = await call('ada', 'PATCH', '/2026-02-28', { fatigue: 4, mood: 1 }, 2);
    expect(same.status).toBe(200);
    const changed = await call('ada', 'PATCH', '/2026-02-28', { fatigue: 6, changeReason: 'mistyped' }, 3);
    expect([changed.body.sum, changed.body.version]).toEqual([16, 4]);
    const stale = await call('ada', 'PATCH', '/2026-02-28', { sleepHours: 8 }, 3);
    expect(stale.status).toBe(412);
    expect((await call('ada', 'PATCH', '/2026-02-28', { sleepHours: 8 })).status).toBe(428);
    const { items } = (await call('ada', 'GET', '/2026-02-28/history')).body;
    expect(items.map(({ version, reason }: { version: number; reason: string | null }) => [version, reason])).toEqual([
      [1, null],
      [2, null],
      [3, 'mistyped'],
    ]);
    expect(items[2].snapshot).toMatchObject({ fatigue: 4, sum: 14 });
  });

  test('is there once; withdrawn, it makes room for another', async () => {
    await enter({ day: '2026-02-20', ...four });
    const twice = await enter({ day: '2026-02-20', ...four }, 'staff');
    expect([twice.status, twice.body.errors[0]]).toEqual([409, expect.objectContaining({ field: 'day' })]);
    const gone = await call('ada', 'POST', '/2026-02-20/withdrawal', { reason: 'another athlete’s' }, 1);
    expect(gone.body).toMatchObject({ withdrawReason: 'another athlete’s', version: 2 });
    expect((await call('ada', 'GET', '/2026-02-20')).status).toBe(404);
    expect((await enter({ day: '2026-02-20', ...four, sleep: 1 })).body.sum).toBe(12);
    expect((await call('ada', 'GET', '?from=2026-02-20&to=2026-02-20')).body.items).toHaveLength(1);
  });

  test('of which two are sent at once is stored once', async () => {
    const answers = await Promise.all([1, 2, 3].map((sleep) => enter({ day: '2026-02-19', sleep })));
    expect(answers.map(({ status }) => status).toSorted()).toEqual([201, 409, 409]);
    const stored = (await call('ada', 'GET', '/2026-02-19')).body;
    expect(stored.sleep).toBe(answers.find(({ status }) => status === 201)!.body.sleep);
  });

  test('belongs to the athlete’s own date: today is allowed, tomorrow is not, nor a day before the squad', async () => {
    expect((await enter({ day: '2026-03-03', ...four })).status).toBe(201);
    const tomorrow = await enter({ day: '2026-03-04', ...four });
    expect([tomorrow.status, tomorrow.body.errors[0]]).toEqual([
      422,
      expect.objectContaining({ field: 'day', allowed: expect.stringContaining('2026-03-03') }),
    ]);
    expect((await enter({ day: '2026-01-09', ...four })).status).toBe(422);
  });

  test('entered late is kept and marked', async () => {
    const late = await enter({ day: '2026-02-10', ...four });
    expect(late.body).toMatchObject({ quality: 'question', qualityNotes: ['entered 21 days later'] });
  });
});

describe('RR intervals', () => {
  const quiet = Array.from({ length: 60 }, (_, beat) => 1000 + (beat % 2) * 40);

  test('give RMSSD after artefacts are removed', async () => {
    const clean = await enter({ day: '2026-02-27', rrIntervalsMs: quiet });
    expect(clean.body).toMatchObject({ rmssdMs: 40, rrIntervals: 60, rrRemoved: 0, quality: 'question' });
    const exact = await enter({ day: '2026-02-23', rrIntervalsMs: quiet.map((interval) => interval + 0.25) });
    expect(exact.body).toMatchObject({ rmssdMs: 40, rrIntervals: 60 });
    const spiked = quiet.with(30, 1900);
    const one = await enter({ day: '2026-02-26', rrIntervalsMs: spiked });
    expect(one.body).toMatchObject({ rmssdMs: 40, rrRemoved: 1 });
    const noisy = quiet.map((interval, beat) => (beat % 10 === 5 ? 1900 : interval));
    const many = await enter({ day: '2026-02-25', rrIntervalsMs: noisy });
    expect(many.body).toMatchObject({ rrRemoved: 6, quality: 'suspect' });
    expect(many.body.qualityNotes).toContain('6 of 60 RR intervals were artefacts');
  });

  test('that are all alike give no usable RMSSD', async () => {
    const flat = await enter({ day: '2026-02-24', rrIntervalsMs: Array.from({ length: 30 }, () => 900) });
    expect([flat.status, flat.body.errors[0].field]).toEqual([422, 'rrIntervalsMs']);
  });
});

describe('who sees it', () => {
  const planted = { day: '2026-02-18', ...four, mood: 6, sleepHours: 3.25 };

  test('staff may enter and gets a receipt; coach and manager neither enter nor read', async () => {
    const receipt = await enter(planted, 'staff');
    expect([receipt.status, Object.keys(receipt.body as object).toSorted()]).toEqual([
      201,
      ['athleteId', 'day', 'id', 'version'],
    ]);
    for (const who of ['staff', 'coach', 'manager'] as const) {
      for (const rest of ['?from=2026-02-01&to=2026-02-28', '/2026-02-18', '/2026-02-18/history']) {
        expect([who, (await call(who, 'GET', rest)).status]).toEqual([who, 403]);
      }
    }
    for (const who of ['coach', 'manager'] as const) expect((await enter(planted, who)).status).toBe(403);
    expect((await call('other', 'GET', '/2026-02-18')).status).toBe(404);
    for (const who of ['ada', 'medic'] as const) {
      expect((await call(who, 'GET', '/2026-02-18')).body).toMatchObject({ sleepHours: 3.25, sum: 14 });
    }
  });
});

describe('bad input names the field and what is allowed', () => {
  const bad: [name: string, body: object, field: string, allowed: RegExp][] = [
    ['a scale that starts at 0', { ...four, sleep: 0 }, 'sleep', /1 to 7/],
    ['a scale that ends at 8', { ...four, soreness: 8 }, 'soreness', /7/],
    ['half a point', { ...four, stress: 2.5 }, 'stress', /whole number/],
    ['an rMSSD of 0', { rmssdMs: 0 }, 'rmssdMs', /1 to 500/],
    ['an rMSSD of 2000', { rmssdMs: 2000 }, 'rmssdMs', /1 to 500/],
    ['a resting heart rate of 20', { restingHeartRateBpm: 20 }, 'restingHeartRateBpm', /25 to 120/],
    ['25 hours of sleep', { sleepHours: 25 }, 'sleepHours', /0 to 24/],
    ['nothing', {}, '(whole input)', /at least one of/],
    [
      'intervals in seconds',
      { rrIntervalsMs: Array.from({ length: 30 }, () => 0.9) },
      'rrIntervalsMs[0]',
      /300 to 2000/,
    ],
    ['nineteen intervals', { rrIntervalsMs: Array.from({ length: 19 }, () => 900) }, 'rrIntervalsMs', /20 and 2000/],
    [
      'both at once',
      { rmssdMs: 40, rrIntervalsMs: Array.from({ length: 20 }, (_, i) => 900 + i) },
      'rmssdMs',
      /beside/,
    ],
    ['an unknown field', { ...four, bodyMassKg: 70 }, 'bodyMassKg', /./],
  ];

  test.each(bad)('%s', async (_, body, field, allowed) => {
    const answer: ApiAnswer = await enter({ day: '2026-02-15', ...body });
    expect(answer.status).toBe(400);
    expect(answer.body.errors[0]).toMatchObject({ field, allowed: expect.stringMatching(allowed) });
    expect((await call('ada', 'GET', '/2026-02-15')).status).toBe(404);
  });

  test('a day that is none', async () => {
    expect((await call('ada', 'GET', '/2026-02-30')).status).toBe(400);
    expect((await call('ada', 'GET', '?from=2026-02-10&to=2026-02-01')).body.errors[0].field).toBe('to');
  });
});

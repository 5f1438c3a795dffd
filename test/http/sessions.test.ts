import { afterAll, beforeAll, describe, expect, it } from '@jest/globals';
import { startTestApp } from '../support/app.ts';
import type { TestApp, TestClub } from '../support/app.ts';
import { rowsOf } from '../support/rows.ts';

let test: TestApp;
let club: TestClub;
let squadId: string;
let staff: string;
let athleteId: string;

beforeAll(async () => {
  test = await startTestApp();
  club = await test.newClub();
  squadId = await club.squad('Rowers', 'Europe/Prague');
  staff = (await club.person([{ role: 'staff', squadId }])).token;
  athleteId = (await club.athlete(squadId, { name: 'Nora', sex: 'female', memberFrom: '2025-01-10' })).athleteId;
});
afterAll(async () => test?.close());

const minutes = (moderate: number, heavy = 0) => ({ kind: 'domain-minutes', moderate, heavy, severe: 0, extreme: 0 });
const session = (startedAt: string, more: object = {}) => ({ startedAt, durationMin: 60, modality: 'rowing', ...more });
const call = (method: string, path: string, body?: unknown, headers: Record<string, string> = {}) =>
  test.api(method, path, { token: staff, body, headers });
const log = async (startedAt: string, more: object = {}, athlete = athleteId) => {
  const answer = await call('POST', `/v1/athletes/${athlete}/sessions`, session(startedAt, more));
  if (answer.status !== 201) throw new Error(JSON.stringify(answer.body));
  return answer.body;
};
const total = async (day: string, athlete = athleteId) =>
  (
    await rowsOf(
      test.db.ownerUrl,
      `select sessions, minutes, rating_load, rating_missing, domain_load, domain_missing, moderate_min, heavy_min,
        applicable_min, covered_min, basis_minutes, suspect from daily_total where athlete_id = $1 and day = $2`,
      [athlete, day],
    )
  )[0];

describe('logging', () => {
  it('stores what was entered, weighs it and answers with the version as ETag', async () => {
    const body = session('2026-02-01T07:30:00+01:00', { rating: 4, content: minutes(40, 20) });
    const answer = await call('POST', `/v1/athletes/${athleteId}/sessions`, body);
    expect(answer.status).toBe(201);
    expect(answer.headers.get('etag')).toBe('"v1"');
    expect(answer.body).toMatchObject({
      athleteId,
      startedAt: '2026-02-01T06:30:00.000Z',
      trainingDay: '2026-02-01',
      zone: 'Europe/Prague',
      ratingBy: 'athlete',
      quality: 'ok',
      version: 1,
      weight: {
        ratingLoad: 240,
        basis: 'minutes',
        domain: { state: 'present', load: 80, minutes: { moderate: 40, heavy: 20, severe: 0, extreme: 0 } },
        thresholdsUsed: [],
      },
    });
    const read = await call('GET', `/v1/sessions/${answer.body.id}`);
    expect(read.body).toEqual(answer.body);
    expect(read.headers.get('etag')).toBe('"v1"');
  });

  it('sums the day by measure, basis and what is missing', async () => {
    await log('2026-02-02T07:00:00+01:00', { rating: 5, content: minutes(40, 20) });
    await log('2026-02-02T12:00:00+01:00', { content: minutes(50, 10), durationMin: 60.5 });
    await log('2026-02-02T18:00:00+01:00', { modality: 'strength', setting: 'gym', durationMin: 45, rating: 6 });
    await log('2026-02-02T20:00:00+01:00', { rating: 3, durationMin: 30 });
    expect(await total('2026-02-02')).toEqual({
      sessions: 4,
      minutes: 195.5,
      rating_load: 300 + 270 + 90,
      rating_missing: 1,
      domain_load: 80 + 70,
      domain_missing: 1,
      moderate_min: 90,
      heavy_min: 30,
      applicable_min: 150.5,
      covered_min: 120,
      basis_minutes: { minutes: 120 },
      suspect: 0,
    });
  });

  it('the training day is the date of the start where the athlete lives that day', async () => {
    expect(await log('2026-02-03T23:30:00Z')).toMatchObject({ trainingDay: '2026-02-04', zone: 'Europe/Prague' });
    const camp = { zone: 'America/Denver', from: '2026-02-05', to: '2026-02-07' };
    const made = await test.api('POST', `/v1/athletes/${athleteId}/zone-periods`, {
      token: club.adminToken,
      body: camp,
    });
    expect(made.status).toBe(201);
    // 05:30 in Prague on the 6th is still the 5th in the mountains.
    expect(await log('2026-02-06T04:30:00Z')).toMatchObject({ trainingDay: '2026-02-05', zone: 'America/Denver' });
    expect(await log('2026-02-08T08:30:00Z')).toMatchObject({ trainingDay: '2026-02-08', zone: 'Europe/Prague' });
  });

  it('a day holds as many minutes as it has: 23 h and 25 h when the clocks change', async () => {
    const long = (startedAt: string, durationMin: number) =>
      call('POST', `/v1/athletes/${athleteId}/sessions`, session(startedAt, { durationMin }));
    expect((await long('2025-03-30T00:30:00+01:00', 1380)).status).toBe(201);
    const full = await long('2025-03-30T10:00:00+02:00', 1);
    expect(full.status).toBe(422);
    expect(full.body.errors).toEqual([
      {
        field: 'durationMin',
        value: 1,
        allowed: 'at most 0 min: 2025-03-30 has 1380 min, 1380 of them logged',
      },
    ]);
    expect((await long('2025-10-26T00:30:00+02:00', 1440)).status).toBe(201);
    expect((await long('2025-10-26T10:00:00+01:00', 60)).status).toBe(201);
    expect((await long('2025-10-26T12:00:00+01:00', 0.5)).status).toBe(422);
  });

  it('refuses the future by the service’s clock, to the second', async () => {
    const at = (startedAt: string) => call('POST', `/v1/athletes/${athleteId}/sessions`, session(startedAt));
    expect((await at('2026-03-02T12:00:00Z')).status).toBe(201);
    const answer = await at('2026-03-02T12:00:01Z');
    expect(answer.status).toBe(422);
    expect(answer.body).toMatchObject({ type: 'urn:loadweir:problem:rule-broken', errors: [{ field: 'startedAt' }] });
  });

  it('one source names a session once, also after its withdrawal', async () => {
    const named = { source: 'watch', externalId: 'w-1' };
    const first = await log('2026-02-10T07:00:00+01:00', named);
    const again = await call('POST', `/v1/athletes/${athleteId}/sessions`, session('2026-02-10T09:00:00+01:00', named));
    expect([again.status, again.body.errors[0].field]).toEqual([409, 'externalId']);
    expect(await log('2026-02-10T11:00:00+01:00', { ...named, source: 'sheet' })).toMatchObject({ version: 1 });
    await call('POST', `/v1/sessions/${first.id}/withdrawal`, { reason: 'double' }, { 'if-match': '"v1"' });
    const third = await call('POST', `/v1/athletes/${athleteId}/sessions`, session('2026-02-10T13:00:00+01:00', named));
    expect(third.status).toBe(409);
  });
});

describe('two at the same moment', () => {
  it('the same name from one source, on different days: the database keeps one and says which field', async () => {
    const days = ['21', '22', '23', '24', '25', '26'];
    const answers = await Promise.all(
      days.map((day) => {
        const body = session(`2026-02-${day}T07:00:00+01:00`, { source: 'watch', externalId: 'raced' });
        return call('POST', `/v1/athletes/${athleteId}/sessions`, body);
      }),
    );
    expect(answers.map(({ status }) => status).toSorted()).toEqual([201, 409, 409, 409, 409, 409]);
    for (const { status, body } of answers) if (status === 409) expect(body.errors[0].field).toBe('externalId');
  });
});

describe('correcting and withdrawing', () => {
  it('needs the version: 428 without, 412 with an old one, 400 with something else', async () => {
    const { id } = await log('2026-02-12T07:00:00+01:00', { rating: 5 });
    const body = { ...session('2026-02-12T07:00:00+01:00', { rating: 6 }), changeReason: 'asked again' };
    expect((await call('PUT', `/v1/sessions/${id}`, body)).status).toBe(428);
    expect((await call('PUT', `/v1/sessions/${id}`, body, { 'if-match': '"v2"' })).status).toBe(412);
    expect((await call('PUT', `/v1/sessions/${id}`, body, { 'if-match': '*' })).status).toBe(400);
    const done = await call('PUT', `/v1/sessions/${id}`, body, { 'if-match': '"v1"' });
    expect([done.status, done.headers.get('etag'), done.body.weight.ratingLoad]).toEqual([200, '"v2"', 360]);
    expect((await call('PUT', `/v1/sessions/${id}`, body, { 'if-match': '"v1"' })).status).toBe(412);
  });

  it('moves the sums with the day and keeps every version with its reason', async () => {
    const { id } = await log('2026-02-13T07:00:00+01:00', { rating: 5, title: 'easy' });
    const moved = { ...session('2026-02-14T07:00:00+01:00', { rating: 7 }), changeReason: 'wrong day' };
    expect((await call('PUT', `/v1/sessions/${id}`, moved, { 'if-match': '"v1"' })).status).toBe(200);
    expect(await total('2026-02-13')).toBeUndefined();
    expect(await total('2026-02-14')).toMatchObject({ sessions: 1, rating_load: 420 });
    const gone = await call('POST', `/v1/sessions/${id}/withdrawal`, { reason: 'not hers' }, { 'if-match': '"v2"' });
    expect(gone.body).toMatchObject({ version: 3, withdrawReason: 'not hers', weight: null });
    expect(await total('2026-02-14')).toBeUndefined();
    const { items } = (await call('GET', `/v1/sessions/${id}/history`)).body;
    expect(items.map((item: { version: number; reason: string }) => [item.version, item.reason])).toEqual([
      [1, 'wrong day'],
      [2, 'not hers'],
      [3, null],
    ]);
    expect(items[0].snapshot).toMatchObject({ title: 'easy', rating: 5, weight: { ratingLoad: 300 } });
    expect(items[1].snapshot).toMatchObject({ title: null, rating: 7 });
    const listed = await call('GET', `/v1/athletes/${athleteId}/sessions?from=2026-02-13&to=2026-02-14`);
    expect(listed.body).toEqual({ items: [], nextCursor: null });
    const again = await call('POST', `/v1/sessions/${id}/withdrawal`, { reason: 'again' }, { 'if-match': '"v3"' });
    expect(again.status).toBe(409);
  });

  it('of several corrections of one version, one wins', async () => {
    const { id } = await log('2026-02-15T07:00:00+01:00', { rating: 1 });
    const correct = (rating: number) =>
      call(
        'PUT',
        `/v1/sessions/${id}`,
        { ...session(`2026-02-1${5 + (rating % 2)}T07:00:00+01:00`, { rating }), changeReason: 'race' },
        { 'if-match': '"v1"' },
      );
    const statuses = (await Promise.all([2, 3, 4, 5].map(correct))).map(({ status }) => status);
    expect(statuses.toSorted()).toEqual([200, 412, 412, 412]);
    const { rating, trainingDay } = (await call('GET', `/v1/sessions/${id}`)).body;
    expect(await total(trainingDay)).toMatchObject({ sessions: 1, rating_load: rating * 60 });
    expect(await total(trainingDay === '2026-02-15' ? '2026-02-16' : '2026-02-15')).toBeUndefined();
  });

  it('may fill the day up with its own minutes, not beyond', async () => {
    const { id } = await log('2026-02-17T00:00:00+01:00', { durationMin: 1000 });
    await log('2026-02-17T20:00:00+01:00', { durationMin: 200 });
    const long = (durationMin: number) => ({
      ...session('2026-02-17T00:00:00+01:00', { durationMin }),
      changeReason: 'watch was stopped late',
    });
    expect((await call('PUT', `/v1/sessions/${id}`, long(1241), { 'if-match': '"v1"' })).status).toBe(422);
    expect((await call('PUT', `/v1/sessions/${id}`, long(1240), { 'if-match': '"v1"' })).status).toBe(200);
  });
});

describe('listing', () => {
  it('pages from the newest to the oldest, each once', async () => {
    const { athleteId: paged } = await club.athlete(squadId, { name: 'Pia' });
    const made: string[] = [];
    for (const hour of ['08', '08', '09', '10', '11']) {
      made.push((await log(`2026-02-20T${hour}:00:00Z`, { durationMin: 30 }, paged)).id);
    }
    const seen: string[] = [];
    let cursor: string | null = '';
    while (cursor !== null) {
      const path: string = `/v1/athletes/${paged}/sessions?limit=2${cursor && `&cursor=${cursor}`}`;
      const page: { body: { items: { id: string }[]; nextCursor: string | null } } = await call('GET', path);
      seen.push(...page.body.items.map(({ id }) => id));
      cursor = page.body.nextCursor;
    }
    expect(seen).toHaveLength(5);
    expect(seen.slice(0, 3)).toEqual(made.slice(2).reverse());
    expect(new Set(seen)).toEqual(new Set(made));
  });
});

import { afterAll, beforeAll, describe, expect, test } from '@jest/globals';
import { startTestApp } from '../support/app.ts';
import type { TestApp, TestClub } from '../support/app.ts';

// The clock stands at noon UTC of 2026-03-02.
let app: TestApp;
let club: TestClub;
let squadId: string;
let athleteId: string;
let tokens: Record<'staff' | 'coach' | 'manager' | 'athlete', string>;

beforeAll(async () => {
  app = await startTestApp();
  club = await app.newClub();
  squadId = await club.squad();
  const inSquad = async (role: string) => (await club.person([{ role, squadId }])).token;
  const athlete = await club.athlete(squadId, { memberFrom: '2025-10-01', login: true });
  ({ athleteId } = athlete);
  tokens = {
    staff: await inSquad('staff'),
    coach: await inSquad('coach'),
    manager: await inSquad('manager'),
    athlete: athlete.token!,
  };
});
afterAll(async () => app?.close());

type Who = keyof typeof tokens;
const define = (body: object, who: Who = 'manager') =>
  app.api('POST', `/v1/squads/${squadId}/test-definitions`, { token: tokens[who], body });
const results = (method: string, rest: string, body?: object, who: Who = 'staff') =>
  app.api(method, `/v1/athletes/${athleteId}/test-results${rest}`, { token: tokens[who], body });
const trial = {
  ...{ kind: 'criterion', protocol: '2 km, rate free', modality: 'rowing', setting: 'ergometer' },
  ...{ unit: 's', direction: 'lower', typicalError: 2 },
};
const bout = { kind: 'standard-bout', protocol: '6 min at a fixed power', modality: 'rowing' };
let named = 0;
const newTest = async (body: object) => {
  const { body: made } = await define({ ...body, name: `Test ${(named += 1)}` });
  return made.id as string;
};

describe('a test of the squad', () => {
  test('is defined by the manager, read by all in the squad and taken out of use with its results kept', async () => {
    const made = await define({ ...trial, name: '2 km' });
    expect([made.status, made.body]).toEqual([
      201,
      expect.objectContaining({ ...trial, name: '2 km', ratingTypicalError: null, heartRateTypicalError: null }),
    ]);
    const fixed = await define({ ...bout, name: 'Warm-up' });
    expect(fixed.body).toMatchObject({ setting: 'any', unit: null, typicalError: null });
    expect(fixed.body).toMatchObject({ ratingTypicalError: 0.5, heartRateTypicalError: 3 });
    expect((await define({ ...trial, name: '2 km' })).status).toBe(409);
    for (const who of ['staff', 'coach', 'athlete'] as const) {
      expect([403, 404]).toContain((await define({ ...trial, name: who }, who)).status);
    }
    const definitionId = made.body.id as string;
    await results('POST', '', { definitionId, day: '2026-01-05', value: 400 });
    const gone = await app.api('POST', `/v1/squads/${squadId}/test-definitions/${definitionId}/withdrawal`, {
      token: tokens.manager,
      body: { reason: 'replaced by the 6 min test' },
    });
    expect(gone.body).toMatchObject({ withdrawReason: 'replaced by the 6 min test' });
    const refused = await results('POST', '', { definitionId, day: '2026-01-06', value: 400 });
    expect([refused.status, refused.body.errors[0].field]).toEqual([422, 'definitionId']);
    expect((await results('GET', `?definitionId=${definitionId}`)).body.items).toHaveLength(1);
  });

  test.each([
    ['a criterion without typical error', { ...trial, typicalError: undefined }, 'typicalError'],
    ['a typical error of 0', { ...trial, typicalError: 0 }, 'typicalError'],
    ['another direction', { ...trial, direction: 'faster' }, 'direction'],
    ['a bout with a unit', { ...bout, unit: 's' }, 'unit'],
    ['another kind', { ...trial, kind: 'quiz' }, 'kind'],
  ])('refuses %s', async (_, body, field) => {
    const answer = await define({ ...body, name: 'Bad' });
    expect([answer.status, answer.body.errors[0].field]).toEqual([400, field]);
  });
});

describe('a result', () => {
  test('stands beside the mean of the last three to six that are at least 15 days older, in typical errors', async () => {
    const definitionId = await newTest(trial);
    const days = ['2025-11-03', '2025-11-17', '2025-12-01', '2025-12-15'];
    for (const [index, day] of days.entries()) {
      const { body } = await results('POST', '', { definitionId, day, value: [400, 402, 398, 400][index] });
      expect([day, body.expected]).toEqual([day, null]);
    }
    const { body } = await results('POST', '', { definitionId, day: '2026-01-05', value: 406 });
    expect(body).toMatchObject({ expected: 400, deviation: -3, quality: 'ok' });
    const far = await results('POST', '', { definitionId, day: '2026-01-19', value: 500 });
    expect(far.body).toMatchObject({ quality: 'suspect', expected: 400 });
    expect(far.body.qualityNotes).toEqual([expect.stringMatching(/^25 % from .* confirmed: true$/)]);
    const later = await results('POST', '', { definitionId, day: '2026-02-09', value: 402 });
    expect(later.body.expected).toBeCloseTo((400 + 402 + 398 + 400 + 406) / 5, 9);
    const listed = await results('GET', `?definitionId=${definitionId}`, undefined, 'coach');
    expect(listed.body.items.map(({ day }: { day: string }) => day)).toEqual([
      ...days,
      '2026-01-05',
      '2026-01-19',
      '2026-02-09',
    ]);
    const confirmed = { value: 500, confirmed: true, reason: 'timed by two watches' };
    const kept = await results('POST', `/${far.body.id as string}/correction`, confirmed);
    expect(kept.body).toMatchObject({ value: 500, quality: 'ok' });
    expect(kept.body.qualityNotes).toEqual(['25 % from the mean of the own last three, confirmed']);
    const after = (await results('GET', `?definitionId=${definitionId}`)).body.items.at(-1);
    expect(after.expected).toBeCloseTo((400 + 402 + 398 + 400 + 406 + 500) / 6, 9);
  });

  test('is corrected by one of two who do it at the same moment', async () => {
    const definitionId = await newTest(trial);
    const { body: first } = await results('POST', '', { definitionId, day: '2026-01-05', value: 400 });
    const path = (what: string) => `/${first.id as string}/${what}`;
    const answers = await Promise.all([
      results('POST', path('correction'), { value: 401, reason: 'read again' }),
      results('POST', path('correction'), { value: 402, reason: 'read again' }),
      results('POST', path('withdrawal'), { reason: 'wrong athlete' }),
    ]);
    const won = answers.filter(({ status }) => status < 300);
    expect(won).toHaveLength(1);
    for (const { status } of answers) expect([200, 201, 404, 409]).toContain(status);
    const { items } = (await results('GET', `?definitionId=${definitionId}`)).body;
    const [{ body }] = won as [(typeof won)[number]];
    expect(items.map(({ id }: { id: string }) => id)).toEqual(body.withdrawnAt === null ? [body.id] : []);
  });

  test('is corrected by another in its place, or taken out, with a reason', async () => {
    const definitionId = await newTest(trial);
    const { body: first } = await results('POST', '', { definitionId, day: '2026-01-05', value: 4000 });
    const right = await results('POST', `/${first.id as string}/correction`, { value: 400, reason: 'a nought' });
    expect([right.status, right.body]).toEqual([201, expect.objectContaining({ value: 400, supersedes: first.id })]);
    expect((await results('POST', `/${first.id as string}/withdrawal`, { reason: 'x' })).status).toBe(404);
    const gone = await results('POST', `/${right.body.id as string}/withdrawal`, { reason: 'wrong athlete' });
    expect(gone.body).toMatchObject({ withdrawReason: 'wrong athlete' });
    expect((await results('GET', `?definitionId=${definitionId}`)).body.items).toEqual([]);
  });

  test('of a standard bout holds what the work cost, and no result', async () => {
    const definitionId = await newTest(bout);
    const readings = { workW: 200, heartRateBpm: 142, heartRateRecoveryBpm: 35, rating: 3, lactateMmolL: 1.6 };
    const made = await results('POST', '', { definitionId, day: '2026-03-02', ...readings });
    expect([made.status, made.body]).toEqual([
      201,
      expect.objectContaining({ ...readings, value: null, expected: null, deviation: null }),
    ]);
  });

  test.each([
    ['without a value', {}, 400, 'value'],
    ['of 0', { value: 0 }, 400, 'value'],
    ['with the watts of a bout', { value: 400, workW: 200 }, 400, 'workW'],
    ['of tomorrow', { value: 400, day: '2026-03-03' }, 422, 'day'],
    ['before the membership', { value: 400, day: '2025-09-30' }, 422, 'day'],
    ['with rating 11', { value: 400, rating: 11 }, 400, 'rating'],
  ])('%s is refused', async (_, more, status, field) => {
    const definitionId = await newTest(trial);
    const answer = await results('POST', '', { definitionId, day: '2026-02-02', ...more });
    expect([answer.status, answer.body.errors[0].field]).toEqual([status, field]);
  });

  test('is there once a day, also when two are sent at the same moment', async () => {
    const definitionId = await newTest(trial);
    const send = () => results('POST', '', { definitionId, day: '2026-02-02', value: 400 });
    const answers = await Promise.all([send(), send(), send()]);
    expect(answers.map(({ status }) => status).toSorted()).toEqual([201, 409, 409]);
  });

  test('of a bout needs a rating or a heart rate, and is entered by staff, not by the athlete', async () => {
    const definitionId = await newTest(bout);
    const empty = await results('POST', '', { definitionId, day: '2026-02-02', workW: 200 });
    expect([empty.status, empty.body.errors[0].field]).toEqual([400, 'rating']);
    const own = await results('POST', '', { definitionId, day: '2026-02-02', rating: 3 }, 'athlete');
    expect(own.status).toBe(403);
  });
});

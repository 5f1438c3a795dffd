import { afterAll, beforeAll, describe, expect, it } from '@jest/globals';
import { startTestApp } from '../support/app.ts';
import type { TestApp, TestClub } from '../support/app.ts';
import { rowsOf } from '../support/rows.ts';

let test: TestApp;
let club: TestClub;
let squadId: string;
let staff: string;
let athletes: string[];

beforeAll(async () => {
  test = await startTestApp();
  club = await test.newClub();
  squadId = await club.squad('Rowers', 'Europe/Prague');
  staff = (await club.person([{ role: 'staff', squadId }])).token;
  athletes = [];
  for (const name of ['Ada', 'Bea', 'Cleo', 'Dora', 'Eva']) {
    athletes.push((await club.athlete(squadId, { name })).athleteId);
  }
});
afterAll(async () => test?.close());

const post = (path: string, body: unknown, headers: Record<string, string> = {}) =>
  test.api('POST', path, { token: staff, body, headers });
const group = (day: string, rows: object[], more: object = {}) =>
  post(`/v1/squads/${squadId}/sessions`, {
    session: { startedAt: `2026-02-${day}T07:30:00+01:00`, durationMin: 60, modality: 'rowing', ...more },
    athletes: rows,
  });
const totals = async (day: string) =>
  rowsOf<{ sessions: number; minutes: number; rating_load: number }>(
    test.db.ownerUrl,
    `select athlete_id, sessions, minutes, rating_load from daily_total where day = $1 order by athlete_id`,
    [`2026-02-${day}`],
  );

describe('one session given to many', () => {
  it('keeps each athlete’s own rating, minutes and content', async () => {
    const own = { kind: 'domain-minutes', moderate: 30, heavy: 0, severe: 0, extreme: 0 };
    const answer = await group('02', [
      { athleteId: athletes[0], rating: 3 },
      { athleteId: athletes[1], rating: 6, ratingBy: 'staff', ratingDelayMin: 30 },
      { athleteId: athletes[2], durationMin: 30, content: own },
    ]);
    expect(answer.status).toBe(201);
    const { groupId, items } = answer.body;
    expect(items.map((item: { groupId: string }) => item.groupId)).toEqual([groupId, groupId, groupId]);
    expect(items).toMatchObject([
      { athleteId: athletes[0], rating: 3, ratingBy: 'athlete', durationMin: 60, weight: { ratingLoad: 180 } },
      { athleteId: athletes[1], rating: 6, ratingBy: 'staff', ratingDelayMin: 30, weight: { ratingLoad: 360 } },
      { athleteId: athletes[2], rating: null, durationMin: 30, weight: { ratingLoad: null, domain: { load: 30 } } },
    ]);
  });

  it('stores none if one is refused, and names every place that is wrong', async () => {
    const other = (await club.athlete(await club.squad('Others'), { name: 'Zoe' })).athleteId;
    const late = (await club.athlete(squadId, { name: 'Late', memberFrom: '2026-02-20' })).athleteId;
    const answer = await group('03', [
      { athleteId: athletes[0], rating: 3 },
      { athleteId: other, rating: 3 },
      { athleteId: late, rating: 3 },
      { athleteId: athletes[1], content: { kind: 'domain-minutes', moderate: 62, heavy: 0, severe: 0, extreme: 0 } },
    ]);
    expect(answer.status).toBe(422);
    expect(answer.body.errors).toEqual([
      expect.objectContaining({ field: 'athletes[1].athleteId', value: other, allowed: 'an athlete of the squad' }),
      expect.objectContaining({
        field: 'athletes[2].startedAt',
        allowed: 'a training day within the membership, from 2026-02-20 on',
      }),
      expect.objectContaining({ field: 'athletes[3].content', value: 62 }),
    ]);
    expect(await totals('03')).toEqual([]);
  });

  it('takes each athlete once', async () => {
    const answer = await group('03', [{ athleteId: athletes[0] }, { athleteId: athletes[0] }]);
    expect(answer.status).toBe(400);
    expect(answer.body.errors).toEqual([
      { field: 'athletes[1].athleteId', value: athletes[0], allowed: 'each athlete once' },
    ]);
  });

  it('answers the same to the same key, and stores it once', async () => {
    const send = () =>
      post(
        `/v1/squads/${squadId}/sessions`,
        {
          session: { startedAt: '2026-02-04T07:30:00+01:00', durationMin: 60, modality: 'rowing' },
          athletes: athletes.map((athleteId) => ({ athleteId, rating: 5 })),
        },
        { 'idempotency-key': 'morning-of-the-4th' },
      );
    const [first, second] = [await send(), await send()];
    expect(second.body).toEqual(first.body);
    expect(second.headers.get('idempotent-replayed')).toBe('true');
    expect((await totals('04')).map(({ sessions }) => sessions)).toEqual([1, 1, 1, 1, 1]);
  });
});

describe('many at once', () => {
  it('groups and single sessions of the same days lose no sum and never wait for each other for ever', async () => {
    const turned = (by: number) => [...athletes.slice(by), ...athletes.slice(0, by)];
    const rows = (by: number) => turned(by).map((athleteId) => ({ athleteId, rating: 2 }));
    const single = (athleteId: string) => {
      const body = { startedAt: '2026-02-05T15:00:00+01:00', durationMin: 30, modality: 'running', rating: 4 };
      return post(`/v1/athletes/${athleteId}/sessions`, body);
    };
    const answers = await Promise.all([
      ...[0, 1, 2, 3, 4].map((by) => group('05', by % 2 === 0 ? rows(by) : rows(by).toReversed())),
      ...athletes.flatMap((athleteId) => [single(athleteId), single(athleteId)]),
    ]);
    expect(answers.map(({ status }) => status)).toEqual(answers.map(() => 201));
    const sums = await totals('05');
    expect(sums).toHaveLength(5);
    for (const sum of sums) expect(sum).toMatchObject({ sessions: 7, minutes: 360, rating_load: 5 * 120 + 2 * 120 });
  });

  it('the limit of a day holds when its last minutes are asked for at once', async () => {
    const half = () => group('06', [{ athleteId: athletes[0] }], { durationMin: 700 });
    const statuses = (await Promise.all([half(), half(), half(), half()])).map(({ status }) => status);
    expect(statuses.toSorted()).toEqual([201, 201, 422, 422]);
    expect(await totals('06')).toMatchObject([{ sessions: 2, minutes: 1400 }]);
  });
});

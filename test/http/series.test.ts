import { afterAll, beforeAll, describe, expect, test } from '@jest/globals';
import { startTestApp } from '../support/app.ts';
import type { TestApp, TestClub } from '../support/app.ts';
import { fixedClock } from '../support/clock.ts';

let app: TestApp;
let club: TestClub;
let manager: string;
let squadId: string;
let athlete: { athleteId: string; token?: string };

// Monday 2 March 2026; the squad's log runs from Sunday 22 February on.
const DAYS = ['2026-02-22', '2026-02-23', '2026-02-24', '2026-02-25', '2026-02-26', '2026-02-27', '2026-02-28'];

beforeAll(async () => {
  app = await startTestApp({ clock: fixedClock('2026-03-02T12:00:00Z') });
  club = await app.newClub();
  manager = (await club.person([{ role: 'manager' }])).token;
  squadId = await club.squad('Series squad');
  athlete = await club.athlete(squadId, { name: 'Sára Series', memberFrom: '2026-01-01', login: true });
});
afterAll(() => app.close());

const get = (path: string, token: string | undefined = manager) => app.api('GET', path, { token });
/** Days of the items of an answer. */
const daysOf = (body: unknown): string[] => (body as { items: { day: string }[] }).items.map(({ day }) => day);
const series = (query = '', token?: string) => get(`/v1/athletes/${athlete.athleteId}/series${query}`, token);
const close = (day: string, unknownAthleteIds: string[] = []) =>
  app.api('POST', `/v1/squads/${squadId}/days/${day}/closing`, { token: manager, body: { unknownAthleteIds } });

describe('series', () => {
  test('without a closed day there is no figure, and nothing is invented', async () => {
    expect((await series()).body).toMatchObject({ asOf: null, firstDay: null, measure: null, items: [] });
    expect((await get(`/v1/squads/${squadId}/overview`)).body).toMatchObject({
      asOf: null,
      items: [{ name: 'Sára Series', row: null, after: null }],
    });
  });

  test('ends on the last closed day, then the morning after it; a closed day without a session is rest', async () => {
    for (const [i, day] of DAYS.entries()) {
      if (i % 2 === 0) {
        const body = { startedAt: `${day}T09:00:00+01:00`, durationMin: 60, modality: 'rowing', rating: 5 };
        await app.api('POST', `/v1/athletes/${athlete.athleteId}/sessions`, { token: manager, body });
      }
      if (day !== '2026-02-28') expect((await close(day)).status).toBe(200);
    }
    const { body } = await series();
    expect(body).toMatchObject({ asOf: '2026-02-27', firstDay: DAYS[0], measure: 'rating-load' });
    expect(daysOf(body)).toEqual(DAYS);
    expect(body.items[1]).toMatchObject({ training: 'rest', rating: { state: 'known', value: 0 } });
    expect(body.items[4]).toMatchObject({ training: 'trained', rating: { state: 'known', value: 300 } });
    // A rating gives no minutes in domain: the day is a lower bound of 0 in domain load, not a rest day.
    expect(body.items[4].domain).toEqual({ state: 'partial', value: 0 });
    expect(body.items[6]).not.toHaveProperty('ratio');
  });

  test('a day on which somebody could not be accounted for is unknown, never 0', async () => {
    await close('2026-02-27', [athlete.athleteId]);
    const { items } = (await series()).body as { items: object[] };
    const row = items.at(-2);
    expect(row).toMatchObject({ day: '2026-02-27', training: 'unknown', rating: { state: 'unknown', value: null } });
    await close('2026-02-27');
  });

  test('from, to and measure are obeyed', async () => {
    const { body } = await series('?from=2026-02-24&to=2026-02-25&measure=domain-load');
    expect(body).toMatchObject({ measure: 'domain-load', measureReason: 'asked for' });
    expect(daysOf(body)).toEqual(['2026-02-24', '2026-02-25']);
  });

  test.each([
    ['?from=2026-02-25&to=2026-02-24', 'to'],
    ['?from=2020-01-01&to=2026-01-01', 'to'],
    ['?from=yesterday', 'from'],
    ['?measure=feelings', 'measure'],
  ])('%s is refused by name', async (query, field) => {
    const { status, body } = await series(query);
    expect(status).toBe(400);
    expect(body.errors[0]).toMatchObject({ field });
  });

  test('overview shows each athlete on the last closed day not after the day asked for', async () => {
    const { body } = await get(`/v1/squads/${squadId}/overview?day=2026-02-24`);
    expect(body).toMatchObject({ day: '2026-02-24', asOf: '2026-02-24', readOn: '2026-02-25' });
    expect(body.items[0]).toMatchObject({
      name: 'Sára Series',
      row: { day: '2026-02-24' },
      after: { day: '2026-02-25' },
    });
  });
});

test('athletes read their own series and nobody else’s; staff who only log read none; strangers see nothing', async () => {
  const other = await club.athlete(squadId, { name: 'Otto Other', memberFrom: '2026-01-01', login: true });
  const coach = await club.person([{ role: 'coach', squadId }]);
  const staff = await club.person([{ role: 'staff', squadId }]);
  const elsewhere = await club.person([{ role: 'coach', squadId: await club.squad() }]);
  expect((await series('', athlete.token)).status).toBe(200);
  expect((await series('', other.token)).status).toBe(404);
  expect((await series('', coach.token)).status).toBe(200);
  expect((await series('', staff.token)).status).toBe(403);
  expect((await series('', elsewhere.token)).status).toBe(404);
  expect((await get(`/v1/squads/${squadId}/overview`, athlete.token)).status).toBe(404);
  expect((await app.api('GET', `/v1/athletes/${athlete.athleteId}/series`)).status).toBe(401);
});

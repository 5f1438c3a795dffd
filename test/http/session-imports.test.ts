import { afterAll, beforeAll, describe, expect, it } from '@jest/globals';
import { startTestApp } from '../support/app.ts';
import type { TestApp, TestClub } from '../support/app.ts';
import { rowsOf } from '../support/rows.ts';

let test: TestApp;
let club: TestClub;
let squadId: string;
let staff: string;
let nora: string;

beforeAll(async () => {
  test = await startTestApp();
  club = await test.newClub();
  squadId = await club.squad('Rowers', 'Europe/Prague');
  staff = (await club.person([{ role: 'staff', squadId }])).token;
  nora = (await club.athlete(squadId, { name: 'Nora Nová' })).athleteId;
  await club.athlete(squadId, { name: 'Ida Twin' });
  await club.athlete(squadId, { name: 'Ida Twin' });
});
afterAll(async () => test?.close());

const bringIn = (body: string, query = '') =>
  test.api('POST', `/v1/squads/${squadId}/session-imports${query}`, { token: staff, body });
const stored = async () =>
  rowsOf(
    test.db.ownerUrl,
    `select title, external_id, source, rating, training_day::text as day, duration_min from training_session
     order by started_at, external_id`,
  );
const header = 'athlete,startedAt,durationMin,modality,rating,title,externalId';

describe('POST /v1/squads/{squadId}/session-imports', () => {
  it('a dry run looks at everything and stores nothing', async () => {
    const answer = await bringIn(`${header}\nNora Nová,2026-02-02 07:30,60,rowing,5,,a-1\n`, '?dryRun=true');
    expect([answer.status, answer.body]).toEqual([200, { rows: 1, stored: 0, errors: [] }]);
    expect(await stored()).toEqual([]);
  });

  it('stores nothing if one row is wrong, and names every wrong cell of every row', async () => {
    const sheet = [
      header,
      'Nora Nová,2026-02-02 07:30,60,rowing,5,,a-1',
      'Nora Nová,2026-02-02 09:30,60,rowing,11,,a-2',
      'Nobody,2026-02-02 07:30,60,chess,5,,a-3',
      'Ida Twin,2026-02-02 07:30,60,rowing,5,,a-4',
      'Nora Nová,2026-03-02 23:30,60,rowing,5,,a-5',
      'Nora Nová,2024-12-31 07:30,60,rowing,5,,a-6',
      'Nora Nová,2026-02-02 11:30,60,rowing,5,,a-1',
      'Nora Nová,2026-02-02 12:30,1400,rowing,5,,a-8',
    ];
    for (const query of ['', '?dryRun=true']) {
      const answer = await bringIn(sheet.join('\n'), query);
      expect(answer.status).toBe(422);
      const places = answer.body.errors.map(({ row, field }: { row: number; field: string }) => [row, field]);
      expect(places).toEqual([
        [3, 'rating'],
        [4, 'athlete'],
        [4, 'modality'],
        [5, 'athlete'],
        [6, 'startedAt'],
        [7, 'startedAt'],
        [8, 'externalId'],
        [9, 'durationMin'],
      ]);
      expect(answer.body.errors[3].allowed).toBe('the id: several athletes have this name');
    }
    expect(await stored()).toEqual([]);
  });

  it('reads a sheet of another office: byte order mark, semicolons, decimal commas, CRLF, quotes, formulas as text', async () => {
    const lines = [
      '\uFEFFtitle;athlete;startedAt;durationMin;modality;rating;externalId;moderateMin;heavyMin',
      `"=HYPERLINK(""x"");2";${nora};2026-02-03T07:30;62,5;rowing;6,5;b-1;50,5;12`,
      '@SUM(A1);Nora Nová;2026-02-03 17:00;30;strength;4;b-2;;',
    ];
    const answer = await bringIn(`${lines.join('\r\n')}\r\n`);
    expect([answer.status, answer.body]).toEqual([201, { rows: 2, stored: 2, errors: [] }]);
    expect(await stored()).toEqual([
      {
        title: '=HYPERLINK("x");2',
        external_id: 'b-1',
        source: 'csv',
        rating: 6.5,
        day: '2026-02-03',
        duration_min: 62.5,
      },
      { title: '@SUM(A1)', external_id: 'b-2', source: 'csv', rating: 4, day: '2026-02-03', duration_min: 30 },
    ]);
    const [total] = await rowsOf(
      test.db.ownerUrl,
      `select sessions, minutes, rating_load, domain_load from daily_total`,
    );
    expect(total).toEqual({ sessions: 2, minutes: 92.5, rating_load: 62.5 * 6.5 + 120, domain_load: 50.5 + 24 });
  });

  it('the same sheet again is refused row by row', async () => {
    const sheet = `${header}\nNora Nová,2026-02-03 07:30,60,rowing,5,,b-1\nNora Nová,2026-02-04 07:30,60,rowing,5,,b-3\n`;
    const answer = await bringIn(sheet);
    expect(answer.status).toBe(422);
    expect(answer.body.errors).toEqual([
      { row: 2, field: 'externalId', value: 'b-1', allowed: 'one that is not stored yet' },
    ]);
  });

  it('takes thousands of rows in one go', async () => {
    const rows = Array.from({ length: 2000 }, (_, index) => {
      const day = new Date(Date.UTC(2025, 0, 2) + Math.floor(index / 5) * 86_400_000).toISOString().slice(0, 10);
      return `Nora Nová,${day} ${String(8 + (index % 5)).padStart(2, '0')}:00,30,rowing,4,,big-${index}`;
    });
    const begun = performance.now();
    const answer = await bringIn([header, ...rows].join('\n'));
    expect([answer.status, answer.body.stored]).toEqual([201, 2000]);
    expect(performance.now() - begun).toBeLessThan(30_000);
    const [sum] = await rowsOf<{ days: string; load: number }>(
      test.db.ownerUrl,
      `select count(*)::int as days, sum(rating_load) as load from daily_total where day < '2026-02-06' and sessions = 5`,
    );
    expect(sum).toEqual({ days: 400 - 1, load: 399 * 600 });
  });

  it('is no JSON route, and no sheet is a fault of the sheet', async () => {
    const json = await test.api('POST', `/v1/squads/${squadId}/session-imports`, { token: staff, body: { a: 1 } });
    expect(json.status).toBe(415);
    const empty = await bringIn('athlete,startedAt\n');
    expect(empty.status).toBe(400);
    expect((await bringIn(`${header}\n"Nora`)).body.errors).toMatchObject([{ row: 2, field: '(whole row)' }]);
  });
});

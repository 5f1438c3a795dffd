import { afterAll, beforeAll, describe, expect, it } from '@jest/globals';
import { DaysService } from '../../src/features/days/days.service.ts';
import { UnitOfWork } from '../../src/platform/unit-of-work.ts';
import { startTestApp } from '../support/app.ts';
import type { TestApp, TestClub } from '../support/app.ts';
import { rowsOf } from '../support/rows.ts';

let test: TestApp;
let club: TestClub;
let squadId: string;
let staff: string;
let manager: string;
let medic: string;
let ada: { athleteId: string; token?: string };
let bea: { athleteId: string };

beforeAll(async () => {
  test = await startTestApp();
  club = await test.newClub();
  squadId = await club.squad('Rowers', 'Pacific/Auckland');
  staff = (await club.person([{ role: 'staff', squadId }])).token;
  manager = (await club.person([{ role: 'manager', squadId }])).token;
  medic = (await club.person([{ role: 'medic', squadId }])).token;
  ada = await club.athlete(squadId, { name: 'Ada', memberFrom: '2026-01-10', login: true });
  bea = await club.athlete(squadId, { name: 'Bea', memberFrom: '2026-02-01' });
});
afterAll(async () => test?.close());

const call = (token: string, method: string, path: string, body?: object) => test.api(method, path, { token, body });
const days = '/v1/squads/';
const close = (day: string, body: object = {}) => call(staff, 'POST', `${days}${squadId}/days/${day}/closing`, body);
const view = async (day: string) => (await call(staff, 'GET', `${days}${squadId}/days/${day}`)).body;
const log = (athleteId: string, startedAt: string, more: object = {}) =>
  call(staff, 'POST', `/v1/athletes/${athleteId}/sessions`, {
    startedAt,
    durationMin: 60,
    modality: 'rowing',
    ...more,
  });

describe('closing a squad’s day', () => {
  it('makes a day without a session rest, but for those named; reopened, it is unknown again', async () => {
    await log(ada.athleteId, '2026-02-02T07:00:00+13:00', { rating: 5 });
    const open = await view('2026-02-02');
    expect(open).toMatchObject({
      closed: false,
      athletes: [
        { name: 'Ada', training: 'trained', completeness: 'partial', ratingLoad: 300, ratingState: 'partial' },
        { name: 'Bea', training: 'unknown', completeness: 'unknown', ratingLoad: null, ratingState: 'unknown' },
      ],
    });
    const closed = await close('2026-02-02');
    expect([closed.status, closed.body.unknownAthleteIds]).toEqual([200, []]);
    expect((await view('2026-02-02')).athletes).toMatchObject([
      { training: 'trained', completeness: 'complete', ratingLoad: 300, ratingState: 'known', domainState: 'partial' },
      { training: 'rest', completeness: 'complete', ratingLoad: 0, domainLoad: 0, domainState: 'known' },
    ]);
    await close('2026-02-02', { unknownAthleteIds: [bea.athleteId] });
    expect((await view('2026-02-02')).athletes[1]).toMatchObject({ training: 'unknown', ratingLoad: null });
    const listed = await call(staff, 'GET', `${days}${squadId}/days?from=2026-02-01&to=2026-02-28`);
    expect(listed.body.items).toMatchObject([{ day: '2026-02-02', unknownAthleteIds: [bea.athleteId] }]);
    for (let times = 0; times < 2; times += 1) {
      const reopened = await call(staff, 'POST', `${days}${squadId}/days/2026-02-02/reopening`);
      expect([reopened.status, reopened.body.closed]).toEqual([200, false]);
    }
    expect((await view('2026-02-02')).athletes[0]).toMatchObject({ completeness: 'partial' });
    expect(await rowsOf(test.db.ownerUrl, 'select * from day_unknown')).toEqual([]);
  });

  it('goes by the squad’s own date: there it is the 3rd already, not yet the 4th', async () => {
    test.clock.set('2026-03-02T12:00:00Z');
    expect((await close('2026-03-03')).status).toBe(200);
    const tomorrow = await close('2026-03-04');
    expect(tomorrow.status).toBe(422);
    expect(tomorrow.body.errors).toEqual([
      { field: 'day', value: '2026-03-04', allowed: 'a date up to today, 2026-03-03' },
    ]);
  });

  it('needs a member that day, and names members only', async () => {
    expect((await close('2026-01-09')).status).toBe(422);
    expect((await close('2026-01-10')).status).toBe(200);
    const stranger = await close('2026-01-11', { unknownAthleteIds: [ada.athleteId, bea.athleteId] });
    expect([stranger.status, stranger.body.errors[0].field]).toEqual([422, 'unknownAthleteIds[1]']);
    const twice = await close('2026-02-11', { unknownAthleteIds: [ada.athleteId, ada.athleteId] });
    expect([twice.status, twice.body.errors[0].field]).toEqual([400, 'unknownAthleteIds[1]']);
    expect((await call(staff, 'GET', `${days}${squadId}/days?from=2026-02-02&to=2026-02-01`)).status).toBe(400);
    expect((await close('2026-02-30')).status).toBe(400);
  });

  it('several closings of one day at the same moment leave one of them', async () => {
    const named = [[], [ada.athleteId], [bea.athleteId], [ada.athleteId, bea.athleteId]];
    const answers = await Promise.all(named.map((unknownAthleteIds) => close('2026-02-12', { unknownAthleteIds })));
    for (const { status } of answers) expect(status).toBe(200);
    const left = (await call(staff, 'GET', `${days}${squadId}/days?from=2026-02-12&to=2026-02-12`)).body.items;
    expect(left).toHaveLength(1);
    expect(named.map((ids) => ids.toSorted().join())).toContain(left[0].unknownAthleteIds.join());
  });
});

describe('day records', () => {
  it('begin with the first session or closing within a membership and are gapless', async () => {
    const service = test.app.get(DaysService, { strict: false });
    const work = test.app.get(UnitOfWork, { strict: false });
    const nobody = (await club.athlete(squadId, { name: 'New', memberFrom: '2026-03-02' })).athleteId;
    await close('2026-02-20');
    const ids = [ada.athleteId, bea.athleteId, nobody];
    const records = await work.run({ clubId: club.clubId, personId: null }, () =>
      service.dayRecords(ids, '2026-02-20'),
    );
    expect(records.has(nobody)).toBe(false);
    const [adas, beas] = [records.get(ada.athleteId)!, records.get(bea.athleteId)!];
    expect([adas[0]!.day, adas.at(-1)!.day, adas.length]).toEqual(['2026-01-10', '2026-02-20', 42]);
    expect([beas[0]!.day, beas.length]).toEqual(['2026-02-12', 9]);
    expect(beas.at(-1)).toMatchObject({ training: 'rest', rating: { state: 'known', value: 0 }, squadId });
    expect(adas[1]).toMatchObject({ training: 'unknown', rating: { state: 'unknown', value: NaN } });
    const last = (until: string) =>
      work.run({ clubId: club.clubId, personId: null }, () => service.lastClosedDay(squadId, until));
    expect([await last('2026-02-19'), await last('2026-01-09')]).toEqual(['2026-02-12', null]);
  });
});

describe('availability', () => {
  const path = (athleteId: string) => `/v1/athletes/${athleteId}/availability`;

  it('tells coaches and staff what, the athlete and the medic also why', async () => {
    const ill = { state: 'none', cause: 'illness', reason: 'fever since Sunday', from: '2026-02-23', to: '2026-02-25' };
    const made = await call(medic, 'POST', path(ada.athleteId), ill);
    expect([made.status, made.body.reason]).toEqual([201, 'fever since Sunday']);
    const away = await call(manager, 'POST', path(ada.athleteId), {
      state: 'none',
      cause: 'away',
      from: '2026-02-26',
      to: '2026-02-27',
    });
    expect([away.status, away.body.cause]).toEqual([201, 'away']);
    const seen = async (token: string) =>
      (await call(token, 'GET', path(ada.athleteId))).body.items.map((item: { cause: string; reason: string }) => [
        item.cause,
        item.reason,
      ]);
    for (const token of [staff, manager])
      expect(await seen(token)).toEqual([
        [null, null],
        ['away', null],
      ]);
    for (const token of [medic, ada.token!]) {
      expect(await seen(token)).toEqual([
        ['illness', 'fever since Sunday'],
        ['away', null],
      ]);
    }
    const audit = await rowsOf(
      test.db.ownerUrl,
      `select detail::text from audit_entry where action like 'availability%'`,
    );
    expect(JSON.stringify(audit)).not.toMatch(/fever|illness/);
  });

  it('makes a day known 0 where the athlete could not train, unknown where she was merely away', async () => {
    expect((await view('2026-02-24')).athletes[0]).toMatchObject({
      training: 'rest',
      availability: 'none',
      ratingLoad: 0,
    });
    expect((await view('2026-02-26')).athletes[0]).toMatchObject({ training: 'unknown', availability: 'none' });
  });

  it('does not overlap, begins within a membership and ends once', async () => {
    const add = (more: object) =>
      call(medic, 'POST', path(bea.athleteId), { state: 'modified', cause: 'complaint', ...more });
    const first = await add({ from: '2026-02-10', allowedModalities: ['cycling'] });
    expect(first.status).toBe(201);
    expect((await add({ from: '2026-02-20', to: '2026-02-21' })).status).toBe(409);
    const end = (to: string) => call(medic, 'POST', `${path(bea.athleteId)}/${first.body.id}/end`, { to });
    expect((await end('2026-02-09')).status).toBe(422);
    expect((await end('2026-02-19')).body).toMatchObject({ to: '2026-02-19', allowedModalities: ['cycling'] });
    expect((await end('2026-02-22')).status).toBe(409);
    expect((await add({ from: '2026-02-20', to: '2026-02-21' })).status).toBe(201);
    const early = await add({ from: '2026-01-31', to: '2026-01-31' });
    expect([early.status, early.body.errors[0].allowed]).toEqual([422, 'a date not before 2026-02-01']);
    expect(
      (await call(staff, 'POST', path(bea.athleteId), { state: 'none', cause: 'away', from: '2026-03-01' })).status,
    ).toBe(403);
  });
});

describe('load periods', () => {
  const add = (body: object) => call(manager, 'POST', `/v1/squads/${squadId}/periods`, body);

  it('an overload lasts at most 21 days, and the answer says how many were given', async () => {
    const long = await add({ purpose: 'overload', from: '2026-03-01', to: '2026-03-22' });
    expect(long.status).toBe(422);
    expect(long.body.errors).toEqual([
      { field: 'to', value: '2026-03-22', allowed: 'at most 21 days together, 22 are given' },
    ]);
    expect((await add({ purpose: 'overload', from: '2026-03-01', to: '2026-03-21' })).status).toBe(201);
    expect((await add({ purpose: 'taper', from: '2026-04-01', to: '2026-04-30' })).status).toBe(201);
  });

  it('no two of the squad, and no two of one athlete, overlap', async () => {
    expect((await add({ purpose: 'unload', from: '2026-03-21', to: '2026-03-25' })).status).toBe(409);
    const own = { purpose: 'unload', from: '2026-03-20', to: '2026-03-25', athleteId: ada.athleteId, note: 'exams' };
    expect((await add(own)).status).toBe(201);
    expect((await add({ ...own, from: '2026-03-25' })).status).toBe(409);
    expect((await add({ ...own, athleteId: bea.athleteId })).status).toBe(201);
    const listed = await call(staff, 'GET', `/v1/squads/${squadId}/periods`);
    expect(listed.body.items.map(({ from }: { from: string }) => from)).toEqual([
      '2026-03-01',
      '2026-03-20',
      '2026-03-20',
      '2026-04-01',
    ]);
  });

  it('are of athletes of the squad', async () => {
    const other = (await club.athlete(await club.squad('Others'), { name: 'Zoe' })).athleteId;
    const answer = await add({ purpose: 'taper', from: '2026-05-01', to: '2026-05-02', athleteId: other });
    expect([answer.status, answer.body.errors[0].field]).toEqual([422, 'athleteId']);
  });
});

it('a mark "unknown" of a squad the athlete no longer belonged to that day has no say', async () => {
  const cleo = await club.athlete(squadId, { name: 'Cleo', memberFrom: '2026-02-01' });
  await close('2026-02-10', { unknownAthleteIds: [cleo.athleteId] });
  const [stay] = (await call(manager, 'GET', `/v1/athletes/${cleo.athleteId}/memberships`)).body.items;
  await call(club.adminToken, 'POST', `/v1/athletes/${cleo.athleteId}/memberships/${stay.id}/end`, {
    to: '2026-02-09',
  });
  const next = await club.squad('Next', 'Pacific/Auckland');
  const joined = { squadId: next, from: '2026-02-10' };
  await call(club.adminToken, 'POST', `/v1/athletes/${cleo.athleteId}/memberships`, joined);
  const closer = (await club.person([{ role: 'manager', squadId: next }])).token;
  const closing = (body: object) => call(closer, 'POST', `${days}${next}/days/2026-02-10/closing`, body);
  expect((await closing({})).status).toBe(200);
  const shown = async () => (await call(closer, 'GET', `${days}${next}/days/2026-02-10`)).body.athletes[0].training;
  expect(await shown()).toBe('rest');
  expect((await closing({ unknownAthleteIds: [cleo.athleteId] })).status).toBe(200);
  expect(await shown()).toBe('unknown');
});

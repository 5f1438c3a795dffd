import { afterAll, beforeAll, describe, expect, it } from '@jest/globals';
import { ReweighRepository } from '../../src/features/sessions/reweigh.repository.ts';
import { ReweighService } from '../../src/features/sessions/reweigh.service.ts';
import { startTestApp } from '../support/app.ts';
import type { TestApp, TestClub } from '../support/app.ts';
import { copySession } from '../support/copy-session.ts';
import { rowsOf } from '../support/rows.ts';

let test: TestApp;
let club: TestClub;
let squadId: string;
let manager: string;

beforeAll(async () => {
  test = await startTestApp();
  club = await test.newClub();
  squadId = await club.squad('Mixed', 'Europe/Prague');
  manager = (await club.person([{ role: 'manager', squadId }])).token;
});
afterAll(async () => test?.close());

const api = (method: string, path: string, body?: object) => test.api(method, path, { token: manager, body });
const enter = (athleteId: string, ...values: object[]) =>
  api('POST', `/v1/athletes/${athleteId}/thresholds`, { values });
const threshold = (quantity: string, modality: string, value: number, validFrom: string) => ({
  ...{ quantity, modality, value, method: 'step test', validFrom },
});
const powerSession = (modality: string, day: string, powerW = 250) => ({
  ...{ startedAt: `${day}T10:00:00Z`, durationMin: 60, modality, rating: 5 },
  content: { kind: 'intervals', lines: [{ repetitions: 1, durationS: 3600, powerW }] },
});
const log = async (athleteId: string, body: object): Promise<string> => {
  const answer = await api('POST', `/v1/athletes/${athleteId}/sessions`, body);
  if (answer.status !== 201) throw new Error(JSON.stringify(answer.body));
  return answer.body.id;
};
/** Every stored weight as the bytes the database would print. */
const weights = async () => {
  const rows = await rowsOf<{ id: string; bytes: string }>(
    test.db.ownerUrl,
    `select session_id as id, w::text as bytes from session_weight w order by 1`,
  );
  return new Map(rows.map(({ id, bytes }) => [id, bytes]));
};
const changedSince = async (before: Map<string, string>) =>
  [...(await weights())].filter(([id, bytes]) => before.get(id) !== bytes).map(([id]) => id);
const loadOf = async (id: string) => (await api('GET', `/v1/sessions/${id}`)).body.weight.domain.load;
const totalOf = async (athleteId: string, day: string) =>
  (
    await rowsOf<{ domain_load: number }>(
      test.db.ownerUrl,
      'select domain_load from daily_total where athlete_id = $1 and day = $2',
      [athleteId, day],
    )
  )[0]?.domain_load;

describe('three athletes, two modalities, three values each', () => {
  const days = ['2026-01-05', '2026-01-15', '2026-01-25', '2026-02-05', '2026-02-15', '2026-02-25'];
  const athletes: string[] = [];
  /** sessions[athlete][modality][day] */
  const sessions: Record<string, Record<string, Record<string, string>>> = {};

  beforeAll(async () => {
    for (const name of ['Ada', 'Bea', 'Cleo']) {
      const { athleteId } = await club.athlete(squadId, { name });
      athletes.push(athleteId);
      sessions[athleteId] = {};
      for (const modality of ['rowing', 'cycling']) {
        await enter(
          athleteId,
          threshold('lt1-power', modality, 150, '2026-01-01'),
          threshold('critical-power', modality, 240, '2026-01-01'),
          threshold('critical-power', modality, 245, '2026-02-01'),
          threshold('critical-power', modality, 260, '2026-02-20'),
        );
        const mine: Record<string, string> = {};
        for (const day of days) mine[day] = await log(athleteId, powerSession(modality, day));
        sessions[athleteId][modality] = mine;
      }
    }
  });

  it('a late value touches just the sessions of its athlete, modality and days', async () => {
    const [ada] = athletes as [string];
    const before = await weights();
    const mine = sessions[ada]!.rowing!;
    const expected = [mine['2026-01-15']!, mine['2026-01-25']!];
    expect(await loadOf(expected[0]!)).toBe(180);
    const answer = await enter(ada, threshold('critical-power', 'rowing', 255, '2026-01-10'));
    expect(answer.body.reweighed).toEqual({ sessionIds: expected.toSorted(), task: null });
    expect((await changedSince(before)).toSorted()).toEqual(expected.toSorted());
    expect(await loadOf(expected[0]!)).toBe(120);
    // The day holds 180 of cycling and now 120 of rowing; the day before the change is as it was.
    expect(await totalOf(ada, '2026-01-15')).toBe(180 + 120);
    expect(await totalOf(ada, '2026-01-05')).toBe(360);
  });

  it('a correction and a withdrawal touch the days of that value alone', async () => {
    const [, bea] = athletes as [string, string];
    const mine = sessions[bea]!.cycling!;
    const history = await api('GET', `/v1/athletes/${bea}/thresholds?quantity=critical-power&modality=cycling`);
    const middle = history.body.items.find(({ validFrom }: { validFrom: string }) => validFrom === '2026-02-01');
    const touched = [mine['2026-02-05']!, mine['2026-02-15']!].toSorted();

    let before = await weights();
    const path = `/v1/athletes/${bea}/thresholds/${middle.id}/correction`;
    const corrected = await api('POST', path, { value: 251, reason: 'typing error' });
    expect(corrected.body.reweighed).toEqual({ sessionIds: touched, task: null });
    expect((await changedSince(before)).toSorted()).toEqual(touched);
    expect(await loadOf(touched[0]!)).toBe(120);

    before = await weights();
    const withdrawal = `/v1/athletes/${bea}/thresholds/${corrected.body.item.id}/withdrawal`;
    const withdrawn = await api('POST', withdrawal, { reason: 'other athlete' });
    expect(withdrawn.body.reweighed).toEqual({ sessionIds: touched, task: null });
    expect((await changedSince(before)).toSorted()).toEqual(touched);
    const weight = (await api('GET', `/v1/sessions/${touched[0]!}`)).body.weight;
    expect(weight.thresholdsUsed).toContainEqual(expect.objectContaining({ quantity: 'critical-power', value: 240 }));
    expect(await totalOf(bea, '2026-02-05')).toBe(360);
  });

  it('a quantity no session uses, and a value for another setting, touch none', async () => {
    const [, , cleo] = athletes as [string, string, string];
    const before = await weights();
    const speed = await enter(cleo, threshold('lt1-speed', 'rowing', 3, '2026-01-01'), {
      ...threshold('critical-power', 'rowing', 300, '2026-01-01'),
      setting: 'water',
    });
    expect(speed.body.reweighed).toEqual({ sessionIds: [], task: null });
    expect(await changedSince(before)).toEqual([]);
  });

  it('a policy with other weights weighs the squad’s sessions from its day on anew', async () => {
    const before = await weights();
    const weightsGiven = { moderate: 1, heavy: 2, severe: 4, extreme: 5 };
    const body = { validFrom: '2026-02-20', settings: { weights: weightsGiven } };
    const answer = await api('POST', `/v1/squads/${squadId}/policies`, body);
    expect(answer.status).toBe(201);
    // On 2026-02-25 critical power is 260: 250 W are heavy, which still weighs 2.
    expect(answer.body.reweighed).toEqual({ sessionIds: [], task: null });
    expect(await changedSince(before)).toEqual([]);
    const second = { validFrom: '2026-02-21', settings: { weights: { ...weightsGiven, heavy: 3 } } };
    const reweighed = (await api('POST', `/v1/squads/${squadId}/policies`, second)).body.reweighed;
    const expected = athletes.flatMap((id) => ['rowing', 'cycling'].map((name) => sessions[id]![name]!['2026-02-25']!));
    expect(reweighed).toEqual({ sessionIds: expected.toSorted(), task: null });
    expect(await totalOf(athletes[0]!, '2026-02-25')).toBe(360);
  });
});

describe('a value entered while sessions are being logged', () => {
  it('weighs every one of them, whichever comes first', async () => {
    const { athleteId } = await club.athlete(squadId, { name: 'Frida' });
    await enter(
      athleteId,
      threshold('lt1-power', 'rowing', 150, '2026-01-01'),
      threshold('critical-power', 'rowing', 240, '2026-01-01'),
    );
    const days = Array.from({ length: 12 }, (_, index) => `2026-02-${String(index + 1).padStart(2, '0')}`);
    const logs = days.map((day) => log(athleteId, powerSession('rowing', day)));
    const late = enter(athleteId, threshold('critical-power', 'rowing', 255, '2026-01-20'));
    const policy = api('POST', `/v1/squads/${squadId}/policies`, {
      validFrom: '2026-02-27',
      settings: { weights: { moderate: 1, heavy: 2, severe: 3, extreme: 3 } },
    });
    const [ids, entered, changed] = [await Promise.all(logs), await late, await policy];
    expect([entered.status, changed.status]).toEqual([201, 201]);
    const used = await Promise.all(ids.map(async (id) => (await api('GET', `/v1/sessions/${id}`)).body.weight));
    for (const { thresholdsUsed } of used) {
      expect(thresholdsUsed).toContainEqual(expect.objectContaining({ quantity: 'critical-power', value: 255 }));
    }
  });
});

describe('quality', () => {
  it('is judged anew with the values it was judged by', async () => {
    const { athleteId } = await club.athlete(squadId, { name: 'Hedda' });
    const { body } = await enter(athleteId, threshold('max-heart-rate', 'running', 190, '2026-01-01'));
    const run = { startedAt: '2026-02-01T10:00:00Z', durationMin: 30, modality: 'running', meanHeartRateBpm: 182 };
    const id = await log(athleteId, run);
    const read = async () => (await api('GET', `/v1/sessions/${id}`)).body;
    expect(await read()).toMatchObject({ quality: 'ok', version: 1 });
    const path = `/v1/athletes/${athleteId}/thresholds/${body.items[0].id}/correction`;
    const lowered = await api('POST', path, { value: 180, reason: 'a strap that slipped' });
    expect(lowered.body.reweighed.sessionIds).toEqual([id]);
    expect(await read()).toMatchObject({ quality: 'suspect', version: 1 });
    const again = `/v1/athletes/${athleteId}/thresholds/${lowered.body.item.id}/correction`;
    const answer = await api('POST', again, { value: 190, reason: 'new maximum in a race' });
    expect(answer.body.reweighed.sessionIds).toEqual([id]);
    expect(await read()).toMatchObject({ quality: 'ok', qualityNotes: [], version: 1 });
  });
});

describe('a change that touches more than 500 sessions', () => {
  let ownSquad: string;

  it('becomes a task that goes on where a crash left it, and does nothing twice', async () => {
    ownSquad = await club.squad('Old hands');
    manager = (await club.person([{ role: 'manager' }])).token;
    const { athleteId } = await club.athlete(ownSquad, { name: 'Greta', memberFrom: '2020-01-01' });
    await enter(
      athleteId,
      threshold('lt1-power', 'rowing', 150, '2020-01-01'),
      threshold('critical-power', 'rowing', 240, '2020-01-01'),
    );
    const first = await log(athleteId, { ...powerSession('rowing', '2024-01-01'), source: 'old' });
    await copySession(test.db.ownerUrl, first, 599);
    const before = await weights();
    const answer = await enter(athleteId, threshold('critical-power', 'rowing', 255, '2021-01-01'));
    expect(answer.body.reweighed).toEqual({ sessionIds: [], task: { id: expect.any(String), total: 600 } });
    const task: string = answer.body.reweighed.task.id;
    expect(await changedSince(before)).toEqual([]);
    const [job] = await rowsOf(test.db.ownerUrl, `select name, data from pgboss.job where name = 'reweigh'`);
    expect(JSON.stringify(job)).toContain(task);

    const reweigh = test.app.get(ReweighService, { strict: false });
    const repository = test.app.get(ReweighRepository, { strict: false });
    const advance = repository.advance.bind(repository);
    let batches = 0;
    repository.advance = async (...given) => {
      batches += 1;
      if (batches === 2) throw new Error('the machine stops here');
      return advance(...given);
    };
    await expect(reweigh.processTask(club.clubId, task)).rejects.toThrow('the machine stops here');
    const half = await api('GET', `/v1/reweighings/${task}`);
    expect(half.body).toMatchObject({ state: 'running', total: 600, done: 200 });
    expect((await changedSince(before)).toSorted()).toEqual(half.body.sessionIds.toSorted());

    await Promise.all([reweigh.processTask(club.clubId, task), reweigh.processTask(club.clubId, task)]);
    repository.advance = advance;
    const done = await api('GET', `/v1/reweighings/${task}`);
    expect(done.body).toMatchObject({ state: 'done', total: 600, done: 600 });
    expect(new Set(done.body.sessionIds).size).toBe(600);
    expect(done.body.sessionIds).toHaveLength(600);
    expect((await changedSince(before)).length).toBe(600);
    const after = await weights();
    await reweigh.processTask(club.clubId, task);
    expect(await changedSince(after)).toEqual([]);
    const [sum] = await rowsOf<{ days: number; load: number }>(
      test.db.ownerUrl,
      'select count(*)::int as days, sum(domain_load)::int as load from daily_total where athlete_id = $1',
      [athleteId],
    );
    expect(sum).toEqual({ days: 600, load: 600 * 120 });
  });

  it('a policy that weighs them differently becomes one as well', async () => {
    const before = await weights();
    const settings = { weights: { moderate: 1, heavy: 2.5, severe: 3, extreme: 3 } };
    const answer = await api('POST', `/v1/squads/${ownSquad}/policies`, { validFrom: '2024-02-01', settings });
    const { task } = answer.body.reweighed;
    expect(task).toMatchObject({ total: 600 - 31 });
    await test.app.get(ReweighService, { strict: false }).processTask(club.clubId, task.id);
    const done = (await api('GET', `/v1/reweighings/${task.id}`)).body;
    expect(done).toMatchObject({ state: 'done', done: 569 });
    // The task is the squad's, whoever of it comes first and wherever that athlete is by now.
    const theirs = (await club.person([{ role: 'manager', squadId: ownSquad }])).token;
    const elsewhere = (await club.person([{ role: 'manager', squadId: await club.squad('Elsewhere') }])).token;
    const seen = (token: string) => test.api('GET', `/v1/reweighings/${task.id as string}`, { token });
    expect([(await seen(theirs)).status, (await seen(elsewhere)).status]).toEqual([200, 404]);
    expect((await changedSince(before)).toSorted()).toEqual(done.sessionIds.toSorted());
    const loads = await rowsOf(
      test.db.ownerUrl,
      `select domain_load as load, count(*)::int as sessions from session_weight w join training_session s on s.id = w.session_id
       where s.source = 'old' group by 1 order by 1`,
    );
    expect(loads).toEqual([
      { load: 120, sessions: 31 },
      { load: 150, sessions: 569 },
    ]);
  });

  it('is found by those who may read thresholds, and by nobody of another club', async () => {
    const [task] = await rowsOf<{ id: string }>(test.db.ownerUrl, 'select id from reweigh_task');
    const other = await test.newClub();
    expect((await test.api('GET', `/v1/reweighings/${task!.id}`, { token: other.adminToken })).status).toBe(404);
  });
});

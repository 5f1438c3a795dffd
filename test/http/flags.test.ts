import { afterAll, beforeAll, describe, expect, test } from '@jest/globals';
import { FlagsService } from '../../src/features/flags/flags.service.ts';
import { UnitOfWork } from '../../src/platform/unit-of-work.ts';
import { startTestApp } from '../support/app.ts';
import type { TestApp, TestClub } from '../support/app.ts';
import { fixedClock } from '../support/clock.ts';

let app: TestApp;
let club: TestClub;
let manager: string;
let squadId: string;
let gap: { athleteId: string; token?: string };
let whole: { athleteId: string };

const DAYS = Array.from({ length: 8 }, (_, i) => new Date(Date.UTC(2026, 1, 22 + i)).toISOString().slice(0, 10));

beforeAll(async () => {
  app = await startTestApp({ clock: fixedClock('2026-03-02T12:00:00Z') });
  club = await app.newClub();
  manager = (await club.person([{ role: 'manager' }])).token;
  squadId = await club.squad('Flag squad');
  gap = await club.athlete(squadId, { name: 'Gita Gap', memberFrom: '2026-02-01', login: true });
  whole = await club.athlete(squadId, { name: 'Wanda Whole', memberFrom: '2026-02-01' });
  for (const day of DAYS) await close(day, day >= '2026-02-27' && day < '2026-03-01' ? [gap.athleteId] : []);
});
afterAll(() => app.close());

async function close(day: string, unknownAthleteIds: string[] = []): Promise<void> {
  const path = `/v1/squads/${squadId}/days/${day}/closing`;
  const answer = await app.api('POST', path, { token: manager, body: { unknownAthleteIds } });
  expect(answer.status).toBe(200);
}
const squadFlags = (query = '', token = manager) => app.api('GET', `/v1/squads/${squadId}/flags${query}`, { token });
const athleteFlags = (id: string, token = manager) => app.api('GET', `/v1/athletes/${id}/flags`, { token });
const evaluate = (until: string) => {
  const service = app.app.get(FlagsService, { strict: false });
  const work = app.app.get(UnitOfWork, { strict: false });
  return work.run({ clubId: club.clubId, personId: null }, () => service.evaluateSquad(squadId, until));
};

describe('flags', () => {
  test('a gap in the log is flagged with sentence, evidence, since, what clears it and the cautions', async () => {
    const { body } = await squadFlags();
    expect(body).toMatchObject({ asOf: '2026-03-01' });
    expect(body.items).toEqual([
      expect.objectContaining({
        athleteId: gap.athleteId,
        kind: 'log-gap',
        level: 'note',
        since: '2026-02-28',
        until: null,
        evidence: { kind: 'log-gap', day: '2026-03-01', known: 5, of: 7 },
        clears: expect.stringContaining('6 of 7 days'),
      }),
    ]);
    const { sentence } = body.items[0] as { sentence: string };
    expect(sentence).toMatch(/^Only 5 of the last 7 days are in the log, .*; ask what was done/);
    expect(body.cautions[0]).toContain('not a diagnosis');
  });

  test('judging again writes nothing', async () => {
    await evaluate('2026-03-01');
    expect((await evaluate('2026-03-01')).written).toBe(0);
  });

  test('an earlier day is judged with what was closed by then, and leaves the record of today alone', async () => {
    const { body } = await squadFlags('?day=2026-02-26');
    expect(body).toMatchObject({ asOf: '2026-02-26', items: [] });
    expect((await athleteFlags(gap.athleteId)).body.items).toMatchObject([{ kind: 'log-gap', until: null }]);
    expect((await evaluate('2026-02-26')).written).toBe(0);
  });

  test('a corrected log takes the flag back in sight: the row stays, ends and says why', async () => {
    await close('2026-02-27');
    await close('2026-02-28');
    expect((await squadFlags()).body.items).toEqual([]);
    const { body } = await athleteFlags(gap.athleteId);
    expect(body.items).toMatchObject([
      { kind: 'log-gap', since: '2026-02-28', until: '2026-03-01', clears: expect.stringContaining('Taken back') },
    ]);
    expect((await evaluate('2026-03-01')).written).toBe(0);
  });

  test('and the same evidence brings the same row back', async () => {
    const before = (await athleteFlags(gap.athleteId)).body.items[0].id;
    await close('2026-02-27', [gap.athleteId]);
    await close('2026-02-28', [gap.athleteId]);
    const { body } = await athleteFlags(gap.athleteId);
    expect(body.items).toMatchObject([{ id: before, until: null, clears: expect.stringContaining('6 of 7') }]);
  });

  test('two who look at the same moment leave one row', async () => {
    await Promise.all([evaluate('2026-03-01'), evaluate('2026-03-01'), athleteFlags(gap.athleteId)]);
    expect((await athleteFlags(gap.athleteId)).body.items).toHaveLength(1);
  });
});

test('athletes see their own flags as soon as staff do, and no others', async () => {
  expect((await athleteFlags(gap.athleteId, gap.token)).body.items).toHaveLength(1);
  expect((await athleteFlags(whole.athleteId, gap.token)).status).toBe(404);
  expect((await squadFlags('', gap.token)).status).toBe(404);
  const staff = await club.person([{ role: 'staff', squadId }]);
  expect((await squadFlags('', staff.token)).status).toBe(403);
  expect((await squadFlags('?day=soon')).status).toBe(400);
});

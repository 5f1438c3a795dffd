import { afterAll, beforeAll, expect, test } from '@jest/globals';
import { startTestApp } from '../support/app.ts';
import type { TestApp } from '../support/app.ts';

let app: TestApp;
let squadId: string;
let athleteId: string;
let stranger: string;
let tokens: Record<'staff' | 'coach' | 'manager', string>;

beforeAll(async () => {
  app = await startTestApp();
  const club = await app.newClub();
  squadId = await club.squad();
  const inSquad = async (role: string) => (await club.person([{ role, squadId }])).token;
  tokens = { staff: await inSquad('staff'), coach: await inSquad('coach'), manager: await inSquad('manager') };
  ({ athleteId } = await club.athlete(squadId, { memberFrom: '2026-01-01' }));
  ({ athleteId: stranger } = await club.athlete(await club.squad(), { memberFrom: '2026-01-01' }));
});
afterAll(async () => app?.close());

const call = (who: keyof typeof tokens, method: string, rest: string, body?: object) =>
  app.api(method, `/v1/squads/${squadId}/circumstances${rest}`, { token: tokens[who], body });

test('are entered for the squad or an athlete, read by the coach, and taken back with a reason', async () => {
  const heat = { kind: 'heat', from: '2026-02-10', to: '2026-02-14', note: 'camp' };
  const camp = await call('staff', 'POST', '', heat);
  expect([camp.status, camp.body]).toEqual([201, expect.objectContaining({ ...heat, athleteId: null })]);
  const travel = await call('manager', 'POST', '', { kind: 'travel', from: '2026-02-01', to: '2026-02-01', athleteId });
  expect(travel.body).toMatchObject({ athleteId, kind: 'travel' });
  expect((await call('coach', 'POST', '', heat)).status).toBe(403);
  const listed = await call('coach', 'GET', '');
  expect(listed.body.items.map(({ kind }: { kind: string }) => kind)).toEqual(['travel', 'heat']);
  const gone = await call('staff', 'POST', `/${camp.body.id as string}/withdrawal`, { reason: 'cancelled' });
  expect(gone.body).toMatchObject({ withdrawReason: 'cancelled' });
  expect((await call('coach', 'GET', '')).body.items).toHaveLength(1);
  expect((await call('staff', 'POST', `/${camp.body.id as string}/withdrawal`, { reason: 'x' })).status).toBe(404);
});

test.each([
  ['another kind', { kind: 'fog' }, 400, 'kind'],
  ['an end before the start', { to: '2026-02-01' }, 400, 'to'],
  ['a day that is none', { from: '2026-02-30' }, 400, 'from'],
  ['an athlete of another squad', { athleteId: 'stranger' }, 422, 'athleteId'],
])('refuses %s', async (_, more, status, field) => {
  const given = { kind: 'heat', from: '2026-02-10', to: '2026-02-14', ...more };
  const body = 'athleteId' in given ? { ...given, athleteId: stranger } : given;
  const answer = await call('staff', 'POST', '', body);
  expect([answer.status, answer.body.errors[0].field]).toEqual([status, field]);
});

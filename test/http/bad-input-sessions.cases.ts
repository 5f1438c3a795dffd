/** One request that has to be refused. `{athleteId}` and the like stand for what is there. */
export interface BadInput {
  name: string;
  method?: string;
  path: string;
  body?: unknown;
  status: number;
  /** A field the answer has to name; null where no field is to blame. */
  field: string | null;
  headers?: Record<string, string>;
}

/** A UUID nobody has. */
export const nobody = '0198f3a0-ffff-7000-8000-00000000ffff';

const session = { startedAt: '2026-02-02T07:30:00+01:00', durationMin: 60, modality: 'rowing' };
const sessions = '/v1/athletes/{athleteId}/sessions';
const one = (name: string, more: object, status: number, field: string): BadInput => ({
  ...{ name: `session: ${name}`, path: sessions, body: { ...session, ...more }, status, field },
});
const line = (more: object) => ({
  content: { kind: 'intervals', lines: [{ repetitions: 1, durationS: 600, ...more }] },
});
const minutes = (moderate: number) => ({ kind: 'domain-minutes', moderate, heavy: 0, severe: 0, extreme: 0 });
const strength = (more: object) => ({
  content: { kind: 'strength', sets: [{ exercise: 'squat', sets: 3, repetitions: 5, loadKg: 100, ...more }] },
});

export const sessionCases: BadInput[] = [
  one('duration 0', { durationMin: 0 }, 400, 'durationMin'),
  one('25 hours', { durationMin: 1500 }, 400, 'durationMin'),
  one('more than the day has left', { startedAt: '2026-02-01T09:00:00+01:00', durationMin: 1381 }, 422, 'durationMin'),
  one('duration as text', { durationMin: '60' }, 400, 'durationMin'),
  one('no modality', { modality: undefined }, 400, 'modality'),
  one('unknown modality', { modality: 'chess' }, 400, 'modality'),
  one('unknown setting', { setting: 'moon' }, 400, 'setting'),
  one('unknown kind', { kind: 'nap' }, 400, 'kind'),
  one('rating 11', { rating: 11 }, 400, 'rating'),
  one('rating −0.5', { rating: -0.5 }, 400, 'rating'),
  one('intended rating 10.1', { intendedRating: 10.1 }, 400, 'intendedRating'),
  one('rated by nobody known', { rating: 5, ratingBy: 'coach' }, 400, 'ratingBy'),
  one('rated by somebody, but not rated', { ratingBy: 'staff' }, 400, 'ratingBy'),
  one('rated 15 days later', { rating: 5, ratingDelayMin: 20161 }, 400, 'ratingDelayMin'),
  one('half a minute of delay', { rating: 5, ratingDelayMin: 0.5 }, 400, 'ratingDelayMin'),
  one('mean heart rate 24', { meanHeartRateBpm: 24 }, 400, 'meanHeartRateBpm'),
  one('mean heart rate above the maximum', { meanHeartRateBpm: 190.5 }, 422, 'meanHeartRateBpm'),
  one('mean above the peak', { meanHeartRateBpm: 150, peakHeartRateBpm: 140 }, 422, 'meanHeartRateBpm'),
  one('peak heart rate 251', { peakHeartRateBpm: 251 }, 400, 'peakHeartRateBpm'),
  one('distance 0', { distanceM: 0 }, 400, 'distanceM'),
  one('title of 121 characters', { title: 'x'.repeat(121) }, 400, 'title'),
  one('title of two lines', { title: 'a\nb' }, 400, 'title'),
  one('half a character in the title', { title: '\ud800' }, 400, 'title'),
  one('source of 41 characters', { source: 'x'.repeat(41) }, 400, 'source'),
  one('empty externalId', { externalId: ' ' }, 400, 'externalId'),
  one('stored before', { externalId: 'taken' }, 409, 'externalId'),
  one('unknown field', { risk: 1 }, 400, 'risk'),
  one('no offset', { startedAt: '2026-02-02T07:30:00' }, 400, 'startedAt'),
  one('before the log can begin', { startedAt: '1999-06-01T07:30:00Z' }, 422, 'startedAt'),
  one('30 February', { startedAt: '2026-02-30T07:30:00Z' }, 400, 'startedAt'),
  one('tomorrow', { startedAt: '2026-03-03T07:30:00Z' }, 422, 'startedAt'),
  one('before the membership', { startedAt: '2026-01-09T22:30:00Z' }, 422, 'startedAt'),
  one('domain minutes over the duration', { content: minutes(61.5) }, 422, 'content'),
  one('negative domain minutes', { content: minutes(-1) }, 400, 'content.moderate'),
  one('unknown content', { content: { kind: 'dance' } }, 400, 'content.kind'),
  one('no lines', { content: { kind: 'intervals', lines: [] } }, 400, 'content.lines'),
  one('two intensities', line({ powerW: 200, heartRateBpm: 150 }), 400, 'content.lines[0].powerW'),
  one('no intensity', line({}), 400, 'content.lines[0].powerW'),
  one('power 3001', line({ powerW: 3001 }), 400, 'content.lines[0].powerW'),
  one('speed 15.1', line({ speedMps: 15.1 }), 400, 'content.lines[0].speedMps'),
  one('201 repetitions', line({ powerW: 200, repetitions: 201 }), 400, 'content.lines[0].repetitions'),
  one('recovery of 2 h and a bit', line({ powerW: 200, recoveryS: 7201 }), 400, 'content.lines[0].recoveryS'),
  one('recovery power without recovery', line({ powerW: 200, recoveryPowerW: 90 }), 400, 'content.lines[0].recoveryS'),
  one('intervals longer than the session', line({ powerW: 200, durationS: 3700 }), 422, 'content.lines'),
  one('interval heart rate above the maximum', line({ heartRateBpm: 194 }), 422, 'content.lines[0].heartRateBpm'),
  one('lifting 0 kg', strength({ loadKg: 0 }), 400, 'content.sets[0].loadKg'),
  one('51 sets', strength({ sets: 51 }), 400, 'content.sets[0].sets'),
  { name: 'session: a list', path: sessions, body: [session], status: 400, field: '(whole input)' },
  {
    name: 'session: no JSON',
    path: sessions,
    body: '{"a":',
    headers: { 'content-type': 'application/json' },
    status: 400,
    field: null,
  },
  { name: 'session: of nobody', path: '/v1/athletes/{nobody}/sessions', body: session, status: 404, field: null },
  { name: 'session: of no UUID', path: '/v1/athletes/42/sessions', body: session, status: 400, field: 'athleteId' },
  {
    name: 'session: of somebody who left',
    path: '/v1/athletes/{goneId}/sessions',
    body: session,
    status: 422,
    field: 'startedAt',
  },
];

const correction = { ...session, changeReason: 'asked again' };
const group = (more: object, athletes: object[]) => ({ session: { ...session, ...more }, athletes });
export const changeCases: BadInput[] = [
  {
    name: 'correction: without If-Match',
    method: 'PUT',
    path: '/v1/sessions/{sessionId}',
    body: correction,
    status: 428,
    field: null,
  },
  {
    ...{ name: 'correction: stale', method: 'PUT', path: '/v1/sessions/{sessionId}', body: correction },
    ...{ status: 412, field: null, headers: { 'if-match': '"v7"' } },
  },
  {
    ...{ name: 'correction: If-Match is no tag', method: 'PUT', path: '/v1/sessions/{sessionId}', body: correction },
    ...{ status: 400, field: 'If-Match', headers: { 'if-match': 'v1' } },
  },
  {
    ...{ name: 'correction: no reason', method: 'PUT', path: '/v1/sessions/{sessionId}', body: session },
    ...{ status: 400, field: 'changeReason', headers: { 'if-match': '"v1"' } },
  },
  {
    ...{ name: 'withdrawal: no reason', path: '/v1/sessions/{sessionId}/withdrawal', body: {} },
    ...{ status: 400, field: 'reason', headers: { 'if-match': '"v1"' } },
  },
  {
    name: 'group: of none',
    path: '/v1/squads/{squadId}/sessions',
    body: group({}, []),
    status: 400,
    field: 'athletes',
  },
  {
    ...{
      name: 'group: rating in the common part',
      path: '/v1/squads/{squadId}/sessions',
      status: 400,
      field: 'session.rating',
    },
    body: group({ rating: 5 }, [{ athleteId: '{athleteId}' }]),
  },
  {
    ...{
      name: 'group: one of them wrong',
      path: '/v1/squads/{squadId}/sessions',
      status: 400,
      field: 'athletes[1].rating',
    },
    body: group({}, [{ athleteId: '{athleteId}' }, { athleteId: '{goneId}', rating: 11 }]),
  },
  {
    ...{
      name: 'group: a stranger',
      path: '/v1/squads/{squadId}/sessions',
      status: 422,
      field: 'athletes[0].athleteId',
    },
    body: group({}, [{ athleteId: '{nobody}' }]),
  },
  { name: 'list: cursor from nowhere', method: 'GET', path: `${sessions}?cursor=abc`, status: 400, field: 'cursor' },
  { name: 'list: 201 at once', method: 'GET', path: `${sessions}?limit=201`, status: 400, field: 'limit' },
  { name: 'list: unknown parameter', method: 'GET', path: `${sessions}?page=2`, status: 400, field: 'page' },
];

const columns = 'athlete,startedAt,durationMin,modality,rating';
const sheet = (name: string, body: string, status: number, field: string): BadInput => ({
  ...{ name: `sheet: ${name}`, path: '/v1/squads/{squadId}/session-imports', body, status, field },
});
export const sheetCases: BadInput[] = [
  sheet('empty', '', 400, '(whole sheet)'),
  sheet('an open quote', `${columns}\n"Nora,1,2,3,4`, 400, '(whole row)'),
  sheet('too few fields', `${columns}\nNora,2026-02-02 07:30`, 400, '(whole row)'),
  sheet('a column of its own', `${columns},mood\nNora,2026-02-02 07:30,60,rowing,5,good`, 400, 'mood'),
  sheet('an unknown athlete', `${columns}\nNova,2026-02-02 07:30,60,rowing,5`, 422, 'athlete'),
  sheet(
    'one bad row of two',
    `${columns}\nNora,2026-02-02 07:30,60,rowing,5\nNora,2026-02-03 07:30,60,rowing,11`,
    422,
    'rating',
  ),
  sheet('a formula for a number', `${columns}\nNora,2026-02-02 07:30,=60,rowing,5`, 422, 'durationMin'),
  sheet('a NUL', `${columns},title\nNora,2026-02-02 07:30,60,rowing,5,a\u0000b`, 422, 'title'),
];

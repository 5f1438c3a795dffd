import { nobody } from './bad-input-sessions.cases.ts';
import type { BadInput } from './bad-input-sessions.cases.ts';

const mornings = '/v1/athletes/{athleteId}/mornings';
const morning = (name: string, more: object, status: number, field: string): BadInput => ({
  ...{ name: `morning: ${name}`, path: mornings, body: { day: '2026-02-02', ...more }, status, field },
});
const change = (
  name: string,
  body: object,
  version: string | null,
  status: number,
  field: string | null,
): BadInput => ({
  ...{ name: `change of a morning: ${name}`, method: 'PATCH', path: `${mornings}/2026-02-01`, body, status, field },
  ...(version === null ? {} : { headers: { 'if-match': version } }),
});
const intervals = (count: number, interval: number) => Array.from({ length: count }, () => interval);

const morningCases: BadInput[] = [
  ...(['sleep', 'fatigue', 'stress', 'soreness', 'mood'] as const).flatMap((item) => [
    morning(`${item} of 0`, { [item]: 0 }, 400, item),
    morning(`${item} of 8`, { [item]: 8 }, 400, item),
  ]),
  morning('half a point', { sleep: 2.5 }, 400, 'sleep'),
  morning('a rating as text', { sleep: '3' }, 400, 'sleep'),
  morning('25 hours of sleep', { sleepHours: 25 }, 400, 'sleepHours'),
  morning('RMSSD of 0', { rmssdMs: 0 }, 400, 'rmssdMs'),
  morning('RMSSD of 2000 ms', { rmssdMs: 2000 }, 400, 'rmssdMs'),
  morning('resting heart rate of 20', { restingHeartRateBpm: 20 }, 400, 'restingHeartRateBpm'),
  morning('19 RR intervals', { rrIntervalsMs: intervals(19, 900) }, 400, 'rrIntervalsMs'),
  morning('RR intervals in seconds', { rrIntervalsMs: intervals(20, 0.9) }, 400, 'rrIntervalsMs[0]'),
  morning('RR intervals that are all alike', { rrIntervalsMs: intervals(20, 900) }, 422, 'rrIntervalsMs'),
  morning('RMSSD and intervals', { rmssdMs: 40, rrIntervalsMs: intervals(20, 900) }, 400, 'rmssdMs'),
  morning('nothing', {}, 400, '(whole input)'),
  morning('tomorrow', { day: '2026-03-03', sleep: 3 }, 422, 'day'),
  morning('before the membership', { day: '2026-01-09', sleep: 3 }, 422, 'day'),
  morning('30 February', { day: '2026-02-30', sleep: 3 }, 400, 'day'),
  morning('there already', { day: '2026-02-01', sleep: 3 }, 409, 'day'),
  morning('a sum', { sum: 12 }, 400, 'sum'),
  change('an answer that is there, without a reason', { sleep: 4 }, '"v1"', 422, 'changeReason'),
  change('nothing', {}, '"v1"', 400, '(whole input)'),
  change('without its version', { soreness: 4 }, null, 428, null),
  change('of another version', { soreness: 4 }, '"v2"', 412, null),
  { name: 'mornings: no span', method: 'GET', path: mornings, status: 400, field: 'from' },
  { name: 'morning: none that day', method: 'GET', path: `${mornings}/2026-02-03`, status: 404, field: null },
];

const circumstance = (name: string, more: object, status: number, field: string): BadInput => ({
  ...{ name: `circumstance: ${name}`, path: '/v1/squads/{squadId}/circumstances', status, field },
  body: { kind: 'travel', from: '2026-03-02', to: '2026-03-04', ...more },
});
const definition = (name: string, more: object, status: number, field: string): BadInput => ({
  ...{ name: `test: ${name}`, path: '/v1/squads/{squadId}/test-definitions', status, field },
  body: {
    ...{ kind: 'criterion', name: 'Ramp', protocol: 'p', modality: 'rowing' },
    ...{ unit: 'W', direction: 'higher', typicalError: 5, ...more },
  },
});
const result = (name: string, more: object, status: number, field: string): BadInput => ({
  ...{ name: `result: ${name}`, path: '/v1/athletes/{athleteId}/test-results', status, field },
  body: { definitionId: '{definitionId}', day: '2026-02-02', ...more },
});
const bout = (name: string, more: object, status: number, field: string): BadInput =>
  result(`of a bout: ${name}`, { definitionId: '{boutId}', ...more }, status, field);
const results = '/v1/athletes/{athleteId}/test-results';

const testCases: BadInput[] = [
  circumstance('unknown kind', { kind: 'fog' }, 400, 'kind'),
  circumstance('ends before it began', { to: '2026-03-01' }, 400, 'to'),
  circumstance('of a stranger', { athleteId: nobody }, 422, 'athleteId'),
  {
    name: 'withdrawal of a circumstance: without a reason',
    path: '/v1/squads/{squadId}/circumstances/{circumstanceId}/withdrawal',
    body: {},
    status: 400,
    field: 'reason',
  },
  definition('typical error of 0', { typicalError: 0 }, 400, 'typicalError'),
  definition('no direction', { direction: undefined }, 400, 'direction'),
  definition('name taken', { name: '2 km' }, 409, 'name'),
  definition('a bout with a unit', { kind: 'standard-bout' }, 400, 'unit'),
  result('none', {}, 400, 'value'),
  result('0', { value: 0 }, 400, 'value'),
  result('tomorrow', { value: 420, day: '2026-03-03' }, 422, 'day'),
  result('before the membership', { value: 420, day: '2026-01-09' }, 422, 'day'),
  result('there already', { value: 421, day: '2026-02-01' }, 409, 'day'),
  result('of a test nobody does', { value: 420, definitionId: nobody }, 422, 'definitionId'),
  result('with the lactate of a bout', { value: 420, lactateMmolL: 2 }, 400, 'lactateMmolL'),
  result('confirmed: false', { value: 420, confirmed: false }, 400, 'confirmed'),
  bout('a value', { value: 420, rating: 3 }, 400, 'value'),
  bout('neither rating nor heart rate', { workW: 200 }, 400, 'rating'),
  bout('rating 11', { rating: 11 }, 400, 'rating'),
  bout('heart rate 250', { heartRateBpm: 250 }, 400, 'heartRateBpm'),
  {
    name: 'correction of a result: without a reason',
    path: `${results}/{resultId}/correction`,
    body: { value: 421 },
    status: 400,
    field: 'reason',
  },
  {
    name: 'withdrawal of a result: nobody’s',
    path: `${results}/{nobody}/withdrawal`,
    body: { reason: 'x' },
    status: 404,
    field: null,
  },
  {
    name: 'body mass: 15 kg more than four weeks before',
    path: '/v1/athletes/{athleteId}/thresholds',
    body: { values: [{ quantity: 'body-mass', value: 85, method: 'scales', validFrom: '2026-02-17' }] },
    status: 422,
    field: 'values[0].value',
  },
];

export const responseCases: BadInput[] = [...morningCases, ...testCases];

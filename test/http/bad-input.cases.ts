import { responseCases } from './bad-input-responses.cases.ts';
import { changeCases, sessionCases, sheetCases } from './bad-input-sessions.cases.ts';
import type { BadInput } from './bad-input-sessions.cases.ts';

const session = { startedAt: '2026-02-02T07:30:00+01:00', durationMin: 60, modality: 'rowing' };
const sessions = '/v1/athletes/{athleteId}/sessions';
const values = '/v1/athletes/{athleteId}/thresholds';
const value = (name: string, more: object, status: number, field: string): BadInput => ({
  ...{ name: `threshold: ${name}`, path: values, status, field: `values[0].${field}` },
  body: {
    values: [
      { quantity: 'critical-power', modality: 'rowing', value: 280, method: 'test', validFrom: '2026-02-01', ...more },
    ],
  },
});
const thresholdCases: BadInput[] = [
  { name: 'threshold: none', path: values, body: { values: [] }, status: 400, field: 'values' },
  value('unknown quantity', { quantity: 'lactate' }, 400, 'quantity'),
  value('out of range', { value: 1001 }, 400, 'value'),
  value('error as large as the value', { standardError: 280 }, 400, 'standardError'),
  value('no method', { method: undefined }, 400, 'method'),
  value('no modality', { modality: undefined }, 400, 'modality'),
  value('body mass of rowing', { quantity: 'body-mass', value: 70 }, 400, 'modality'),
  value('30 February', { validFrom: '2026-02-30' }, 400, 'validFrom'),
  {
    name: 'threshold: resting heart rate at the maximum',
    path: values,
    body: {
      values: [
        { quantity: 'resting-heart-rate', value: 110, method: 'test', validFrom: '2026-02-01' },
        { quantity: 'max-heart-rate', modality: 'skiing', value: 110, method: 'test', validFrom: '2026-02-01' },
      ],
    },
    status: 422,
    field: 'values[0].value',
  },
  value('before the log can begin', { validFrom: '1999-12-31' }, 400, 'validFrom'),
  value('tomorrow', { validFrom: '2026-03-03' }, 422, 'validFrom'),
  value('the same day again', { validFrom: '2026-01-20' }, 409, 'validFrom'),
  value('bound below LT1', { value: 200 }, 422, 'value'),
  value('LT2 above the maximum heart rate', { quantity: 'lt2-heart-rate', value: 191 }, 422, 'value'),
  {
    name: 'correction of a value: out of range',
    path: `${values}/{valueId}/correction`,
    body: { value: 5, reason: 'x' },
    status: 400,
    field: 'value',
  },
  {
    name: 'correction of a value: below LT1',
    path: `${values}/{valueId}/correction`,
    body: { value: 199, reason: 'x' },
    status: 422,
    field: 'value',
  },
  {
    name: 'withdrawal of a value: nobody’s',
    path: `${values}/{nobody}/withdrawal`,
    body: { reason: 'x' },
    status: 404,
    field: null,
  },
  { name: 'in force: no date', method: 'GET', path: `${values}/in-force?modality=rowing`, status: 400, field: 'date' },
];

const day = (name: string, path: string, body: object, status: number, field: string): BadInput => ({
  ...{ name: `day: ${name}`, path: `/v1/squads/{squadId}/days/${path}`, body, status, field },
});
const absence = (name: string, more: object, status: number, field: string): BadInput => ({
  ...{ name: `availability: ${name}`, path: '/v1/athletes/{athleteId}/availability', status, field },
  body: { state: 'none', cause: 'injury', from: '2026-02-20', to: '2026-02-21', ...more },
});
const period = (name: string, more: object, status: number, field: string): BadInput => ({
  ...{ name: `period: ${name}`, path: '/v1/squads/{squadId}/periods', status, field },
  body: { purpose: 'overload', from: '2026-03-02', to: '2026-03-08', ...more },
});
const planCases: BadInput[] = [
  day('tomorrow', '2026-03-03/closing', {}, 422, 'day'),
  day('before any member', '2025-12-31/closing', {}, 422, 'day'),
  day('29 February of no leap year', '2026-02-29/closing', {}, 400, 'day'),
  day('naming a stranger', '2026-02-02/closing', { unknownAthleteIds: ['{nobody}'] }, 422, 'unknownAthleteIds[0]'),
  day('naming no UUID', '2026-02-02/closing', { unknownAthleteIds: ['Nora'] }, 400, 'unknownAthleteIds[0]'),
  day('reopening with something', '2026-02-01/reopening', { why: 'x' }, 400, 'why'),
  absence('end before start', { to: '2026-02-19' }, 400, 'to'),
  absence('unknown cause', { cause: 'mood' }, 400, 'cause'),
  absence('overlapping', { from: '2026-02-12' }, 409, 'from'),
  absence('before the membership', { from: '2026-01-09' }, 422, 'from'),
  absence('allowed though none', { allowedModalities: ['cycling'] }, 400, 'allowedModalities'),
  {
    name: 'availability: ends before it began',
    path: '/v1/athletes/{athleteId}/availability/{availabilityId}/end',
    body: { to: '2026-02-09' },
    status: 422,
    field: 'to',
  },
  period('22 days of overload', { to: '2026-03-23' }, 422, 'to'),
  period('end before start', { to: '2026-03-01' }, 400, 'to'),
  period('overlapping', { from: '2026-04-10', to: '2026-04-12' }, 409, 'from'),
  period('of a stranger', { athleteId: '{nobody}' }, 422, 'athleteId'),
  period('unknown purpose', { purpose: 'rest' }, 400, 'purpose'),
];

const othersCases: BadInput[] = [
  { name: 'squad: bad zone', path: '/v1/squads', body: { name: 'S', zone: '+01:00' }, status: 400, field: 'zone' },
  { name: 'squad: name taken', path: '/v1/squads', body: { name: 'Rowers', zone: 'UTC' }, status: 409, field: 'name' },
  { name: 'person: bad mail', path: '/v1/people', body: { name: 'P', email: 'p' }, status: 400, field: 'email' },
  {
    name: 'person: unknown role',
    path: '/v1/people',
    body: { name: 'P', email: 'p@example.org', roles: [{ role: 'boss' }] },
    status: 400,
    field: 'roles[0].role',
  },
  {
    name: 'role: squad of an admin',
    path: '/v1/people/{personId}/roles',
    body: { role: 'admin', squadId: '{squadId}' },
    status: 400,
    field: 'squadId',
  },
  {
    name: 'role: there already',
    path: '/v1/people/{personId}/roles',
    body: { role: 'medic' },
    status: 409,
    field: 'role',
  },
  {
    name: 'token: 401 days',
    path: '/v1/people/{personId}/tokens',
    body: { label: 'x', validDays: 401 },
    status: 400,
    field: 'validDays',
  },
  {
    name: 'token: nobody’s',
    path: '/v1/people/{nobody}/tokens',
    body: { label: 'x', validDays: 1 },
    status: 404,
    field: null,
  },
  {
    name: 'athlete: born in 1899',
    path: '/v1/athletes',
    body: { name: 'A', birthYear: 1899, squadId: '{squadId}', memberFrom: '2026-01-01' },
    status: 400,
    field: 'birthYear',
  },
  {
    name: 'athlete: of no squad',
    path: '/v1/athletes',
    body: { name: 'A', squadId: '{nobody}', memberFrom: '2026-01-01' },
    status: 404,
    field: null,
  },
  {
    name: 'membership: overlapping',
    path: '/v1/athletes/{athleteId}/memberships',
    body: { squadId: '{squadId}', from: '2026-02-01' },
    status: 409,
    field: 'from',
  },
  {
    name: 'membership: ends before it began',
    path: '/v1/athletes/{athleteId}/memberships/{membershipId}/end',
    body: { to: '2026-01-01' },
    status: 422,
    field: 'to',
  },
  {
    name: 'zone period: backwards',
    path: '/v1/athletes/{athleteId}/zone-periods',
    body: { zone: 'UTC', from: '2026-02-02', to: '2026-02-01' },
    status: 400,
    field: 'to',
  },
  {
    name: 'policy: earlier than the one there',
    path: '/v1/squads/{squadId}/policies',
    body: { validFrom: '2000-01-01', settings: {} },
    status: 409,
    field: 'validFrom',
  },
  {
    name: 'policy: weight 21',
    path: '/v1/squads/{squadId}/policies',
    body: { validFrom: '2026-03-01', settings: { weights: { moderate: 1, heavy: 2, severe: 3, extreme: 21 } } },
    status: 400,
    field: 'settings.weights.extreme',
  },
  {
    name: 'policy: another form without its limit',
    path: '/v1/squads/{squadId}/policies',
    body: { validFrom: '2026-03-01', settings: { ratio: { form: 'exponential' } } },
    status: 422,
    field: 'settings.ratio.upper',
  },
  {
    name: 'report: week 54',
    path: '/v1/squads/{squadId}/reports',
    body: { isoWeek: '0000-W01' },
    status: 400,
    field: 'isoWeek',
  },
  {
    name: 'job: unknown',
    path: '/v1/squads/{squadId}/job-runs',
    body: { job: 'dance', period: '2026-W09' },
    status: 400,
    field: 'job',
  },
  {
    name: 'key of 201 characters',
    path: sessions,
    body: session,
    headers: { 'idempotency-key': 'k'.repeat(201) },
    status: 400,
    field: 'Idempotency-Key',
  },
];

export const cases: BadInput[] = [
  ...sessionCases,
  ...changeCases,
  ...sheetCases,
  ...thresholdCases,
  ...planCases,
  ...responseCases,
  ...othersCases,
];

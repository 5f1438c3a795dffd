import { randomUUID } from 'node:crypto';
import { afterAll, beforeAll, describe, expect, test } from '@jest/globals';
import { expectRefused, openAsOwner } from './support/constraints.ts';
import type { OwnersDatabase } from './support/constraints.ts';

// Every constraint of what is logged is broken once, past the schemas of the edge, and says what is allowed.
const tables = [
  'threshold_value',
  'training_session',
  'session_revision',
  'session_weight',
  'daily_total',
  'day_closing',
  'day_unknown',
  'availability',
  'load_period',
  'reweigh_task',
];
const [club, squad, athlete, session] = [randomUUID(), randomUUID(), randomUUID(), randomUUID()];
const now = '2026-03-02T12:00:00Z';

let db: OwnersDatabase;
beforeAll(async () => {
  db = await openAsOwner();
  const { insert } = db;
  await insert('club', { id: club, name: 'Club', created_at: now });
  await insert('squad', { club_id: club, id: squad, name: 'Squad', zone: 'UTC', created_at: now });
  await insert('athlete', { club_id: club, id: athlete, name: 'Alex', created_at: now });
  await insert('threshold_value', { ...newValue(), valid_from: '2026-01-01', valid_to: null });
  await insert('training_session', { ...newSession(), id: session, external_id: 'x' });
  await insert('day_closing', { club_id: club, squad_id: squad, day: '2026-01-01', closed_at: now });
  await insert('availability', { ...newAvailability(), valid_from: '2026-01-01', valid_to: null });
  await insert('load_period', { ...newPeriod(), valid_from: '2026-01-01', valid_to: '2026-01-10' });
});
afterAll(() => db.close());

const own = () => ({ club_id: club, id: randomUUID() });
const newValue = () => ({
  ...{ ...own(), athlete_id: athlete, quantity: 'critical-power', modality: 'rowing', setting: 'any', value: 280 },
  ...{ method: 'test', valid_from: '2025-01-01', valid_to: '2025-12-31', entered_at: now },
});
const newSession = () => ({
  ...{ ...own(), athlete_id: athlete, source: 'api', started_at: now, zone: 'UTC', training_day: '2026-03-02' },
  ...{ duration_min: 60, kind: 'training', modality: 'rowing', setting: 'any', content: { kind: 'none' } },
  ...{ quality: 'ok', quality_notes: [], version: 1, created_at: now, updated_at: now },
});
const newWeight = () => ({
  ...{ club_id: club, session_id: session, domain_state: 'absent', basis: 'rating', measures: '[]' },
  ...{ thresholds_used: '[]', method_version: '1', weighed_at: now },
});
const newTotal = () => ({
  ...{ club_id: club, athlete_id: athlete, day: '2026-03-02', sessions: 1, minutes: 60, rating_load: 0 },
  ...{ rating_missing: 0, domain_load: 0, domain_missing: 0, moderate_min: 0, heavy_min: 0, severe_min: 0 },
  ...{ extreme_min: 0, applicable_min: 0, covered_min: 0, basis_minutes: {}, suspect: 0 },
});
const newUnknown = () => ({ club_id: club, athlete_id: athlete, squad_id: squad, day: '2026-01-01' });
const newAvailability = () => ({
  ...{ ...own(), athlete_id: athlete, state: 'none', cause: 'illness', allowed_modalities: [] },
  ...{ valid_from: '2025-01-01', valid_to: '2025-01-05', entered_at: now },
});
const newPeriod = () => ({
  ...{ ...own(), squad_id: squad, purpose: 'taper', valid_from: '2025-01-01', valid_to: '2025-01-31', entered_at: now },
});
const newTask = () => ({
  ...{ ...own(), athlete_id: athlete, scope: {}, total: 1, done: 0, touched: [], state: 'waiting', created_at: now },
});
const backwards = { valid_from: '2020-02-02', valid_to: '2020-02-01' };
const stranger = randomUUID();

type Case = [constraint: string, row: object, status: number];
const threshold = (name: string, row: object, status: number): Case => [
  `threshold_value_${name}`,
  { ...newValue(), ...row },
  status,
];
const logged = (name: string, row: object, status: number): Case => [
  `training_session_${name}`,
  { ...newSession(), ...row },
  status,
];
const weight = (name: string, row: object, status: number): Case => [
  `session_weight_${name}`,
  { ...newWeight(), ...row },
  status,
];
const absence = (name: string, row: object, status: number): Case => [
  `availability_${name}`,
  { ...newAvailability(), ...row },
  status,
];
const period = (name: string, row: object, status: number): Case => [
  `load_period_${name}`,
  { ...newPeriod(), ...row },
  status,
];

const broken: Case[] = [
  threshold('athlete_fk', { athlete_id: stranger }, 404),
  threshold('error_range', { standard_error: 280 }, 400),
  threshold('no_overlap', { valid_from: '2025-06-01', valid_to: null }, 409),
  threshold('order', backwards, 422),
  threshold('range', { value: 1001 }, 400),
  threshold('range', { quantity: 'lactate' }, 400),
  threshold('supersedes_fk', { supersedes: stranger }, 404),
  threshold('modality_known', { modality: 'chess' }, 400),
  threshold('setting_known', { setting: 'moon' }, 400),
  threshold('entered_by_fk', { entered_by: stranger }, 404),
  threshold('withdrawn_by_fk', { withdrawn_by: stranger }, 404),

  logged('athlete_fk', { athlete_id: stranger }, 404),
  logged('distance_range', { distance_m: 0 }, 400),
  logged('duration_range', { duration_min: 1440.5 }, 400),
  logged('external_once', { external_id: 'x' }, 409),
  logged('heart_rate_range', { mean_heart_rate_bpm: 241 }, 400),
  logged('heart_rate_range', { peak_heart_rate_bpm: 251 }, 400),
  logged('intended_rating_range', { intended_rating: 10.5 }, 400),
  logged('kind_known', { kind: 'play' }, 400),
  logged('quality_known', { quality: 'good' }, 400),
  logged('rating_delay_range', { rating_delay_min: -1 }, 400),
  logged('rating_range', { rating: 'NaN' }, 400),
  logged('withdrawn_why', { withdrawn_at: now }, 400),
  logged('modality_known', { modality: 'chess' }, 400),
  logged('setting_known', { setting: 'moon' }, 400),
  logged('rating_by_known', { rating_by: 'x' }, 400),
  logged('version_range', { version: 0 }, 422),
  logged('mean_below_peak', { mean_heart_rate_bpm: 150, peak_heart_rate_bpm: 140 }, 422),
  logged('entered_by_fk', { entered_by: stranger }, 404),

  [
    'session_revision_session_fk',
    { ...own(), id: undefined, session_id: stranger, version: 1, snapshot: {}, changed_at: now },
    404,
  ],
  [
    'session_revision_changed_by_fk',
    { ...own(), id: undefined, session_id: session, version: 1, snapshot: {}, changed_at: now, changed_by: stranger },
    404,
  ],
  weight('basis_known', { basis: 'x' }, 422),
  weight('minutes_not_negative', { rating_load: 'Infinity' }, 422),
  weight('minutes_not_negative', { domain_state: 'present', domain_load: 'NaN' }, 422),
  weight('minutes_not_negative', { unassigned_min: -5 }, 422),
  weight('domain_load_when_present', { domain_state: 'present' }, 422),
  weight('domain_state_known', { domain_state: 'maybe' }, 422),
  weight('minutes_not_negative', { heavy_min: -1 }, 422),
  weight('policy_fk', { policy_id: stranger }, 404),
  weight('session_fk', { session_id: stranger }, 404),
  ['daily_total_athlete_fk', { ...newTotal(), athlete_id: stranger }, 404],
  ['daily_total_not_negative', { ...newTotal(), minutes: -1 }, 422],
  ['daily_total_not_negative', { ...newTotal(), domain_load: 'NaN' }, 422],
  ['daily_total_not_negative', { ...newTotal(), moderate_min: -1 }, 422],
  ['reweigh_task_state_known', { ...newTask(), state: 'x' }, 422],
  ['reweigh_task_counts_range', { ...newTask(), done: -1 }, 422],
  ['reweigh_task_athlete_fk', { ...newTask(), athlete_id: stranger }, 404],

  ['day_closing_squad_fk', { club_id: club, squad_id: stranger, day: '2026-01-02', closed_at: now }, 404],
  [
    'day_closing_closed_by_fk',
    { club_id: club, squad_id: squad, day: '2026-01-02', closed_at: now, closed_by: stranger },
    404,
  ],
  ['day_unknown_athlete_fk', { ...newUnknown(), athlete_id: stranger }, 404],
  ['day_unknown_closing_fk', { ...newUnknown(), day: '2026-01-02' }, 409],

  absence('entered_by_fk', { entered_by: stranger }, 404),
  absence('athlete_fk', { athlete_id: stranger }, 404),
  absence('cause_known', { cause: 'mood' }, 400),
  absence('no_overlap', { valid_from: '2026-06-01', valid_to: null }, 409),
  absence('order', backwards, 400),
  absence('state_known', { state: 'some' }, 400),

  period('entered_by_fk', { entered_by: stranger }, 404),
  period('athlete_fk', { athlete_id: stranger }, 404),
  period('no_overlap', { valid_from: '2026-01-10', valid_to: '2026-01-11' }, 409),
  period('order', backwards, 400),
  period('overload_length', { purpose: 'overload', valid_to: '2025-01-22' }, 422),
  period('purpose_known', { purpose: 'fun' }, 400),
  period('squad_fk', { squad_id: stranger }, 404),
];

describe('constraints of what is logged', () => {
  test.each(broken)('%s', async (constraint, row, status) => {
    const table = tables.find((name) => constraint.startsWith(`${name}_`))!;
    await expectRefused(db.insert(table, row), constraint, status);
  });

  test('none is left out', async () => {
    expect([...new Set(broken.map(([constraint]) => constraint))].toSorted()).toEqual(await db.constraintsOf(tables));
  });
});

import { randomUUID } from 'node:crypto';
import { afterAll, beforeAll, describe, expect, test } from '@jest/globals';
import { expectRefused, openAsOwner } from './support/constraints.ts';
import type { OwnersDatabase } from './support/constraints.ts';

// Every constraint of what athletes answer and do in tests is broken once, past the schemas of the edge.
const tables = ['morning_answer', 'morning_revision', 'circumstance', 'test_definition', 'test_result'];
const [club, squad, athlete, morning, definition] = [0, 1, 2, 3, 4].map(() => randomUUID());
const now = '2026-03-02T12:00:00Z';
const stranger = randomUUID();

let db: OwnersDatabase;
beforeAll(async () => {
  db = await openAsOwner();
  await db.insert('club', { id: club, name: 'Club', created_at: now });
  await db.insert('squad', { club_id: club, id: squad, name: 'Squad', zone: 'UTC', created_at: now });
  await db.insert('athlete', { club_id: club, id: athlete, name: 'Alex', created_at: now });
  await db.insert('test_definition', { ...newDefinition(), id: definition, name: 'Known' });
  await db.insert('test_result', { ...newResult(), day: '2026-01-01' });
  await db.insert('morning_answer', { ...newMorning(), id: morning, day: '2026-01-01' });
});
afterAll(() => db.close());

const own = () => ({ club_id: club, id: randomUUID() });
const newMorning = () => ({
  ...{ ...own(), athlete_id: athlete, day: '2026-03-02', rr_intervals_ms: [], quality: 'ok', quality_notes: [] },
  ...{ version: 1, entered_at: now, updated_at: now },
});
const newCircumstance = () => ({
  ...{ ...own(), squad_id: squad, kind: 'heat', valid_from: '2026-03-02', valid_to: '2026-03-05', entered_at: now },
});

const newDefinition = () => ({
  ...{ ...own(), squad_id: squad, kind: 'criterion', name: randomUUID(), protocol: 'p', modality: 'rowing' },
  ...{ setting: 'any', unit: 'W', direction: 'higher', typical_error: 4, created_at: now },
});
const newResult = () => ({
  ...{ ...own(), definition_id: definition, athlete_id: athlete, day: '2026-03-02', value: 300 },
  ...{ quality: 'ok', quality_notes: [], entered_at: now },
});

const scaleOfNone = { unit: null, direction: null, typical_error: null };
const boutErrors = {
  ...{ ...scaleOfNone, kind: 'standard-bout', rating_typical_error: 0.5, heart_rate_typical_error: 3 },
};

type Case = [constraint: string, table: string, row: object, status: number];
const answered = (name: string, row: object, status: number): Case => [
  `morning_answer_${name}`,
  'morning_answer',
  { ...newMorning(), ...row },
  status,
];
const circumstance = (name: string, row: object, status: number): Case => [
  `circumstance_${name}`,
  'circumstance',
  { ...newCircumstance(), ...row },
  status,
];
const defined = (name: string, row: object, status: number): Case => [
  `test_definition_${name}`,
  'test_definition',
  { ...newDefinition(), ...row },
  status,
];
const tested = (name: string, row: object, status: number): Case => [
  `test_result_${name}`,
  'test_result',
  { ...newResult(), ...row },
  status,
];

const broken: Case[] = [
  answered('athlete_fk', { athlete_id: stranger }, 404),
  answered('entered_by_fk', { entered_by: stranger }, 404),
  [
    'morning_revision_changed_by_fk',
    'morning_revision',
    { club_id: club, morning_id: morning, version: 1, snapshot: {}, changed_at: now, changed_by: stranger },
    404,
  ],
  ...['sleep', 'fatigue', 'stress', 'soreness', 'mood'].flatMap((item) => [
    answered(`${item}_range`, { [item]: 0 }, 400),
    answered(`${item}_range`, { [item]: 8 }, 400),
  ]),
  answered('once', { day: '2026-01-01' }, 409),
  answered('quality_known', { quality: 'good' }, 422),
  answered('resting_heart_rate_range', { resting_heart_rate_bpm: 20 }, 400),
  answered('rmssd_range', { rmssd_ms: 0 }, 400),
  answered('rmssd_range', { rmssd_ms: 2000 }, 400),
  answered('sleep_hours_range', { sleep_hours: 25 }, 400),
  answered('withdrawn_why', { withdrawn_at: now }, 400),
  [
    'morning_revision_morning_fk',
    'morning_revision',
    { club_id: club, morning_id: stranger, version: 1, snapshot: {}, changed_at: now },
    404,
  ],
  circumstance('athlete_fk', { athlete_id: stranger }, 404),
  circumstance('entered_by_fk', { entered_by: stranger }, 404),
  circumstance('kind_known', { kind: 'fog' }, 400),
  circumstance('order', { valid_to: '2026-03-01' }, 400),
  circumstance('squad_fk', { squad_id: stranger }, 404),
  circumstance('withdrawn_why', { withdraw_reason: 'x' }, 400),

  defined('direction_known', { direction: 'sideways' }, 400),
  defined('kind_known', { kind: 'quiz', ...scaleOfNone }, 400),
  defined('name_once', { name: 'Known' }, 409),
  defined('scale_by_kind', { typical_error: null }, 400),
  defined('scale_by_kind', { rating_typical_error: 0.5 }, 400),
  defined('scale_by_kind', { kind: 'standard-bout' }, 400),
  defined('scale_by_kind', { ...scaleOfNone, kind: 'standard-bout', rating_typical_error: 0.5 }, 400),
  defined('squad_fk', { squad_id: stranger }, 404),
  defined('created_by_fk', { created_by: stranger }, 404),
  defined('typical_error_range', { typical_error: 0 }, 400),
  defined('typical_error_range', { ...boutErrors, rating_typical_error: 3.1 }, 400),
  defined('typical_error_range', { ...boutErrors, heart_rate_typical_error: 0.4 }, 400),

  defined('withdrawn_why', { withdrawn_at: now }, 400),

  tested('athlete_fk', { athlete_id: stranger }, 404),
  tested('entered_by_fk', { entered_by: stranger }, 404),
  tested('withdrawn_by_fk', { withdrawn_by: stranger }, 404),
  tested('definition_fk', { definition_id: stranger }, 404),
  tested('heart_rate_range', { heart_rate_bpm: 241 }, 400),
  tested('heart_rate_recovery_range', { heart_rate_recovery_bpm: 121 }, 400),
  tested('lactate_range', { lactate_mmol_l: 36 }, 400),
  tested('once', { day: '2026-01-01' }, 409),
  tested('quality_known', { quality: 'question' }, 422),
  tested('rating_range', { rating: 11 }, 400),
  tested('supersedes_fk', { supersedes: stranger }, 404),
  tested('value_range', { value: 0 }, 400),
  tested('withdrawn_why', { withdrawn_at: now }, 400),
  tested('work_range', { work_w: 19 }, 400),
  tested('work_range', { work_mps: 13 }, 400),
];

describe('constraints of responses', () => {
  test.each(broken)('%s', async (constraint, table, row, status) => {
    await expectRefused(db.insert(table, row), constraint, status);
  });

  test('none is left out', async () => {
    expect([...new Set(broken.map(([constraint]) => constraint))].toSorted()).toEqual(await db.constraintsOf(tables));
  });
});

import { censoredMean } from '../response-signs/censored-mean.ts';
import { effortMismatch } from '../response-signs/effort-mismatch.ts';
import { expectedRating } from '../response-signs/expected-rating.ts';
import { huberRegression } from '../response-signs/huber-regression.ts';
import { ratingRelation } from '../response-signs/rating-relation.ts';
import { define, fields, input, options } from './define.ts';
import type { Method } from './method.ts';
import { PROVENANCE } from './method.ts';

const sessions = fields('sessions', 'day number, min, CR-10', 'rows', {
  ...{ day: 'number', id: 'any', modality: 'any', totalMin: 'number', minutes: 'any', rating: 'number' },
  ...{ inBaseline: 'flag', judged: 'flag' },
});
const huber = 'Huber PJ 1973, Ann Stat 1(5):799–821';

export const effortMethods: readonly Method[] = [
  define({
    file: 'response-signs/huber-regression.ts',
    fn: huberRegression,
    name: 'Robust regression',
    inputs: [
      input('rows', 'any units, one row a value', 'table'),
      input('values', 'any unit', 'numbers'),
      options('SD; count; unit of the values', 'tuning', 'maxIterations', 'tolerance', 'leastScale'),
    ],
    unit: 'unit of the values',
    source: huber,
    provenance: PROVENANCE.memory,
    checkedAgainst: [],
  }),
  define({
    file: 'response-signs/censored-mean.ts',
    fn: censoredMean,
    name: 'Expected size above a lower bound',
    inputs: ['bound', 'centre', 'sd'].map((name) => input(name, 'any unit')),
    unit: 'unit of the bound',
    source: 'Schmee J, Hahn GJ 1979, A simple method for regression analysis with censored data',
    provenance: PROVENANCE.memory,
    checkedAgainst: [],
  }),
  define({
    file: 'response-signs/rating-relation.ts',
    fn: ratingRelation,
    name: 'Own relation of session rating to minutes',
    inputs: [sessions, input('day', 'day number')],
    unit: 'points, points per hour',
    source: huber,
    provenance: PROVENANCE.form,
    checkedAgainst: [],
  }),
  define({
    file: 'response-signs/expected-rating.ts',
    fn: expectedRating,
    name: 'Expected session rating',
    inputs: [
      fields('relation', 'as the own relation gives it', 'record', {
        ...{ status: 'any', from: 'any', to: 'any', pairs: 'any', modalities: 'any', coefficients: 'any' },
        ...{ sd: 'number', factor: 'any', dependent: 'any' },
      }),
      fields('session', 'min', 'record', { modality: 'any', totalMin: 'number', minutes: 'any' }),
    ],
    unit: 'CR-10',
    source: 'textbook',
    provenance: PROVENANCE.textbook,
    checkedAgainst: [],
  }),
  define({
    file: 'response-signs/effort-mismatch.ts',
    fn: effortMismatch,
    name: 'Sessions harder than the own usual',
    inputs: [
      sessions,
      ...['from', 'to'].map((name) => input(name, 'day number')),
      options('fraction and SD', 'weight', 'width'),
    ],
    unit: 'own SD; state by day',
    source: 'NIST/SEMATECH e-Handbook of Statistical Methods, 6.3.2.4',
    provenance: PROVENANCE.form,
    checkedAgainst: [],
  }),
];

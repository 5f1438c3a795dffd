import { basisMixShift } from '../flags/basis-mix-shift.ts';
import { primaryMeasure } from '../flags/primary-measure.ts';
import { define, fields, options } from './define.ts';
import type { Method } from './method.ts';
import { PROVENANCE } from './method.ts';

const own = { source: 'own convention', provenance: PROVENANCE.own, checkedAgainst: [] };
const minutesByBasis = {
  power: 'maybe-number',
  speed: 'maybe-number',
  interval: 'maybe-number',
  minutes: 'maybe-number',
  'heart-rate': 'maybe-number',
  rating: 'maybe-number',
} as const;

export const measureMethods: readonly Method[] = [
  define({
    file: 'flags/primary-measure.ts',
    fn: primaryMeasure,
    name: 'Measure that drives the figures',
    inputs: [
      fields('days', 'state, min, min', 'rows', { domain: 'state', minutes: 'number', domainMinutes: 'number' }),
      options('days and fraction', 'minKnown', 'minShare'),
    ],
    unit: 'name of a measure',
    ...own,
  }),
  define({
    file: 'flags/basis-mix-shift.ts',
    fn: basisMixShift,
    name: 'Shift of the basis mix',
    inputs: [
      fields('acute', 'min by basis', 'record', minutesByBasis),
      fields('chronic', 'min by basis', 'record', minutesByBasis),
    ],
    unit: 'percentage points',
    ...own,
  }),
];

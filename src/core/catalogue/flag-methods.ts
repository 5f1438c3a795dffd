import { loadConcern } from '../flags/load-concern.ts';
import { logGap } from '../flags/log-gap.ts';
import { plannedOverloadPhase } from '../flags/planned-overload-phase.ts';
import { returnPhase } from '../flags/return-phase.ts';
import { sessionSpikePercent, spikeClass } from '../flags/session-spike.ts';
import { thresholdsOutOfDate } from '../flags/thresholds-out-of-date.ts';
import { define, fields, input, options } from './define.ts';
import type { Method } from './method.ts';
import { PROVENANCE } from './method.ts';

const frandsen = 'Frandsen JSB et al. 2025, Br J Sports Med 59(17):1203–1210, doi 10.1136/bjsports-2024-109380';
const own = { source: 'own convention', provenance: PROVENANCE.own, checkedAgainst: [] };
export const flagMethods: readonly Method[] = [
  define({
    file: 'flags/load-concern.ts',
    fn: loadConcern,
    name: 'Load concern',
    asObject: true,
    inputs: [
      fields('days', 'day number, no unit, load units; spike in %', 'rows', {
        day: 'number',
        ratio: 'number',
        chronic: 'number',
        monotony: 'number',
        strain: 'number',
        muted: 'any',
        spike: 'any',
      }),
      input('firstDay', 'day number'),
    ],
    unit: 'episodes of days',
    source: 'Foster C 1998, Med Sci Sports Exerc 30(7):1164–1168',
    provenance: PROVENANCE.mixed,
    checkedAgainst: [],
  }),
  define({
    file: 'flags/session-spike.ts',
    fn: sessionSpikePercent,
    name: 'Single-session spike of running distance',
    inputs: [input('distanceKm', 'km'), input('longestBeforeKm', 'km')],
    unit: '%',
    source: frandsen,
    provenance: PROVENANCE.published,
    checkedAgainst: [],
  }),
  define({
    file: 'flags/session-spike.ts',
    fn: spikeClass,
    name: 'Class of a single-session spike',
    inputs: [input('percent', '%')],
    unit: 'name of a class',
    source: frandsen,
    provenance: PROVENANCE.published,
    checkedAgainst: [],
  }),
  define({
    file: 'flags/log-gap.ts',
    fn: logGap,
    name: 'Gap in the log',
    inputs: [fields('days', 'day number, state', 'rows', { day: 'number', state: 'state' })],
    unit: 'stretches of days',
    ...own,
  }),
  define({
    file: 'flags/thresholds-out-of-date.ts',
    fn: thresholdsOutOfDate,
    name: 'Thresholds out of date',
    inputs: [
      fields('days', 'day number, days', 'rows', { day: 'number', ageDays: 'number' }),
      options('days', 'maxAgeDays'),
    ],
    unit: 'stretches of days',
    source: 'common practice, no source',
    provenance: PROVENANCE.practice,
    checkedAgainst: [],
  }),
  define({
    file: 'flags/return-phase.ts',
    fn: returnPhase,
    name: 'Day of return after unavailability',
    inputs: [
      fields('days', 'day number, true or false, load units', 'rows', {
        day: 'number',
        unavailable: 'flag',
        chronic: 'number',
      }),
      options('days and %', 'minSpellDays', 'untilShare', 'fallbackDays'),
    ],
    unit: 'day number; %',
    ...own,
  }),
  define({
    file: 'flags/planned-overload-phase.ts',
    fn: plannedOverloadPhase,
    name: 'Day within a planned overload',
    inputs: [input('day', 'day number'), fields('periods', 'day numbers', 'rows', { from: 'number', to: 'number' })],
    unit: 'day number',
    ...own,
  }),
];

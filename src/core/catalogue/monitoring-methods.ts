import { cleanRrIntervals } from '../monitoring/clean-rr-intervals.ts';
import { hooperSum } from '../monitoring/hooper-sum.ts';
import { lnRmssd, rmssd } from '../monitoring/rmssd.ts';
import { totalMoodDisturbance } from '../monitoring/total-mood-disturbance.ts';
import {
  limitsOfAgreement,
  smallestWorthwhileChange,
  typicalError,
  typicalErrorPercent,
} from '../monitoring/typical-error.ts';
import { define, fields, input } from './define.ts';
import type { Method } from './method.ts';
import { PROVENANCE } from './method.ts';

const hopkins = 'Hopkins WG 2000, Sports Med 30(1):1–15';
const intervals = input('intervalsMs', 'ms', 'numbers');
const rating = (name: string) => input(name, '1 to 7, 7 worse');
const trials = [
  input('first', 'any unit, one an athlete', 'numbers'),
  input('second', 'same unit, same athletes', 'numbers'),
];

export const monitoringMethods: readonly Method[] = [
  define({
    file: 'monitoring/rmssd.ts',
    fn: rmssd,
    name: 'RMSSD',
    inputs: [input('intervalsMs', 'ms, null removed', 'numbers')],
    unit: 'ms',
    source: 'Task Force of the European Society of Cardiology 1996, Circulation 93(5):1043–1065',
    provenance: PROVENANCE.published,
    checkedAgainst: ['HRV-01'],
  }),
  define({
    file: 'monitoring/rmssd.ts',
    fn: lnRmssd,
    name: 'Logarithm of RMSSD',
    inputs: [input('rmssdMs', 'ms')],
    unit: 'ln ms',
    source: 'Plews DJ et al. 2012, Eur J Appl Physiol 112(11):3729–3741',
    provenance: PROVENANCE.published,
    checkedAgainst: ['HRV-01'],
  }),
  define({
    file: 'monitoring/clean-rr-intervals.ts',
    fn: cleanRrIntervals,
    name: 'RR intervals without artefacts',
    inputs: [intervals],
    unit: 'ms, null removed',
    source: PROVENANCE.practice,
    provenance: PROVENANCE.practice,
    checkedAgainst: [],
  }),
  define({
    file: 'monitoring/hooper-sum.ts',
    fn: hooperSum,
    name: 'Sum of the four morning ratings',
    inputs: ['sleep', 'fatigue', 'stress', 'soreness'].map(rating),
    unit: 'points, 4 to 28',
    source: 'Hooper SL et al. 1995, Med Sci Sports Exerc 27(1):106–112',
    provenance: PROVENANCE.memory,
    checkedAgainst: ['Q-01'],
  }),
  define({
    file: 'monitoring/total-mood-disturbance.ts',
    fn: totalMoodDisturbance,
    name: 'Total mood disturbance',
    inputs: [
      fields('scores', 'points', 'record', {
        ...{ tension: 'number', depression: 'number', anger: 'number' },
        ...{ fatigue: 'number', confusion: 'number', vigour: 'number' },
      }),
      { ...input('offset', 'points'), optional: true },
    ],
    unit: 'points',
    source: 'McNair DM et al. 1971, Profile of Mood States manual',
    provenance: PROVENANCE.memory,
    checkedAgainst: ['Q-02'],
  }),
  ...[
    { fn: typicalError, name: 'Typical error', unit: 'unit of the results', checkedAgainst: ['TEM-01'] },
    {
      fn: typicalErrorPercent,
      name: 'Typical error as a coefficient of variation',
      unit: '%',
      checkedAgainst: ['TEM-02'],
    },
  ].map((one) =>
    define({
      ...one,
      file: 'monitoring/typical-error.ts',
      inputs: trials,
      source: hopkins,
      provenance: PROVENANCE.published,
    }),
  ),
  define({
    file: 'monitoring/typical-error.ts',
    fn: limitsOfAgreement,
    name: 'Limits of agreement of two trials',
    inputs: [input('typicalErrorOfOne', 'any unit')],
    unit: 'unit of the typical error',
    source: hopkins,
    provenance: PROVENANCE.published,
    checkedAgainst: ['TEM-03'],
  }),
  define({
    file: 'monitoring/typical-error.ts',
    fn: smallestWorthwhileChange,
    name: 'Smallest worthwhile change',
    inputs: [input('results', 'any unit, one an athlete', 'numbers')],
    unit: 'unit of the results',
    source: hopkins,
    provenance: PROVENANCE.published,
    checkedAgainst: ['TEM-01'],
  }),
];

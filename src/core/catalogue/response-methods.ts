import { impulseComponentExclusive, impulseComponentInclusive } from '../response/impulse-component.ts';
import { impulseResponseConvolution } from '../response/impulse-response-convolution.ts';
import { impulseResponse, impulseResponseInclusive } from '../response/impulse-response.ts';
import { longShortLoad } from '../response/long-short-load.ts';
import { define, fields, input, options } from './define.ts';
import type { Method } from './method.ts';
import { PROVENANCE } from './method.ts';

const morton = 'Morton RH, Fitz-Clarke JR, Banister EW 1990, J Appl Physiol 69(3):1171–1177';
const imbach = 'Imbach F et al. 2022, Sports Med Open 8:29, Eq. (1)';
const loads = input('loads', 'load units a day, null unknown', 'numbers');
const tauDays = input('tauDays', 'days');
const held = { k1: 'number', k2: 'number', tau1: 'number', tau2: 'number' } as const;
const parameters = fields('parameters', 'performance units (per load unit), days', 'record', { p0: 'number', ...held });
const start = { ...input('start', 'load units, default 0'), optional: true };

const components: readonly Method[] = [
  { fn: impulseComponentExclusive, name: 'Component read before the load (E)', source: imbach },
  { fn: impulseComponentInclusive, name: 'Component read after the load (I)', source: morton },
].map((one) =>
  define({
    ...one,
    file: 'response/impulse-component.ts',
    inputs: [loads, tauDays, start],
    unit: 'load units',
    provenance: PROVENANCE.published,
    checkedAgainst: [],
  }),
);

const responses: readonly Method[] = [
  {
    fn: impulseResponse,
    file: 'response/impulse-response.ts',
    name: 'Impulse–response model read before the load (E)',
    source: imbach,
    checkedAgainst: ['BAN-10', 'BAN-11', 'BAN-13', 'BAN-16'],
  },
  {
    fn: impulseResponseInclusive,
    file: 'response/impulse-response.ts',
    name: 'Impulse–response model read after the load (I)',
    source: morton,
    checkedAgainst: ['BAN-10', 'BAN-12'],
  },
  {
    fn: impulseResponseConvolution,
    file: 'response/impulse-response-convolution.ts',
    name: 'Impulse–response model as a direct sum (E)',
    source: imbach,
    checkedAgainst: ['BAN-13'],
  },
].map((one) =>
  define({ ...one, inputs: [loads, parameters], unit: 'performance units', provenance: PROVENANCE.published }),
);

export const responseMethods: readonly Method[] = [
  ...components,
  ...responses,
  define({
    file: 'response/long-short-load.ts',
    fn: longShortLoad,
    name: 'Long load and short load',
    inputs: [
      fields('days', 'day number, state, load units', 'rows', { day: 'number', state: 'state', value: 'number' }),
      options('days', 'longDays', 'shortDays', 'medianDays', 'minLogDays', 'startDays', 'startKnown'),
    ],
    unit: 'load units; % of own median',
    source: morton,
    provenance: 'published nominal constants: value from memory; the rest own convention',
    checkedAgainst: [],
  }),
];

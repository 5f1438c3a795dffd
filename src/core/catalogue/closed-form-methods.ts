import { impulseInfluence } from '../response/impulse-influence.ts';
import { partialSumInclusive, steadyStateSumExclusive, steadyStateSumInclusive } from '../response/steady-state-sum.ts';
import { gainRatioFromRecovery, timeToPeak, timeToRecover } from '../response/time-to-recover.ts';
import { define, fields, input } from './define.ts';
import type { Method } from './method.ts';
import { PROVENANCE } from './method.ts';

const fitzClarke = 'Fitz-Clarke JR, Morton RH, Banister EW 1991, J Appl Physiol 71(3):1151–1158';
const tauDays = input('tauDays', 'days');
const gains = [
  input('k1', 'performance units per load unit'),
  input('k2', 'performance units per load unit'),
  input('tau1', 'days'),
  input('tau2', 'days'),
];
const held = { k1: 'number', k2: 'number', tau1: 'number', tau2: 'number' } as const;

const times: readonly Method[] = [
  { fn: timeToRecover, name: 'Time to recover', checkedAgainst: ['BAN-01', 'BAN-04', 'BAN-05', 'BAN-17'] },
  { fn: timeToPeak, name: 'Time to peak', checkedAgainst: ['BAN-02', 'BAN-04', 'BAN-05', 'BAN-07'] },
].map((one) =>
  define({
    ...one,
    file: 'response/time-to-recover.ts',
    asObject: true,
    inputs: gains,
    unit: 'days',
    source: fitzClarke,
    provenance: PROVENANCE.published,
  }),
);

const sums: readonly Method[] = [
  { fn: steadyStateSumInclusive, name: 'Steady-state sum (I)', inputs: [tauDays], checkedAgainst: ['BAN-08'] },
  { fn: steadyStateSumExclusive, name: 'Steady-state sum (E)', inputs: [tauDays], checkedAgainst: ['BAN-08'] },
  {
    fn: partialSumInclusive,
    name: 'Partial sum (I)',
    inputs: [tauDays, input('dayCount', 'days')],
    checkedAgainst: ['BAN-09'],
  },
].map((one) =>
  define({
    ...one,
    file: 'response/steady-state-sum.ts',
    unit: 'days',
    source: 'textbook geometric series',
    provenance: PROVENANCE.textbook,
  }),
);

export const closedFormMethods: readonly Method[] = [
  define({
    file: 'response/impulse-influence.ts',
    fn: impulseInfluence,
    name: 'Influence of a load on a later day',
    inputs: [input('daysBefore', 'days'), fields('gains', 'performance units per load unit, days', 'record', held)],
    unit: 'performance units per load unit',
    source: fitzClarke,
    provenance: PROVENANCE.published,
    checkedAgainst: ['BAN-03', 'BAN-05', 'BAN-14'],
  }),
  ...times,
  define({
    file: 'response/time-to-recover.ts',
    fn: gainRatioFromRecovery,
    name: 'Ratio of gains from the time to recover',
    asObject: true,
    inputs: [input('tau1', 'days'), input('tau2', 'days'), input('timeToRecoverDays', 'days')],
    unit: 'no unit',
    source: 'Hellard P et al. 2006, J Sports Sci 24(5):509–520',
    provenance: PROVENANCE.derived,
    checkedAgainst: ['BAN-07'],
  }),
  ...sums,
];

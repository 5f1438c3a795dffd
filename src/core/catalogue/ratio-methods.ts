import { acuteChronicCoupled } from '../ratio/acute-chronic-coupled.ts';
import { acuteChronicExponential } from '../ratio/acute-chronic-exponential.ts';
import { acuteChronicUncoupled } from '../ratio/acute-chronic-uncoupled.ts';
import { correlation } from '../ratio/correlation.ts';
import { coupledFromUncoupled, uncoupledFromCoupled } from '../ratio/coupled-from-uncoupled.ts';
import { define, input, options } from './define.ts';
import type { Method } from './method.ts';
import { PROVENANCE } from './method.ts';

const lolli = 'Lolli L et al. 2019, Br J Sports Med 53(15):921–922';
const days = input('days', 'load units a day, null unknown', 'numbers');
const windows = options('days', 'acuteDays', 'chronicDays', 'minAcuteKnown', 'minChronicKnown');
const unit = 'load units a day; ratio no unit';

export const ratioMethods: readonly Method[] = [
  define({
    file: 'ratio/acute-chronic-coupled.ts',
    fn: acuteChronicCoupled,
    name: 'Acute:chronic ratio, rolling, coupled',
    inputs: [days, windows],
    unit,
    source: 'Hulin BT et al. 2014, Br J Sports Med 48(8):708–712, doi 10.1136/bjsports-2013-092524',
    provenance: 'published; the fewest known days are an own convention',
    checkedAgainst: ['AC-01', 'AC-07', 'AC-10', 'AC-11'],
  }),
  define({
    file: 'ratio/acute-chronic-uncoupled.ts',
    fn: acuteChronicUncoupled,
    name: 'Acute:chronic ratio, rolling, uncoupled',
    inputs: [days, windows],
    unit,
    source: lolli,
    provenance: 'published; the fewest known days are an own convention',
    checkedAgainst: ['AC-01', 'AC-11'],
  }),
  define({
    file: 'ratio/acute-chronic-exponential.ts',
    fn: acuteChronicExponential,
    name: 'Acute:chronic ratio, exponentially weighted',
    inputs: [days, options('days', 'acuteDays', 'chronicDays')],
    unit,
    source: 'Williams S et al. 2017, Br J Sports Med 51(3):209–210, doi 10.1136/bjsports-2016-096589',
    provenance: PROVENANCE.memory,
    checkedAgainst: ['AC-05', 'AC-06', 'AC-07', 'AC-11'],
  }),
  define({
    file: 'ratio/coupled-from-uncoupled.ts',
    fn: coupledFromUncoupled,
    name: 'Coupled ratio from the uncoupled one',
    inputs: [input('uncoupled', 'no unit')],
    unit: 'no unit',
    source: lolli,
    provenance: PROVENANCE.derived,
    checkedAgainst: ['AC-02'],
  }),
  define({
    file: 'ratio/coupled-from-uncoupled.ts',
    fn: uncoupledFromCoupled,
    name: 'Uncoupled ratio from the coupled one',
    inputs: [input('coupled', 'no unit, 0 to 4')],
    unit: 'no unit',
    source: lolli,
    provenance: PROVENANCE.derived,
    checkedAgainst: ['AC-03'],
  }),
  define({
    file: 'ratio/correlation.ts',
    fn: correlation,
    name: 'Product-moment correlation',
    inputs: [input('x', 'any unit', 'numbers'), input('y', 'any unit', 'numbers')],
    unit: 'no unit, −1 to 1',
    source: 'textbook definition',
    provenance: PROVENANCE.textbook,
    checkedAgainst: ['AC-09'],
  }),
];

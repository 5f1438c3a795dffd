import { boutVerdict } from '../response-signs/bout-verdict.ts';
import { dayMarks } from '../response-signs/day-marks.ts';
import { morningSigns } from '../response-signs/morning-signs.ts';
import { ownBaseline } from '../response-signs/own-baseline.ts';
import { standardBouts } from '../response-signs/standard-bouts.ts';
import { variabilityBand } from '../response-signs/variability-band.ts';
import { variabilityHalfWidth } from '../response-signs/variability-half-width.ts';
import { define, fields, input, options } from './define.ts';
import type { Method } from './method.ts';
import { PROVENANCE } from './method.ts';

const own = { source: 'own convention', provenance: PROVENANCE.own, checkedAgainst: [] };
const form = { provenance: PROVENANCE.form, checkedAgainst: [] };
const roete = 'Roete AJ et al. 2021, Int J Sports Physiol Perform 16(8):1065–1073';
const plews = 'Plews DJ et al. 2013, Sports Med 43(9):773–781';
const mornings = (unit: string) =>
  fields('days', `day number, ${unit}, true or false`, 'rows', {
    ...{ day: 'number', value: 'number', inBaseline: 'flag', judged: 'flag' },
  });
/** One row a bout. */
export const bouts = fields('bouts', 'day number, bpm, CR-10', 'rows', {
  ...{ day: 'number', id: 'any', key: 'any', heartRateBpm: 'number', rating: 'number' },
  ...{ heartRateTypicalError: 'number', ratingTypicalError: 'number', inBaseline: 'flag', judged: 'flag' },
});
const days = ['from', 'to'].map((name) => input(name, 'day number'));
const heartAndEffort = { heartRateBpm: 'number', rating: 'number' } as const;

export const responseSignMethods: readonly Method[] = [
  define({
    ...{ file: 'response-signs/day-marks.ts', fn: dayMarks, name: 'Which days are usual, judged or explained', ...own },
    inputs: [
      fields('days', 'true or false', 'rows', {
        ...{ ill: 'flag', returning: 'flag', away: 'flag', suspect: 'flag', disputed: 'flag' },
      }),
    ],
    unit: 'true or false',
  }),
  define({
    ...{ file: 'response-signs/own-baseline.ts', fn: ownBaseline, name: 'Own baseline of stable days', ...own },
    inputs: [mornings('any unit'), input('index', 'place from 0')],
    unit: 'unit of the values',
  }),
  define({
    ...{ file: 'response-signs/morning-signs.ts', fn: morningSigns, name: 'Mornings above the own usual', ...own },
    inputs: [mornings('points'), options('SD and points', 'spreads', 'leastSpread')],
    unit: 'points; state by day',
  }),
  define({
    ...{ file: 'response-signs/variability-half-width.ts', fn: variabilityHalfWidth, ...form, source: plews },
    name: 'Half-width of the own band of ln RMSSD',
    inputs: [input('sd', 'ln ms'), input('validDays', 'days')],
    unit: 'ln ms',
  }),
  define({
    ...{ file: 'response-signs/variability-band.ts', fn: variabilityBand, ...form, source: plews },
    name: 'Weeks of ln RMSSD outside the own band',
    inputs: [mornings('ln ms')],
    unit: 'ln ms; state by day',
  }),
  define({
    ...{ file: 'response-signs/bout-verdict.ts', fn: boutVerdict, ...form, source: roete },
    name: 'Heart rate and rating of a standard bout together',
    inputs: [
      fields('bout', 'bpm, CR-10', 'record', {
        ...{ ...heartAndEffort, heartRateTypicalError: 'number', ratingTypicalError: 'number' },
      }),
      fields('expected', 'bpm, CR-10', 'record', heartAndEffort),
    ],
    unit: 'name of a verdict',
  }),
  define({
    ...{ file: 'response-signs/standard-bouts.ts', fn: standardBouts, name: 'Standard bouts', ...form, source: roete },
    inputs: [bouts, ...days],
    unit: 'bpm, points; state by day',
  }),
];

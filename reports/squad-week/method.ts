import type { LoadPolicySettings } from '../../src/features/policies/policies.types.ts';
import { FORM_WORDS, MEASURE_WORDS, longDate } from './squad-week.view.ts';
import type { MethodLine } from './squad-week.view.ts';

const OWN = 'own convention';
const COMMON = 'common practice, no source';

/** The sheet Method: the policy in force and how every figure is made. */
export function methodLines(policy: { validFrom: string; settings: LoadPolicySettings }): MethodLine[] {
  const { settings } = policy;
  const { weights, ratio, monotony, bound } = settings;
  const line = (topic: string, text: string, source: string): MethodLine => ({ topic, text, source });
  return [
    line(
      'Policy',
      `In force from ${policy.validFrom <= '2000-01-01' ? 'the beginning' : longDate(policy.validFrom)}. Primary measure ${MEASURE_WORDS[settings.primaryMeasure]}; weights ${weights.moderate}, ${weights.heavy}, ${weights.severe}, ${weights.extreme}; ratio ${FORM_WORDS[ratio.form]}, upper limit ${ratio.upper}; monotony with the ${monotony.sd} standard deviation, limit ${monotony.upper}; low chronic load below ${Math.round(100 * settings.chronicLowShare)} % of the own median; thresholds up to ${settings.thresholdMaxAgeWeeks} weeks old.`,
      "the squad's policy",
    ),
    line(
      'Domain load',
      'Minutes in the moderate, heavy, severe and extreme domain times the weights of the policy, added up. It stands on measured power, on intervals entered by hand with power or an allowed speed, or on heart rate (three domains, bouts of 3 minutes and more); a rating alone gives no minutes in domain. A session of which more than 10 % of the minutes cannot be placed has no domain load, and its day is a lower bound. Strength and games have none by nature.',
      `weights 1, 2, 3, 3: ${settings.weightsSource} (Lucía A et al. 2003, Med Sci Sports Exerc 35(5):872–878); 10 %: ${OWN}; 3 minutes: ${COMMON}`,
    ),
    line(
      'Heavy/severe bound',
      `${bound.quantity === 'critical' ? 'Critical power or critical speed where there is one' : 'The second lactate threshold'}, else the second threshold${bound.fallbackLt2Method === null ? '' : ` of the method ${bound.fallbackLt2Method}`}; one bound per squad and kind of exercise, whichever test is newer. Thresholds count from the day of the test on; a value entered late or corrected weighs anew the sessions it touches.`,
      "the squad's policy",
    ),
    line(
      'Rating load',
      "The athlete's own rating of the whole session (0 to 10) times its minutes from warm-up to cool-down. What staff meant the session to be is kept apart and is never load.",
      'Foster C et al. 2001, J Strength Cond Res 15(1):109–115',
    ),
    line(
      'Primary measure',
      'Drives ratio, monotony, strain, long and short load. Domain load, or rating load where in the 28 days up to the last Sunday fewer than 24 days of domain load are known or less than 80 % of the minutes (strength and games left out) have minutes in domain. Decided each Monday, then used for the whole window.',
      OWN,
    ),
    line(
      'Missing days',
      'A day without an entry is not a day of rest. A day counts as known when staff have closed it; a day of which a part is missing counts as unknown and its sum is shown as a lower bound (≥). No training for lack of availability is a known 0; merely away is unknown. Means are sums over known days divided by known days: 6 of 7 and 24 of 28 (18 of 21) are needed; monotony and strain need 7 of 7.',
      OWN,
    ),
    line(
      'Acute:chronic ratio',
      `Form: ${FORM_WORDS[ratio.form]}. Raised above ${ratio.upper} and above the own 95th percentile of the last 26 weeks (from 8 weeks of log on); no lower limit. Withheld when too few days are known, on return after time out, without load, or when the minutes of the two windows were counted in ways that differ by more than 25 points.`,
      `limit 1.5 for the coupled form: Gabbett TJ 2016, Br J Sports Med 50:273–280 (quoted from another text); its use is disputed: Impellizzeri FM et al. 2021, Sports Med 51:581–592; percentile, floors and 25 points: ${OWN}`,
    ),
    line(
      'Monotony and strain',
      `Mean of seven days divided by their ${monotony.sd} standard deviation; strain is the week's load times monotony. Judged on Sundays: monotony above ${monotony.upper} counts only with more strain than in each of the six seven-day blocks before.`,
      `Foster C 1998, Med Sci Sports Exerc 30(7):1164–1168; which standard deviation the paper means is not settled; limit 2: ${COMMON}; blocks: ${OWN}`,
    ),
    line(
      'Long and short load',
      'Two fading sums with nominal time constants of 45 and 15 days, read on the morning after the last closed day and shown in % of the own median of 26 weeks (from 8 weeks of log on). Not fitness and not fatigue: nothing has been fitted to this athlete. They start in equilibrium with the first 28 days if 24 of these are known. An unknown day is filled three ways: the own median of that weekday (the value), rest and the own 90th percentile (the bounds, shown when they differ by more than 5 %).',
      `time constants: Morton RH, Fitz-Clarke JR, Banister EW 1990, J Appl Physiol 69(3):1171–1177 (value from memory); the rest: ${OWN}`,
    ),
    line(
      "Week's load in % of own usual",
      'Against the median of the own earlier full weeks (7 of 7 days known), at most 26, from 4 on. With 6 of 7 days known it is a lower bound ("at least").',
      OWN,
    ),
    line(
      'Single long run',
      'A run more than 10 % longer than the longest of the 30 days before; competitions are left out.',
      'Frandsen JSB et al. 2025, Br J Sports Med 59(17):1203–1210',
    ),
    line(
      'Flags',
      'Ratio, low chronic load, monotony with strain and a single long run are views of one series: together they are one piece of evidence, the strongest is named, and load alone never makes more than a note. Raised at the limit, cleared inside 95 % of it on three days in a row. Planned overload silences load concern only; return silences it until chronic load is back at 80 % of before. "Needs a talk" counts load concerns and everything above note.',
      OWN,
    ),
    line(
      'Log gap, old test, doubtful reading',
      `Fewer than 6 of the last 7 days known (cleared after three days with 6 or 7); a kind of exercise trained in the last 28 days whose newest first threshold or heavy/severe bound in use is more than ${settings.thresholdMaxAgeWeeks} weeks old; a session kept with the mark suspect, for 14 days.`,
      `age of thresholds: ${COMMON}; the rest: ${OWN}`,
    ),
    line(
      'Where the numbers come from',
      'Sessions, ratings and thresholds as entered by athletes and staff, each kept with who entered it, with what it was counted from and with the thresholds used; loads are stored with the session, everything that looks over several days is computed when the report is made. A report that was made is never changed: a correction makes a new version that says what differs.',
      'this service',
    ),
  ];
}

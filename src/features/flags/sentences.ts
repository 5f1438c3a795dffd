import { dayNumber } from '../../core/series/day.ts';
import type { FlagEpisode, FlagEvidence, FlagWords, LoadPart } from './flags.types.ts';

/** Said of an open or past flag that a correction of the log has taken the ground from. */
export const NO_LONGER_SUPPORTED =
  'Taken back: after a correction, or by the policy or measure in force now, the log no longer shows it.';

/** What the week is compared with, by the form of the ratio. */
const BASES: Readonly<Record<string, string>> = {
  'rolling-uncoupled': 'the three weeks before it',
  exponential: 'the slower mean of the last weeks',
};

const MONTHS = ['Jan', 'Feb', 'Mar', 'Apr', 'May', 'Jun', 'Jul', 'Aug', 'Sep', 'Oct', 'Nov', 'Dec'];

/**
 * A flag in the words of a training hall: one claim, one comparison with the athlete's own earlier days, one question.
 * No health words, no forecast; figures as they stood on the last day of the flag.
 */
export function flagWords(episode: FlagEpisode): FlagWords {
  const { claim, ask, clears } = words(episode.evidence, episode);
  return { claim, ask, clears, sentence: `${claim}; ${ask}.` };
}

function words(evidence: FlagEvidence, episode: FlagEpisode): Omit<FlagWords, 'sentence'> {
  switch (evidence.kind) {
    case 'load-concern':
      return loadWords(evidence, episode);
    case 'return':
      return {
        claim:
          evidence.share === null
            ? `Day ${evidence.dayN} of return, load of before not known`
            : `Day ${evidence.dayN} of return, load at ${Math.round(evidence.share)} % of before`,
        ask: 'ask whether the next step up feels right',
        clears: 'Ends when the four-week load is back at 80 % of before.',
      };
    case 'recovering':
      return {
        claim: `Recovering after planned overload, day ${evidence.dayN} of ${evidence.of}`,
        ask: 'ask whether easy sessions feel easy again',
        clears: `Ends after day ${evidence.of}.`,
      };
    case 'planned-overload': {
      const times = evidence.ratio === null ? '' : `, this week at ${times2(evidence.ratio)} times the own four weeks`;
      return {
        claim: `Within planned overload, day ${evidence.dayN} of ${evidence.of}${times}`,
        ask: 'ask whether it feels as hard as intended',
        clears: `Ends after day ${evidence.of}.`,
      };
    }
    case 'log-gap':
      return {
        claim: `Only ${evidence.known} of the last ${evidence.of} days are in the log, too few to compare with the own usual week`,
        ask: 'ask what was done on the missing days',
        clears: 'Clears when 6 of 7 days are known on three days in a row.',
      };
    case 'data-suspect': {
      const many = evidence.sessions > 1;
      return {
        claim: `${evidence.sessions} logged ${many ? 'sessions carry readings that do' : 'session carries a reading that does'} not fit the own known values, last on ${date(evidence.lastSeen)}`,
        ask: many ? 'ask whether the readings are right' : 'ask whether the reading is right',
        clears: 'Clears when the session is corrected, or after 14 days without another.',
      };
    }
    case 'thresholds-out-of-date':
      return {
        claim: `${capital(evidence.modality)} is still weighed with the test of ${date(evidence.newest)}, ${Math.floor(evidence.ageDays / 7)} weeks ago (at most ${evidence.limitDays / 7} are meant)`,
        ask: 'ask when the next test is',
        clears: 'Clears with the first session weighed by a newer test.',
      };
  }
}

function loadWords(
  evidence: Extract<FlagEvidence, { kind: 'load-concern' }>,
  episode: FlagEpisode,
): Omit<FlagWords, 'sentence'> {
  const part = evidence.parts.find(({ measure }) => measure === evidence.strongest)!;
  const weeks = Math.floor((dayNumber(evidence.day) - dayNumber(episode.since)) / 7) + 1;
  const spell = weeks > 1 ? `${ordinal(weeks)} week: ` : '';
  const { claim, ask, clears } = byMeasure(part, evidence.form, evidence.ratioLimit);
  return { claim: capital(`${spell}${spell === '' ? claim : uncapital(claim)}`), ask, clears };
}

function byMeasure(part: LoadPart, form: string, ratioLimit: number): Omit<FlagWords, 'sentence'> {
  switch (part.measure) {
    case 'ratio': {
      const limit = times2(part.limit);
      const above =
        part.shortHistory === true
          ? `the general limit of ${limit} (short history)`
          : part.limit > ratioLimit
            ? `the own upper end of ${limit}`
            : `${limit} and above the own upper end`;
      const base = BASES[form] ?? 'the last four weeks';
      return {
        claim: `This week's daily load is ${times2(part.value)} times that of ${base}, above ${above}`,
        ask: 'ask whether the jump was meant and how the sessions feel',
        clears: `Clears at ${times2(0.95 * part.limit)} or less on three days in a row.`,
      };
    }
    case 'chronic-low': {
      const usual = part.usual ?? NaN;
      return {
        claim: `Four-week load has dropped to ${percentOf(part.value, usual)} % of the own usual and no easy block is planned`,
        ask: 'ask what gets in the way of training',
        clears: `Clears when it is back at ${percentOf(part.limit / 0.95, usual)} % of the own usual on three days in a row.`,
      };
    }
    case 'monotony-strain':
      return {
        claim: `A heavy week of much the same every day (monotony ${times1(part.value)}), with more strain than any of the six known weeks before`,
        ask: 'ask which day could be made really easy',
        clears: 'Judged again on Sunday.',
      };
    case 'spike':
      return {
        claim: `A run ${Math.round(part.value)} % longer than the longest of the 30 days before it`,
        ask: 'ask whether it was planned and how the legs took it',
        clears: 'Clears seven days after the run.',
      };
  }
}

const times2 = (value: number): string => value.toFixed(2);
const times1 = (value: number): string => value.toFixed(1);
const percentOf = (value: number, whole: number): number => Math.round((100 * value) / whole);
const capital = (text: string): string => text.charAt(0).toUpperCase() + text.slice(1);
const uncapital = (text: string): string => text.charAt(0).toLowerCase() + text.slice(1);

function date(day: string): string {
  return `${Number(day.slice(8))} ${MONTHS[Number(day.slice(5, 7)) - 1]}`;
}

function ordinal(n: number): string {
  const words = ['First', 'Second', 'Third', 'Fourth', 'Fifth', 'Sixth', 'Seventh', 'Eighth'];
  return words[n - 1] ?? `${n}th`;
}

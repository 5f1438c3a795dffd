/** What is on record of a day, apart from its values. */
export interface DayRecord {
  readonly ill: boolean;
  /** Between return and the day load is back. */
  readonly returning: boolean;
  /** Travel, heat or altitude. */
  readonly away: boolean;
  readonly suspect: boolean;
  readonly disputed: boolean;
}

/** What may be done with the values of a day. */
export interface DayMarks {
  readonly inBaseline: boolean;
  readonly judged: boolean;
  /** Something is on record that explains how the athlete responds. */
  readonly explained: boolean;
}

const AFTER_ILLNESS_DAYS = 7;

/**
 * Which days may enter a baseline, which may be judged, and which are explained.
 *
 * A morning with fever tells nothing of training; nor is it what is usual.
 *
 * @param days records in order without gaps, one a day [true or false each]
 * @returns per day: inBaseline, judged, explained [true or false each]; same length
 * @remarks Equation: explained = ill, one of the 7 days after, returning, or away; judged = neither explained nor suspect;
 * inBaseline = judged and not disputed. A disputed value is still judged: an objection takes it out of baselines and silences nothing.
 * Limits: an illness nobody entered explains nothing.
 * @see own convention
 * @example
 * dayMarks([{ ill: true, returning: false, away: false, suspect: false, disputed: false }]); // => [{ inBaseline: false, judged: false, explained: true }]
 */
export function dayMarks(days: readonly DayRecord[]): DayMarks[] {
  let sinceIllness = Infinity;
  return days.map(({ ill, returning, away, suspect, disputed }) => {
    sinceIllness = ill ? 0 : sinceIllness + 1;
    const explained = sinceIllness <= AFTER_ILLNESS_DAYS || returning || away;
    const judged = !explained && !suspect;
    return { inBaseline: judged && !disputed, judged, explained };
  });
}

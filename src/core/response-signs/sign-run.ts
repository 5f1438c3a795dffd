import type { FamilyDay, SignPoint } from './types.ts';

const LAST_MEASURED = 7;
const WITHIN_DAYS = 14;
const RAISED_FROM = 3;
const OPEN_FROM = 2;

/** The last measured days of a family, and whether it stands. */
export interface SignRun {
  /** Days judged, with their sign if they were one. */
  readonly recent: readonly { readonly day: number; readonly sign: SignPoint | null }[];
  readonly state: Omit<FamilyDay, 'day'>;
}

export const NO_RUN: SignRun = {
  recent: [],
  state: { raised: false, open: false, since: null, firstSign: null, measured: 0, signs: [] },
};

/**
 * One day further: `today` is the sign, null for a judged day without one, undefined where nothing was judged.
 * Raised by signs on 3 of the own last 7 measured days within 14 days, open until fewer than 2 are left: own convention.
 */
export function nextRun(run: SignRun, day: number, today: SignPoint | null | undefined): SignRun {
  const all = today === undefined ? run.recent : [...run.recent, { day, sign: today }];
  const recent = all.slice(-LAST_MEASURED).filter((one) => one.day > day - WITHIN_DAYS);
  const signs = recent.flatMap(({ sign }) => sign ?? []);
  const raised = signs.length >= RAISED_FROM;
  const open = raised || (run.state.open && signs.length >= OPEN_FROM);
  const since = open ? (run.state.since ?? day) : null;
  const firstSign = open ? (run.state.firstSign ?? signs[0]!.day) : null;
  return { recent, state: { raised, open, since, firstSign, measured: recent.length, signs } };
}

/** True while a sign is among the days that count; what it is measured by stays as it was. */
export function hasSigns(run: SignRun): boolean {
  return run.state.signs.length > 0;
}

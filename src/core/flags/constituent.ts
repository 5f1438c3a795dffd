import type { LoadEvidence } from '../types.ts';

/** One measure's stretch of days; evidence as of its last open day with a value, strength to compare measures with. */
export interface Constituent {
  readonly since: number;
  readonly until: number | null;
  readonly strength: number;
  readonly evidence: Omit<LoadEvidence, 'since' | 'until'>;
}

/**
 * What one day says to a measure. 'silent': no value, so it neither raises, clears nor resets. 'absent': no training
 * because unavailable; it ends an open stretch only when it lasts.
 */
export type Verdict =
  | { readonly kind: 'muted' }
  | { readonly kind: 'silent' }
  | { readonly kind: 'absent' }
  | {
      readonly kind: 'judged';
      readonly raised: boolean;
      readonly inside: boolean;
      readonly strength: number;
      readonly evidence: Omit<LoadEvidence, 'since' | 'until'>;
    };

/** So many unavailable days in a row end a concern: own convention, the days it takes to clear. */
const ABSENT_DAYS = 3;

/**
 * Folds the days' verdicts into stretches: open when raised, closed after enough judged days inside in a row, at once when muted, or on the third absent day in a row.
 * Each day sees only itself and the state before it.
 */
export function stretches(
  days: readonly { readonly day: number }[],
  verdict: (index: number) => Verdict,
  clearAfter: number,
): Constituent[] {
  const done: Constituent[] = [];
  let open: Constituent | null = null;
  let inside = 0;
  let absent = 0;
  days.forEach(({ day }, index) => {
    const today = verdict(index);
    absent = today.kind === 'absent' ? absent + 1 : 0;
    if (today.kind === 'silent' || (today.kind === 'absent' && absent < ABSENT_DAYS)) return;
    if (today.kind === 'muted' || today.kind === 'absent') {
      if (open !== null) done.push({ ...open, until: day });
      open = null;
      return;
    }
    const { strength, evidence } = today;
    if (open === null) {
      if (today.raised) open = { since: day, until: null, strength, evidence };
      inside = 0;
      return;
    }
    inside = today.inside ? inside + 1 : 0;
    if (inside >= clearAfter) {
      done.push({ ...open, until: day });
      open = null;
    } else {
      open = { ...open, strength, evidence };
    }
  });
  return open === null ? done : [...done, open];
}

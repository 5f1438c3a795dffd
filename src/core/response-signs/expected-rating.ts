import { within } from '../guard.ts';
import { forward } from '../numeric/cholesky.ts';
import type { RatingRelation } from './rating-relation.ts';
import type { SessionWork } from './session-work.ts';
import { columnsOf } from './session-work.ts';

const [LOWEST, HIGHEST] = [0, 10];
/** A minute more or less of what never varied by itself is let pass. */
const SLACK_HOURS = 1 / 60;
const FURTHEST = 1;

/**
 * The rating this athlete is expected to give to a session, done or planned.
 *
 * @param relation how the athlete rates what kind of session, see the rating relation
 * @param session modality, length [min] and minutes in domain [min]
 * @returns rating [CR-10, 0 to 10] and spread, the SD of a single rating about it [points]; both NaN for a modality or mixture the relation
 *   has not seen, or minutes that are not known
 * @throws NumericInputError on negative or infinite minutes
 * @remarks Equation: x·coefficients, held within 0 to 10; spread = SD·√(1 + h), h = x·(X′WX)⁻¹·x′. No answer if h > 1: further off than the
 * log reaches; nor if a column that never varied by itself departs from the others by more than a minute.
 * Limits: a competition is rated differently from a session of the same minutes.
 * @see textbook prediction of a linear regression; the limits of h and a minute: own convention
 * @example
 * expectedRating({ status: 'converged', from: 0, to: 55, pairs: 25, modalities: ['row'], coefficients: [2, 1.5, 0, 0], sd: 0.6, factor: { kept: [0, 1], lower: [[5], [5, 2]] }, dependent: [] }, { modality: 'row', totalMin: 60, minutes: { moderate: 60, heavy: 0, severe: 0, extreme: 0 } }).rating; // => 3.5
 */
export function expectedRating(relation: RatingRelation, session: SessionWork): { rating: number; spread: number } {
  const { modality, totalMin, minutes } = session;
  for (const [name, value] of Object.entries({ totalMin, ...minutes })) {
    if (!Number.isNaN(value)) within('expectedRating', name, value, 0, Infinity, 'min');
  }
  const none = { rating: NaN, spread: NaN };
  const { modalities, coefficients, sd, factor, dependent } = relation;
  if (!modalities.includes(modality)) return none;
  const x = columnsOf(session, modalities);
  const kept = factor.kept.map((column) => x[column]!);
  const unseen = dependent.some(({ column, on }) => {
    const usual = on.reduce((sum, weight, k) => sum + weight * kept[k]!, 0);
    return !(Math.abs(x[column]! - usual) <= SLACK_HOURS);
  });
  const leverage = forward(factor, kept).reduce((sum, one) => sum + one * one, 0);
  if (unseen || !(leverage <= FURTHEST)) return none;
  const rating = x.reduce((sum, value, column) => sum + value * coefficients[column]!, 0);
  return { rating: Math.min(HIGHEST, Math.max(LOWEST, rating)), spread: sd * Math.sqrt(1 + leverage) };
}

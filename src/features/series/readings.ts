import { BASIS_MIX_LIMIT } from '../../core/flags/basis-mix-shift.ts';
import type { Banded } from '../../core/types.ts';
import type { ComponentReading, RatioForm, RatioReading } from './series.types.ts';

// The words that stand in place of a withheld figure. A figure is null exactly where one of these gives a reason.

const COMPONENT_MIN_DAYS = 56;
/** Known days needed in each window (own convention); the exponential form keeps the floors of the rolling ones. */
export const FLOORS = { acute: 6, chronic: 24, chronicUncoupled: 18 } as const;

/** JSON has no NaN: a number that is not finite is null. */
export function finite(value: number): number | null {
  return Number.isFinite(value) ? value : null;
}

/** Why a mean over a window is withheld. `fullFrom`: days of log from which the window is whole. */
export function windowWithheld(
  known: number,
  of: number,
  floor: number,
  logDays: number,
  fullFrom: number = of,
): string | null {
  if (known < floor) return `${known} of ${of} days known`;
  return logDays < fullFrom ? `${logDays} of ${fullFrom} days in` : null;
}

/** Why a ratio is withheld, the most telling reason first. */
export function ratioWithheld(
  form: RatioForm,
  known: RatioReading['knownDays'],
  logDays: number,
  chronic: number,
  returnDay: number | null,
  basisShift: number,
): string | null {
  const floor = form === 'rolling-uncoupled' ? FLOORS.chronicUncoupled : FLOORS.chronic;
  const thin =
    windowWithheld(known.acute, known.acuteOf, FLOORS.acute, logDays) ??
    windowWithheld(known.chronic, known.chronicOf, floor, logDays, 28);
  if (thin !== null) return thin;
  if (returnDay !== null) return `day ${returnDay} of return`;
  if (!(chronic > 0)) return `no load in ${known.chronicOf} days`;
  if (basisShift > BASIS_MIX_LIMIT) {
    return `minutes counted another way (${Math.round(basisShift)} points)`;
  }
  return null;
}

/** Why monotony and strain of a week are withheld. */
export function monotonyWithheld(week: readonly number[], monotony: number): string | null {
  const known = week.filter((value) => !Number.isNaN(value)).length;
  if (known < 7) return `${known} of 7 days known`;
  if (Number.isFinite(monotony)) return null;
  return week.every((value) => value === 0) ? 'seven days of rest' : 'all seven days alike';
}

/** A component with its bounds; the share needs eight weeks of log. */
export function componentReading(
  units: Banded | undefined,
  share: Banded | undefined,
  logDays: number,
): ComponentReading {
  if (units === undefined || share === undefined) {
    const none = { units: null, low: null, high: null, share: null, shareLow: null, shareHigh: null };
    return { ...none, withheld: 'first day of the log' };
  }
  const reading = {
    units: finite(units.value),
    low: finite(units.low),
    high: finite(units.high),
    share: finite(share.value),
    shareLow: finite(share.low),
    shareHigh: finite(share.high),
  };
  if (reading.share !== null) return reading;
  const withheld = logDays < COMPONENT_MIN_DAYS ? `${logDays} of ${COMPONENT_MIN_DAYS} days in` : 'own median is 0';
  return { ...reading, withheld };
}

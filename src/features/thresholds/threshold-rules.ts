import { dayNumber } from '../../core/series/day.ts';
import { ConflictError, RuleError, ValidationError } from '../../platform/errors.ts';
import type { FieldError } from '../../platform/errors.ts';
import { orderConflict } from './check-order.ts';
import { sameDayPair } from './date-values.ts';
import { errorAllowed, isInRange, rangeOf } from './thresholds.schema.ts';
import type { ThresholdEntry } from './thresholds.schema.ts';
import { quantityRanges } from './thresholds.types.ts';
import type { Quantity, ThresholdValue } from './thresholds.types.ts';

/** A test that has not taken place yet has no result. */
export function refuseFutureDays(values: readonly { validFrom: string }[], today: string): void {
  const fields = values.flatMap(({ validFrom }, index): FieldError[] =>
    validFrom > today
      ? [{ field: `values[${index}].validFrom`, value: validFrom, allowed: `a date up to today, ${today}` }]
      : [],
  );
  if (fields.length > 0) throw new RuleError('A value cannot be valid from a day in the future.', fields);
}

/** A body mass this far from the nearest earlier one, not older than that, is asked about first: own convention. */
const LARGEST_MASS_STEP = 0.1;
const MASS_LOOK_BACK_DAYS = 60;

/** A body mass far from the one before is more often another athlete's, or pounds: it has to be confirmed. */
export function refuseMassJump(
  values: readonly Pick<ThresholdEntry, 'quantity' | 'value' | 'validFrom' | 'confirmed'>[],
  before: readonly ThresholdValue[],
): void {
  const masses = before.filter(({ quantity, withdrawnAt }) => quantity === 'body-mass' && withdrawnAt === null);
  const fields = values.flatMap(({ quantity, value, validFrom, confirmed }, index): FieldError[] => {
    if (quantity !== 'body-mass' || confirmed === true) return [];
    const last = masses
      .filter((mass) => {
        const age = dayNumber(validFrom) - dayNumber(mass.validFrom);
        return age > 0 && age <= MASS_LOOK_BACK_DAYS;
      })
      .reduce<ThresholdValue | null>((a, b) => (a === null || b.validFrom > a.validFrom ? b : a), null);
    if (last === null || Math.abs(value - last.value) <= LARGEST_MASS_STEP * last.value) return [];
    const [low, high] = [1 - LARGEST_MASS_STEP, 1 + LARGEST_MASS_STEP].map((part) => (part * last.value).toFixed(1));
    const allowed = `${low} to ${high} kg, within 10 % of ${last.value} kg of ${last.validFrom}`;
    return [{ field: `values[${index}].value`, value, allowed, hint: 'If it is right, send it with confirmed: true.' }];
  });
  if (fields.length > 0) throw new RuleError('This body mass is far from the one before.', fields);
}

/** A correction meets the range of its value's quantity. */
export function refuseMisfit(
  quantity: Quantity,
  { value, standardError }: { value: number; standardError?: number | undefined },
): void {
  const fields: FieldError[] = [];
  if (!isInRange(quantity, value)) fields.push({ field: 'value', value, allowed: rangeOf(quantity) });
  if (standardError !== undefined && standardError >= value) {
    fields.push({ field: 'standardError', value: standardError, allowed: errorAllowed });
  }
  if (fields.length > 0) throw new ValidationError(fields);
}

/** One value of one series a day; the second one is a correction. */
export function refuseSameDay(values: readonly ThresholdValue[], before: readonly ThresholdValue[]): void {
  const pair = sameDayPair(values);
  if (pair === undefined) return;
  const [, second] = pair;
  const field = fieldOf(second, values, before, 'validFrom');
  const allowed = `one ${second.quantity} of a modality and setting a day; correct the one that is there`;
  throw new ConflictError(`There is a ${second.quantity} from ${second.validFrom} already.`, {
    fields: [{ field, value: second.validFrom, allowed }],
  });
}

/** LT1 below LT2 and below critical power or speed, heart rates in their order, on every day on which the set changes. */
export function refuseDisorder(values: readonly ThresholdValue[], before: readonly ThresholdValue[]): void {
  const conflict = orderConflict(values);
  if (conflict === undefined) return;
  const { day, modality, setting, lower, higher, relation } = conflict;
  const known = new Set(before.map(({ id }) => id));
  const at = known.has(lower.id) ? higher : lower;
  const other = at === lower ? higher : lower;
  const side = at === lower ? relation : relation === 'below' ? 'above' : 'at least';
  throw new RuleError(
    `On ${day} the set in force for ${modality} (${setting}) would hold ${shown(lower)} and ${shown(higher)}: ` +
      `${lower.quantity} has to be ${relation} ${higher.quantity}.`,
    [
      {
        field: fieldOf(at, values, before, 'value'),
        value: at.value,
        allowed: `${side} ${shown(other)} in force on ${day}`,
      },
    ],
  );
}

function shown({ quantity, value, validFrom }: ThresholdValue): string {
  return `${quantity} ${value} ${quantityRanges[quantity].unit} from ${validFrom}`;
}

/** The place of a value in the request: entered ones stand in order behind those that were there. */
function fieldOf(
  value: ThresholdValue,
  values: readonly ThresholdValue[],
  before: readonly ThresholdValue[],
  name: string,
): string {
  const index = values.findIndex(({ id }) => id === value.id) - before.length;
  if (index < 0) return 'valueId';
  return value.supersedes === null ? `values[${index}].${name}` : name;
}

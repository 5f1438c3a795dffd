import { RuleError } from '../../platform/errors.ts';
import type { FieldError } from '../../platform/errors.ts';
import { weightsSource } from './default-settings.ts';
import type { PolicyChange } from './policies.schema.ts';
import type { LoadPolicySettings } from './policies.types.ts';

/**
 * The settings after a change. A limit belongs to the form it was set for: another form or standard deviation without
 * its own limit is refused.
 */
export function mergeSettings(current: LoadPolicySettings, change: PolicyChange): LoadPolicySettings {
  refuseFormWithoutLimit(current, change);
  const weights = change.weights ?? current.weights;
  const { bound, ratio, monotony } = change;
  const byModality = bound?.byModality === undefined ? current.bound.byModality : whole(bound.byModality);
  return {
    primaryMeasure: change.primaryMeasure ?? current.primaryMeasure,
    weights,
    weightsSource: weightsSource(weights),
    bound: {
      quantity: bound?.quantity ?? current.bound.quantity,
      fallbackLt2Method:
        bound?.fallbackLt2Method === undefined ? current.bound.fallbackLt2Method : bound.fallbackLt2Method,
      ...(byModality === undefined ? {} : { byModality }),
    },
    ratio: { form: ratio?.form ?? current.ratio.form, upper: ratio?.upper ?? current.ratio.upper },
    monotony: { sd: monotony?.sd ?? current.monotony.sd, upper: monotony?.upper ?? current.monotony.upper },
    chronicLowShare: change.chronicLowShare ?? current.chronicLowShare,
    thresholdMaxAgeWeeks: change.thresholdMaxAgeWeeks ?? current.thresholdMaxAgeWeeks,
    filterTimeConstantS: change.filterTimeConstantS ?? current.filterTimeConstantS,
  };
}

/** Whether sessions weigh differently under the other settings. */
export function weighsDifferently(a: LoadPolicySettings, b: LoadPolicySettings): boolean {
  const names = ['moderate', 'heavy', 'severe', 'extreme'] as const;
  return names.some((name) => a.weights[name] !== b.weights[name]) || boundKey(a) !== boundKey(b);
}

function boundKey({ bound }: LoadPolicySettings): string {
  const modalities = Object.entries(bound.byModality ?? {}).toSorted(([a], [b]) => a.localeCompare(b));
  return JSON.stringify([
    bound.quantity,
    bound.fallbackLt2Method,
    modalities.map(([name, { quantity, fallbackLt2Method }]) => [name, quantity, fallbackLt2Method]),
  ]);
}

function refuseFormWithoutLimit(current: LoadPolicySettings, { ratio, monotony }: PolicyChange): void {
  const fields: FieldError[] = [];
  if (ratio?.form !== undefined && ratio.form !== current.ratio.form && ratio.upper === undefined) {
    fields.push({
      field: 'settings.ratio.upper',
      allowed: `a limit set for the form ${ratio.form}`,
      hint: `The present limit belongs to the form ${current.ratio.form}.`,
    });
  }
  if (monotony?.sd !== undefined && monotony.sd !== current.monotony.sd && monotony.upper === undefined) {
    fields.push({
      field: 'settings.monotony.upper',
      allowed: `a limit set for the ${monotony.sd} standard deviation`,
      hint: `The present limit belongs to the ${current.monotony.sd} standard deviation.`,
    });
  }
  if (fields.length > 0) throw new RuleError('A limit belongs to the form it was set for.', fields);
}

function whole<T>(record: Partial<Record<string, T>>): Record<string, T> {
  return Object.fromEntries(Object.entries(record).filter((entry): entry is [string, T] => entry[1] !== undefined));
}

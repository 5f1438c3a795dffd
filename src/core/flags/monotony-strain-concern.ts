import type { LoadConcernDay, Muting } from '../types.ts';
import { weekday } from '../series/day.ts';
import type { Constituent } from './constituent.ts';
import { stretches } from './constituent.ts';
import type { LoadConcernSettings } from './load-concern-settings.ts';

const SUNDAY = 7;
const BLOCKS = 6;
const MUTED_BY: readonly (Muting | null)[] = ['planned-overload', 'return'];

/**
 * Stretches in which weeks were even and strained the athlete more than any of the six weeks before.
 *
 * Evenness alone says little; with the largest strain for six weeks it is worth a look.
 *
 * @param days figures by day; monotony [no unit] and strain [load units] of the 7 days that end there, NaN unknown
 * @param settings limits, see there
 * @returns stretches with their evidence; value and limit are those of monotony [no unit], strain and strainLimit [load units] stand beside
 * @remarks Equation: on Sundays, raised when monotony > 2 and strain > the largest of the six latest known Sunday strains before;
 * none before six exist. Cleared on the next judged Sunday with monotony ≤ 0.95·2 or strain ≤ 0.95·that largest.
 * Strength: the smaller of the two quotients value ÷ limit. Limits: which standard deviation is used moves the monotony by 8 %.
 * @see Foster C 1998, Med Sci Sports Exerc 30(7):1164–1168 (own thresholds, chiefly of strain); 2 for monotony: common practice, no source
 * @example
 * monotonyStrainConcern([3, 10, 17, 24, 31, 38, 45].map((day) => ({ day, ratio: 1, chronic: 50, monotony: 2.4, strain: 400 + day, muted: null, spike: null })), loadConcernSettings({})).map((c) => c.since); // => [45]
 */
export function monotonyStrainConcern(days: readonly LoadConcernDay[], settings: LoadConcernSettings): Constituent[] {
  const { monotonyLimit, clearFactor } = settings;
  // For every day the strains of the Sundays before it, newest last.
  const before: number[][] = [];
  let strains: number[] = [];
  for (const { strain, day } of days) {
    before.push(strains);
    if (weekday(day) === SUNDAY && !Number.isNaN(strain)) strains = [...strains, strain].slice(-BLOCKS);
  }
  return stretches(
    days,
    (index) => {
      const { monotony, strain, muted, day } = days[index]!;
      if (muted === 'unavailable') return { kind: 'absent' };
      if (MUTED_BY.includes(muted)) return { kind: 'muted' };
      const earlier = before[index]!;
      const judged = weekday(day) === SUNDAY && !Number.isNaN(monotony) && !Number.isNaN(strain);
      if (!judged || earlier.length < BLOCKS) return { kind: 'silent' };
      const strainLimit = Math.max(...earlier);
      return {
        kind: 'judged',
        raised: monotony > monotonyLimit && strain > strainLimit,
        inside: monotony <= clearFactor * monotonyLimit || strain <= clearFactor * strainLimit,
        strength: Math.min(monotony / monotonyLimit, strainLimit > 0 ? strain / strainLimit : Infinity),
        evidence: { measure: 'monotony-strain', value: monotony, limit: monotonyLimit, strain, strainLimit, day },
      };
    },
    1,
  );
}

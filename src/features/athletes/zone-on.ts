import { localDay } from '../../platform/zoned-time.ts';
import type { Membership, ZonePeriod } from './athletes.types.ts';

type Stay = Pick<Membership, 'from' | 'to'> & { zone: string };

/**
 * The zone an athlete lives in at an instant or on a day: that of a zone period, else of the squad. Outside every
 * membership it is the zone of the nearest one, so that the day can be told and then refused.
 * @returns null without any membership
 */
export function zoneAt(
  periods: readonly Pick<ZonePeriod, 'zone' | 'from' | 'to'>[],
  stays: readonly Stay[],
  at: string | Date,
): string | null {
  const dayIn = (zone: string) => (typeof at === 'string' ? at : localDay(at, zone));
  const covers = ({ zone, from, to }: Stay) => from <= dayIn(zone) && (to === null || dayIn(zone) <= to);
  const covering = periods.find(covers) ?? stays.find(covers);
  if (covering !== undefined) return covering.zone;
  const begun = stays.filter(({ zone, from }) => from <= dayIn(zone));
  return (begun.at(-1) ?? stays[0])?.zone ?? null;
}

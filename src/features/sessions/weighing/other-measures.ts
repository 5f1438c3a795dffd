import { edwardsZoneMinutes, heartRateLoadEdwards } from '../../../core/load/heart-rate-load-edwards.ts';
import { heartRateLoadBanister } from '../../../core/load/heart-rate-load-banister.ts';
import { heartRateLoadThreePhase } from '../../../core/load/heart-rate-load-three-phase.ts';
import { volumeLoad } from '../../../core/load/volume-load.ts';
import type { ResolvedThreshold } from '../../thresholds/thresholds.types.ts';
import type { DomainResult, IntervalLine, OtherMeasure, WeighContext } from '../sessions.types.ts';
import { intensitiesOf, intervalBouts } from './interval-bouts.ts';
import { MAX_UNASSIGNED_SHARE } from './weigh-domain.ts';
import type { Weighable } from './weigh-domain.ts';

interface Counted {
  measure: OtherMeasure;
  used: ResolvedThreshold[];
}

/** Every other measure the session offers something for; what is missing for one is said in its place. */
export function otherMeasures(
  session: Weighable,
  domain: DomainResult,
  context: WeighContext,
): { measures: OtherMeasure[]; used: ResolvedThreshold[] } {
  const counted = [
    banisterOfMean(session, context),
    edwards(session, context),
    threePhase(domain),
    strengthVolume(session),
  ].filter((each) => each !== null);
  return { measures: counted.map(({ measure }) => measure), used: counted.flatMap(({ used }) => used) };
}

const MINUTES_OF_A_DAY = 1440;

function banisterOfMean(session: Weighable, { thresholds, sex }: WeighContext): Counted | null {
  const heartRateBpm = session.meanHeartRateBpm;
  if (heartRateBpm === null) return null;
  const made = measure('banister-of-mean', 'heart-rate-load-banister');
  const max = thresholds.get('max-heart-rate');
  const resting = thresholds.get('resting-heart-rate');
  if (sex === null) return made.without('the sex is not entered');
  if (max === undefined) return made.without('no value in force for max-heart-rate');
  if (resting === undefined) return made.without('no value in force for resting-heart-rate');
  const used = [max, resting];
  if (heartRateBpm > max.value) return made.without('the mean heart rate is above the stored maximum', used);
  if (heartRateBpm < resting.value) return made.without('the mean heart rate is below the stored resting value', used);
  const { durationMin } = session;
  const load = heartRateLoadBanister({ durationMin, heartRateBpm, restingBpm: resting.value, maxBpm: max.value, sex });
  return made.with(load, used);
}

function edwards({ content, durationMin }: Weighable, { thresholds }: WeighContext): Counted | null {
  if (content.kind !== 'intervals' || !intensitiesOf(content.lines).includes('heart-rate')) return null;
  const made = measure('edwards', 'heart-rate-load-edwards');
  const max = thresholds.get('max-heart-rate');
  if (max === undefined) return made.without('no value in force for max-heart-rate');
  const bouts = heartRateBouts(content.lines);
  if (bouts.some(({ heartRateBpm }) => heartRateBpm > max.value)) {
    return made.without('a heart rate is above the stored maximum', [max]);
  }
  const covered = bouts.reduce((sum, bout) => sum + bout.durationMin, 0);
  if (durationMin - covered > MAX_UNASSIGNED_SHARE * durationMin + 1e-9) {
    return made.without('more than 10 % of the minutes have no heart rate', [max]);
  }
  if (covered > MINUTES_OF_A_DAY) return made.without('more minutes than a day has', [max]);
  return made.with(heartRateLoadEdwards(edwardsZoneMinutes(bouts, max.value)), [max]);
}

function heartRateBouts(lines: readonly IntervalLine[]) {
  const { bouts } = intervalBouts(lines, 'heart-rate');
  return bouts.map(({ durationMin, intensity }) => ({ durationMin, heartRateBpm: intensity }));
}

function threePhase(domain: DomainResult): Counted | null {
  if (domain.state !== 'present') return null;
  const { moderate, heavy, severe, extreme } = domain.minutes;
  const load = heartRateLoadThreePhase([moderate, heavy, severe + extreme]);
  return measure('three-phase', 'heart-rate-load-three-phase').with(load, []);
}

function strengthVolume({ content }: Weighable): Counted | null {
  if (content.kind !== 'strength') return null;
  return measure('volume-load', 'volume-load').with(volumeLoad(content.sets), []);
}

function measure(name: OtherMeasure['measure'], method: string) {
  const made = { measure: name, method, version: '1' };
  return {
    with: (value: number, used: ResolvedThreshold[]): Counted => ({ measure: { ...made, value, reason: null }, used }),
    without: (reason: string, used: ResolvedThreshold[] = []): Counted => ({
      measure: { ...made, value: null, reason },
      used,
    }),
  };
}

import type { IntervalLine } from '../sessions.types.ts';

export type Intensity = 'power' | 'speed' | 'heart-rate';

export interface Bout {
  durationMin: number;
  intensity: number;
}

/** The lines of a session counted in one kind of intensity. */
export interface IntervalBouts {
  bouts: Bout[];
  /** Recoveries without any intensity: rest. */
  restMin: number;
  /** Work and recoveries whose intensity is of another kind. */
  otherMin: number;
}

/** Which kinds of intensity the work of these lines was entered in, in the order of bases. */
export function intensitiesOf(lines: readonly IntervalLine[]): Intensity[] {
  const kinds: Intensity[] = ['power', 'speed', 'heart-rate'];
  return kinds.filter((kind) => lines.some((line) => workIntensity(line, kind) !== undefined));
}

/** Work and recoveries one after another, each repetition with its recovery, the last one too (own convention). */
export function intervalBouts(lines: readonly IntervalLine[], kind: Intensity): IntervalBouts {
  const bouts: Bout[] = [];
  let restMin = 0;
  let otherMin = 0;
  for (const line of lines) {
    const work = workIntensity(line, kind);
    const recovery = recoveryIntensity(line, kind);
    const durationMin = line.durationS / 60;
    const recoveryMin = (line.recoveryS ?? 0) / 60;
    for (let repetition = 0; repetition < line.repetitions; repetition += 1) {
      if (work === undefined) otherMin += durationMin;
      else bouts.push({ durationMin, intensity: work });
      if (recoveryMin === 0) continue;
      if (recovery !== undefined) bouts.push({ durationMin: recoveryMin, intensity: recovery });
      else if (hasRecoveryIntensity(line)) otherMin += recoveryMin;
      else restMin += recoveryMin;
    }
  }
  return { bouts, restMin, otherMin };
}

/** Minutes of all lines with their recoveries. */
export function intervalMinutes(lines: readonly IntervalLine[]): number {
  return lines.reduce((sum, line) => sum + (line.repetitions * (line.durationS + (line.recoveryS ?? 0))) / 60, 0);
}

function workIntensity(line: IntervalLine, kind: Intensity): number | undefined {
  if (kind === 'power') return line.powerW;
  return kind === 'speed' ? line.speedMps : line.heartRateBpm;
}

function recoveryIntensity(line: IntervalLine, kind: Intensity): number | undefined {
  if (kind === 'power') return line.recoveryPowerW;
  return kind === 'speed' ? line.recoverySpeedMps : line.recoveryHeartRateBpm;
}

function hasRecoveryIntensity(line: IntervalLine): boolean {
  return (line.recoveryPowerW ?? line.recoverySpeedMps ?? line.recoveryHeartRateBpm) !== undefined;
}

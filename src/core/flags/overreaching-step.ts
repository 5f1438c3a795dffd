import type { CriterionEvidence } from '../response-signs/criterion-evidence.ts';
import { criterionEvidence } from '../response-signs/criterion-evidence.ts';
import type { OverreachingSettings } from './overreaching-settings.ts';
import type { OverreachingEpisode, OverreachingInput, OverreachingStep } from './overreaching-types.ts';
import type { StandingFamily } from './standing-families.ts';
import { sourcesOf } from './standing-families.ts';

/** An episode under way, and how many days in a row its evidence has been missing. */
export interface Under {
  readonly episode: OverreachingEpisode;
  readonly levelSince: number;
  readonly withoutSigns: number;
  readonly withoutCriterion: number;
}

/** An episode on its first day. */
export function raised(day: number, families: readonly StandingFamily[]): Under {
  const level = 'strained';
  const steps: OverreachingStep[] = [{ day, change: 'raised', level }];
  const evidence = { day, families, criterion: null };
  const episode = { since: day, until: null, level, highest: level, steps, evidence } as const;
  return { episode, levelSince: day, withoutSigns: 0, withoutCriterion: 0 };
}

/** The same a day on; `families`: those still open that day. */
export function carried(
  before: Under,
  day: number,
  explained: boolean,
  families: readonly StandingFamily[],
  log: Pick<OverreachingInput, 'results' | 'bouts'>,
  { clearDays, minStayDays }: OverreachingSettings,
): Under {
  const holds = families.length >= 2;
  const fallen = holds ? performance(families, day, log) : null;
  const withoutSigns = holds ? 0 : before.withoutSigns + 1;
  const withoutCriterion = fallen === null ? before.withoutCriterion + 1 : 0;
  const stayed = day - before.levelSince >= minStayDays;
  const { episode } = before;
  const now = { ...before, withoutSigns, withoutCriterion };
  if (stayed && withoutSigns >= clearDays) {
    const steps = [...episode.steps, { day, change: 'cleared', level: null } as const];
    return { ...now, episode: { ...episode, until: day, steps } };
  }
  const seen = holds ? { day, families, criterion: fallen?.criterion ?? null } : episode.evidence;
  const suspected = episode.level === 'overreaching-suspected';
  if (!suspected && fallen !== null && !explained) {
    return changed(now, day, 'escalated', { ...seen, families: fallen.families });
  }
  if (suspected && stayed && withoutCriterion >= clearDays)
    return changed(now, day, 'eased', { ...seen, criterion: null });
  if (!suspected) return { ...now, episode: { ...episode, evidence: { ...seen, criterion: null } } };
  // While only the performance evidence is missing, the higher level is shown as it last held.
  const evidence = fallen === null ? episode.evidence : { ...seen, families: fallen.families };
  return { ...now, episode: { ...episode, evidence } };
}

function changed(
  now: Under,
  day: number,
  change: 'escalated' | 'eased',
  evidence: OverreachingEpisode['evidence'],
): Under {
  const level = change === 'escalated' ? 'overreaching-suspected' : 'strained';
  const { episode } = now;
  const steps = [...episode.steps, { day, change, level } as const];
  const highest = change === 'escalated' ? level : episode.highest;
  return { ...now, levelSince: day, withoutCriterion: 0, episode: { ...episode, level, highest, steps, evidence } };
}

/** Performance evidence that leaves two families to stand on, and the families that share no value with it. */
function performance(
  families: readonly StandingFamily[],
  day: number,
  log: Pick<OverreachingInput, 'results' | 'bouts'>,
): { criterion: CriterionEvidence; families: StandingFamily[] } | null {
  const firstSign = Math.min(...families.map((one) => one.firstSign ?? Infinity));
  for (const [place, one] of families.entries()) {
    for (const other of families.slice(place + 1)) {
      const criterion = criterionEvidence(log, day, firstSign, sourcesOf([one, other]));
      if (criterion === null) continue;
      const taken = [criterion.test.id, criterion.confirmedBy.id];
      const free = families.filter((family) => !sourcesOf([family]).some((source) => taken.includes(source)));
      return { criterion, families: free };
    }
  }
  return null;
}

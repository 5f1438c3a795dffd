import { overreachingScreen } from '../../src/core/flags/overreaching-screen.ts';
import type { OverreachingEpisode } from '../../src/core/flags/overreaching-types.ts';
import { effortMismatch } from '../../src/core/response-signs/effort-mismatch.ts';
import { morningSigns } from '../../src/core/response-signs/morning-signs.ts';
import { standardBouts } from '../../src/core/response-signs/standard-bouts.ts';
import { variabilityBand } from '../../src/core/response-signs/variability-band.ts';
import type { Log } from './response-signs/support.ts';
import { FIRST } from './response-signs/support.ts';

/** Everything from the first day to this one: the log as it stood then, its families, the screen. */
export function screenUpTo(log: Log, lastDay: number): OverreachingEpisode[] {
  const upTo = <T extends { readonly day: number }>(all: readonly T[]): T[] => all.filter(({ day }) => day <= lastDay);
  const [mornings, bouts] = [upTo(log.mornings), upTo(log.bouts)];
  const families = {
    'morning-answers': morningSigns(mornings),
    'effort-mismatch': effortMismatch(upTo(log.sessions), FIRST, lastDay),
    variability: variabilityBand(upTo(log.variability)),
    'standard-bout': standardBouts(bouts, FIRST, lastDay),
  };
  const days = mornings.map(({ day }) => ({ day, explained: false }));
  return overreachingScreen({ days, families, results: upTo(log.results), bouts });
}

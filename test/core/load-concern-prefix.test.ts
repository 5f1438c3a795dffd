import { expect, test } from '@jest/globals';
import fc from 'fast-check';
import type { LoadConcernDay, Muting } from '../../src/core/types.ts';
import { loadConcern } from '../../src/core/flags/load-concern.ts';
import { acuteChronicCoupled } from '../../src/core/ratio/acute-chronic-coupled.ts';
import { monotonyPopulation, strain } from '../../src/core/load/monotony.ts';
import { FIRST } from './flag-days.ts';

const MUTINGS: Muting[] = ['planned-overload', 'unload', 'taper', 'unavailable', 'return'];

/** Figures of a log: loads by day (NaN unknown), stretches of muting, spikes. */
function figures(loads: number[], muted: (Muting | null)[], spikes: number[]): LoadConcernDay[] {
  const { ratio, chronic } = acuteChronicCoupled(loads);
  return loads.map((_, index) => {
    const week = index < 6 ? [NaN] : loads.slice(index - 6, index + 1);
    const monotony = monotonyPopulation(week);
    return {
      day: FIRST + index,
      ratio: ratio[index]!,
      chronic: chronic[index]!,
      monotony,
      strain: strain(
        week.reduce((sum, one) => sum + one, 0),
        monotony,
      ),
      muted: muted[Math.floor(index / 10)] ?? null,
      spike: spikes.includes(index) ? { percent: 5 + index, sessionId: String(index) } : null,
    };
  });
}

/** Blocks of twelve days at levels far enough apart to raise and clear every measure. */
const log = fc
  .record({
    levels: fc.array(fc.constantFrom(0, 20, 50, 100, 200, 400), { minLength: 8, maxLength: 16 }),
    wobble: fc.array(fc.constantFrom(0, 0.1, 1, 1.7, NaN), { minLength: 11, maxLength: 11 }),
    muted: fc.array(fc.option(fc.constantFrom(...MUTINGS), { freq: 4 }), { maxLength: 20 }),
    spikes: fc.array(fc.nat(150), { maxLength: 4 }),
    gap: fc.nat(3),
  })
  .map(({ levels, wobble, muted, spikes, gap }) => {
    const loads = levels.flatMap((level, block) =>
      Array.from({ length: 12 }, (_, i) => {
        const part = wobble[(block * 5 + i) % 11]!;
        if (Number.isNaN(part) && gap > 0) return level;
        return level * (gap > 1 ? 1 + 0.05 * part : part);
      }),
    );
    return figures(loads, muted.slice(), spikes);
  });

test('a day sees only data up to it: episodes of a prefix are those of the whole, but for how they go on', () => {
  let compared = 0;
  fc.assert(
    fc.property(log, fc.array(fc.nat(190), { minLength: 4, maxLength: 4 }), (days, cuts) => {
      const whole = loadConcern({ days, firstDay: FIRST });
      for (const cut of cuts) {
        const last = FIRST + Math.min(cut, days.length - 1);
        const part = loadConcern({ days: days.slice(0, last - FIRST + 1), firstDay: FIRST });
        const begun = whole.filter(({ since }) => since <= last);
        expect(part.map(({ since }) => since)).toEqual(begun.map(({ since }) => since));
        begun.forEach((episode, index) => {
          const ended = episode.until !== null && episode.until <= last;
          if (ended) expect(part[index]).toEqual(episode);
          else expect(part[index]!.until).toBeNull();
          compared += 1;
        });
      }
    }),
    { numRuns: 60 },
  );
  expect(compared).toBeGreaterThan(100);
});

test('one hard week raises one episode that clears, and since stays what it was from the first day to the last', () => {
  const loads = Array.from({ length: 150 }, (_, index) => (index >= 90 && index < 97 ? 300 : 60 + (index % 7) * 10));
  const days = figures(loads, [], []);
  const sinces = new Set<number>();
  for (let length = 91; length <= days.length; length += 1) {
    const open = loadConcern({ days: days.slice(0, length), firstDay: FIRST }).filter(({ until }) => until === null);
    open.forEach(({ since }) => sinces.add(since));
  }
  const ratios = loadConcern({ days, firstDay: FIRST });
  expect(ratios.length).toBe(1);
  expect([...sinces]).toEqual(ratios.map(({ since }) => since));
  expect(ratios[0]!.since - FIRST).toBeGreaterThanOrEqual(90);
  expect(ratios[0]!.until! - FIRST).toBeLessThan(120);
});

test('an even log with one day off a week raises nothing', () => {
  const even = Array.from({ length: 200 }, (_, index) => (index % 7 === 0 ? 0 : 80));
  const episodes = loadConcern({ days: figures(even, [], []), firstDay: FIRST });
  expect(episodes).toEqual([]);
});

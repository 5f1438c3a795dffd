import { describe, expect, test } from '@jest/globals';
import { CAUTIONS } from '../../../src/features/flags/cautions.types.ts';
import { flagWords } from '../../../src/features/flags/sentences.ts';
import type { FlagEpisode, FlagEvidence, LoadPart } from '../../../src/features/flags/flags.types.ts';

const day = '2026-11-29';

function episode(evidence: FlagEvidence, since = '2026-11-26'): FlagEpisode {
  return { kind: evidence.kind, level: 'note', since, until: null, evidence };
}

function load(part: Partial<LoadPart> & Pick<LoadPart, 'measure' | 'value' | 'limit'>): FlagEvidence {
  const parts = [{ day, since: '2026-11-26', until: null, ...part }];
  const { measure: strongest } = part;
  return {
    kind: 'load-concern',
    day,
    strongest,
    parts,
    ratioLimit: 1.5,
    loadMeasure: 'domain-load',
    form: 'rolling-coupled',
  };
}

const all: FlagEvidence[] = [
  load({ measure: 'ratio', value: 1.7234, limit: 1.5488 }),
  load({ measure: 'ratio', value: 1.7234, limit: 1.5, shortHistory: true }),
  load({ measure: 'chronic-low', value: 42, limit: 50, usual: 100 }),
  load({ measure: 'monotony-strain', value: 2.4, limit: 2, strain: 5000, strainLimit: 4800 }),
  load({ measure: 'spike', value: 28.4, limit: 10, spikeClass: 'small' }),
  { kind: 'return', day, dayN: 5, share: 46.4 },
  { kind: 'return', day, dayN: 5, share: null },
  { kind: 'recovering', day, dayN: 3, of: 14 },
  { kind: 'planned-overload', day, dayN: 5, of: 14, ratio: 1.31 },
  { kind: 'log-gap', day, known: 4, of: 7 },
  { kind: 'data-suspect', day, sessions: 2, lastSeen: '2026-11-27' },
  { kind: 'thresholds-out-of-date', day, modality: 'rowing', newest: '2026-09-12', ageDays: 78, limitDays: 56 },
];

describe('sentences', () => {
  test('every kind says one claim and one question, in the words of a training hall', () => {
    for (const evidence of all) {
      const { claim, ask, sentence, clears } = flagWords(episode(evidence));
      expect(sentence).toBe(`${claim}; ${ask}.`);
      expect(ask).toMatch(/^ask /);
      expect(sentence.match(/;/g)).toHaveLength(1);
      expect(clears).toMatch(/\.$/);
      expect(`${sentence} ${clears}`).not.toMatch(/risk|injur|\bill|sick|fatigue|overtrain|diagnos|NaN|undefined/i);
    }
  });

  test('the figures are those of the evidence, rounded for speech', () => {
    const claim = (evidence: FlagEvidence, since?: string) => flagWords(episode(evidence, since)).claim;
    expect(claim(all[0]!)).toBe(
      "This week's daily load is 1.72 times that of the last four weeks, above the own upper end of 1.55",
    );
    expect(claim(all[1]!)).toContain('above the general limit of 1.50 (short history)');
    expect(claim(all[2]!)).toContain('dropped to 42 % of the own usual');
    expect(claim(all[4]!)).toBe('A run 28 % longer than the longest of the 30 days before it');
    expect(claim(all[5]!)).toBe('Day 5 of return, load at 46 % of before');
    expect(claim(all[8]!)).toContain('Within planned overload, day 5 of 14');
    expect(claim(all[11]!)).toContain('the test of 12 Sep, 11 weeks ago (at most 8 are meant)');
  });

  test('a concern that lasts says which week it is', () => {
    const { claim } = flagWords(episode(all[0]!, '2026-11-12'));
    expect(claim).toMatch(/^Third week: this week's daily load/);
  });

  test('low chronic load clears at its limit ÷ 0.95', () => {
    expect(flagWords(episode(all[2]!)).clears).toContain('back at 53 %');
  });
});

test('cautions never speak of risk', () => {
  expect(CAUTIONS.join(' ')).not.toMatch(/risk/i);
});

import { describe, expect, it } from '@jest/globals';
import { judgeSession } from '../../../src/features/sessions/judge-session.ts';
import { sessionEntry } from '../../../src/features/sessions/session-entry.ts';
import { sessionInputSchema } from '../../../src/features/sessions/sessions.schema.ts';
import type { Quantity, ResolvedThreshold } from '../../../src/features/thresholds/thresholds.types.ts';

const thresholds = new Map<Quantity, ResolvedThreshold>(
  (
    [
      ['max-heart-rate', 190],
      ['resting-heart-rate', 50],
    ] as const
  ).map(([quantity, value]) => [quantity, { quantity, value, id: quantity, validFrom: '2026-01-01', method: 'test' }]),
);

function judge(more: object, known = thresholds) {
  const input = { startedAt: '2026-03-01T07:30:00+01:00', durationMin: 60, modality: 'rowing', ...more };
  return judgeSession(sessionEntry(sessionInputSchema.parse(input)), known);
}

describe('judgeSession', () => {
  it('accepts an ordinary session', () => {
    expect(judge({ rating: 5, meanHeartRateBpm: 150, peakHeartRateBpm: 188 })).toEqual({
      refused: [],
      quality: 'ok',
      notes: [],
    });
  });

  it.each([
    [190, 'ok', 0],
    [190.5, 'suspect', 1],
    [230, 'suspect', 1],
  ] as const)('a mean of %s bpm with a maximum of 190: %s, refused %s', (meanHeartRateBpm, quality, refused) => {
    const judgement = judge({ meanHeartRateBpm });
    expect(judgement.quality).toBe(quality);
    expect(judgement.refused).toHaveLength(refused);
  });

  it('says that the stored maximum may be old', () => {
    expect(judge({ meanHeartRateBpm: 200 }).refused).toEqual([
      {
        field: 'meanHeartRateBpm',
        value: 200,
        allowed: 'at most 190 bpm, the stored maximum',
        hint: 'That may be old.',
      },
    ]);
  });

  it('judges the heart rates of intervals the same way', () => {
    const content = { kind: 'intervals', lines: [{ repetitions: 1, durationS: 600, heartRateBpm: 194 }] };
    expect(judge({ content }).refused).toEqual([expect.objectContaining({ field: 'content.lines[0].heartRateBpm' })]);
    content.lines[0]!.heartRateBpm = 190;
    expect(judge({ content })).toMatchObject({ quality: 'ok', refused: [] });
  });

  it('keeps a peak above the maximum with a note', () => {
    expect(judge({ peakHeartRateBpm: 195 })).toEqual({
      refused: [],
      quality: 'ok',
      notes: ['HRmax may be higher, confirm'],
    });
  });

  it('judges no heart rate without a stored value', () => {
    expect(judge({ meanHeartRateBpm: 230, peakHeartRateBpm: 235 }, new Map())).toMatchObject({
      quality: 'ok',
      refused: [],
    });
  });

  it.each([
    ['a mean below rest', { meanHeartRateBpm: 49 }],
    ['a rating of 0', { rating: 0 }],
    ['longer than 8 h', { durationMin: 480.5 }],
    ['few domain minutes', { content: { kind: 'domain-minutes', moderate: 53.9, heavy: 0, severe: 0, extreme: 0 } }],
  ])('questions %s', (_, more) => {
    expect(judge(more)).toMatchObject({ quality: 'question', refused: [] });
  });

  it.each([
    ['8 h', { durationMin: 480 }],
    ['90 % of the minutes', { content: { kind: 'domain-minutes', moderate: 54, heavy: 0, severe: 0, extreme: 0 } }],
    ['a mean at rest', { meanHeartRateBpm: 50 }],
  ])('does not question %s', (_, more) => {
    expect(judge(more)).toMatchObject({ quality: 'ok', notes: [] });
  });

  it('allows a description one minute longer than the session, not more', () => {
    const minutes = (moderate: number) => ({
      content: { kind: 'domain-minutes', moderate, heavy: 0, severe: 0, extreme: 0 },
    });
    expect(judge(minutes(61)).refused).toEqual([]);
    expect(judge(minutes(61.5)).refused).toEqual([
      { field: 'content', value: 61.5, allowed: 'at most 61 min together (durationMin and 1)' },
    ]);
    const lines = (durationS: number) => ({
      content: { kind: 'intervals', lines: [{ repetitions: 4, durationS, powerW: 200, recoveryS: 300 }] },
    });
    expect(judge(lines(615)).refused).toEqual([]);
    expect(judge(lines(616)).refused).toEqual([expect.objectContaining({ field: 'content.lines', value: 61.07 })]);
  });

  it('refuses a mean above the session’s own peak', () => {
    expect(judge({ meanHeartRateBpm: 150, peakHeartRateBpm: 149 }).refused).toEqual([
      { field: 'meanHeartRateBpm', value: 150, allowed: 'at most peakHeartRateBpm' },
    ]);
  });
});
